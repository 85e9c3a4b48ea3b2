import { textHeight } from "../columns.ts";
import type { PlanCell, PlanFormat, PlanLink } from "../plan.ts";
import { type Section, section, text } from "../section.ts";

/** Widths in characters: names, cells, three columns of figures, words. Together they fill a lying page. */
export const reviewWidths: readonly number[] = [34, 18, 15, 15, 15, 36];
export const reviewColumns = reviewWidths.length;

/** Where the words of a line stand that has its label in the first column. */
const wordsColumn = 1;

/** Height in points of a text over the columns from `first` to `last`. */
export const heightOver = (words: string, first: number, last = reviewColumns - 1): number =>
  textHeight(
    words,
    reviewWidths.slice(first, last + 1).reduce((sum, width) => sum + width, 0),
  );

export const acrossReview = (row: number, style: NonNullable<PlanFormat["style"]>): PlanFormat => ({
  area: { row, column: 0, rows: 1, columns: reviewColumns },
  style,
});

/** A sentence over the whole page, joined so that it wraps. */
export const sentenceAcross = (row: number, words: string): PlanFormat => ({
  ...acrossReview(row, "sentence"),
  merge: true,
  wrap: true,
  rowHeight: heightOver(words, 0),
});

/** A label, and words that wrap over the rest of the page. */
export interface LabelledLine {
  readonly label: string;
  readonly words: string;
  readonly style: NonNullable<PlanFormat["style"]>;
}

export const labelledCells = ({ label, words }: LabelledLine): PlanCell[] => [text(label), text(words)];

export const labelledFormats = (row: number, { label, words, style }: LabelledLine): PlanFormat[] => [
  { area: { row, column: 0, rows: 1, columns: 1 }, style: style === "sentence" ? "label" : style, wrap: true },
  {
    area: { row, column: wordsColumn, rows: 1, columns: reviewColumns - wordsColumn },
    style,
    merge: true,
    wrap: true,
    align: "left",
    rowHeight: Math.max(heightOver(label, 0, 0), heightOver(words, wordsColumn)),
  },
];

/** Sentences under a heading, one a row. */
export function sentencesSection(heading: string, sentences: readonly string[]): Section {
  return section(
    [[text(heading)], ...sentences.map((words) => [text(words)])],
    [acrossReview(0, "heading"), ...sentences.map((words, index) => sentenceAcross(index + 1, words))],
  );
}

/** Cells of the workbook become links; places that are none stay text. */
export const linkTo = (row: number, column: number, cell: string): PlanLink[] =>
  cell.includes("!") ? [{ row, column, text: cell, target: cell }] : [];
