/**
 * The columns of a result sheet, counted from 0. The page that is read and printed runs from `first` to `last`, charts
 * included; the numbers behind the charts and the spilled results of a live sheet stand further right, under their own
 * headings.
 */
export const page = { first: 0, last: 10, columns: 11 } as const;
export const chartDataColumn = 13;
export const liveColumn = 40;

/** Widths in characters: the names, nine columns of figures, the words at the end; then a gutter. */
export const pageWidths: readonly number[] = [28, 14, 13, 13, 16, 12, 11, 13, 12, 12, 32, 3];

/** A character of the normal font is 7 pixels wide, with 5 around the text; a point is 4/3 pixels. */
export const pointsOf = (characters: number): number => (characters * 7 + 5) * 0.75;

/**
 * Of a row with one line of text, in points: a little less than spreadsheets take of themselves, so that it is written
 * into the sheet and holds there, and a page ends where it is counted to end whatever font a program has.
 */
export const lineHeight = 14.25;
/** Of each line where there are several. */
const wrappedLineHeight = 15;
/** A column's width counts digits; letters are narrower on the average. A margin is left, since fonts differ. */
const digitsALetter = 0.92;

/** Height in points of a text wrapped over so many characters. */
export function textHeight(text: string, characters: number): number {
  const lines = Math.ceil((text.length * digitsALetter) / characters);
  return lines < 2 ? lineHeight : lines * wrappedLineHeight;
}

/** Height in points of a text wrapped over the columns from `first` to `last`, by default over the whole page. */
export const wrappedHeight = (text: string, first: number = page.first, last: number = page.last): number =>
  textHeight(
    text,
    pageWidths.slice(first, last + 1).reduce((sum, width) => sum + width, 0),
  );
