import type { Answer } from "../core/answer/answer.ts";
import { evidenceTable } from "../core/answer/tables.ts";
import { page, wrappedHeight } from "./columns.ts";
import type { Figures } from "./figures.ts";
import { figureFormat, numberHeadingFormat, pValueFormat } from "./numberFormats.ts";
import { headingFormat } from "./pageFormats.ts";
import type { PlanCell, PlanFormat } from "./plan.ts";
import { type Section, section, text } from "./section.ts";

type Row = readonly (string | number)[];

/** Where each column of the evidence table stands on the page, and how far it runs. */
const places = [
  { first: 0, last: 0 },
  { first: 1, last: 2 },
  { first: 3, last: 3 },
  { first: 4, last: 4 },
  { first: 5, last: 5 },
  { first: 6, last: 6 },
  { first: 7, last: 7 },
  { first: 8, last: 8 },
  { first: 9, last: 10 },
] as const;

/** Columns of the table that hold statistics, p-values and words. */
const statistics = [2, 5] as const;
const pValues = [4, 7] as const;
const laws = [3, 6] as const;
const words = [0, 1, 8] as const;

/** All tests with their readings. */
export function evidenceSection(answer: Answer, figures: Figures): Section {
  const { headings, tests } = partsOf(answer);
  return section(
    [
      [text("Evidence")],
      placed(headings.map((heading) => text(String(heading)))),
      ...tests.map((row, index) => placed(row.map((_, column) => figures.evidence(index + 1, column)))),
    ],
    [headingFormat(0), ...headingFormats(tests.length), ...testFormats(tests)],
  );
}

/** What is said of the fit as a whole: the last rows of the evidence, each a name and one figure. */
export function fitSection(answer: Answer, figures: Figures): Section {
  const { tests, fit } = partsOf(answer);
  const first = tests.length + 1;
  return section(
    [
      [text("The fit as a whole")],
      ...fit.map((_, index) => [figures.evidence(first + index, 0), figures.evidence(first + index, 2)]),
    ],
    [
      { area: { row: 0, column: 0, rows: 1, columns: 2 }, style: "table heading", heads: fit.length },
      { area: { row: 1, column: 0, rows: fit.length, columns: 1 }, style: "label" },
      ...fit.map((values, index): PlanFormat => ({
        area: { row: 1 + index, column: 1, rows: 1, columns: 1 },
        ...figure(figureFormat(values[2])),
      })),
    ],
  );
}

interface Parts {
  readonly headings: Row;
  readonly tests: readonly Row[];
  readonly fit: readonly Row[];
}

function partsOf(answer: Answer): Parts {
  const [headings = [], ...body] = evidenceTable(answer);
  const count = body.findIndex(isFitRow);
  return { headings, tests: body.slice(0, count), fit: body.slice(count) };
}

/** Rows about the fit as a whole have one figure and nothing beside it. */
const isFitRow = (row: Row): boolean => row.every((value, column) => column === 0 || column === 2 || value === "");

/** The cells of a row of the table on the columns of the page. */
function placed(cells: readonly PlanCell[]): PlanCell[] {
  const row = Array.from({ length: page.columns }, (): PlanCell => null);
  cells.forEach((cell, column) => {
    row[places[column]!.first] = cell;
  });
  return row;
}

const cellFormat = (row: number, column: number, format: Omit<PlanFormat, "area">): PlanFormat => {
  const { first, last } = places[column]!;
  const columns = last - first + 1;
  return { area: { row, column: first, rows: 1, columns }, ...format, ...(columns > 1 ? { merge: true } : {}) };
};

/** Words that stand right of a figure keep their distance from it. */
const apart = { align: "left", indent: 1 } as const;
const figure = (numberFormat: string) => ({ numberFormat, align: "right" }) as const;

const headingFormats = (tests: number): readonly PlanFormat[] => [
  { area: { row: 1, column: 0, rows: 1, columns: page.columns }, style: "table heading", heads: tests },
  ...[...statistics, ...pValues].map((column) => cellFormat(1, column, figure(numberHeadingFormat))),
  ...laws.map((column) => cellFormat(1, column, apart)),
  cellFormat(1, 1, {}),
  cellFormat(1, 8, apart),
];

const testFormats = (tests: readonly Row[]): PlanFormat[] => [
  { area: { row: 2, column: 0, rows: tests.length, columns: page.columns }, style: "sentence" },
  { area: { row: 2, column: 0, rows: tests.length, columns: 1 }, style: "label" },
  ...tests.flatMap((row, index) => rowFormats(row, index + 2)),
];

const rowFormats = (row: Row, at: number): PlanFormat[] => [
  ...statistics.map((column) => cellFormat(at, column, figure(figureFormat(row[column])))),
  ...pValues.map((column) => cellFormat(at, column, figure(pValueFormat))),
  ...laws.map((column) => cellFormat(at, column, apart)),
  cellFormat(at, 0, { wrap: true }),
  cellFormat(at, 1, { wrap: true, align: "left" }),
  cellFormat(at, 8, { ...apart, wrap: true, rowHeight: heightOf(row) }),
];

/** The tallest of the texts in a row. */
const heightOf = (row: Row): number =>
  Math.max(
    ...words.map((column) => {
      const { first, last } = places[column];
      return wrappedHeight(String(row[column] ?? ""), first, last);
    }),
  );
