import { cellKind } from "./cells.ts";
import { type Grid, coverage, fitsBody, hasFit, isBlankCell } from "./grid.ts";
import { isYear } from "./periodLabels.ts";
import { sense, senseOfText } from "./senses.ts";
import { cellInWords } from "./spots.ts";

/**
 * The row of headings in a block: the row of words nearest above the data that covers at least half of its width.
 * Titles cover less, or stand apart by a blank row.
 * @returns null where the data begin without headings.
 */
export function findHeadingRow(grid: Grid): number | null {
  const data = firstDataRow(grid);
  if (data === null) return firstCoveringRow(grid);
  let row = data - 1;
  while (row >= grid.first) {
    const bottom = row;
    while (row >= grid.first && coverage(grid, row) > 0) row--;
    const heading = bestOf(grid, row + 1, bottom);
    if (heading !== null) return heading;
    row--;
  }
  return areYearHeadings(grid, data) ? data : null;
}

/** The first row that covers half of the width and holds what its columns hold; null where all is words. */
export function firstDataRow(grid: Grid): number | null {
  for (let row = grid.first; row <= grid.last; row++) {
    if (coversHalf(grid, row) && hasFit(grid, row)) return row;
  }
  return null;
}

function firstCoveringRow(grid: Grid): number | null {
  for (let row = grid.first; row <= grid.last; row++) {
    if (coversHalf(grid, row)) return row;
  }
  return null;
}

/** The row that holds the most of the headings looked for, among the first hundred rows; null where none holds any. */
export function rowOfHeadings(grid: Grid, wanted: readonly string[]): number | null {
  const sought = new Set(wanted.map(plainHeading));
  let best: number | null = null;
  let most = 0;
  for (let row = grid.first; row <= Math.min(grid.last, grid.first + deepestHeading); row++) {
    const found = new Set(
      wordsOf(grid, row)
        .map(plainHeading)
        .filter((word) => sought.has(word)),
    ).size;
    if (found > most) [best, most] = [row, found];
  }
  return best;
}

/** Headings are the same where they differ in case and blanks alone. */
export const plainHeading = (heading: string): string => heading.trim().replaceAll(/\s+/g, " ").toLowerCase();

/**
 * Whether a row under the headings gives units ("USD", "%"): words without digits, no value, nothing in the columns
 * that hold words.
 */
export function isUnitsRow(grid: Grid, row: number): boolean {
  const worded = grid.filled.filter((column) => !grid.bodies[column]!.valued);
  const words = wordsOf(grid, row);
  return (
    words.length > 0 &&
    isWorded(grid, row) &&
    !hasFit(grid, row) &&
    words.every((word) => !/\d/.test(word)) &&
    worded.every((column) => isBlankCell(grid.block.columns[column]!, row))
  );
}

const deepestHeading = 100;

export const wordsOf = ({ block, filled }: Grid, row: number): string[] =>
  filled.map((column) => cellInWords(block.columns[column]!, row)).filter((word) => word !== "");

const coversHalf = (grid: Grid, row: number): boolean => coverage(grid, row) * 2 >= grid.width;

/** From this many columns on, a row of units under the headings is likelier than a title that covers them all. */
const wide = 3;

function bestOf(grid: Grid, top: number, bottom: number): number | null {
  let best: number | null = null;
  let most = 0;
  for (let row = top; row <= bottom; row++) {
    if (!coversHalf(grid, row) || !isWorded(grid, row)) continue;
    const words = new Set(wordsOf(grid, row)).size;
    if (words > most || (words === most && grid.filled.length < wide)) [best, most] = [row, words];
  }
  return best;
}

/** Whether a row holds words alone, or dates above columns of something else. */
const isWorded = (grid: Grid, row: number): boolean =>
  grid.filled.every((column) => {
    const cells = grid.block.columns[column]!;
    if (isBlankCell(cells, row)) return true;
    if (cells.kinds[row] === cellKind.date) return !fitsBody(grid, column, row);
    return cells.kinds[row] === cellKind.text && isWord(cells.texts[cells.numbers[row]!]!);
  });

function isWord(text: string): boolean {
  const one = senseOfText(text);
  return one === sense.text || one === sense.textNumber;
}

/** Years as headings, 2019, 2020, 2021: one after the other, and no such years in the row below. */
function areYearHeadings(grid: Grid, row: number): boolean {
  const years = yearsIn(grid, row);
  const inTurn = years.every((year, i) => i === 0 || Math.abs(year - years[i - 1]!) === 1);
  return years.length > 1 && inTurn && yearsIn(grid, row + 1).length === 0;
}

/** The numbers of a row if all of them are years, else none. */
function yearsIn({ block, filled }: Grid, row: number): number[] {
  const numbers = filled
    .map((column) => block.columns[column]!)
    .filter((cells) => cells.kinds[row] === cellKind.number)
    .map((cells) => cells.numbers[row]!);
  return numbers.every(isYear) ? numbers : [];
}
