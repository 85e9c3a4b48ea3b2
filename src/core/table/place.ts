import { addressOf } from "./address.ts";
import type { Place } from "./source.ts";

/**
 * The name of one cell as the user knows it: "Months!C14", or "row 13 of drivers, column 2" for an argument
 * of a worksheet function.
 * @param row - row of the column's data, from 0.
 */
export function cellOf(place: Place, row: number): string {
  if (place.kind === "argument")
    return `row ${rowNumberOf(place, row)} of ${place.argument}, column ${place.column + 1}`;
  return addressOf({ sheet: place.sheet, row: place.firstRow + row, column: place.column, rows: 1, columns: 1 });
}

/** The name of a whole column of data: "Months!C2:C97", "column 2 of drivers". */
export function rangeOf(place: Place, rowCount: number): string {
  if (place.kind === "argument") return `column ${place.column + 1} of ${place.argument}`;
  const { sheet, column, firstRow } = place;
  return addressOf({ sheet, row: firstRow, column, rows: Math.max(rowCount, 1), columns: 1 });
}

/** The number of a row as the user counts, from 1 at the top of the sheet or argument. */
export const rowNumberOf = (place: Place, row: number): number => place.firstRow + row + 1;
