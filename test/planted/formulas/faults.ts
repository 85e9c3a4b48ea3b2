import type { BookCell } from "../../../src/desk/book/bookData.ts";
import { type Form, linestForms, positionForms } from "./forms.ts";
import { type Ranges, type Worksheet, changed, numberIn } from "./worksheet.ts";

/** What a review must say: the short name of a finding, or why a formula could not be read. */
export type Said = { readonly finding: string } | { readonly unread: RegExp };

/** One thing that goes wrong where formulas report, in the words of a workbook and not of the review. */
export interface FormulaFault {
  readonly name: string;
  readonly said: Said;
  /** All where it does not say. */
  readonly forms?: readonly Form[];
  readonly severalDrivers?: true;
  /** Where formulas name no drivers; none where it does not say. */
  readonly ofPositions?: readonly Form[];
  /** No number is left that formulas report, so that no second fault can show beside it. */
  readonly alone?: true;
  /** Data sets that it can be planted in; all where it does not say. */
  readonly only?: readonly string[];
  readonly sheet?: (sheet: Worksheet) => Worksheet;
  readonly ranges?: (whole: Ranges, sheet: Worksheet) => Ranges;
  /** What became of the data after the formulas were calculated. */
  readonly since?: (sheet: Worksheet) => Worksheet;
  readonly constant?: false;
  readonly slip?: number;
  readonly labels?: (names: readonly string[]) => readonly string[];
  readonly report?: (rows: BookCell[][], names: readonly string[]) => BookCell[][];
}

const finding = (code: string): Said => ({ finding: code });

/** Rows from the middle of the sheet. */
const middle = ({ rows }: Worksheet, count: number): number[] =>
  Array.from({ length: count }, (_, i) => Math.floor(((i + 1) * rows.length) / (count + 1.6)));

const both = (span: Ranges["outcome"]): Ranges => ({ outcome: span, drivers: span });

const withTotal = (sheet: Worksheet): Worksheet => {
  const total = sheet.headings.map((_, column): BookCell =>
    column === 0 ? "Total" : sheet.rows.reduce((sum, row) => sum + (numberIn(row[column]) ?? 0), 0),
  );
  return { ...sheet, rows: [...sheet.rows, total] };
};

/** A cell that a formula fills, of the same value. */
const byFormula = (cell: BookCell): BookCell => {
  const value = numberIn(cell);
  return value === null ? cell : { value, formula: `=ROUND(${value},12)` };
};

export const withFormulas = (sheet: Worksheet): Worksheet =>
  changed(sheet, 2, [sheet.rows.map((_, row) => row), byFormula]);

const linest: readonly Form[] = linestForms;

/** The ranges are not those that the data have. */
export const rangeFaults: readonly FormulaFault[] = [
  {
    name: "the range stops before the data do",
    ofPositions: positionForms,
    said: finding("range-stops-early"),
    ranges: ({ outcome: { from, to } }) => both({ from, to: to - 4 }),
  },
  {
    name: "the range begins after the data do",
    ofPositions: positionForms,
    said: finding("range-stops-early"),
    ranges: ({ outcome: { from, to } }) => both({ from: from + 2, to }),
  },
  {
    name: "a total inside the range",
    ofPositions: positionForms,
    said: finding("total-row-in-range"),
    sheet: withTotal,
  },
  {
    name: "a heading inside the range",
    said: finding("heading-inside"),
    forms: ["one driver"],
    ranges: ({ outcome: { to } }) => both({ from: -1, to }),
  },
  {
    name: "a heading inside the range of LINEST",
    said: { unread: /#VALUE!.*![A-Z]1, which it is to use, holds "/ },
    alone: true,
    forms: [...linest, "trend"],
    ranges: ({ outcome: { to } }) => both({ from: -1, to }),
  },
  {
    name: "the drivers' range a row further down",
    said: finding("shifted"),
    ranges: ({ outcome: { from, to } }) => ({ outcome: { from, to: to - 1 }, drivers: { from: from + 1, to } }),
  },
  {
    name: "ranges of unequal height",
    said: finding("unequal"),
    alone: true,
    ranges: ({ outcome, drivers }) => ({ outcome, drivers: { ...drivers, to: drivers.to - 1 } }),
  },
  {
    name: "ranges that slipped down as the formula was copied",
    said: finding("range-stops-early"),
    forms: ["one driver"],
    slip: 1,
  },
];

/** The formulas give something else than the report says. */
export const readingFaults: readonly FormulaFault[] = [
  {
    name: "no constant",
    ofPositions: positionForms,
    said: finding("no-constant"),
    forms: [...linest, "trend"],
    constant: false,
  },
  {
    name: "LINEST read from the first driver to the last",
    said: finding("named-otherwise"),
    forms: linest,
    severalDrivers: true,
    labels: (names) => names.toReversed(),
  },
  {
    name: "the error of the regression taken for that of the slope",
    said: finding("named-otherwise"),
    forms: ["one driver"],
    report: (rows, [name = ""]) => [
      ["Driver", "Coefficient", "Standard error"],
      [name, rows[0]![1]!, rows[3]![1]!],
      ["Constant", rows[1]![1]!],
    ],
  },
  {
    name: "a correlation called R squared",
    said: finding("named-otherwise"),
    forms: ["one driver"],
    report: (rows) => [...rows.slice(0, 2), ["R squared", rows[4]![1]!]],
  },
  {
    name: "LINEST's standard errors where the data do not allow them",
    said: finding("errors-not-allowed"),
    forms: linest,
    only: ["months", "shops", "weeks", "school-scores-3"],
  },
  {
    name: "a number typed over a formula of the report",
    said: finding("typed-among-formulas"),
    forms: ["index", "let"],
    report: (rows) => rows.map((row, at) => (at === 1 ? [row[0]!, row[1]!, numberIn(row[2]), ...row.slice(3)] : row)),
  },
  {
    name: "results pasted as values",
    said: finding("typed-results"),
    alone: true,
    forms: ["index"],
    report: (rows) => rows.map((row) => row.map((cell) => (typeof cell === "string" ? cell : numberIn(cell)))),
  },
  {
    name: "results older than the data",
    ofPositions: ["array of positions", "table of positions"],
    said: finding("older-results"),
    forms: [...linest, "one driver"],
    since: (sheet) => changed(sheet, 1, [middle(sheet, 1), (cell) => (numberIn(cell) ?? 0) * 1.5 + 1]),
  },
];

/** The sheet of the data is made so that a reader, or a function, goes wrong. */
export const sheetFaults: readonly FormulaFault[] = [
  {
    name: "a number typed over the formulas of a driver",
    said: finding("over-formula"),
    sheet: (sheet) =>
      changed(withFormulas(sheet), 2, [middle(sheet, 1), (cell) => Math.round(120 * (numberIn(cell) ?? 0)) / 100 + 1]),
  },
  {
    name: "hidden rows counted in",
    ofPositions: positionForms,
    said: finding("hidden-rows"),
    sheet: (sheet) => ({ ...sheet, more: { hiddenRows: middle(sheet, 3).map((row) => row + 1) } }),
  },
  {
    name: "a hidden driver",
    said: finding("hidden-line"),
    sheet: (sheet) => ({ ...sheet, more: { hiddenColumns: [2] } }),
  },
  {
    name: "a hidden sheet",
    ofPositions: positionForms,
    said: finding("hidden-sheet"),
    sheet: (sheet) => ({ ...sheet, more: { hidden: true } }),
  },
  {
    name: "words among the data",
    said: finding("text-in-range"),
    forms: ["one driver"],
    sheet: (sheet) => changed(sheet, 2, [middle(sheet, 2), () => "closed"]),
  },
  {
    name: "words among the data of LINEST",
    said: { unread: /#VALUE!.*!C\d+, which it is to use, holds "closed"/ },
    alone: true,
    forms: [...linest, "trend"],
    sheet: (sheet) => changed(sheet, 2, [middle(sheet, 2), () => "closed"]),
  },
  {
    name: "numbers kept as text",
    said: finding("text-numbers-left-out"),
    forms: ["one driver"],
    sheet: (sheet) => changed(sheet, 2, [middle(sheet, 3), (cell) => String(numberIn(cell))]),
  },
  {
    name: "empty cells among the data",
    said: finding("blanks-in-range"),
    forms: ["one driver"],
    sheet: (sheet) => changed(sheet, 1, [middle(sheet, 2), () => null]),
  },
  {
    name: "a block of rows pasted twice",
    ofPositions: positionForms,
    said: finding("repeated"),
    sheet: (sheet) => ({ ...sheet, rows: [...sheet.rows, ...sheet.rows.slice(2, 9)] }),
  },
];

/** Nothing wrong, though it looks unusual. */
export const soundSheets: readonly Pick<FormulaFault, "name" | "sheet">[] = [
  { name: "nothing else" },
  { name: "a column of formulas", sheet: withFormulas },
  {
    name: "a note below",
    sheet: (sheet) => ({ ...sheet, more: {}, rows: [...sheet.rows, [], ["Checked against the ledger."]] }),
  },
  { name: "a total below", sheet: withTotal },
];
