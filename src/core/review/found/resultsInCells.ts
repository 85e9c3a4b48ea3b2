import type { Book, BookFormula, BookSheet } from "../book.ts";
import type { CellPlace } from "../cellsOfBook.ts";
import { nothingMet } from "../formula/met.ts";
import { evaluate } from "../formula/evaluate.ts";
import { parseFormula } from "../formula/parse.ts";
import type { CellResult, Results } from "../formula/results.ts";
import { showsRegression } from "../formula/telling.ts";
import { type Value, unknown } from "../formula/values.ts";
import { arraysAmong } from "./arraysAmong.ts";

/** What the cells of a book show of regressions, each formula followed once, when it is first asked for. */
export function resultsInCells(book: Book): Results {
  const isTold = showsRegression(book.names);
  const sheets = new Map<BookSheet, (place: CellPlace) => BookFormula | null>();
  const known = new Map<BookFormula, Omit<CellResult, "value" | "isCorner"> | null>();
  const results: Results = (place) => {
    const { sheet, row, column } = place;
    const at = sheets.get(sheet) ?? formulasOver(sheet, isTold);
    sheets.set(sheet, at);
    const entered = at(place);
    if (entered === null) return null;
    const found = followed(entered, sheet);
    if (found === null) return null;
    const [down, across] = [row - entered.row, column - entered.column];
    return { ...found, value: partOf(found.whole, down, across), isCorner: down + across === 0 };
  };
  const followed = (entered: BookFormula, sheet: BookSheet) => {
    const before = known.get(entered);
    if (before !== undefined) return before;
    // While it is being followed it stands for nothing: a circle ends there.
    known.set(entered, null);
    const formula = parseFormula(entered.formula);
    const met = nothingMet();
    const home = { book, sheet, row: entered.row, column: entered.column };
    const whole = formula && evaluate(formula, { ...home, given: new Map(), followed: 0, results }, met);
    const isResult = whole !== null && whole.kind !== "unknown" && whole.kind !== "known" && met.regressions.length > 0;
    const found = isResult ? { whole, met } : null;
    known.set(entered, found);
    return found;
  };
  return results;
}

const partOf = (whole: Value, row: number, column: number): Value =>
  whole.kind === "block" ? (whole.rows[row]?.[column] ?? unknown("")) : row + column === 0 ? whole : unknown("");

/** The formula that fills a cell, by itself or from another cell. */
function formulasOver(sheet: BookSheet, isTold: (formula: string) => boolean) {
  const single = new Map<string, BookFormula>();
  const wide: BookFormula[] = [];
  const told = sheet.formulas.filter(({ formula }) => isTold(formula));
  for (const entered of [...arraysAmong(sheet, told), ...arraysAmong(sheet, sheet.readers)]) {
    if (entered.rows * entered.columns === 1) single.set(`${entered.row},${entered.column}`, entered);
    else wide.push(entered);
  }
  return ({ row, column }: CellPlace): BookFormula | null =>
    single.get(`${row},${column}`) ?? wide.find((one) => fills(one, row, column)) ?? null;
}

const fills = (one: BookFormula, row: number, column: number): boolean =>
  row >= one.row && row < one.row + one.rows && column >= one.column && column < one.column + one.columns;
