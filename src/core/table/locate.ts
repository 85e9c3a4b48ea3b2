import type { Problem } from "../problem/problem.ts";
import { type Result, failure, success } from "../problem/result.ts";
import { addressOf } from "./address.ts";
import { endOfData, firstWord, rowsInWords } from "./afterData.ts";
import type { CellBlock } from "./block.ts";
import type { CellColumn } from "./cells.ts";
import { type Grid, gridOf, isBlankCell, nextFilled } from "./grid.ts";
import { findHeadingRow, firstDataRow, isUnitsRow, plainHeading, rowOfHeadings, wordsOf } from "./headingRow.ts";
import { columnInWords, distinctNames } from "./headings.ts";
import { hiddenAmong } from "./hiddenRows.ts";
import type { Column, Source } from "./source.ts";
import { cellInWords } from "./spots.ts";

/** A table found in a block of cells. */
export interface LocatedTable {
  readonly source: Source;
  /** Sheet row of the headings, from 0; null where there are none and columns go by their letters. */
  readonly headingRow: number | null;
  /** What was read otherwise than a reader would expect, or not read, as sentences; the source carries them too. */
  readonly notes: readonly string[];
}

/**
 * Finds the table in a block as real sheets have it: titles above, units below the headings, notes and totals below
 * the data are not read; blank rows inside stay, to be counted as left out; empty columns are left away.
 * @param wanted - headings that are to be found: the row that holds most of them is the row of headings.
 * @returns Problem "no-data", "no-headings" where headings are wanted and none stands, "empty-column" where a wanted
 *   heading has nothing below it.
 */
export function readBlock(block: CellBlock, wanted: readonly string[] = []): Result<LocatedTable> {
  const grid = gridOf(block);
  const where = addressOfBlock(block);
  if (grid === null) return failure({ code: "no-data", where });
  const heading = rowOfHeadings(grid, wanted) ?? findHeadingRow(grid);
  if (heading === null && wanted.some((name) => !/^column [a-z]{1,3}$/i.test(name))) {
    return failure({ code: "no-headings", where });
  }
  const start = startOfData(grid, heading);
  if (start.first > grid.last) return failure({ code: "no-data", where: `${where}, below the headings` });
  const end = endOfData(grid, start.first);
  const read = { grid, heading, first: start.first, last: end.last };
  const empty = emptyAmong(read, wanted);
  if (empty !== null) return failure(empty);
  const notes = [...start.notes, ...emptyNotes(read), ...end.notes];
  return success({
    source: { ...sourceOf(read), notes },
    headingRow: heading === null ? null : block.firstRow + heading,
    notes,
  });
}

interface Read {
  readonly grid: Grid;
  readonly heading: number | null;
  readonly first: number;
  readonly last: number;
}

export const addressOfBlock = ({ sheet, firstRow, firstColumn, rowCount, columns }: CellBlock): string =>
  addressOf({
    sheet,
    row: firstRow,
    column: firstColumn,
    rows: Math.max(rowCount, 1),
    columns: Math.max(columns.length, 1),
  });

function startOfData(grid: Grid, heading: number | null): { first: number; notes: readonly string[] } {
  if (heading === null) return startWithoutHeadings(grid);
  const below = nextFilled(grid, heading + 1);
  if (below >= grid.last || !isUnitsRow(grid, below)) return { first: below, notes: [] };
  const words = `"${wordsOf(grid, below).join('", "')}"`;
  return {
    first: nextFilled(grid, below + 1),
    notes: [`${rowsInWords(grid, below, below)} under the headings holds no data and was not read: ${words}.`],
  };
}

function startWithoutHeadings(grid: Grid): { first: number; notes: readonly string[] } {
  const first = firstDataRow(grid) ?? grid.first;
  const unnamed = "No headings were found, so columns go by their letters.";
  if (first === grid.first) return { first, notes: [unnamed] };
  const rows = rowsInWords(grid, grid.first, first - 1);
  const word = firstWord(grid, grid.first, first - 1);
  return {
    first,
    notes: [`${unnamed} ${rows} above the data ${first - grid.first === 1 ? "was" : "were"} not read: "${word}".`],
  };
}

function hasData({ grid, first, last }: Read, column: number): boolean {
  const cells = grid.block.columns[column]!;
  for (let row = first; row <= last; row++) {
    if (!isBlankCell(cells, row)) return true;
  }
  return false;
}

const headingOf = ({ grid, heading }: Read, column: number): string =>
  heading === null ? "" : cellInWords(grid.block.columns[column]!, heading);

const emptyColumns = (read: Read): number[] => read.grid.filled.filter((column) => !hasData(read, column));

const fullColumns = (read: Read): number[] => read.grid.filled.filter((column) => hasData(read, column));

/** A heading that is wanted and stands above an empty column only. */
function emptyAmong(read: Read, wanted: readonly string[]): Extract<Problem, { code: "empty-column" }> | null {
  const plain = (column: number): string => plainHeading(headingOf(read, column));
  const full = new Set(fullColumns(read).map(plain));
  const missed = new Set(wanted.map(plainHeading).filter((heading) => !full.has(heading)));
  const column = emptyColumns(read).find((one) => missed.has(plain(one)));
  if (column === undefined) return null;
  const where = columnInWords(read.grid.block.firstColumn + column);
  return { code: "empty-column", column: headingOf(read, column), where };
}

const emptyNotes = (read: Read): string[] =>
  emptyColumns(read)
    .filter((column) => headingOf(read, column) !== "")
    .map((column) => `Column "${headingOf(read, column)}" is empty and was left away.`);

function sourceOf(read: Read): Source {
  const { grid, first, last } = read;
  const { sheet, firstRow, firstColumn, columns, hiddenRows = [] } = grid.block;
  const kept = fullColumns(read);
  const names = distinctNames(
    kept.map((column) => ({ heading: headingOf(read, column), where: columnInWords(firstColumn + column) })),
  );
  const hidden = hiddenAmong(hiddenRows, firstRow + first, last - first + 1);
  return {
    rowCount: last - first + 1,
    ...(hidden !== null && { hidden }),
    columns: kept.map((column, i): Column => ({
      name: names[i]!,
      place: { kind: "sheet", sheet, column: firstColumn + column, firstRow: firstRow + first },
      cells: rowsOf(columns[column]!, first, last + 1),
    })),
  };
}

/** The cells from one row up to another, over the same memory. */
export const rowsOf = ({ kinds, numbers, texts }: CellColumn, from: number, to: number): CellColumn => ({
  kinds: kinds.subarray(from, to),
  numbers: numbers.subarray(from, to),
  texts,
});
