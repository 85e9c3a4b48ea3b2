import type { ICellData } from "@univerjs/core";
import type { Area } from "./areas.ts";
import { worksheetOf, type Book } from "./book.ts";
import { cellsOf } from "./cells.ts";
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

/** Writes cells at once; what is null in the block stays as it is. */
export function writeCells(
  book: Book,
  area: Area,
  cellOf: (row: number, column: number) => string | number | boolean | null,
): void {
  growTo(book, area);
  const cells = cellsOf(book, area.sheet);
  const cellValue: Record<number, Record<number, ICellData>> = {};
  for (let row = 0; row < area.rows; row++) {
    const line: Record<number, ICellData> = {};
    for (let column = 0; column < area.columns; column++) {
      const value = cellOf(row, column);
      if (value === null) continue;
      const format = formatAt(book, cells.stored[area.row + row]?.[area.column + column] ?? undefined);
      const typed = asTyped(value, format);
      const takesFormat = typed.format !== null && format === "General";
      line[area.column + column] = takesFormat ? { ...typed.cell, s: { n: { pattern: typed.format } } } : typed.cell;
    }
    cellValue[area.row + row] = line;
  }
  carryOut(book.grid, command.setValues, { unitId: book.unit, subUnitId: area.sheet, cellValue });
}
