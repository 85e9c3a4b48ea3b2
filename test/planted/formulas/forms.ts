import type { BookCell, BookValue } from "../../../src/desk/book/bookData.ts";
import { type Calculated, type Calculation, calculated } from "./calculated.ts";
import { type Ranges, type Worksheet, rangeOf } from "./worksheet.ts";

/** How formulas report a regression. */
export const forms = ["array", "spilled", "index", "let", "one driver", "trend"] as const;
/** Formulas that name no drivers: 1, 2, 3 and so on take their place. */
export const positionForms = ["array of positions", "table of positions", "trend of positions"] as const;
/** Tables that read the results of LINEST in the cells beside them. */
export const readerForms = ["copied", "read from a spill", "read by MATCH"] as const;
export type Form = (typeof forms)[number] | (typeof positionForms)[number] | (typeof readerForms)[number];

/** The forms that take several drivers and end in an error where a cell is no number. */
export const linestForms = ["array", "spilled", "index", "let"] as const satisfies readonly Form[];

export interface Reporting {
  /** The data as they were when the formulas were calculated. */
  readonly sheet: Worksheet;
  readonly name: string;
  readonly ranges: Ranges;
  readonly constant: boolean;
  /** By how many rows the ranges move from one formula to the next, as they do where they were copied without $. */
  readonly slip: number;
  /** The driver that each place in the report is said to be about. */
  readonly labels: readonly string[];
  /** Whether the formulas name no drivers. */
  readonly byPosition?: true;
}

type Rows = BookCell[][];

export const reportRows: Readonly<Record<Form, (reporting: Reporting) => Rows>> = {
  array: (reporting) => block(reporting, "array"),
  spilled: (reporting) => block(reporting, "spilled"),
  index: (reporting) => table(reporting, (linest, row, column) => `INDEX(${linest},${row},${column})`),
  let: (reporting) => table(reporting, (linest, row, column) => `LET(fit,${linest},INDEX(fit,${row},${column}))`),
  "one driver": oneDriver,
  trend,
  copied: (reporting) => beside(reporting, (row, column) => cellOfBlock(row, column)),
  "read from a spill": (reporting) => beside(reporting, (row, column) => `INDEX($${blockColumn}$2#,${row},${column})`),
  "read by MATCH": (reporting) =>
    beside(reporting, (row, column) => {
      const k = reporting.sheet.driverCount;
      const [first, last] = [cellOfBlock(0, 1), cellOfBlock(5, k + 1)];
      const name = [...reporting.labels].reverse()[column - 1] ?? "Constant";
      const headings = `${first}:${cellOfBlock(0, k + 1)}`;
      return `INDEX(${cellOfBlock(1, 1)}:${last},${row},${row < 3 ? `MATCH("${name}",${headings},0)` : column})`;
    }),
  "array of positions": (reporting) => block(byPosition(reporting), "array"),
  "table of positions": (reporting) => reportRows.index(byPosition(reporting)),
  "trend of positions": (reporting) => trend(byPosition(reporting)),
};

/** One driver, which is nobody's column. */
const byPosition = (reporting: Reporting): Reporting => ({
  ...reporting,
  sheet: { ...reporting.sheet, driverCount: 1 },
  labels: ["Place"],
  byPosition: true,
});

const driversOf = ({ sheet, byPosition: none }: Reporting): Calculation["drivers"] =>
  none === true ? "positions" : Array.from({ length: sheet.driverCount }, (_, j) => j + 2);

/** The outcome's range and the drivers', as a formula has them. */
function dataOf({ sheet, name, ranges, byPosition: none }: Reporting): string {
  const outcome = rangeOf(name, ranges.outcome, { from: 1, to: 2 });
  return none === true
    ? `${outcome},`
    : `${outcome},${rangeOf(name, ranges.drivers, { from: 2, to: 2 + sheet.driverCount })}`;
}

const linestOf = (reporting: Reporting): string =>
  `LINEST(${dataOf(reporting)},${reporting.constant ? "TRUE" : "FALSE"},TRUE)`;

const linestResult = (reporting: Reporting): Calculated | null =>
  calculated(reporting.sheet, { ...reporting, drivers: driversOf(reporting), otherCells: "error" });

const unequal = ({ outcome, drivers }: Ranges): boolean => outcome.to - outcome.from !== drivers.to - drivers.from;

/** What LINEST shows where it cannot calculate. */
const linestError = (ranges: Ranges): BookValue => ({ error: unequal(ranges) ? "#REF!" : "#VALUE!" });

/** The five rows of LINEST, the last driver first. */
function linestValues(reporting: Reporting): BookValue[][] {
  const { sheet, ranges, constant } = reporting;
  const found = linestResult(reporting);
  const width = sheet.driverCount + 1;
  if (found === null) return Array.from({ length: 5 }, () => Array.from({ length: width }, () => linestError(ranges)));
  const { fit, standardErrors } = found;
  const none = { error: "#N/A" } as const;
  const reversed = (values: Iterable<number>, lacking: BookValue): BookValue[] =>
    [...(constant ? [] : [lacking]), ...values].reverse();
  const explained = fit.totalSumOfSquares - fit.residualSumOfSquares;
  const f = explained / sheet.driverCount / fit.sigma ** 2;
  const pairs: readonly (readonly [number, number])[] = [
    [fit.rSquared, fit.sigma],
    [f, fit.degreesOfFreedom],
    [explained, fit.residualSumOfSquares],
  ];
  return [
    reversed(fit.coefficients, 0),
    reversed(standardErrors, none),
    ...pairs.map((pair) => Array.from({ length: width }, (_, column): BookValue => pair[column] ?? none)),
  ];
}

/** LINEST over a block of cells, the names of the drivers above it. */
function block(reporting: Reporting, entered: "array" | "spilled"): Rows {
  const values = linestValues(reporting);
  const formula = `=${linestOf(reporting)}`;
  const last = `${String.fromCharCode(65 + values[0]!.length)}6`;
  const cell = (value: BookValue, isFirst: boolean): BookCell => {
    if (entered === "array") return { value, formula };
    return isFirst ? { value, formula, spill: `B2:${last}` } : value;
  };
  const names = [...reporting.labels].reverse();
  return [
    [null, ...names, "Constant"],
    ...values.map((row, index): BookCell[] => [
      ["Coefficient", "Standard error"][index] ?? null,
      ...row.map((value, column) => cell(value, index + column === 0)),
    ]),
  ];
}

/** The block stands so many columns to the right of the table that reads it. */
const blockOffset = 6;
const blockColumn = String.fromCharCode(65 + blockOffset + 1);

/** "$H$2" for the first number of the block; its row 0 holds the names. */
const cellOfBlock = (row: number, column: number): string =>
  `$${String.fromCharCode(65 + blockOffset + column)}$${row + 1}`;

/** The table with the block that it reads beside it. */
function beside(reporting: Reporting, read: (row: number, column: number) => string): Rows {
  const left = table(reporting, (_, row, column) => read(row, column));
  const right = block(reporting, "spilled");
  const width = right[0]!.length - 1;
  const spill = `${blockColumn}2:${String.fromCharCode(64 + blockOffset + 1 + width)}6`;
  return Array.from({ length: Math.max(left.length, right.length) }, (_, at): BookCell[] => {
    const line = Array.from({ length: blockOffset }, (_none, column): BookCell => left[at]?.[column] ?? null);
    const moved = (right[at] ?? []).map((cell): BookCell =>
      cell !== null && typeof cell === "object" && "spill" in cell ? { ...cell, spill } : cell,
    );
    return [...line, ...moved];
  });
}

/** A line for each driver, each number taken out of LINEST, ratios and p-values worked out beside. */
function table(reporting: Reporting, taken: (linest: string, row: number, column: number) => string): Rows {
  const { sheet, labels, constant, ranges, name } = reporting;
  const linest = linestOf(reporting);
  const values = linestValues(reporting);
  const pValues = linestResult(reporting)?.pValues;
  const out = (row: number, column: number): BookCell => ({
    value: values[row - 1]![column - 1]!,
    formula: `=${taken(linest, row, column)}`,
  });
  const k = sheet.driverCount;
  const lines = [
    ...labels.map((label, j) => [label, k - j] as const),
    ...(constant ? [["Constant", k + 1] as const] : []),
  ];
  const rows = lines.map(([label, column], index): BookCell[] => {
    const at = index + 2;
    const [b, se] = [values[0]![column - 1]!, values[1]![column - 1]!];
    const place = column === k + 1 ? 0 : k - column + (constant ? 1 : 0);
    const ratio: BookValue = typeof b === "number" && typeof se === "number" ? b / se : linestError(ranges);
    return [
      label,
      out(1, column),
      out(2, column),
      { value: ratio, formula: `=B${at}/C${at}` },
      {
        value: pValues?.[place] ?? linestError(ranges),
        formula: `=T.DIST.2T(ABS(D${at}),${taken(linest, 4, 2)})`,
      },
    ];
  });
  return [
    ["Driver", "Coefficient", "Standard error", "t ratio", "p-value"],
    ...rows,
    [],
    ["R squared", out(3, 1)],
    [
      "Observations",
      {
        value: ranges.outcome.to - ranges.outcome.from,
        formula: `=ROWS(${rangeOf(name, ranges.outcome, { from: 1, to: 2 })})`,
      },
    ],
  ];
}

/** The functions of one driver, one below the other. */
function oneDriver({ sheet, name, ranges, slip }: Reporting): Rows {
  const at = Math.round(calculatedOn(sheet, ranges)?.rows[0]?.[1] ?? 0);
  const figures: readonly (readonly [string, string, (found: Calculated) => number])[] = [
    ["Slope", "SLOPE", ({ fit }) => fit.coefficients[1]!],
    ["Intercept", "INTERCEPT", ({ fit }) => fit.coefficients[0]!],
    ["R squared", "RSQ", ({ fit }) => fit.rSquared],
    ["Standard error of the regression", "STEYX", ({ fit }) => fit.sigma],
    ["Correlation", "CORREL", ({ fit }) => Math.sign(fit.coefficients[1]!) * Math.sqrt(fit.rSquared)],
    [`Forecast at ${at}`, "FORECAST.LINEAR", ({ fit }) => fit.coefficients[0]! + fit.coefficients[1]! * at],
    [`The same of ${at}`, "FORECAST", ({ fit }) => fit.coefficients[0]! + fit.coefficients[1]! * at],
  ];
  return figures.map(([label, called, figure], index) => {
    const moved = movedBy(ranges, slip * index);
    const found = calculatedOn(sheet, moved);
    const cells = `${rangeOf(name, moved.outcome, { from: 1, to: 2 })},${rangeOf(name, moved.drivers, { from: 2, to: 3 })}`;
    const value = found === null ? { error: "#N/A" } : figure(found);
    return [label, { value, formula: `=${called}(${called.startsWith("FORECAST") ? `${at},` : ""}${cells})` }];
  });
}

const calculatedOn = (sheet: Worksheet, ranges: Ranges): Calculated | null =>
  calculated(sheet, { ranges, drivers: [2], constant: true, otherCells: "passed over" });

const movedBy = ({ outcome, drivers }: Ranges, by: number): Ranges => ({
  outcome: { from: outcome.from + by, to: outcome.to + by },
  drivers: { from: drivers.from + by, to: drivers.to + by },
});

/** The fitted values, spilled down a column. */
function trend(reporting: Reporting): Rows {
  const { ranges, constant } = reporting;
  const found = linestResult(reporting);
  const fitted = found?.rows.map(([y], index): BookValue => y! - found.fit.residuals[index]!) ?? [linestError(ranges)];
  const data = dataOf(reporting);
  const formula = constant ? `=TREND(${data})` : `=TREND(${data},,FALSE)`;
  const first: BookCell =
    fitted.length > 1
      ? { value: fitted[0]!, formula, spill: `A2:A${fitted.length + 1}` }
      : { value: fitted[0]!, formula };
  return [["Fitted"], [first], ...fitted.slice(1).map((value) => [value])];
}
