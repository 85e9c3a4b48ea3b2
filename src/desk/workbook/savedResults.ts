import type { ICellData } from "@univerjs/core";
import { FormulaDataModel } from "@univerjs/engine-formula";
import { parseAddress } from "../../core/table/address.ts";
import type { BookCell, SheetData } from "../book/bookData.ts";
import { toRange, type Area } from "./areas.ts";
import { worksheetOf, type Book } from "./book.ts";
import { isStyled } from "./toGrid.ts";

/** Lays the saved results of spilling formulas back over the cells they fill: the grid keeps them apart. */
export function seedSpills(book: Book, data: SheetData, sheet: string): void {
  const model = book.grid.injector.get(FormulaDataModel);
  const ranges = ((model.getArrayFormulaRange()[book.unit] ??= {})[sheet] ??= {});
  const values = ((model.getArrayFormulaCellData()[book.unit] ??= {})[sheet] ??= {});
  for (const area of savedSpills(data, sheet)) {
    (ranges[area.row] ??= {})[area.column] = toRange(area);
    for (let row = area.row; row < area.row + area.rows; row++) {
      const line = (values[row] ??= {});
      for (let column = area.column; column < area.column + area.columns; column++) {
        line[column] = moveResult(book, area, { row, column });
      }
    }
  }
}

/** Takes a result out of its cell, unless it is the cell with the formula; its looks stay. */
function moveResult(book: Book, area: Area, at: { readonly row: number; readonly column: number }): ICellData {
  const stored = worksheetOf(book, area.sheet).getCellMatrix();
  const { v, t, s } = stored.getValue(at.row, at.column) ?? {};
  const isFirst = at.row === area.row && at.column === area.column;
  if (!isFirst) stored.setValue(at.row, at.column, s === undefined ? {} : { s });
  return { v: v ?? null, t: t ?? null };
}

function savedSpills(data: SheetData, sheet: string): readonly Area[] {
  return data.rows.flatMap((row) =>
    row.flatMap((cell) => {
      const area = isStyled(cell) && cell.spill !== undefined ? parseAddress(cell.spill) : null;
      return area === null || area.rows * area.columns < 2 ? [] : [{ ...area, sheet }];
    }),
  );
}

/** The formulas whose values were not saved, or only what showed while they were at work: Excel calculates those on opening. */
export function unsavedFormulas(data: SheetData, sheet: string): readonly Area[] {
  return data.rows.flatMap((cells, row) =>
    cells.flatMap((cell, column) => (isUnsaved(cell) ? [{ sheet, row, column, rows: 1, columns: 1 }] : [])),
  );
}

function isUnsaved(cell: BookCell): boolean {
  if (!isStyled(cell) || cell.formula === undefined) return false;
  const { value } = cell;
  if (value === null) return true;
  return typeof value === "object" && (value.error === "#BUSY!" || value.error === "#NAME?");
}
