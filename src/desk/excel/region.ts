import { mostColumns, mostRows } from "../../core/table/address.ts";
import type { Area } from "../workbook/areas.ts";
import { cellAt, cellsOf, kindOf, type SheetCells } from "../workbook/cells.ts";
import type { Host } from "./host.ts";

interface Box {
  top: number;
  bottom: number;
  left: number;
  right: number;
}

/** The block of cells around an area, up to the first blank row and column on each side. */
export function surroundingRegion(host: Host, { sheet, row, column, rows, columns }: Area): Area {
  const cells = cellsOf(host.book, sheet);
  const box: Box = { top: row, bottom: row + rows - 1, left: column, right: column + columns - 1 };
  // Each side moves as far as it can before the others look again: few passes, even over long columns.
  while (grow(cells, box));
  return { sheet, row: box.top, column: box.left, rows: box.bottom - box.top + 1, columns: box.right - box.left + 1 };
}

function grow(cells: SheetCells, box: Box): boolean {
  const before = { ...box };
  while (box.bottom < mostRows - 1 && rowHolds(cells, box.bottom + 1, box)) box.bottom += 1;
  while (box.top > 0 && rowHolds(cells, box.top - 1, box)) box.top -= 1;
  while (box.right < mostColumns - 1 && columnHolds(cells, box.right + 1, box)) box.right += 1;
  while (box.left > 0 && columnHolds(cells, box.left - 1, box)) box.left -= 1;
  return (
    box.top !== before.top || box.bottom !== before.bottom || box.left !== before.left || box.right !== before.right
  );
}

const holds = (cells: SheetCells, row: number, column: number): boolean =>
  kindOf(cellAt(cells, row, column)) !== "Empty";

/** Corners count: a cell that touches the block at a corner belongs to it. */
function rowHolds(cells: SheetCells, row: number, { left, right }: Box): boolean {
  for (let column = Math.max(0, left - 1); column <= right + 1; column++) if (holds(cells, row, column)) return true;
  return false;
}

function columnHolds(cells: SheetCells, column: number, { top, bottom }: Box): boolean {
  for (let row = Math.max(0, top - 1); row <= bottom + 1; row++) if (holds(cells, row, column)) return true;
  return false;
}
