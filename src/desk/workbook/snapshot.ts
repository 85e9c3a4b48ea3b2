import { BooleanNumber, type IColumnData, type ICellData, type IRowData } from "@univerjs/core";
import { localAddressOf, columnLetters } from "../../core/table/address.ts";
import type { BookCell, BookData, BookValue, SheetData, StyledCell } from "../book/bookData.ts";
import { fromRange, localAddress } from "./areas.ts";
import { activeSheet, nameOf, recordOf, sheetIds, worksheetOf, type Book } from "./book.ts";
import {
  cellAt,
  cellsOf,
  formulaAt,
  isFormula,
  kindOf,
  spillFrom,
  usedWithin,
  valueOf,
  type SheetCells,
} from "./cells.ts";
import { wholeSheet } from "./areas.ts";
import { rulersOf, toBookChart } from "./charts.ts";
import { namesOf } from "./names.ts";
import { charactersOf, pointsPerPixel } from "./sizes.ts";
import { styleAt } from "./styles.ts";
import { fromGridStyle } from "./styleTables.ts";

/** The workbook as it stands now, as plain data: what is saved, and what tests compare. */
export function snapshotOf(book: Book): BookData {
  const ids = sheetIds(book);
  return {
    sheets: ids.map((sheet) => sheetData(book, sheet)),
    names: namesOf(book).map(({ name, refersTo, sheet, comment }) => ({
      name,
      refersTo,
      ...(sheet === null ? {} : { sheet: nameOf(book, sheet) }),
      ...(comment === "" ? {} : { comment }),
    })),
    active: Math.max(0, ids.indexOf(activeSheet(book))),
    ...(book.customXml.length === 0 ? {} : { customXml: book.customXml.map((part) => ({ ...part })) }),
    ...(book.manualCalculation ? { manualCalculation: true as const } : {}),
    ...(book.settings.size === 0 ? {} : { settings: Object.fromEntries(book.settings) }),
  };
}

function sheetData(book: Book, sheet: string): SheetData {
  const worksheet = worksheetOf(book, sheet);
  const record = recordOf(book, sheet);
  const sizes = sizesOf(book, sheet);
  const { customProperties } = record;
  return {
    name: nameOf(book, sheet),
    rows: rowsOf(book, sheet),
    ...sizes,
    merges: worksheet.getMergeData().map((range) => localAddress(fromRange(sheet, range))),
    frozenRows: worksheet.getFreeze().ySplit,
    hidden: worksheet.isSheetHidden() === BooleanNumber.TRUE,
    protected: record.protected,
    tables: record.tables.map((table) => ({ name: table.name, address: localAddressOf(table) })),
    charts: record.charts.map((chart) => toBookChart(chart, rulersOf(sizes))),
    printArea: record.printArea,
    onePageWide: record.onePageWide,
    ...(record.landscape ? { landscape: true } : {}),
    ...(record.pageBreaks.length === 0 ? {} : { pageBreaks: [...record.pageBreaks] }),
    ...(record.margins === null ? {} : { margins: record.margins }),
    ...(record.footer === null ? {} : { footer: record.footer }),
    links: [...record.links].map(([place, { target }]) => ({ cell: cellName(place), target })),
    ...(customProperties.size === 0 ? {} : { customProperties: Object.fromEntries(customProperties) }),
  };
}

function cellName(place: string): string {
  const [row, column] = place.split(",").map(Number);
  return `${columnLetters(column ?? 0)}${(row ?? 0) + 1}`;
}

type Sizes = Pick<SheetData, "columnWidths" | "rowHeights" | "hiddenRows" | "hiddenColumns">;

function sizesOf(book: Book, sheet: string): Sizes {
  const config = worksheetOf(book, sheet).getConfig();
  const columnWidths: (number | undefined)[] = [];
  const hiddenColumns: number[] = [];
  for (const [column, data] of Object.entries(config.columnData as Record<string, Partial<IColumnData>>)) {
    if (data.w !== undefined) columnWidths[Number(column)] = charactersOf(data.w);
    if (data.hd === BooleanNumber.TRUE) hiddenColumns.push(Number(column));
  }
  const rowHeights: (number | undefined)[] = [];
  const hiddenRows: number[] = [];
  for (const [row, data] of Object.entries(config.rowData as Record<string, Partial<IRowData>>)) {
    if (data.h !== undefined && data.ia === BooleanNumber.FALSE) rowHeights[Number(row)] = data.h * pointsPerPixel;
    if (data.hd === BooleanNumber.TRUE) hiddenRows.push(Number(row));
  }
  return {
    columnWidths: Array.from(columnWidths),
    ...(rowHeights.length === 0 ? {} : { rowHeights: Array.from(rowHeights) }),
    hiddenRows,
    ...(hiddenColumns.length === 0 ? {} : { hiddenColumns }),
  };
}

function rowsOf(book: Book, sheet: string): readonly (readonly BookCell[])[] {
  const used = usedWithin(book, wholeSheet(sheet), false);
  if (used === null) return [];
  const cells = cellsOf(book, sheet);
  const rows: (readonly BookCell[])[] = [];
  for (let row = 0; row < used.row + used.rows; row++) {
    const line: BookCell[] = [];
    for (let column = 0; column < used.column + used.columns; column++)
      line.push(bookCell(book, cells, { sheet, row, column }));
    while (line.length > 0 && line[line.length - 1] === null) line.pop();
    rows.push(line);
  }
  return rows;
}

function bookCell(book: Book, cells: SheetCells, at: { sheet: string; row: number; column: number }): BookCell {
  const cell = cellAt(cells, at.row, at.column);
  if (cell === undefined) return null;
  const value = bookValue(cell);
  if (!isFormula(cell) && (cell.s ?? null) === null) return value;
  const style = fromGridStyle(styleAt(book, cell));
  const formula = formulaAt(book, at.sheet, at);
  if (formula === "" && style === undefined) return value;
  const spill = formula === "" ? null : spillFrom(book, at.sheet, at);
  const styled: StyledCell = {
    value,
    ...(formula === "" ? {} : { formula }),
    ...(spill === null ? {} : { spill: localAddress(spill) }),
    ...(style === undefined ? {} : { style }),
  };
  return styled;
}

function bookValue(cell: ICellData): BookValue {
  const value = valueOf(cell);
  const kind = kindOf(cell);
  if (kind === "Error") return { error: String(value) };
  return kind === "Empty" ? null : value;
}
