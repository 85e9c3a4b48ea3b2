import type { Errand } from "../app/errand.ts";
import { type Result, failure, success } from "../core/problem/result.ts";
import { addressOf } from "../core/table/address.ts";
import type { SheetPlan } from "../sheet/plan.ts";
import { type Rectangle, rectangleOf, whereabouts } from "./areas.ts";
import { rangeAt } from "./writeCells.ts";

/** Stands on every sheet that Footing wrote; it travels with the workbook and outlives a change of the sheet's name. */
export const sheetMark = { key: "Footing", value: "result sheet" } as const;

export const markOf = ({ holds }: SheetPlan): string => (holds === "review" ? "review sheet" : sheetMark.value);

type Done = Result<{ readonly sheet: string }>;

/** Calculates every formula of the sheet in front, whether or not a cell that it reads has changed. */
export async function recalculateSheet(context: Excel.RequestContext): Promise<Done> {
  const sheet = context.workbook.worksheets.getActiveWorksheet().load("name");
  const used = sheet.getUsedRangeOrNullObject(false).load(whereabouts);
  await context.sync();
  if (used.isNullObject) return failure({ code: "no-data", where: sheet.name });
  used.calculate();
  await context.sync();
  return success({ sheet: sheet.name });
}

/** Puts values in the place of the formulas of the sheet in front, once every value is there. */
export async function keepSheet(context: Excel.RequestContext, errand: Errand): Promise<Done> {
  const sheet = context.workbook.worksheets.getActiveWorksheet().load("name");
  const mark = sheet.customProperties.getItemOrNullObject(sheetMark.key).load("value");
  const used = sheet.getUsedRangeOrNullObject(false).load(whereabouts);
  sheet.protection.load("protected");
  await context.sync();
  const { name } = sheet;
  if (mark.isNullObject || used.isNullObject) return failure({ code: "not-a-result-sheet", sheet: name });
  if (sheet.protection.protected) return failure({ code: "sheet-protected", sheet: name });
  const found = await readStrips(sheet, rectangleOf(used));
  const missing = found.flatMap((strip) => errorsIn(strip, name));
  if (missing.length > 0) return failure({ code: "values-missing", ...named(missing) });
  // Half a kept sheet would be neither: from here on it is not cancelled.
  if (errand.signal.aborted) return failure({ code: "cancelled" });
  for (const { area, values, formulas } of found) {
    rangeAt(sheet, area).formulas = values.map((line, row) =>
      line.map((value, column) => kept(value, formulas[row]![column])),
    );
    await context.sync();
  }
  return success({ sheet: name });
}

/** Rows of a sheet as they were read, few enough for one trip. */
interface Strip {
  readonly area: Rectangle;
  readonly values: readonly (readonly unknown[])[];
  readonly formulas: readonly (readonly unknown[])[];
  readonly types: readonly (readonly string[])[];
}

/** Values, formulas and types of so many cells stay below the 5 MB that Excel on the web hands over at once. */
const cellsAtOnce = 20_000;

async function readStrips(sheet: Excel.Worksheet, { row, column, rows, columns }: Rectangle): Promise<Strip[]> {
  const height = Math.max(1, Math.floor(cellsAtOnce / columns));
  const strips: Strip[] = [];
  for (let first = 0; first < rows; first += height) {
    const area = { row: row + first, column, rows: Math.min(height, rows - first), columns };
    const range = rangeAt(sheet, area).load("values,formulas,valueTypes");
    await sheet.context.sync();
    const { values, formulas, valueTypes } = range;
    strips.push({ area, values, formulas, types: valueTypes });
  }
  return strips;
}

interface Missing {
  readonly cell: string;
  readonly value: string;
}

function errorsIn({ area, values, types }: Strip, sheet: string): Missing[] {
  const cellAt = (row: number, column: number): string =>
    addressOf({ sheet, row: area.row + row, column: area.column + column, rows: 1, columns: 1 });
  return types.flatMap((line, row) =>
    line.flatMap((type, column) =>
      type === "Error" ? [{ cell: cellAt(row, column), value: String(values[row]![column]) }] : [],
    ),
  );
}

const mostNamed = 10;

const named = (missing: readonly Missing[]) => ({
  cells: missing.slice(0, mostNamed).map(({ cell }) => cell),
  values: missing.slice(0, mostNamed).map(({ value }) => value),
  count: missing.length,
});

const isFormula = (formula: unknown): boolean => typeof formula === "string" && formula.startsWith("=");

/** A text is entered behind an apostrophe, so that it stays text; null leaves an empty cell as it is. */
function kept(value: unknown, formula: unknown): string | number | boolean | null {
  if (typeof value === "number" || typeof value === "boolean") return value;
  if (typeof value === "string" && value !== "") return `'${value}`;
  return isFormula(formula) ? "" : null;
}
