import type { Answer } from "../core/answer/answer.ts";
import { answerTable } from "../core/answer/tables.ts";
import { page, wrappedHeight } from "./columns.ts";
import type { Figures } from "./figures.ts";
import { formatFor, numberHeadingFormat, pValueFormat, ratioFormat } from "./numberFormats.ts";
import { headingFormat } from "./pageFormats.ts";
import type { PlanFormat } from "./plan.ts";
import { type Section, section, text } from "./section.ts";

type Row = readonly (string | number)[];

/** Columns of the answer's table that hold amounts in the outcome's units, ratios and p-values. */
const amounts = [1, 2, 3, 4, 5, 8, 9];
const inForce = 5;
const ratio = 6;
const pValue = 7;

/** Every term: coefficient, the three standard errors side by side, what is in force, and whether that is firm. */
export function driversSection(answer: Answer, figures: Figures): Section {
  const [headings = [], ...body] = answerTable(answer);
  const rows = body.map((row, index) => row.map((_, column) => figures.answer(index + 1, column)));
  const { columns } = page;
  return section(
    [[text("Drivers")], headings.map((heading) => text(String(heading))), ...rows],
    [
      headingFormat(0),
      { area: { row: 1, column: 0, rows: 1, columns }, style: "table heading", heads: body.length },
      { area: { row: 1, column: 1, rows: 1, columns: columns - 2 }, align: "right", numberFormat: numberHeadingFormat },
      { area: { row: 2, column: 0, rows: body.length, columns }, style: "sentence" },
      { area: { row: 2, column: 0, rows: body.length, columns: 1 }, style: "label", wrap: true },
      { area: { row: 2, column: inForce, rows: body.length, columns: 1 }, style: "in force" },
      { area: { row: 1, column: page.last, rows: body.length + 1, columns: 1 }, align: "left", indent: 1 },
      ...body.flatMap((row, index) => rowFormats(row, index + 2)),
    ],
  );
}

function rowFormats(row: Row, at: number): PlanFormat[] {
  const format = (column: number, numberFormat: string): PlanFormat => ({
    area: { row: at, column, rows: 1, columns: 1 },
    numberFormat,
    align: "right",
  });
  const name = { row: at, column: 0, rows: 1, columns: 1 };
  return [
    { area: name, rowHeight: wrappedHeight(String(row[0] ?? ""), 0, 0) },
    ...amounts.map((column) => format(column, formatFor(sizesOf(row)))),
    format(ratio, ratioFormat),
    format(pValue, pValueFormat),
  ];
}

/** One format a row: enough digits for the standard error in force, which is the smallest amount that matters. */
const sizesOf = (row: Row): number[] => [row[inForce]].filter((value) => typeof value === "number");
