import { WrapStrategy, numfmt } from "@univerjs/core";
import { fromRange, intersectionOf, toRange, type Area } from "../workbook/areas.ts";
import { worksheetOf } from "../workbook/book.ts";
import { cellAt, cellsOf, usedWithin, valueOf } from "../workbook/cells.ts";
import { carryOut, command } from "../workbook/grid.ts";
import { pixelsOf, standardHeight } from "../workbook/sizes.ts";
import { formatAt, styleAt } from "../workbook/styles.ts";
import { ensureWritable } from "./guards.ts";
import type { Host } from "./host.ts";
import { withinGrid } from "./rangeShape.ts";

type Areas = readonly Area[];

export function setColumnWidth(host: Host, areas: Areas, pixels: number): void {
  for (const area of areas) {
    ensureWritable(host, area.sheet);
    const ranges = [toRange(withinGrid(host, area))];
    const params = { unitId: host.book.unit, subUnitId: area.sheet, ranges, colWidth: pixels };
    carryOut(host.book.grid, command.columnWidth, params);
  }
}

export function setRowHeight(host: Host, areas: Areas, pixels: number): void {
  for (const area of areas) {
    ensureWritable(host, area.sheet);
    const ranges = [toRange(withinGrid(host, area))];
    const shared = { unitId: host.book.unit, subUnitId: area.sheet, ranges };
    carryOut(host.book.grid, command.rowHeight, { ...shared, rowHeight: pixels });
    carryOut(host.book.grid, command.rowFixed, { ...shared, autoHeightInfo: 0 });
  }
}

/** Rows looked at to find a column's widest text: more would cost time and change little. */
const mostRowsLooked = 5000;

/** Makes columns as wide as their longest text; merged and wrapped cells do not count, as in Excel. */
export function autofitColumns(host: Host, areas: Areas): void {
  for (const area of areas) {
    const used = usedWithin(host.book, area, true);
    if (used === null) continue;
    for (let column = used.column; column < used.column + used.columns; column++) {
      const characters = longestText(host, { ...used, column, columns: 1 });
      if (characters > 0) setColumnWidth(host, [{ ...used, column, columns: 1 }], pixelsOf(characters + 1));
    }
  }
}

function longestText(host: Host, area: Area): number {
  const cells = cellsOf(host.book, area.sheet);
  const merges = worksheetOf(host.book, area.sheet).getMergeData();
  const apart = (row: number): boolean =>
    !merges.some((range) => intersectionOf(fromRange(area.sheet, range), { ...area, row, rows: 1 }) !== null);
  let longest = 0;
  for (let row = area.row; row < area.row + Math.min(area.rows, mostRowsLooked); row++) {
    const cell = cellAt(cells, row, area.column);
    if (cell === undefined || styleAt(host.book, cell).tb === WrapStrategy.WRAP || !apart(row)) continue;
    const value = valueOf(cell);
    const text = typeof value === "number" ? numfmt.format(formatAt(host.book, cell), value) : String(value);
    longest = Math.max(longest, ...text.split("\n").map((line) => line.length));
  }
  return longest;
}

/** Makes rows as high as their wrapped text needs at the columns' widths. */
export function autofitRows(host: Host, areas: Areas): void {
  for (const area of areas) {
    const used = usedWithin(host.book, area, true);
    if (used === null) continue;
    for (let row = used.row; row < used.row + Math.min(used.rows, mostRowsLooked); row++) {
      const lines = mostLines(host, { ...used, row, rows: 1 });
      setRowHeight(host, [{ ...used, row, rows: 1 }], lines * standardHeight);
    }
  }
}

function mostLines(host: Host, area: Area): number {
  const cells = cellsOf(host.book, area.sheet);
  const worksheet = worksheetOf(host.book, area.sheet);
  let most = 1;
  for (let column = area.column; column < area.column + area.columns; column++) {
    const cell = cellAt(cells, area.row, column);
    const text = String(valueOf(cell));
    const width = pixelsOf(text.length);
    const wraps = styleAt(host.book, cell).tb === WrapStrategy.WRAP;
    const lines = wraps ? Math.ceil(width / worksheet.getColumnWidth(column)) : text.split("\n").length;
    most = Math.max(most, lines);
  }
  return most;
}
