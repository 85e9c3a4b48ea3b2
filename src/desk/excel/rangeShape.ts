import { BooleanNumber } from "@univerjs/core";
import { intersectionOf, toRange, type Area } from "../workbook/areas.ts";
import { worksheetOf } from "../workbook/book.ts";
import { spillsOf } from "../workbook/cells.ts";
import { lengthOf } from "../workbook/charts.ts";
import { carryOut, command } from "../workbook/grid.ts";
import { pointsPerPixel } from "../workbook/sizes.ts";
import { growTo } from "../workbook/write.ts";
import { fault } from "./fault.ts";
import { ensureWritable, isUnbounded } from "./guards.ts";
import type { Host } from "./host.ts";
import type { Arguments } from "./model.ts";

/** Excel's count is a 32-bit number; where it cannot hold the count, Excel says -1. */
export const countOf = (count: number): number => (count > 2 ** 31 - 1 ? -1 : count);

export function ensureSize(host: Host, area: Area, args: Arguments): void {
  if (args[0] === area.rows && args[1] === area.columns) {
    if (!isUnbounded(area)) growTo(host.book, area);
    return;
  }
  throw fault(
    "InvalidArgument",
    "The number of rows or columns in the input array doesn't match the size or dimensions of the range.",
  );
}

/** The same answer for all, or null where they differ: so Excel tells of mixed areas. */
export function common<T>(answers: readonly T[]): T | null {
  const [first] = answers;
  return first !== undefined && answers.every((answer) => answer === first) ? first : null;
}

export function hasSpill(host: Host, area: Area): boolean | null {
  const covered = spillsOf(host.book, area.sheet).reduce((sum, spill) => {
    const part = intersectionOf(spill, area);
    return part === null ? sum : sum + part.rows * part.columns;
  }, 0);
  if (covered === 0) return false;
  return covered === area.rows * area.columns ? true : null;
}

export const isRowHidden = (host: Host, sheet: string, row: number): boolean =>
  !worksheetOf(host.book, sheet).getRowVisible(row);

export function rowsHidden(host: Host, area: Area): boolean | null {
  const worksheet = worksheetOf(host.book, area.sheet);
  const rows = Math.max(1, Math.min(area.rows, worksheet.getRowCount() - area.row));
  // Only rows that something was done to have an entry: a sheet of a million rows is not walked through.
  const known = Object.keys(worksheet.getConfig().rowData).map(Number);
  const inside = known.filter((row) => row >= area.row && row < area.row + rows);
  const hidden = inside.filter((row) => isRowHidden(host, area.sheet, row)).length;
  return hidden === 0 ? false : hidden === rows ? true : null;
}

export function columnsHidden(host: Host, { sheet, column, columns }: Area): boolean | null {
  const worksheet = worksheetOf(host.book, sheet);
  const count = Math.min(columns, worksheet.getColumnCount() - column);
  return common(Array.from({ length: Math.max(1, count) }, (_, index) => !worksheet.getColVisible(column + index)));
}

export function hideColumns(host: Host, area: Area, hide: boolean): void {
  ensureWritable(host, area.sheet);
  const ranges = [toRange(withinGrid(host, area))];
  const name = hide ? command.hideColumns : command.showColumns;
  carryOut(host.book.grid, name, { unitId: host.book.unit, subUnitId: area.sheet, ranges });
}

export function hideRows(host: Host, area: Area, hide: boolean): void {
  ensureWritable(host, area.sheet);
  const ranges = [toRange(withinGrid(host, area))];
  const name = hide ? command.hideRows : command.showRows;
  carryOut(host.book.grid, name, { unitId: host.book.unit, subUnitId: area.sheet, ranges });
}

/** Whole columns and rows, cut to what the grid holds of them. */
export function withinGrid(host: Host, area: Area): Area {
  if (!isUnbounded(area)) {
    growTo(host.book, area);
    return area;
  }
  const worksheet = worksheetOf(host.book, area.sheet);
  const rows = Math.min(area.rows, Math.max(1, worksheet.getRowCount() - area.row));
  const columns = Math.min(area.columns, Math.max(1, worksheet.getColumnCount() - area.column));
  return { ...area, rows, columns };
}

/** @param across - joins the cells of each row by themselves. */
export function mergeRange(host: Host, area: Area, across: boolean): void {
  ensureWritable(host, area.sheet);
  const lines = Array.from({ length: area.rows }, (_, row) => toRange({ ...area, row: area.row + row, rows: 1 }));
  const ranges = across ? lines : [toRange(area)];
  growTo(host.book, area);
  const merges = worksheetOf(host.book, area.sheet).getMergeData();
  const crossed = merges.some((range) => overlaps(range, toRange(area)));
  if (crossed) unmergeRange(host, area);
  carryOut(host.book.grid, command.merge, { unitId: host.book.unit, subUnitId: area.sheet, ranges });
}

interface Edges {
  readonly startRow: number;
  readonly endRow: number;
  readonly startColumn: number;
  readonly endColumn: number;
}

const overlaps = (one: Edges, other: Edges): boolean =>
  one.startRow <= other.endRow &&
  other.startRow <= one.endRow &&
  one.startColumn <= other.endColumn &&
  other.startColumn <= one.endColumn;

export function unmergeRange(host: Host, area: Area): void {
  ensureWritable(host, area.sheet);
  const ranges = worksheetOf(host.book, area.sheet)
    .getMergeData()
    .filter((merged) => overlaps(merged, toRange(area)));
  if (ranges.length > 0) {
    carryOut(host.book.grid, command.unmerge, { unitId: host.book.unit, subUnitId: area.sheet, ranges });
  }
}

export interface Place {
  readonly left: number;
  readonly top: number;
  readonly width: number;
  readonly height: number;
}

/** Where an area lies on its sheet, in points. */
export function placeOf(host: Host, area: Area): Place {
  const worksheet = worksheetOf(host.book, area.sheet);
  const widthOf = (column: number): number => worksheet.getColumnWidth(column) * pointsPerPixel;
  const heightOf = (row: number): number =>
    isShown(host, area.sheet, row) ? worksheet.getRowHeight(row) * pointsPerPixel : 0;
  const left = lengthOf(area.column, widthOf);
  const top = lengthOf(area.row, heightOf);
  const width = lengthOf(area.columns, (index) => widthOf(area.column + index));
  return { left, top, width, height: lengthOf(area.rows, (index) => heightOf(area.row + index)) };
}

function isShown(host: Host, sheet: string, row: number): boolean {
  return worksheetOf(host.book, sheet).getRowManager().getRow(row)?.hd !== BooleanNumber.TRUE;
}
