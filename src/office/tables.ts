import { type Rectangle, rectangleOf, whereabouts } from "./areas.ts";

/** A table of the workbook: all its cells, its headings with the rows below them, and those rows alone; the total row is in `whole` only. */
export interface TablePlace {
  readonly name: string;
  readonly sheet: string;
  readonly whole: Rectangle;
  readonly data: Rectangle;
  readonly body: Rectangle;
}

/** The tables of a sheet or of the workbook, in two trips. */
export async function tablesOf(holder: Excel.Worksheet | Excel.Workbook): Promise<readonly TablePlace[]> {
  const { tables } = holder;
  tables.load("items/name,items/showHeaders,items/showTotals,items/worksheet/name");
  await holder.context.sync();
  const ranges = tables.items.map((table) => table.getRange().load(whereabouts));
  if (ranges.length > 0) await holder.context.sync();
  return tables.items.map((table, index) => placeOf(table, rectangleOf(ranges[index]!)));
}

function placeOf(table: Excel.Table, whole: Rectangle): TablePlace {
  const data = { ...whole, rows: whole.rows - Number(table.showTotals) };
  const headings = Number(table.showHeaders);
  const body = { ...data, row: data.row + headings, rows: data.rows - headings };
  return { name: table.name, sheet: table.worksheet.name, whole, data, body };
}
