import {
  BooleanNumber,
  CellValueType,
  type ICellData,
  type IColumnData,
  type IRowData,
  type IWorkbookData,
  type IWorksheetData,
} from "@univerjs/core";
import { parseAddress } from "../../core/table/address.ts";
import type { BookCell, BookData, BookValue, SheetData, StyledCell } from "../book/bookData.ts";
import { toRange } from "./areas.ts";
import { pixelsOf, pointsPerPixel, standardHeight, standardWidth } from "./sizes.ts";
import { toGridStyle } from "./styleTables.ts";
import { staysText } from "./typed.ts";

/** The grid shows at least this much, so that an empty sheet looks like one. */
const leastRows = 1000;
const leastColumns = 26;
const spareRows = 100;
const spareColumns = 5;

/** A workbook's cells, looks and sizes as the grid opens them. */
export function toGrid(id: string, data: BookData, sheetIds: readonly string[]): Partial<IWorkbookData> {
  const sheets = data.sheets.map((sheet, index) => toWorksheet(sheet, sheetIds[index]!));
  return {
    id,
    name: "Book",
    sheetOrder: [...sheetIds],
    styles: {},
    sheets: Object.fromEntries(sheets.map((sheet) => [sheet.id, sheet])),
  };
}

function toWorksheet(sheet: SheetData, id: string): Partial<IWorksheetData> & { readonly id: string } {
  const widths = Math.max(sheet.columnWidths.length, 1 + Math.max(-1, ...(sheet.hiddenColumns ?? [])));
  const wide = sheet.rows.reduce((most, row) => Math.max(most, row.length), widths);
  return {
    id,
    name: sheet.name,
    hidden: sheet.hidden ? BooleanNumber.TRUE : BooleanNumber.FALSE,
    rowCount: Math.max(leastRows, sheet.rows.length + spareRows),
    columnCount: Math.max(leastColumns, wide + spareColumns),
    defaultColumnWidth: standardWidth,
    defaultRowHeight: standardHeight,
    cellData: toCells(sheet),
    columnData: toColumns(sheet),
    rowData: toRows(sheet),
    mergeData: sheet.merges.flatMap((address) => {
      const area = parseAddress(address);
      return area === null ? [] : [toRange(area)];
    }),
    freeze: { xSplit: 0, ySplit: sheet.frozenRows, startRow: sheet.frozenRows || -1, startColumn: -1 },
  };
}

function toColumns(sheet: SheetData): Record<number, Partial<IColumnData>> {
  const columns: Record<number, Partial<IColumnData>> = {};
  for (const column of sheet.hiddenColumns ?? []) columns[column] = { hd: BooleanNumber.TRUE };
  sheet.columnWidths.forEach((width, column) => {
    if (width !== undefined) columns[column] = { ...columns[column], w: pixelsOf(width) };
  });
  return columns;
}

function toRows(sheet: SheetData): Record<number, Partial<IRowData>> {
  const rows: Record<number, Partial<IRowData>> = {};
  for (const row of sheet.hiddenRows) rows[row] = { hd: BooleanNumber.TRUE };
  (sheet.rowHeights ?? []).forEach((points, row) => {
    if (points !== undefined) rows[row] = { ...rows[row], h: points / pointsPerPixel, ia: BooleanNumber.FALSE };
  });
  return rows;
}

function toCells(sheet: SheetData): Record<number, Record<number, ICellData>> {
  const cells: Record<number, Record<number, ICellData>> = {};
  sheet.rows.forEach((row, r) => {
    const line: Record<number, ICellData> = {};
    row.forEach((cell, c) => {
      const kept = toCell(cell);
      if (kept !== null) line[c] = kept;
    });
    if (row.length > 0) cells[r] = line;
  });
  return cells;
}

export const isStyled = (cell: BookCell | undefined): cell is StyledCell =>
  typeof cell === "object" && cell !== null && "value" in cell;

function toCell(cell: BookCell): ICellData | null {
  if (!isStyled(cell)) return cell === null ? null : toValue(cell);
  const style = cell.style === undefined ? {} : toGridStyle(cell.style);
  return {
    ...toValue(cell.value),
    ...(cell.formula === undefined ? {} : { f: cell.formula }),
    ...(Object.keys(style).length === 0 ? {} : { s: style }),
  };
}

function toValue(value: BookValue): ICellData {
  if (value === null) return {};
  if (typeof value === "number") return { v: value, t: CellValueType.NUMBER };
  if (typeof value === "boolean") return { v: value ? 1 : 0, t: CellValueType.BOOLEAN };
  // Text of a file is text, even where it reads like an error or a number.
  if (typeof value === "string") {
    return { v: value, t: staysText(value) ? CellValueType.STRING : CellValueType.FORCE_STRING };
  }
  return { v: value.error, t: CellValueType.STRING };
}
