import type { Result } from "../problem/result.ts";
import { cellOf } from "../table/place.ts";
import { cellInWords } from "../table/spots.ts";
import type { Column } from "../table/source.ts";
import type { Term } from "./design.ts";

/** What one part of the model needs of every row, and the terms it makes of the rows that are used. */
export interface Ingredient {
  /** 1 for the rows of the source that it can use. */
  readonly present: Uint8Array;
  /** Why a row cannot be used. */
  readonly lackOf: (row: number) => Lack;
  /** @param rows - the source rows used, in design order. */
  readonly terms: (rows: Int32Array) => Result<readonly Term[]>;
  readonly notes: readonly string[];
}

/** The cell that is missing, and why the row is left out, as words after "because". */
export interface Lack {
  readonly cell: string;
  readonly because: string;
}

/** The lack of a cell that is blank or holds a mark for a missing value. */
export function missingCell({ name, place, cells }: Column, row: number): Lack {
  const words = cellInWords(cells, row);
  return { cell: cellOf(place, row), because: words === "" ? `"${name}" is blank` : `"${name}" holds "${words}"` };
}

export const gather = (values: Float64Array, rows: Int32Array): Float64Array<ArrayBuffer> => {
  const gathered = new Float64Array(rows.length);
  for (let i = 0; i < rows.length; i++) gathered[i] = values[rows[i]!]!;
  return gathered;
};
