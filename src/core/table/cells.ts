/** One cell as it stands in the sheet: blank is null, a date carries its serial number, an error its sign. */
export type Cell = number | string | boolean | null | { readonly date: number } | { readonly error: string };

/** What a cell holds, as a byte of `CellColumn.kinds`. */
export const cellKind = { blank: 0, number: 1, text: 2, boolean: 3, error: 4, date: 5 } as const;

/**
 * The cells of one column in a form that crosses to the worker without copying.
 * `numbers[i]` is the number, the date's serial, 1 or 0 for a boolean, and for text and errors
 * the index into `texts` (each distinct text once).
 */
export interface CellColumn {
  readonly kinds: Uint8Array<ArrayBuffer>;
  readonly numbers: Float64Array<ArrayBuffer>;
  readonly texts: readonly string[];
}
