import type { Answer } from "../core/answer/answer.ts";
import { evidenceTable } from "../core/answer/tables.ts";
import { page, sentenceHeight } from "./columns.ts";
import type { Figures } from "./figures.ts";
import { figureFormat, numberHeadingFormat, pValueFormat } from "./numberFormats.ts";
import { headingFormat } from "./plainWordsSection.ts";
import type { PlanFormat } from "./plan.ts";
import { type Section, section, text } from "./section.ts";

/** Columns of the evidence table that hold statistics, p-values and the reading, which runs to the page's end. */
const statistics = [2, 5];
const pValues = [4, 7];
const reading = 8;

/** All tests with their readings, then the fit as a whole. */
export function evidenceSection(answer: Answer, figures: Figures): Section {
  const [headings = [], ...body] = evidenceTable(answer);
  const rows = body.map((row, index) => row.map((_, column) => figures.evidence(index + 1, column)));
  const cell = (row: number, column: number, numberFormat: string): PlanFormat => ({
    area: { row, column, rows: 1, columns: 1 },
    numberFormat,
    align: "right",
  });
  const figureFormats = body.flatMap((row, index) => [
    ...statistics.map((at) => cell(index + 2, at, figureFormat(row[at]))),
    ...pValues.map((at) => cell(index + 2, at, pValueFormat)),
  ]);
  const readings = body.map((row, index): PlanFormat => ({
    area: { row: index + 2, column: reading, rows: 1, columns: page.columns - reading },
    merge: true,
    wrap: true,
    align: "left",
    rowHeight: sentenceHeight(String(row[reading] ?? ""), reading),
  }));
  return section(
    [[text("Evidence")], headings.map((heading) => text(String(heading))), ...rows],
    [
      headingFormat(0),
      { area: { row: 1, column: 0, rows: 1, columns: page.columns }, style: "table heading" },
      ...[...statistics, ...pValues].map((at) => cell(1, at, numberHeadingFormat)),
      { area: { row: 2, column: 0, rows: body.length, columns: page.columns }, style: "sentence" },
      { area: { row: 2, column: 0, rows: body.length, columns: 1 }, style: "label" },
      ...figureFormats,
      ...readings,
    ],
  );
}
