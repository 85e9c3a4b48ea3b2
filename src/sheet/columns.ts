/**
 * The columns of a result sheet, counted from 0. The page a reader sees runs from `first` to `last`, charts stand
 * beside it, the numbers behind the charts and the spilled results of a live sheet further right, under their own headings.
 */
export const page = { first: 0, last: 10, columns: 11 } as const;
export const chartColumn = 12;
export const chartColumns = 9;
export const chartDataColumn = 24;
export const liveColumn = 40;

/** Widths in characters: the names, ten columns of figures, a gutter, the charts' columns. */
export const pageWidths: readonly number[] = [30, 28, 16, 14, 16, 12, 13, 14, 13, 13, 32, 2];

/** In points. */
const lineHeight = 15;
/** A column's width counts digits; letters are narrower on the average. A margin is left, since fonts differ. */
const digitsALetter = 0.95;

/** Height in points of a text wrapped over the columns from `first` on, by default over the whole page. */
export function sentenceHeight(sentence: string, first: number = page.first): number {
  const characters = pageWidths.slice(first, page.last + 1).reduce((sum, width) => sum + width, 0);
  return lineHeight * Math.max(1, Math.ceil((sentence.length * digitsALetter) / characters));
}
