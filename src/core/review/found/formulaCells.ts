import type { Book, BookFormula, BookSheet } from "../book.ts";
import { type CellPlace, addressAt, numberAt, wordsAt } from "../cellsOfBook.ts";
import type { BookReview } from "../claimReview.ts";
import { type Met, nothingMet } from "../formula/met.ts";
import { evaluate, quantitiesIn } from "../formula/evaluate.ts";
import { parseFormula } from "../formula/parse.ts";
import type { Regression } from "../formula/foundRegression.ts";
import { type Results, noResults } from "../formula/results.ts";
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
  /** Whether the formula reads the result in other cells and makes no regression itself. */
  readonly isReader: boolean;
}

/** What the formulas of a sheet report, and which of them could not be read. */
export interface FormulasRead {
  readonly cells: readonly FormulaCell[];
  /** The regressions of all formulas that could be read, with the cell where each was first met. */
  readonly met: readonly { readonly regression: Regression; readonly cell: string }[];
  readonly unread: BookReview["unread"];
}

export function readFormulas(sheet: BookSheet, { book, results }: Ground): FormulasRead {
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
    const value = ownValue(entered, { place, book, met: seen, results });
    const found = value === null ? [] : cellsOf(entered, value, { sheet, met: seen });
    cells.push(...found);
    met.push(...seen.regressions.map(({ regression }) => ({ regression, cell: addressAt(place) })));
    const why = found.length > 0 ? null : whyNothing(value, { place, book, met: seen });
    if (why !== null) unread.push({ cell: addressAt(place), why });
  }
  return { cells: [...cells, ...readersOf(sheet, results)], met, unread };
}

/** A workbook, and what its cells show of regressions. */
export interface Ground {
  readonly book: Book;
  readonly results: Results;
}

interface At extends Ground {
  readonly place: CellPlace;
  readonly met: Met;
}

/** Results of other cells are followed where that tells more than the numbers in them. */
function ownValue({ formula }: BookFormula, { place, book, met, results }: At): Value | null {
  const parsed = parseFormula(formula);
  if (parsed === null) return null;
  const scope = { ...place, book, given: new Map(), followed: 0 };
  const followed = nothingMet();
  const value = evaluate(parsed, { ...scope, results }, followed);
  if (value.kind === "unknown") return evaluate(parsed, { ...scope, results: noResults }, met);
  met.regressions.push(...followed.regressions);
  met.unread.push(...followed.unread);
  return value;
}

/** The cells of formulas that read results in other cells; of those that cannot be followed nothing is missed. */
const readersOf = (sheet: BookSheet, results: Results): FormulaCell[] =>
  arraysAmong(sheet, sheet.readers).flatMap((entered) => {
    const result = results({ sheet, row: entered.row, column: entered.column });
    if (result === null) return [];
    const cells = cellsOf(entered, result.whole, { sheet, met: result.met });
    return cells.filter(({ measure }) => isReport(measure)).map((cell) => ({ ...cell, isReader: true }));
  });

/** A copy, or a figure worked out from results; a multiple of a coefficient is a use that is made of it. */
function isReport({ quantity: { kind }, steps }: Measure): boolean {
  const isFigure = kind === "ratio" || kind === "p-value" || kind === "low" || kind === "high" || kind === "prediction";
  return isFigure || steps.every((step) => step.kind === "rounded");
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
        return shows ? [{ place, measure, formula: entered.formula, functions, isReader: false }] : [];
      }),
    );
}

/** Why a formula reports nothing; null where no regression was met in it after all. */
function whyNothing(value: Value | null, { place, book, met }: Omit<At, "results">): string | null {
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
