import { blankSheet } from "../book/blankSheet.ts";
import type { BookCell, CellStyle, SheetData } from "../book/bookData.ts";
import { heightsUnder, looks, titleRows } from "./looks.ts";

/** A worksheet function over the months: what it shows, its formula, and the rows that its result takes at most. */
interface Sample {
  readonly name: string;
  readonly shows: string;
  /** Written for the sheet row, counted from 1, at which the result begins. */
  readonly formula: (row: number) => string;
  readonly rows: number;
  /** The looks of the result's columns, one after the other. */
  readonly columns: readonly CellStyle[];
  /** Cells that the formula reads, beside the result from its first row on. */
  readonly reads?: readonly (readonly BookCell[])[];
}

const above = [
  "The worksheet functions, each once",
  "All over the sheet Months: change a month there, or a cell on a ground of colour here, and the figures follow.",
];

const data = "Months!$B$4:$B$100,Months!$C$4:$E$100";
const months = "Months!$A$4:$A$100";
/** The months with their heading. */
const monthRows = 97;

const text: CellStyle = {};
const figure: CellStyle = { numberFormat: "#,##0.0000_)", horizontal: "right" };
const count: CellStyle = { numberFormat: "0_)", horizontal: "right" };
/** The cell holds every digit; four decimals would show a small p-value as zero. */
const pValue: CellStyle = { numberFormat: '[<0.0001]"under 0.0001"_);0.0000_)', horizontal: "right" };

const input = (value: number | string): BookCell => ({ value, style: looks.input });

const samples: readonly Sample[] = [
  {
    name: "ANSWER",
    shows: "The whole answer: a row for each driver, with the three standard errors and the one in force.",
    formula: () => `=FOOTING.ANSWER(${data},,${months})`,
    rows: 5,
    columns: [text, ...Array<CellStyle>(6).fill(figure), pValue, figure, figure, text],
  },
  {
    name: "VERDICT",
    shows: "What may be said of the repairs, in plain words, a sentence a row.",
    formula: () => `=FOOTING.VERDICT(${data},,,${months})`,
    rows: 8,
    columns: [text],
  },
  {
    name: "CHOICE",
    shows: "Which standard errors are in force, and what the ratios are compared with.",
    formula: () => `=FOOTING.CHOICE(${data},,${months})`,
    rows: 1,
    columns: [text],
  },
  {
    name: "EVIDENCE",
    shows: "The tests that led to that choice, each with its reading.",
    formula: () => `=FOOTING.EVIDENCE(${data},,,${months})`,
    rows: 42,
    columns: [text, text, figure, text, pValue, figure, text, pValue, text],
  },
  {
    name: "COEFFICIENTS",
    shows: "The coefficients alone, the constant first: for formulas of your own.",
    formula: () => `=FOOTING.COEFFICIENTS(${data},,${months})`,
    rows: 4,
    columns: [figure],
  },
  {
    name: "ERRORS",
    shows: "Standard errors of one kind: here White's, whatever the tests say.",
    formula: () => `=FOOTING.ERRORS(${data},"white",,${months})`,
    rows: 4,
    columns: [figure],
  },
  {
    name: "PVALUES",
    shows: "How easily chance alone would bring about such coefficients, if the drivers did nothing.",
    formula: () => `=FOOTING.PVALUES(${data},,,,${months})`,
    rows: 4,
    columns: [pValue],
  },
  {
    name: "INTERVALS",
    shows: "From where to where each coefficient may lie. The settings stand in the cells beside: try another level.",
    formula: (row) => `=FOOTING.INTERVALS(${data},,$H$${row}:$I$${row + 1},${months})`,
    rows: 4,
    columns: [figure, figure],
    reads: [["rows", "time"].map(input), ["level", 0.1].map(input)],
  },
  {
    name: "COVARIANCE",
    shows: "How the uncertainties of the coefficients hang together.",
    formula: () => `=FOOTING.COVARIANCE(${data},,,${months})`,
    rows: 4,
    columns: [figure, figure, figure, figure],
  },
  {
    name: "JOINT",
    shows:
      "Whether price and rain together do nothing: statistic, degrees of freedom, p-value. The weights stand beside.",
    formula: (row) => `=FOOTING.JOINT(${data},$H$${row}:$J$${row + 1},,,,${months})`,
    rows: 2,
    columns: [figure, text, pValue],
    reads: [[1, 0, 0].map(input), [0, 0, 1].map(input)],
  },
  {
    name: "PREDICT",
    shows: "Repairs to expect, low and high, at the price index, advertising and rainy days beside.",
    formula: (row) => `=FOOTING.PREDICT(${data},$H$${row}:$J$${row + 1},,,${months})`,
    rows: 2,
    columns: [figure, figure, figure],
    reads: [[105, 8, 10].map(input), [110, 12, 15].map(input)],
  },
  {
    name: "LAGS",
    shows: "How many lags the careful rule takes for 96 months.",
    formula: () => "=FOOTING.LAGS(96)",
    rows: 1,
    columns: [count],
  },
  {
    name: "SETTINGS",
    shows: "Every setting that the functions take, with its values: the manual inside the sheet.",
    formula: () => "=FOOTING.SETTINGS()",
    rows: 30,
    columns: [text, text, text, text],
  },
  {
    name: "FITTED",
    shows: "What the regression expects of each month, a row a month.",
    formula: () => `=FOOTING.FITTED(${data},,${months})`,
    rows: monthRows,
    columns: [figure],
  },
  {
    name: "RESIDUALS",
    shows: "How far each month lies from that, a row a month.",
    formula: () => `=FOOTING.RESIDUALS(${data},,${months})`,
    rows: monthRows,
    columns: [figure],
  },
];

/** The column in which results begin, and the one in which the cells that a formula reads stand beside them. */
const column = { result: 1, reads: 7 } as const;

/** Every worksheet function once, with what it shows; the values are the add-in's to find when the book is opened. */
export function functionsSheet(): SheetData {
  const rows: BookCell[][] = titleRows(above);
  // The sentence stands in one row, the result begins in the next, and rows count from 1.
  for (const sample of samples) rows.push(...rowsOf(sample, rows.length + 2));
  return {
    ...blankSheet("Functions", rows),
    columnWidths: [18, 30, 28, 16, 16, 14, 14, 14, 14, 14, 14, 30],
    rowHeights: heightsUnder(above),
    onePageWide: true,
    landscape: true,
    frozenRows: 2,
  };
}

/** The sentence, then as many rows as the result may take, and one that sets the sample apart from the next. */
function rowsOf({ name, shows, formula, rows, columns, reads = [] }: Sample, row: number): BookCell[][] {
  const said: BookCell[] = [
    { value: name, style: looks.firstHeading },
    { value: shows, style: looks.note },
  ];
  const lines = Array.from({ length: rows }, (_, index): BookCell[] => {
    const result = columns.map((style, place): BookCell => ({
      value: null,
      style,
      ...(index === 0 && place === 0 && { formula: formula(row) }),
    }));
    const beside = reads[index] ?? [];
    const gap = beside.length === 0 ? 0 : column.reads - column.result - result.length;
    return [...Array<BookCell>(column.result).fill(null), ...result, ...Array<BookCell>(gap).fill(null), ...beside];
  });
  return [said, ...lines, []];
}
