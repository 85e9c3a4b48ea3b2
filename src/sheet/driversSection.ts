import type { Answer } from "../core/answer/answer.ts";
import { answerTable } from "../core/answer/tables.ts";
import type { Figures } from "./figures.ts";
import { formatFor, numberHeadingFormat, pValueFormat, ratioFormat } from "./numberFormats.ts";
import { headingFormat } from "./plainWordsSection.ts";
import type { PlanFormat } from "./plan.ts";
import { type Section, section, text } from "./section.ts";

/** Columns of the answer's table that hold amounts in the outcome's units, ratios and p-values. */
const amounts = [1, 2, 3, 4, 5, 8, 9];
const ratio = 6;
const pValue = 7;

/** Every term: coefficient, the three standard errors side by side, what is in force, and whether that is firm. */
export function driversSection(answer: Answer, figures: Figures): Section {
  const table = answerTable(answer);
  const [headings = [], ...body] = table;
  const rows = body.map((row, index) => row.map((_, column) => figures.answer(index + 1, column)));
  const below = (row: number, column: number, numberFormat: string): PlanFormat => ({
    area: { row, column, rows: 1, columns: 1 },
    numberFormat,
    align: "right",
  });
  const formats = body.flatMap((row, index) => [
    ...amounts.map((column) => below(index + 2, column, formatFor(sizesOf(row)))),
    below(index + 2, ratio, ratioFormat),
    below(index + 2, pValue, pValueFormat),
  ]);
  const columns = headings.length;
  return section(
    [[text("Drivers")], headings.map((heading) => text(String(heading))), ...rows],
    [
      headingFormat(0),
      { area: { row: 1, column: 0, rows: 1, columns }, style: "table heading" },
      { area: { row: 1, column: 1, rows: 1, columns: columns - 2 }, align: "right", numberFormat: numberHeadingFormat },
      { area: { row: 2, column: 0, rows: body.length, columns: 1 }, style: "label" },
      { area: { row: 2, column: 5, rows: body.length, columns: 1 }, style: "in force" },
      ...formats,
    ],
  );
}

/** One format a row: enough digits for the standard error in force, which is the smallest amount that matters. */
const sizesOf = (row: readonly (string | number)[]): number[] => [row[5]].filter((value) => typeof value === "number");
