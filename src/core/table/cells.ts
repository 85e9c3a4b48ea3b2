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

/** Cells as a sheet or a test lists them, brought into column form. */
export function toCellColumn(cells: readonly Cell[]): CellColumn {
  const kinds = new Uint8Array(cells.length);
  const numbers = new Float64Array(cells.length);
  const texts: string[] = [];
  const known = new Map<string, number>();
  const indexOf = (text: string): number => {
    const index = known.get(text) ?? texts.push(text) - 1;
    known.set(text, index);
    return index;
  };
  cells.forEach((cell, row) => {
    const [kind, number] = encode(cell, indexOf);
    kinds[row] = kind;
    numbers[row] = number;
  });
  return { kinds, numbers, texts };
}

function encode(cell: Cell, indexOf: (text: string) => number): readonly [number, number] {
  if (cell === null || cell === "") return [cellKind.blank, 0];
  if (typeof cell === "number") return [cellKind.number, cell];
  if (typeof cell === "boolean") return [cellKind.boolean, cell ? 1 : 0];
  if (typeof cell === "string") return [cellKind.text, indexOf(cell)];
  return "date" in cell ? [cellKind.date, cell.date] : [cellKind.error, indexOf(cell.error)];
}
