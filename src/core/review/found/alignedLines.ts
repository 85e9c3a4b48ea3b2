import { mostColumns, mostRows } from "../../table/address.ts";
import type { Book } from "../book.ts";
import { sheetNamed, usedAreaOf } from "../cellsOfBook.ts";
import type { Regression, UsedLine } from "../formula/foundRegression.ts";
import { type Stretch, isNumberAlong } from "./claimedLines.ts";

/** The stretches that a regression uses, outcome first: pair by pair the same number of cells. */
export type Aligned = readonly [outcome: Stretch, ...drivers: Stretch[]];

/**
 * Cuts the ranges of a regression to the cells that can take part: whole columns to the used range and to the cells
 * between the first and the last that are numbers in every line; the same for functions that pass over other cells.
 * @returns null where no cell is left.
 */
export function alignedLines({ outcome, drivers, passesOver }: Regression, book: Book): Aligned | null {
  const lines = [outcome, ...drivers].flatMap((line) => wholeStretch(line, book));
  const [first, ...others] = lines;
  if (first === undefined || lines.length !== drivers.length + 1) return null;
  let from = Math.max(...lines.map((line) => startOfUse(line) - line.from));
  let to = Math.min(...lines.map((line) => endOfUse(line) - line.from), ...lines.map(({ count }) => count));
  from = Math.max(from, 0);
  if (passesOver || first.count >= (first.runs === "down" ? mostRows : mostColumns)) {
    const allNumbers = (index: number): boolean => lines.every((line) => isNumberAlong(line, line.from + index));
    while (from < to && !allNumbers(from)) from++;
    while (to > from && !allNumbers(to - 1)) to--;
  }
  if (to <= from) return null;
  const cut = (line: Stretch): Stretch => ({ ...line, from: line.from + from, count: to - from });
  return [cut(first), ...others.map(cut)];
}

function wholeStretch({ area }: UsedLine, book: Book): Stretch[] {
  const sheet = sheetNamed(book, area.sheet);
  if (sheet === null) return [];
  const down = area.columns === 1;
  return [
    down
      ? { sheet, runs: "down", track: area.column, from: area.row, count: area.rows }
      : { sheet, runs: "across", track: area.row, from: area.column, count: area.columns },
  ];
}

function startOfUse({ sheet, runs }: Stretch): number {
  const used = usedAreaOf(sheet);
  return runs === "down" ? used.row : used.column;
}

function endOfUse({ sheet, runs }: Stretch): number {
  const used = usedAreaOf(sheet);
  return runs === "down" ? used.row + used.rows : used.column + used.columns;
}
