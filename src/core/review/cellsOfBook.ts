import { addressOf, type SheetArea } from "../table/address.ts";
import { cellKind } from "../table/cells.ts";
import { cellInWords } from "../table/spots.ts";
import type { Book, BookSheet } from "./book.ts";

/** Where one cell is; row and column count from 0 at the sheet's corner. */
export interface CellPlace {
  readonly sheet: BookSheet;
  readonly row: number;
  readonly column: number;
}

/** Sheet names are the same where they differ in case alone. */
export const sheetNamed = (book: Book, name: string): BookSheet | null =>
  book.sheets.find(({ sheet }) => sheet.toLowerCase() === name.toLowerCase()) ?? null;

/** A byte of `cellKind`; blank outside of the used range. */
export const kindAt = ({ sheet, row, column }: CellPlace): number =>
  sheet.columns[column - sheet.firstColumn]?.kinds[row - sheet.firstRow] ?? cellKind.blank;

/** The number in a cell; null where it holds none. */
export function numberAt(place: CellPlace): number | null {
  if (kindAt(place) !== cellKind.number) return null;
  const { sheet, row, column } = place;
  return sheet.columns[column - sheet.firstColumn]!.numbers[row - sheet.firstRow]!;
}

/** What stands in a cell in words, "" for a blank. */
export function wordsAt(place: CellPlace): string {
  if (kindAt(place) === cellKind.blank) return "";
  const { sheet, row, column } = place;
  return cellInWords(sheet.columns[column - sheet.firstColumn]!, row - sheet.firstRow);
}

export const isTextAt = (place: CellPlace): boolean => kindAt(place) === cellKind.text;

/** Whether the cell holds a formula of any kind. */
export const isCalculatedAt = ({ sheet, row, column }: CellPlace): boolean =>
  sheet.calculated[column - sheet.firstColumn]?.[row - sheet.firstRow] === 1;

/** Whether the cell is among those that a regression's formula fills: one that spills stands in its first cell alone. */
export const isSpilledAt = ({ sheet, row, column }: CellPlace): boolean =>
  [...sheet.formulas, ...sheet.readers].some((one) => overlap(one, { row, column, rows: 1, columns: 1 }));

/** The number format of a cell; null where it was not read. */
export function formatAt({ sheet, row, column }: CellPlace): string | null {
  const stretch = sheet.formats.find(({ firstRow, rowCount }) => row >= firstRow && row < firstRow + rowCount);
  const across = column - sheet.firstColumn;
  if (stretch === undefined || across < 0 || across >= sheet.columns.length) return null;
  return stretch.formats[stretch.indices[(row - stretch.firstRow) * sheet.columns.length + across]!] ?? null;
}

/** "Handover!B4" */
export const addressAt = ({ sheet, row, column }: CellPlace): string =>
  addressOf({ sheet: sheet.sheet, row, column, rows: 1, columns: 1 });

export type Rectangle = Omit<SheetArea, "sheet">;

/** Whether two areas of one sheet have a cell in common. */
export const overlap = (one: Rectangle, other: Rectangle): boolean =>
  one.row < other.row + other.rows &&
  other.row < one.row + one.rows &&
  one.column < other.column + other.columns &&
  other.column < one.column + one.columns;

/** The used range of a sheet. */
export const usedAreaOf = ({ sheet, firstRow, firstColumn, rowCount, columns }: BookSheet): SheetArea => ({
  sheet,
  row: firstRow,
  column: firstColumn,
  rows: rowCount,
  columns: columns.length,
});

/** The part of an area inside the used range; null where there is none. */
export function usedPart(sheet: BookSheet, area: SheetArea): SheetArea | null {
  const used = usedAreaOf(sheet);
  const row = Math.max(area.row, used.row);
  const column = Math.max(area.column, used.column);
  const rows = Math.min(area.row + area.rows, used.row + used.rows) - row;
  const columns = Math.min(area.column + area.columns, used.column + used.columns) - column;
  return rows > 0 && columns > 0 ? { sheet: sheet.sheet, row, column, rows, columns } : null;
}
