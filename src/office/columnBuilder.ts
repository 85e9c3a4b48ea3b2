import { type CellColumn, cellKind } from "../core/table/cells.ts";
import { isDateFormat } from "./dateFormats.ts";

/** What Excel tells of a block of cells, row by row. */
export interface ReadCells {
  readonly values: readonly (readonly unknown[])[];
  readonly valueTypes: readonly (readonly string[])[];
  /** Null where they were not asked for: a column then goes on in the format of its last number. */
  readonly numberFormat: readonly (readonly string[])[] | null;
}

export interface ColumnBuilder {
  /** Takes over one column of a block that begins at the given row. */
  readonly put: (block: ReadCells, column: number, firstRow: number) => void;
  readonly column: () => CellColumn;
}

/** Fills one column piece by piece, so that a sheet read in chunks is never held twice. */
export function columnBuilder(rowCount: number): ColumnBuilder {
  const kinds = new Uint8Array(rowCount);
  const numbers = new Float64Array(rowCount);
  const known = new Map<string, number>();
  let lastFormat = "General";
  const numberOf = (text: string): number => {
    const index = known.get(text) ?? known.size;
    known.set(text, index);
    return index;
  };
  return {
    put: ({ values, valueTypes, numberFormat }, column, firstRow) => {
      for (let row = 0; row < values.length; row++) {
        const value = values[row]![column];
        const format = numberFormat?.[row]?.[column] ?? lastFormat;
        if (typeof value === "number") lastFormat = format;
        const kind = kindOf(value, valueTypes[row]![column]!, format);
        kinds[firstRow + row] = kind;
        const inWords = kind === cellKind.text || kind === cellKind.error;
        numbers[firstRow + row] = inWords ? numberOf(String(value)) : Number(value);
      }
    },
    column: () => ({ kinds, numbers, texts: [...known.keys()] }),
  };
}

/** The type tells a blank from a text and an error from a text that looks like one; a date is a number in a date's format. */
function kindOf(value: unknown, type: string, format: string): number {
  if (type === "Error") return cellKind.error;
  if (value === "" || type === "Empty") return cellKind.blank;
  if (typeof value === "boolean") return cellKind.boolean;
  if (typeof value === "number") return isDateFormat(format) ? cellKind.date : cellKind.number;
  return cellKind.text;
}
