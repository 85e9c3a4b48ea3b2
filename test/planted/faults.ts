import type { Cell } from "../../src/core/table/cells.ts";
import type { Fault, Made, Used } from "./fault.ts";
import type { Sheet } from "./sheet.ts";

const explained = (hypothesis: string) => ({ kind: "explanation", hypothesis }) as const;

const plain = (cell: Cell): number | null => (typeof cell === "number" ? cell : null);

/** The sheet with some cells of a column changed. */
function changed(sheet: Sheet, track: number, at: readonly number[], change: (cell: Cell) => Cell): Sheet {
  const rows = sheet.rows.map((row, index) =>
    at.includes(index) ? row.map((cell, column) => (column === track ? change(cell) : cell)) : row,
  );
  return { ...sheet, rows };
}

/** A few rows from the middle, never the same two. */
const middle = (sheet: Sheet, count: number): number[] =>
  Array.from({ length: count }, (_, i) => Math.floor(((i + 1) * sheet.rows.length) / (count + 1.6)));

const eachRow = (made: Made, change: (row: Used, index: number, rows: readonly Used[]) => Used): Made => ({
  ...made,
  rows: made.rows.map(change),
});

const atDriver = (row: Used, j: number, value: number): Used => ({
  ...row,
  x: row.x.map((one, i) => (i === j ? value : one)),
});

const sums = (rows: readonly Used[], divisor: number): Used => ({
  at: -1,
  y: rows.reduce((sum, { y }) => sum + y, 0) / divisor,
  x: rows[0]!.x.map((_, j) => rows.reduce((sum, { x }) => sum + x[j]!, 0) / divisor),
});

const zeroRow = ({ rows }: Made): Used => ({ at: -1, y: 0, x: rows[0]!.x.map(() => 0) });

const leftOffEnd = (count: number): Fault => ({
  name: `last ${count} left off`,
  expected: explained("rows-left-off-at-end"),
  rows: ({ claimed }) => ({ from: claimed.from, to: claimed.to - count }),
});

const leftOffStart = (count: number): Fault => ({
  name: `first ${count} left off`,
  expected: explained("rows-left-off-at-start"),
  rows: ({ claimed }) => ({ from: claimed.from + count, to: claimed.to }),
});

const factor = (name: string, scale: number, column: "outcome" | number): Fault => ({
  name: `${name} times ${scale}`,
  expected: explained("factor"),
  // A driver's own coefficient is the only number that its units move beside its standard error.
  ...(column !== "outcome" && { styles: ["errors", "all", "bounds"] as const }),
  made: (made) =>
    eachRow(made, (row) =>
      column === "outcome" ? { ...row, y: row.y * scale } : atDriver(row, column, row.x[column]! * scale),
    ),
});

const shift = (by: number, column: "outcome" | number): Fault => ({
  name: `${column === "outcome" ? "outcome" : "a driver"} shifted by ${by}`,
  expected: explained("shifted"),
  ...(column !== "outcome" && { only: severalDrivers }),
  made: (made) => ({
    ...made,
    rows: made.rows.flatMap((row, index) => {
      const other = made.rows[index + by];
      if (other === undefined) return [];
      return [column === "outcome" ? { ...row, y: other.y } : atDriver(row, column, other.x[column]!)];
    }),
  }),
});

const severalDrivers = [
  "mtcars",
  "stackloss",
  "credit-card",
  "investment",
  "school-scores-3",
  "months",
  "shops",
  "parts",
  "weeks",
];
const threeDrivers = ["mtcars", "stackloss", "credit-card", "school-scores-3", "months", "shops"];
const unordered = ["mtcars", "stackloss", "credit-card", "mandible", "school-scores-3", "shops", "parts"];
const positive = ["mtcars", "stackloss", "mandible", "months", "shops", "parts", "weeks"];

/** Rows that went missing, or came in by mistake. */
export const rowFaults: readonly Fault[] = [
  leftOffEnd(1),
  leftOffEnd(3),
  leftOffStart(1),
  leftOffStart(2),
  {
    name: "two rows too many at the end",
    expected: explained("extra-rows-at-end"),
    inBook: null,
    sheet: (sheet) => ({ ...sheet, claimed: { from: 0, to: sheet.claimed.to - 2 } }),
    rows: ({ rows }) => ({ from: 0, to: rows.length }),
  },
  {
    name: "a row too many at the start",
    expected: explained("extra-rows-at-start"),
    inBook: null,
    sheet: (sheet) => ({ ...sheet, claimed: { from: 1, to: sheet.claimed.to } }),
    rows: ({ rows }) => ({ from: 0, to: rows.length }),
  },
  {
    name: "total row counted in",
    expected: explained("total-row-counted"),
    sheet: (sheet) => ({ ...sheet, rows: [...sheet.rows, totalOf(sheet)] }),
    rows: ({ rows }) => ({ from: 0, to: rows.length }),
  },
  {
    name: "row of means counted in, since deleted",
    expected: explained("total-row-counted"),
    made: (made) => ({ ...made, rows: [...made.rows, sums(made.rows, made.rows.length)] }),
  },
  {
    name: "heading row counted in",
    expected: explained("heading-row-counted"),
    made: (made) => ({ ...made, rows: [zeroRow(made), ...made.rows] }),
  },
  {
    name: "three empty rows counted in",
    expected: explained("empty-rows-counted"),
    made: (made) => ({ ...made, rows: [...made.rows, zeroRow(made), zeroRow(made), zeroRow(made)] }),
  },
  {
    name: "hidden rows left out",
    expected: explained("hidden-rows-left-out"),
    sheet: (sheet) => ({ ...sheet, hidden: middle(sheet, 3) }),
    made: (made, { sheet }) => ({ ...made, rows: made.rows.filter((row) => !sheet.hidden.includes(row.at)) }),
  },
  {
    name: "one row left out",
    expected: explained("row-left-out"),
    made: (made, { random }) => {
      const gone = 2 + random.below(made.rows.length - 4);
      return { ...made, rows: made.rows.filter((_, row) => row !== gone) };
    },
  },
  {
    name: "a block of rows left out",
    expected: explained("rows-left-out"),
    made: (made) => ({ ...made, rows: made.rows.filter((_, row) => row < 4 || row > 7) }),
  },
  {
    name: "a block of rows pasted twice",
    expected: explained("block-repeated"),
    made: (made) => ({ ...made, rows: [...made.rows, ...made.rows.slice(3, 7)] }),
  },
  {
    name: "a repeated block dropped",
    expected: explained("repeat-left-out"),
    only: unordered,
    sheet: (sheet) => ({
      ...sheet,
      rows: [...sheet.rows.slice(0, 9), ...sheet.rows.slice(5, 9), ...sheet.rows.slice(9)],
      claimed: { from: 0, to: sheet.claimed.to + 4 },
    }),
    made: (made) => ({ ...made, rows: made.rows.filter(({ at }) => at < 9 || at > 12) }),
  },
];

const totalOf = (sheet: Sheet): Cell[] =>
  sheet.headings.map((_, track) =>
    track === 0 ? "Total" : sheet.rows.reduce((sum, row) => sum + (typeof row[track] === "number" ? row[track] : 0), 0),
  );

/** Cells that were read as something that they are not. */
export const cellFaults: readonly Fault[] = [
  {
    name: "empty cells as zero",
    expected: explained("empty-cells-as-zero"),
    sheet: (sheet) => changed(sheet, 2, middle(sheet, 2), () => null),
    read: (cell) => (cell === null ? 0 : plain(cell)),
  },
  {
    name: "words as zero",
    expected: explained("text-as-zero"),
    sheet: (sheet) => changed(sheet, 1, middle(sheet, 2), () => "closed"),
    read: (cell) => (typeof cell === "string" ? 0 : plain(cell)),
  },
  {
    name: "text numbers read",
    expected: explained("text-numbers-read"),
    sheet: (sheet) => changed(sheet, 2, middle(sheet, 3), String),
    read: (cell) => (typeof cell === "string" ? Number(cell) : plain(cell)),
  },
  {
    name: "text numbers as zero",
    expected: explained("text-numbers-as-zero"),
    sheet: (sheet) => changed(sheet, 2, middle(sheet, 2), String),
    read: (cell) => (typeof cell === "string" ? 0 : plain(cell)),
  },
];

/** The right rows, and something done to their columns. */
export const columnFaults: readonly Fault[] = [
  shift(1, "outcome"),
  shift(-2, "outcome"),
  shift(-1, 0),
  {
    name: "logarithm of the outcome",
    expected: explained("logarithm"),
    only: positive,
    made: (made) => eachRow(made, (row) => ({ ...row, y: Math.log(row.y) })),
  },
  {
    name: "logarithm of a driver",
    expected: explained("logarithm"),
    only: positive,
    made: (made) => eachRow(made, (row) => atDriver(row, 0, Math.log(row.x[0]!))),
  },
  {
    name: "logarithm of everything",
    expected: explained("logarithm"),
    only: positive,
    made: (made) => eachRow(made, (row) => ({ ...row, y: Math.log(row.y), x: row.x.map(Math.log) })),
  },
  {
    name: "logarithm to base 10 of the outcome",
    expected: explained("base-10-logarithm"),
    only: positive,
    made: (made) => eachRow(made, (row) => ({ ...row, y: Math.log10(row.y) })),
  },
  {
    name: "logarithm claimed and not taken",
    expected: explained("no-logarithm"),
    inBook: null,
    only: positive,
    claimedForms: { 2: "logarithm" },
  },
  {
    name: "changes in place of values",
    expected: explained("changes"),
    only: ["months", "weeks", "mtcars", "investment", "shops"],
    made: (made) => ({
      ...made,
      rows: made.rows.slice(1).map((row, i) => ({
        at: row.at,
        y: row.y - made.rows[i]!.y,
        x: row.x.map((value, j) => value - made.rows[i]!.x[j]!),
      })),
    }),
  },
  {
    name: "outcome sorted on its own",
    expected: explained("sorted-alone"),
    made: (made) => {
      const sorted = made.rows.map(({ y }) => y).sort((a, b) => a - b);
      return eachRow(made, (row, index) => ({ ...row, y: sorted[index]! }));
    },
  },
];

/** The right numbers in the wrong model, or under the wrong names. */
export const modelFaults: readonly Fault[] = [
  { name: "no constant", expected: explained("no-constant"), made: (made) => ({ ...made, constant: false }) },
  {
    name: "a constant where none is claimed",
    expected: explained("with-constant"),
    inBook: null,
    claimsConstant: false,
  },
  {
    name: "coefficients in reverse order",
    expected: explained("reverse-order"),
    only: severalDrivers,
    made: (made) => ({ ...made, order: made.order.toReversed() }),
  },
  {
    name: "two drivers exchanged",
    expected: explained("drivers-exchanged"),
    only: threeDrivers,
    made: (made) => ({ ...made, order: [1, 0, ...made.order.slice(2)] }),
  },
  factor("outcome", 1000, "outcome"),
  factor("outcome", 0.01, "outcome"),
  factor("first driver", 10, 0),
  factor("first driver", 0.001, 0),
  {
    name: "outcome and a driver changed places",
    expected: explained("swapped"),
    made: (made) => eachRow(made, (row) => ({ ...row, y: row.x[0]!, x: [row.y, ...row.x.slice(1)] })),
  },
  {
    name: "a driver left out",
    expected: explained("driver-left-out"),
    inBook: null,
    only: threeDrivers,
    made: (made) => ({
      ...eachRow(made, (row) => ({ ...row, x: row.x.slice(0, -1) })),
      order: made.order.map((place, term) => (term === made.order.length - 1 ? null : place)),
    }),
  },
  {
    name: "a further driver",
    expected: explained("another-driver"),
    made: (made, { sheet }) => eachRow(made, (row) => ({ ...row, x: [...row.x, spareAt(sheet, row.at)] })),
  },
  {
    name: "another column in place of a driver",
    expected: explained("another-column"),
    made: (made, { sheet }) => eachRow(made, (row) => atDriver(row, 0, spareAt(sheet, row.at))),
  },
];

const spareAt = ({ rows, headings }: Sheet, at: number): number => Number(rows[at]![headings.length - 1]);

/** Standard errors of another kind than the reader would think, or than the data allow. */
export const errorFaults: readonly Fault[] = [
  {
    name: "classical standard errors that are not allowed",
    expected: { kind: "finding", code: "errors-not-allowed" },
    only: ["months", "shops", "weeks", "school-scores-3"],
    errors: { kind: "classical" },
  },
  ...(["HC0", "HC1", "HC2", "HC3", "HC4"] as const).map((version): Fault => ({
    name: `White's ${version}`,
    expected: { kind: "errors", name: `White (${version})` },
    errors: { kind: "white", version },
  })),
  ...[1, 4].map((lags): Fault => ({
    name: `Newey-West, ${lags} lags`,
    expected: { kind: "errors", name: `Newey-West with ${lags} ${lags === 1 ? "lag" : "lags"}` },
    errors: { kind: "newey-west", lags: { kind: "given", lags }, adjusted: true },
  })),
];

/** Slips in the report itself, and reports that are right about too few rows. */
export const reportFaults: readonly Fault[] = [
  {
    name: "two digits of one coefficient exchanged",
    expected: { kind: "finding", code: "one-number-differs" },
    typed: (reported) => {
      const at = reported.findIndex(({ quantity }) => quantity.kind === "coefficient");
      return reported.map((number, index) =>
        index === at ? { ...number, value: number.value + 90 * number.halfUnit } : number,
      );
    },
  },
  {
    name: "the range stops before the data do",
    expected: { kind: "finding", code: "range-stops-early" },
    inBook: explained("rows-left-off-at-end"),
    sheet: (sheet) => ({ ...sheet, claimed: { from: 0, to: sheet.claimed.to - 4 } }),
  },
  {
    name: "a total inside the range",
    expected: { kind: "finding", code: "total-row-in-range" },
    inBook: explained("total-row-counted"),
    sheet: (sheet) => ({
      ...sheet,
      rows: [...sheet.rows, totalOf(sheet)],
      claimed: { from: 0, to: sheet.rows.length + 1 },
    }),
  },
  {
    name: "numbers kept as text left out",
    expected: { kind: "finding", code: "text-numbers-left-out" },
    sheet: (sheet) => changed(sheet, 2, middle(sheet, 3), String),
  },
  {
    name: "bounds of 90 % under headings of 95 %",
    expected: { kind: "errors", name: "classical, bounds at 90 %" },
    inBook: { kind: "finding", code: "bounds-of-another-level" },
    styles: ["bounds"],
    level: 0.1,
  },
];
