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
export const pageWidths: readonly number[] = [30, 12, 12, 12, 12, 12, 10, 12, 12, 12, 30, 3];

const pageCharacters = pageWidths.slice(page.first, page.last + 1).reduce((sum, width) => sum + width, 0);
const lineHeight = 15;

/** Height in points of a sentence wrapped over the page's width; a margin is kept since fonts differ. */
export const sentenceHeight = (sentence: string): number =>
  lineHeight * Math.max(1, Math.ceil((sentence.length * 1.12) / pageCharacters));
