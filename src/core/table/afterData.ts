import { cellKind } from "./cells.ts";
import { type Grid, coverage, fitsBody, hasFit, nextFilled } from "./grid.ts";
import { wordsOf } from "./headingRow.ts";

/** Where the data end, and what was said of the rows below them. */
export interface DataEnd {
  readonly last: number;
  readonly notes: readonly string[];
}

/**
 * Leaves away what stands below the data: words set apart by a blank row or standing in a column of values, and a
 * total or mean of the rows above it, which is taken for one only if it adds up.
 */
export function endOfData(grid: Grid, first: number): DataEnd {
  const notes: string[] = [];
  let last = grid.last;
  for (;;) {
    const before = last;
    last = withoutWords(grid, { first, last });
    if (last < before) notes.unshift(wordsNote(grid, nextFilled(grid, last + 1), before));
    const summed = last > first && isSummary(grid, { first, last });
    if (summed) notes.unshift(summaryNote(grid, last));
    last = lastFilled(grid, { first, last: summed ? last - 1 : last });
    if (last === before) return { last, notes };
  }
}

interface Rows {
  readonly first: number;
  readonly last: number;
}

function lastFilled(grid: Grid, { first, last }: Rows): number {
  while (last > first && coverage(grid, last) === 0) last--;
  return last;
}

function withoutWords(grid: Grid, { first, last }: Rows): number {
  if (!grid.bodies.some(({ valued }) => valued)) return last;
  let top = last;
  while (top > first && coverage(grid, top) > 0 && !hasFit(grid, top)) top--;
  const apart = top < last && top > first && coverage(grid, top) === 0;
  if (apart) return lastFilled(grid, { first, last: top });
  let row = last;
  while (row > first && isStrayWord(grid, row)) row--;
  return row;
}

/** A row whose only content is a word in a column of values. */
const isStrayWord = (grid: Grid, row: number): boolean =>
  coverage(grid, row) === 1 &&
  !hasFit(grid, row) &&
  grid.filled.some((column) => grid.bodies[column]!.valued && grid.block.columns[column]!.kinds[row] === cellKind.text);

const summaryWord = /^(?:grand |sub-?)?(?:total|sum|average|mean)s?\b/i;

function isSummary(grid: Grid, rows: Rows): boolean {
  if (!wordsOf(grid, rows.last).some((word) => summaryWord.test(word))) return false;
  return grid.filled.some(
    (column) =>
      grid.bodies[column]!.kind === cellKind.number && fitsBody(grid, column, rows.last) && addsUp(grid, column, rows),
  );
}

/** Sums typed with two decimals or more still agree to this share of themselves. */
const tolerance = 1e-6;

function addsUp({ block }: Grid, column: number, { first, last }: Rows): boolean {
  const { kinds, numbers } = block.columns[column]!;
  let sum = 0;
  let count = 0;
  for (let row = first; row < last; row++) {
    if (kinds[row] !== cellKind.number) continue;
    sum += numbers[row]!;
    count++;
  }
  const near = (value: number): boolean => Math.abs(numbers[last]! - value) <= tolerance * Math.abs(value);
  return count > 1 && (near(sum) || near(sum / count));
}

function wordsNote(grid: Grid, from: number, to: number): string {
  const rows = rowsInWords(grid, from, to);
  const word = firstWord(grid, from, to);
  return `${rows} below the data ${from === to ? "was" : "were"} not read${word === "" ? "" : `: "${word}"`}.`;
}

function summaryNote(grid: Grid, row: number): string {
  const word = wordsOf(grid, row).find((one) => summaryWord.test(one)) ?? "";
  return `${rowsInWords(grid, row, row)} ("${word}") sums up the rows above it and was not read.`;
}

/** "Row 98", "Rows 98 to 101", as the sheet counts. */
export function rowsInWords({ block }: Grid, from: number, to: number): string {
  const [first, last] = [block.firstRow + from + 1, block.firstRow + to + 1];
  return first === last ? `Row ${first}` : `Rows ${first} to ${last}`;
}

export function firstWord(grid: Grid, from: number, to: number): string {
  for (let row = from; row <= to; row++) {
    const word = wordsOf(grid, row)[0];
    if (word !== undefined) return word;
  }
  return "";
}
