import type { SheetArea } from "../core/table/address.ts";

/** Sheet rows (from 0) of a block that are hidden or filtered away; asked row by row only where some are. */
export async function hiddenRowsOf(context: Excel.RequestContext, place: SheetArea): Promise<readonly number[]> {
  const sheet = context.workbook.worksheets.getItem(place.sheet);
  const column = sheet.getRangeByIndexes(place.row, place.column, place.rows, 1).load("rowHidden");
  await context.sync();
  // One answer for all rows where they agree, null where they differ.
  const same = column.rowHidden as boolean | null;
  if (same === false) return [];
  const hidden = new Set(Array.from({ length: place.rows }, (_, index) => place.row + index));
  if (same === true) return [...hidden];
  const visible = column.getSpecialCellsOrNullObject("Visible");
  visible.areas.load("items/rowIndex,items/rowCount");
  await context.sync();
  for (const { rowIndex, rowCount } of visible.isNullObject ? [] : visible.areas.items) {
    for (let row = rowIndex; row < rowIndex + rowCount; row++) hidden.delete(row);
  }
  return [...hidden];
}

/** Sheet columns (from 0) of a block that are hidden; asked column by column only where some are. */
export async function hiddenColumnsOf(context: Excel.RequestContext, place: SheetArea): Promise<readonly number[]> {
  const sheet = context.workbook.worksheets.getItem(place.sheet);
  const row = sheet.getRangeByIndexes(place.row, place.column, 1, place.columns).load("columnHidden");
  await context.sync();
  const same = row.columnHidden as boolean | null;
  const all = Array.from({ length: place.columns }, (_, index) => place.column + index);
  if (same !== null) return same ? all : [];
  const cells = all.map((column) => sheet.getRangeByIndexes(place.row, column, 1, 1).load("columnHidden"));
  await context.sync();
  return all.filter((_, index) => cells[index]!.columnHidden);
}
