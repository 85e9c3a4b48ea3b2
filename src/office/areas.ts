import type { SheetArea } from "../core/table/address.ts";

/** A rectangle on a sheet; rows and columns count from 0. */
export type Rectangle = Omit<SheetArea, "sheet">;

export const intersection = (a: Rectangle, b: Rectangle): Rectangle | null => {
  const row = Math.max(a.row, b.row);
  const column = Math.max(a.column, b.column);
  const rows = Math.min(a.row + a.rows, b.row + b.rows) - row;
  const columns = Math.min(a.column + a.columns, b.column + b.columns) - column;
  return rows > 0 && columns > 0 ? { row, column, rows, columns } : null;
};

export const sameArea = (a: Rectangle, b: Rectangle): boolean =>
  a.row === b.row && a.column === b.column && a.rows === b.rows && a.columns === b.columns;

/** The properties that say where a range stands, in one word for load(). */
export const whereabouts = "rowIndex,columnIndex,rowCount,columnCount";

export const rectangleOf = (range: Excel.Range): Rectangle => ({
  row: range.rowIndex,
  column: range.columnIndex,
  rows: range.rowCount,
  columns: range.columnCount,
});
