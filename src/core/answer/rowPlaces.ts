import type { Design } from "../design/design.ts";
import { cellOf, rowNumberOf } from "../table/place.ts";
import type { Place, Source } from "../table/source.ts";

/** How the reader knows a row of the design. */
export interface RowPlaces {
  /** Sheet row, from 1. */
  readonly number: (row: number) => number;
  /** "row 57" */
  readonly name: (row: number) => string;
  /** The cell of the outcome in it: "Months!B57". */
  readonly cell: (row: number) => string;
}

/** Rows go by where the outcome stands. */
export function rowPlacesOf({ outcome, sourceRows }: Design, { columns }: Source): RowPlaces {
  const place: Place = columns.find(({ name }) => name === outcome.column)?.place ?? {
    kind: "argument",
    argument: "outcome",
    column: 0,
    firstRow: 0,
  };
  const number = (row: number): number => rowNumberOf(place, sourceRows[row]!);
  return { number, name: (row) => `row ${number(row)}`, cell: (row) => cellOf(place, sourceRows[row]!) };
}
