import { localAddressOf } from "../../../src/core/table/address.ts";
import type { Cell } from "../../../src/core/table/cells.ts";
import { blankSheet } from "../../../src/desk/book/blankSheet.ts";
import type { BookCell, SheetData } from "../../../src/desk/book/bookData.ts";
import type { DataSet } from "../dataSets.ts";

/** A sheet of data that formulas speak of: key, outcome, drivers, spare column; headings in its first row. */
export interface Worksheet {
  readonly headings: readonly string[];
  /** Row by row, headings not included. */
  readonly rows: readonly (readonly BookCell[])[];
  readonly driverCount: number;
  readonly more: Partial<SheetData>;
}

/** The cells that a formula names, by rows of the sheet from 0 below the headings; -1 is the row of the headings. */
export interface Ranges {
  readonly outcome: Span;
  readonly drivers: Span;
}

export interface Span {
  readonly from: number;
  readonly to: number;
}

export function worksheetOf({ key, outcome, drivers, spare }: DataSet): Worksheet {
  const columns = [outcome, ...drivers, spare];
  return {
    headings: [key.name, ...columns.map(({ name }) => name)],
    rows: key.cells.map((cell, row) => [plain(cell), ...columns.map(({ values }) => values[row]!)]),
    driverCount: drivers.length,
    more: {},
  };
}

const plain = (cell: Cell): BookCell =>
  cell !== null && typeof cell === "object" && "date" in cell
    ? { value: cell.date, style: { numberFormat: "yyyy-mm-dd" } }
    : cell;

export const toSheetData = (name: string, { headings, rows, more }: Worksheet): SheetData => ({
  ...blankSheet(name, [headings, ...rows]),
  ...more,
});

/** The number in a cell; null where a worksheet function finds none. */
export function numberIn(cell: BookCell | undefined): number | null {
  const value = cell !== null && typeof cell === "object" && "value" in cell ? cell.value : cell;
  return typeof value === "number" ? value : null;
}

/** "Data3!$C$2:$D$33" */
export function rangeOf(sheet: string, { from, to }: Span, columns: Span): string {
  const area = { row: from + 1, column: columns.from, rows: to - from, columns: columns.to - columns.from };
  return `${sheet}!${localAddressOf(area).replaceAll(/([A-Z]+)(\d+)/g, "$$$1$$$2")}`;
}

/** The sheet with some cells of a column changed. */
export function changed(
  sheet: Worksheet,
  column: number,
  [at, change]: readonly [readonly number[], (cell: BookCell) => BookCell],
): Worksheet {
  const rows = sheet.rows.map((row, index) =>
    at.includes(index) ? row.map((cell, track) => (track === column ? change(cell) : cell)) : row,
  );
  return { ...sheet, rows };
}
