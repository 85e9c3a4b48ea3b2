import type { Book, BookFormula, BookSheet } from "../book.ts";
import { type CellPlace, addressAt, numberAt, wordsAt } from "../cellsOfBook.ts";
import type { BookReview } from "../claimReview.ts";
import { type Met, evaluate, nothingMet, quantitiesIn } from "../formula/evaluate.ts";
import { parseFormula } from "../formula/parse.ts";
import type { Regression } from "../formula/regression.ts";
import { type RegressionFunction, showsRegression } from "../formula/telling.ts";
import type { Measure, Value } from "../formula/values.ts";
import { whyUnread } from "../formula/whyUnread.ts";
import { arraysAmong } from "./arraysAmong.ts";
import { firstUnusable } from "./firstUnusable.ts";

/** A cell that shows a quantity of a regression. */
export interface FormulaCell {
  readonly place: CellPlace;
  readonly measure: Measure;
  readonly formula: string;
  readonly functions: readonly RegressionFunction[];
}

/** What the formulas of a sheet report, and which of them could not be read. */
export interface FormulasRead {
  readonly cells: readonly FormulaCell[];
  /** The regressions of all formulas that could be read, with the cell where each was first met. */
  readonly met: readonly { readonly regression: Regression; readonly cell: string }[];
  readonly unread: BookReview["unread"];
}

export function readFormulas(sheet: BookSheet, book: Book): FormulasRead {
  const isTold = showsRegression(book.names);
  const cells: FormulaCell[] = [];
  const met: { regression: Regression; cell: string }[] = [];
  const unread: { cell: string; why: string }[] = [];
  for (const entered of arraysAmong(
    sheet,
    sheet.formulas.filter(({ formula }) => isTold(formula)),
  )) {
    const place = { sheet, row: entered.row, column: entered.column };
    const seen = nothingMet();
    const value = valueOf(entered, { place, book, met: seen });
    const found = value === null ? [] : cellsOf(entered, value, { sheet, met: seen });
    cells.push(...found);
    met.push(...seen.regressions.map(({ regression }) => ({ regression, cell: addressAt(place) })));
    const why = found.length > 0 ? null : whyNothing(value, { place, book, met: seen });
    if (why !== null) unread.push({ cell: addressAt(place), why });
  }
  return { cells, met, unread };
}

interface At {
  readonly place: CellPlace;
  readonly book: Book;
  readonly met: Met;
}

function valueOf({ formula }: BookFormula, { place, book, met }: At): Value | null {
  const parsed = parseFormula(formula);
  return parsed === null ? null : evaluate(parsed, { ...place, book, given: new Map(), followed: 0 }, met);
}

interface On {
  readonly sheet: BookSheet;
  readonly met: Met;
}

/** The cells that a formula fills, each with the quantity that it shows. */
function cellsOf(entered: BookFormula, value: Value, { sheet, met }: On): FormulaCell[] {
  const functions = [...new Set(met.regressions.map(({ name }) => name))];
  return quantitiesIn(value)
    .slice(0, entered.rows)
    .flatMap((line, row) =>
      line.slice(0, entered.columns).flatMap((measure, column) => {
        const place = { sheet, row: entered.row + row, column: entered.column + column };
        const shows = measure !== null && numberAt(place) !== null;
        return shows ? [{ place, measure, formula: entered.formula, functions }] : [];
      }),
    );
}

/** Why a formula reports nothing; null where no regression was met in it after all. */
function whyNothing(value: Value | null, { place, book, met }: At): string | null {
  if (value === null) return whyUnread.notAFormula;
  const [why] = met.unread;
  if (why !== undefined) return why;
  const [first] = met.regressions;
  if (first === undefined) return null;
  if (value.kind === "unknown" && value.why !== "") return value.why;
  if (numberAt(place) !== null) return whyUnread.goesIntoArithmetic;
  const shows = wordsAt(place);
  const culprit = first.regression.passesOver ? null : firstUnusable(first.regression, book);
  return culprit === null
    ? whyUnread.noNumber(shows)
    : whyUnread.noNumberAmong(shows, addressAt(culprit), wordsAt(culprit));
}
