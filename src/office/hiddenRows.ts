import type { Located } from "./locate.ts";

/** Sheet rows (from 0) of a block that are hidden or filtered away; asked row by row only where some are. */
export async function hiddenRowsOf(context: Excel.RequestContext, place: Located): Promise<readonly number[]> {
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
