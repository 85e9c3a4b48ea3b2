import { type CellColumn, cellKind } from "../core/table/cells.ts";

/** The cells of an argument as Excel hands them over: rows of numbers, texts, booleans, nulls, errors and rich values. */
export type RawCells = readonly (readonly unknown[])[];

/** One value stands for one cell; an argument that was left out has no cells. */
export function rawCells(argument: unknown): RawCells {
  if (isMissing(argument)) return [];
  if (!Array.isArray(argument)) return [[argument]];
  return argument.every(Array.isArray) ? (argument as RawCells) : [argument];
}

/** A blank arrives as null, as undefined or as an empty text, by the version of Excel. */
export const isMissing = (value: unknown): boolean => value === null || value === undefined || value === "";

export const widthOf = (cells: RawCells): number => cells[0]?.length ?? 0;

/** The number of rows down to the last one in use. */
export function usedHeight(cells: RawCells): number {
  let height = cells.length;
  while (height > 0 && cells[height - 1]!.every(isMissing)) height--;
  return height;
}

/**
 * What a cell amounts to: rich values carry a plain one within, errors their sign.
 * A number that JSON cannot hold never arrives, but a caller within the page could hand one over.
 */
export function plainValue(value: unknown): number | string | boolean | null | { readonly error: string } {
  if (typeof value === "number") return Number.isFinite(value) ? value : { error: "#NUM!" };
  if (isMissing(value)) return null;
  switch (typeof value) {
    case "string":
    case "boolean":
      return value;
    default:
      return typeof value === "object" ? unwrapped(value as Rich) : { error: "#VALUE!" };
  }
}

interface Rich {
  readonly code?: unknown;
  readonly type?: unknown;
  readonly basicValue?: unknown;
}

function unwrapped({ code, type, basicValue }: Rich): ReturnType<typeof plainValue> {
  if (typeof code === "string") return { error: code };
  if (type === "Error") return { error: typeof basicValue === "string" ? basicValue : "#VALUE!" };
  return typeof basicValue === "object" ? { error: "#VALUE!" } : plainValue(basicValue);
}

/** Rows `first` to `last` (not included) of one column of an argument; rows beyond its end are blank. */
export function columnOf(cells: RawCells, column: number, [first, last]: readonly [number, number]): CellColumn {
  const kinds = new Uint8Array(last - first);
  const numbers = new Float64Array(last - first);
  const known = new Map<string, number>();
  const indexOf = (text: string): number => {
    const index = known.get(text) ?? known.size;
    known.set(text, index);
    return index;
  };
  for (let row = 0; row < kinds.length; row++) {
    const value = plainValue(cells[first + row]?.[column]);
    if (value === null) continue;
    kinds[row] = kindOf(value);
    numbers[row] =
      typeof value === "object" ? indexOf(value.error) : typeof value === "string" ? indexOf(value) : +value;
  }
  return { kinds, numbers, texts: [...known.keys()] };
}

function kindOf(value: NonNullable<ReturnType<typeof plainValue>>): number {
  if (typeof value === "number") return cellKind.number;
  if (typeof value === "string") return cellKind.text;
  return typeof value === "boolean" ? cellKind.boolean : cellKind.error;
}
