import type { ICellData, IStyleData } from "@univerjs/core";
import type { Area } from "./areas.ts";
import { workbookOf, type Book } from "./book.ts";
import { carryOut, command, styleTrigger } from "./grid.ts";

export function styleAt(book: Book, cell: ICellData | undefined): IStyleData {
  if (cell?.s === undefined || cell.s === null) return {};
  return workbookOf(book).getStyles().getStyleByCell(cell) ?? {};
}

export const formatAt = (book: Book, cell: ICellData | undefined): string => {
  const pattern = styleAt(book, cell).n?.pattern;
  return pattern === undefined || pattern === "" ? "General" : pattern;
};

/** Lays a style over every cell of an area; what the style does not speak of stays. */
export function applyStyle(book: Book, area: Area, style: IStyleData): void {
  setStyles(book, area, () => style);
}

export function setStyles(book: Book, area: Area, styleOf: (row: number, column: number) => IStyleData | null): void {
  const cellValue: Record<number, Record<number, ICellData>> = {};
  for (let row = 0; row < area.rows; row++) {
    const cells: Record<number, ICellData> = {};
    for (let column = 0; column < area.columns; column++) {
      const style = styleOf(row, column);
      if (style !== null) cells[area.column + column] = { s: style };
    }
    cellValue[area.row + row] = cells;
  }
  carryOut(book.grid, command.setValues, {
    unitId: book.unit,
    subUnitId: area.sheet,
    cellValue,
    trigger: styleTrigger,
  });
}
