import type { CellBlock } from "./block.ts";
import { type CellColumn, cellKind } from "./cells.ts";
import { readLabel } from "./periodLabels.ts";
import { sense, senseOfText } from "./senses.ts";

/** A block with what its columns mostly hold: the ground on which headings and notes are told from data. */
export interface Grid {
  readonly block: CellBlock;
  /** The columns that hold anything, by their index in the block. */
  readonly filled: readonly number[];
  /** For each column of the block. */
  readonly bodies: readonly Body[];
  /** The most cells that hold anything in one row: stray columns beside a table do not count against it. */
  readonly width: number;
  /** First and last row that hold anything. */
  readonly first: number;
  readonly last: number;
}

/** What a column mostly holds, as a byte of `cellKind`; `valued` where that can be told from the words of a heading. */
export interface Body {
  readonly kind: number;
  readonly valued: boolean;
}

/** @returns null where no cell holds anything. */
export function gridOf(block: CellBlock): Grid | null {
  const ends = block.columns.map(endsOf);
  const filled = ends.flatMap((end, column) => (end === null ? [] : [column]));
  if (filled.length === 0) return null;
  const first = Math.min(...ends.map((end) => end?.first ?? Infinity));
  const last = Math.max(...ends.map((end) => end?.last ?? -Infinity));
  const width = widest({ block, filled }, first, Math.min(last, first + rowsLookedAt));
  return { block, filled, bodies: block.columns.map(bodyOf), width, first, last };
}

/** So many rows from the top tell how wide a table is. */
const rowsLookedAt = 500;

function widest(grid: Pick<Grid, "block" | "filled">, first: number, last: number): number {
  let most = 0;
  for (let row = first; row <= last; row++) most = Math.max(most, coverage(grid, row));
  return most;
}

export const isBlankCell = ({ kinds, numbers, texts }: CellColumn, row: number): boolean =>
  kinds[row] === cellKind.blank || (kinds[row] === cellKind.text && texts[numbers[row]!]!.trim() === "");

/** How many cells of a row hold anything. */
export const coverage = ({ block, filled }: Pick<Grid, "block" | "filled">, row: number): number =>
  filled.filter((column) => !isBlankCell(block.columns[column]!, row)).length;

/** The first row from here on that holds anything; one beyond the last where none does. */
export function nextFilled(grid: Grid, row: number): number {
  while (row <= grid.last && coverage(grid, row) === 0) row++;
  return row;
}

/** Whether a cell is of the sort that its column mostly holds, where that sort can be told from words. */
export function fitsBody({ block, bodies }: Grid, column: number, row: number): boolean {
  const { kind, valued } = bodies[column]!;
  const cells = block.columns[column]!;
  if (!valued || cells.kinds[row] !== kind) return false;
  return kind !== cellKind.text || isValueText(cells.texts[cells.numbers[row]!]!);
}

/** Whether any cell of a row is of the sort that its column mostly holds. */
export const hasFit = (grid: Grid, row: number): boolean => grid.filled.some((column) => fitsBody(grid, column, row));

function endsOf(column: CellColumn): { first: number; last: number } | null {
  let first = 0;
  let last = column.kinds.length - 1;
  while (first <= last && isBlankCell(column, first)) first++;
  while (last >= first && isBlankCell(column, last)) last--;
  return first > last ? null : { first, last };
}

function bodyOf(column: CellColumn): Body {
  const counts = new Array<number>(Object.keys(cellKind).length).fill(0);
  const { kinds } = column;
  // By index: an iterator takes several times as long, and there may be millions of cells.
  for (let row = 0; row < kinds.length; row++) counts[kinds[row]!]!++;
  counts[cellKind.blank] = 0;
  const kind = counts.indexOf(Math.max(...counts));
  return { kind, valued: kind !== cellKind.text || mostlyValues(column.texts) };
}

/** So many of a column's texts tell whether they are numbers or periods kept as text. */
const sampleSize = 100;

function mostlyValues(texts: readonly string[]): boolean {
  const sample = texts.slice(0, sampleSize);
  return sample.filter(isValueText).length * 2 > sample.length;
}

const isValueText = (text: string): boolean => senseOfText(text) === sense.textNumber || readLabel(text) !== null;
