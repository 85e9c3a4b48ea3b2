import { readFileSync } from "node:fs";
import type { Cell } from "../../src/core/table/cells.ts";
import { demoBook } from "../../src/desk/demo/demoBook.ts";

/** Columns that a regression was made of, whole and without fault. */
export interface DataSet {
  readonly id: string;
  /** The first column of the sheet: periods, or names of the rows. */
  readonly key: { readonly name: string; readonly cells: readonly Cell[] };
  readonly outcome: NamedNumbers;
  readonly drivers: readonly NamedNumbers[];
  /** Numbers beside the data that have no part in the regression. */
  readonly spare: NamedNumbers;
}

export interface NamedNumbers {
  readonly name: string;
  readonly values: readonly number[];
}

interface ReferenceFile {
  readonly id: string;
  readonly outcome: string;
  readonly drivers: string | readonly string[];
  readonly y: readonly number[];
  readonly X: readonly (readonly number[])[];
}

/** Data sets of the reference files, whose sources stand in test/reference/SOURCES.md. */
function referenceSet(id: string, key: DataSet["key"] | null, spare: string): DataSet {
  const file = JSON.parse(readFileSync(new URL(`../reference/${id}.json`, import.meta.url), "utf8")) as ReferenceFile;
  const drivers = [file.drivers].flat().map((name, j): NamedNumbers => ({ name, values: file.X[j]! }));
  const numbered = { name: "Case", cells: file.y.map((_, row) => `no. ${row + 1}`) };
  return {
    id,
    key: key ?? numbered,
    outcome: { name: file.outcome, values: file.y },
    drivers: drivers.filter(({ name }) => name !== spare),
    spare: drivers.find(({ name }) => name === spare) ?? wave(file.y.length),
  };
}

/** A column of numbers that has nothing to do with the rest. */
const wave = (rows: number): NamedNumbers => ({
  name: "Reading",
  values: Array.from(
    { length: rows },
    (_, row) => Math.round(1000 * (5 + 3 * Math.sin(1.7 * row + 0.3 * row * row))) / 1000,
  ),
});

const years = (first: number, count: number): DataSet["key"] => ({
  name: "Year",
  cells: Array.from({ length: count }, (_, i) => first + i),
});

/** A sheet of the demo workbook, found by its headings. */
function demoSet(sheet: string, heading: string, isDated: boolean): DataSet {
  const rows = demoBook()
    .sheets.find(({ name }) => name === sheet)!
    .rows.map((row) =>
      row.map((cell) => (cell !== null && typeof cell === "object" && "value" in cell ? cell.value : cell)),
    );
  const start = rows.findIndex(([first]) => first === heading);
  const headings = rows[start]!.map(String);
  const data = rows.slice(start + 1).filter((row) => typeof row[1] === "number");
  const column = (j: number): NamedNumbers => ({ name: headings[j]!, values: data.map((row) => Number(row[j])) });
  const keys = data.map((row): Cell => (isDated ? { date: Number(row[0]) } : (row[0] as string)));
  return {
    id: sheet.toLowerCase(),
    key: { name: heading, cells: keys },
    outcome: column(1),
    drivers: headings.slice(2).map((_, j) => column(j + 2)),
    spare: wave(data.length),
  };
}

export const dataSets: readonly DataSet[] = [
  referenceSet("mtcars", null, "none"),
  referenceSet("stackloss", null, "none"),
  referenceSet("credit-card", null, "income2"),
  referenceSet("mandible", null, "age2"),
  referenceSet("investment", years(1964, 19), "none"),
  referenceSet("school-scores-3", null, "none"),
  demoSet("Months", "Month", true),
  demoSet("Shops", "Shop", false),
  demoSet("Parts", "Lot", false),
  demoSet("Weeks", "Week from", true),
];
