import type { Spots } from "../problem/problem.ts";
import { type CellColumn, cellKind } from "./cells.ts";
import { dayInDigits } from "./calendar.ts";
import { cellOf } from "./place.ts";
import type { Column } from "./source.ts";

/** More cells than these are counted, not listed. */
const mostListed = 10;

/** The cells of a column that a fault is about: the first ten with what they hold, and how many there are. */
export function spotsOf(column: Column, isSpot: (row: number) => boolean): Spots {
  const rows: number[] = [];
  let count = 0;
  for (let row = 0; row < column.cells.kinds.length; row++) {
    if (!isSpot(row)) continue;
    if (count < mostListed) rows.push(row);
    count++;
  }
  return {
    column: column.name,
    cells: rows.map((row) => cellOf(column.place, row)),
    values: rows.map((row) => cellInWords(column.cells, row)),
    count,
  };
}

/** What stands in a cell, as text: numbers in full, dates as year-month-day, TRUE and FALSE. */
export function cellInWords({ kinds, numbers, texts }: CellColumn, row: number): string {
  const number = numbers[row]!;
  switch (kinds[row]) {
    case cellKind.blank:
      return "";
    case cellKind.text:
    case cellKind.error:
      return texts[number]!.trim().replaceAll(/\s+/g, " ");
    case cellKind.boolean:
      return number === 1 ? "TRUE" : "FALSE";
    case cellKind.date:
      return dayInDigits(number);
    default:
      return String(number);
  }
}
