import type { ICellData } from "@univerjs/core";
import type { Area } from "./areas.ts";
import { worksheetOf, type Book } from "./book.ts";
import { draftContent, draftedAt, draftRow } from "./drafts.ts";
import { carryOut, command } from "./grid.ts";
import { formatAt } from "./styles.ts";
import { asTyped } from "./typed.ts";

/** Rows and columns kept below and beside the last cell, so that the grid shows room to go on. */
const spareRows = 100;
const spareColumns = 5;

/** The grid's sheets do not grow by themselves, and a spill that ends below the last row is refused. */
export function growTo(book: Book, { sheet, row, column, rows, columns }: Area): void {
  const worksheet = worksheetOf(book, sheet);
  const shared = { unitId: book.unit, subUnitId: sheet };
  if (row + rows > worksheet.getRowCount()) {
    carryOut(book.grid, command.rowCount, { ...shared, rowCount: row + rows + spareRows });
  }
  if (column + columns > worksheet.getColumnCount()) {
    carryOut(book.grid, command.columnCount, { ...shared, columnCount: column + columns + spareColumns });
  }
}

type Written = string | number | boolean | null;

/** Writes cells as if typed; what is null in the block stays as it is. They reach the grid with the next flush. */
export function writeCells(book: Book, area: Area, valueOf: (row: number, column: number) => Written): void {
  growTo(book, area);
  const stored = worksheetOf(book, area.sheet).getCellMatrix().getMatrix();
  for (let row = 0; row < area.rows; row++) {
    const draft = draftRow(book, area.sheet, area.row + row);
    const cells = stored[area.row + row];
    for (let column = 0; column < area.columns; column++) {
      const value = valueOf(row, column);
      const at = area.column + column;
      if (value === null) continue;
      draftContent(draft, at, typedInto(book, value, draftedAt(draft, at) ?? cells?.[at] ?? undefined));
    }
  }
}

/** A text that brings a number format along gives it to a cell that has none. */
function typedInto(book: Book, value: string | number | boolean, cell: ICellData | undefined): ICellData {
  const format = formatAt(book, cell);
  const typed = asTyped(value, format);
  const takesFormat = typed.format !== null && format === "General";
  return takesFormat ? { ...typed.cell, s: { n: { pattern: typed.format } } } : typed.cell;
}
