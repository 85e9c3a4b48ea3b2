import type { BookFormula } from "../core/review/book.ts";
import { isRegressionFormula, isTotalFormula } from "../core/review/formula/telling.ts";
import { whereabouts } from "./areas.ts";
import { rangeAt } from "./writeCells.ts";

/** So many questions go to Excel at once. */
const atOnce = 200;

/** The formulas of a sheet, each with how far its result reaches; totals fill their own cell alone and are not asked. */
export async function withSpills(
  context: Excel.RequestContext,
  name: string,
  formulas: readonly BookFormula[],
): Promise<readonly BookFormula[]> {
  const sheet = context.workbook.worksheets.getItem(name);
  const found: BookFormula[] = [];
  for (let first = 0; first < formulas.length; first += atOnce) {
    const some = formulas.slice(first, first + atOnce);
    const spills = some.map((formula) =>
      mayFill(formula) ? rangeAt(sheet, formula).getSpillingToRangeOrNullObject().load(whereabouts) : null,
    );
    if (spills.some((spill) => spill !== null)) await context.sync();
    found.push(...some.map((formula, index) => reaching(formula, spills[index] ?? null)));
  }
  return found;
}

const mayFill = ({ formula }: BookFormula): boolean => isRegressionFormula(formula) || !isTotalFormula(formula);

const reaching = (formula: BookFormula, spill: Excel.Range | null): BookFormula =>
  spill === null || spill.isNullObject ? formula : { ...formula, rows: spill.rowCount, columns: spill.columnCount };
