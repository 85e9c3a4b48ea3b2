import type { IRange } from "@univerjs/core";
import { addressOf, localAddressOf, mostColumns, mostRows, parseAddress } from "../../core/table/address.ts";
import { nameOf, sheetNamed, type Book } from "./book.ts";

/** A rectangle on a sheet, the sheet by the grid's id; rows and columns count from 0. */
export interface Area {
  readonly sheet: string;
  readonly row: number;
  readonly column: number;
  readonly rows: number;
  readonly columns: number;
}

export const wholeSheet = (sheet: string): Area => ({ sheet, row: 0, column: 0, rows: mostRows, columns: mostColumns });

export const isEntireColumn = (area: Area): boolean => area.row === 0 && area.rows === mostRows;
export const isEntireRow = (area: Area): boolean => area.column === 0 && area.columns === mostColumns;

export function toRange({ row, column, rows, columns }: Omit<Area, "sheet">): IRange {
  return { startRow: row, startColumn: column, endRow: row + rows - 1, endColumn: column + columns - 1 };
}

export function fromRange(sheet: string, range: IRange): Area {
  const { startRow, startColumn, endRow, endColumn } = range;
  return {
    sheet,
    row: startRow,
    column: startColumn,
    rows: endRow - startRow + 1,
    columns: endColumn - startColumn + 1,
  };
}

export function intersectionOf(one: Area, other: Area): Area | null {
  const row = Math.max(one.row, other.row);
  const column = Math.max(one.column, other.column);
  const rows = Math.min(one.row + one.rows, other.row + other.rows) - row;
  const columns = Math.min(one.column + one.columns, other.column + other.columns) - column;
  return one.sheet === other.sheet && rows > 0 && columns > 0 ? { sheet: one.sheet, row, column, rows, columns } : null;
}

/** The smallest area around both. */
export function boundsOf(one: Area, other: Area): Area {
  const row = Math.min(one.row, other.row);
  const column = Math.min(one.column, other.column);
  const rows = Math.max(one.row + one.rows, other.row + other.rows) - row;
  const columns = Math.max(one.column + one.columns, other.column + other.columns) - column;
  return { sheet: one.sheet, row, column, rows, columns };
}

export const isInside = (area: Area): boolean =>
  area.row >= 0 &&
  area.column >= 0 &&
  area.rows >= 1 &&
  area.columns >= 1 &&
  area.row + area.rows <= mostRows &&
  area.column + area.columns <= mostColumns;

const lettersOf = (area: Area): string => localAddressOf({ ...area, row: 0, rows: 2 }).replaceAll(/\d/g, "");

/** "A1:B3"; whole columns "A:C" and whole rows "2:4", as Excel writes them. */
export function localAddress(area: Area): string {
  if (isEntireRow(area)) return `${area.row + 1}:${area.row + area.rows}`;
  return isEntireColumn(area) ? lettersOf(area) : localAddressOf(area);
}

/** "Months!A1:B3", the sheet's name quoted where Excel quotes it. */
export function fullAddress(book: Book, area: Area): string {
  const sheet = nameOf(book, area.sheet);
  const cell = addressOf({ sheet, row: 0, column: 0, rows: 1, columns: 1 });
  return cell.slice(0, -"A1".length) + localAddress(area);
}

/** "Months!$A$1:$B$3", as names and charts refer to a range. */
export function absoluteAddress(book: Book, area: Area): string {
  const full = fullAddress(book, area);
  const split = full.lastIndexOf("!") + 1;
  return full.slice(0, split) + full.slice(split).replaceAll(/([A-Z]+|\d+)/g, "$$$1");
}

/**
 * Reads an address as Excel's API takes it; without a sheet it speaks of the one given.
 * @returns null where the text is no address or names no sheet of this workbook.
 */
export function parseArea(book: Book, text: string, sheet: string): Area | null {
  const rows = /^(?:(.+)!)?\$?(\d+):\$?(\d+)$/.exec(text.trim());
  const first = rows === null ? 0 : Math.min(Number(rows[2]), Number(rows[3]));
  const last = rows === null ? 0 : Math.max(Number(rows[2]), Number(rows[3]));
  const cells = rows === null ? text : `${rows[1] === undefined ? "" : `${rows[1]}!`}A${first}:XFD${last}`;
  const parsed = parseAddress(cells);
  if (parsed === null) return null;
  const found = parsed.sheet === "" ? sheet : sheetNamed(book, parsed.sheet);
  return found === null ? null : { ...parsed, sheet: found };
}
