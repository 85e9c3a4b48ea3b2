import { RANGE_TYPE, type IRange } from "@univerjs/core";
import { mostColumns, mostRows } from "../../core/table/address.ts";
import { fromRange, isEntireColumn, isEntireRow, toRange, type Area } from "./areas.ts";
import { activeSheet, worksheetOf, type Book } from "./book.ts";
import { carryOut, command } from "./grid.ts";
import { showSheet } from "./sheets.ts";
import { growTo } from "./write.ts";

/** What is selected on the sheet in view, the last chosen area last; the first cell where nothing ever was. */
export function selectedAreas(book: Book): readonly Area[] {
  const sheet = activeSheet(book);
  const selection = book.grid.api.getActiveWorkbook()?.getActiveSheet().getSelection();
  const areas = selection?.getActiveRangeList().map((range) => fromSelection(sheet, range.getRange())) ?? [];
  return areas.length > 0 ? areas : [{ sheet, row: 0, column: 0, rows: 1, columns: 1 }];
}

/** The grid ends a chosen column at its own last row; Excel's goes on to the last there is. */
function fromSelection(sheet: string, range: IRange): Area {
  const area = fromRange(sheet, range);
  const { rangeType } = range;
  const rows = rangeType === RANGE_TYPE.COLUMN || rangeType === RANGE_TYPE.ALL ? { row: 0, rows: mostRows } : {};
  const columns =
    rangeType === RANGE_TYPE.ROW || rangeType === RANGE_TYPE.ALL ? { column: 0, columns: mostColumns } : {};
  return { ...area, ...rows, ...columns };
}

function toSelection(book: Book, area: Area): IRange {
  const worksheet = worksheetOf(book, area.sheet);
  const rows = isEntireColumn(area) ? { rows: worksheet.getRowCount() } : {};
  const columns = isEntireRow(area) ? { columns: worksheet.getColumnCount() } : {};
  return { ...toRange({ ...area, ...rows, ...columns }), rangeType: typeOf(area) };
}

function typeOf(area: Area): RANGE_TYPE {
  if (isEntireColumn(area)) return isEntireRow(area) ? RANGE_TYPE.ALL : RANGE_TYPE.COLUMN;
  return isEntireRow(area) ? RANGE_TYPE.ROW : RANGE_TYPE.NORMAL;
}

export function selectAreas(book: Book, areas: readonly Area[]): void {
  const sheet = areas[0]?.sheet ?? activeSheet(book);
  if (sheet !== activeSheet(book)) showSheet(book, sheet);
  for (const area of areas) if (!isEntireColumn(area) && !isEntireRow(area)) growTo(book, area);
  const selections = areas.map((area) => ({ range: toSelection(book, area), primary: primaryOf(area), style: null }));
  carryOut(book.grid, command.selections, { unitId: book.unit, subUnitId: sheet, selections, type: selectionDone });
}

/** The grid's sign that a selection is made, not still being dragged. */
const selectionDone = 2;

function primaryOf({ row, column }: Area): object {
  return {
    startRow: row,
    endRow: row,
    startColumn: column,
    endColumn: column,
    actualRow: row,
    actualColumn: column,
    isMerged: false,
    isMergedMainCell: false,
  };
}
