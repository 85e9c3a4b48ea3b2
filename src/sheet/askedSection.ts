import type { Answer } from "../core/answer/answer.ts";
import { askedJointTable, estimatesTable } from "../core/answer/askedTables.ts";
import type { Grid } from "../core/answer/tables.ts";
import { listInWords } from "../core/answer/wording.ts";
import { page, wrappedHeight } from "./columns.ts";
import { figureFormat, formatFor, numberHeadingFormat, pValueFormat, ratioFormat } from "./numberFormats.ts";
import { headingFormat } from "./pageFormats.ts";
import type { PlanFormat } from "./plan.ts";
import { type Section, cellOf, section, text } from "./section.ts";

type Row = Grid[number];

/** How the figures of each column after the first are shown; null for words. */
type Columns = readonly ((row: Row) => string | null)[];

const standardError = 2;
const amount = (row: Row): string => formatFor([row[standardError]].filter((value) => typeof value === "number"));
const words = (): null => null;

const estimateColumns: Columns = [amount, amount, () => ratioFormat, () => pValueFormat, amount, amount, words];
const jointColumns: Columns = [(row) => figureFormat(row[1]), words, () => pValueFormat];

/** The figures behind what was asked of the coefficients; no rows where nothing was. */
export function askedSection(answer: Answer): Section {
  const { estimates, joint } = answer;
  const parts = [
    ...(estimates.length === 0 ? [] : [tableSection(estimatesTable(answer), estimateColumns)]),
    ...(joint.asked === null ? [] : [together(joint.asked.texts), tableSection(askedJointTable(answer), jointColumns)]),
  ];
  if (parts.length === 0) return section([]);
  return parts.reduce(
    below,
    section([[text("Asked of the coefficients, when this sheet was made")]], [headingFormat(0)]),
  );
}

const below = (upper: Section, lower: Section): Section =>
  section(
    [...upper.rows, ...lower.rows],
    [
      ...upper.formats,
      ...lower.formats.map((format) => ({
        ...format,
        area: { ...format.area, row: format.area.row + upper.rows.length },
      })),
    ],
  );

function together(texts: readonly string[]): Section {
  const sentence = `Tested together: ${listInWords(texts)}`;
  const area = { row: 0, column: 0, rows: 1, columns: page.columns };
  return section(
    [[text(sentence)]],
    [
      {
        area,
        style: "label",
        merge: true,
        wrap: true,
        rowHeight: wrappedHeight(sentence),
      },
    ],
  );
}

function tableSection([headings = [], ...body]: Grid, columns: Columns): Section {
  const area = (row: number, column: number, rows: number) => ({
    row,
    column,
    rows,
    columns: 1,
  });
  return section(
    [headings, ...body].map((row) => row.map(cellOf)),
    [
      {
        area: { row: 0, column: 0, rows: 1, columns: headings.length },
        style: "table heading",
        heads: body.length,
      },
      ...columns.map((_, index): PlanFormat => ({
        area: area(0, index + 1, 1),
        ...headingLook(columns, index),
      })),
      { area: { row: 1, column: 0, rows: body.length, columns: headings.length }, style: "sentence" },
      ...body.flatMap((row, index): PlanFormat[] => [
        {
          area: area(index + 1, 0, 1),
          style: "label",
          wrap: true,
          rowHeight: wrappedHeight(String(row[0] ?? ""), 0, 0),
        },
        ...columns.map((format, column): PlanFormat => ({
          area: area(index + 1, column + 1, 1),
          ...look(format(row)),
        })),
      ]),
    ],
  );
}

/** Words that stand right of a figure keep their distance from it. */
const apart = { align: "left", indent: 1 } as const;

const look = (numberFormat: string | null): Omit<PlanFormat, "area"> =>
  numberFormat === null ? apart : { numberFormat, align: "right" };

const headingLook = (columns: Columns, column: number): Omit<PlanFormat, "area"> =>
  columns[column] === words ? apart : look(numberHeadingFormat);
