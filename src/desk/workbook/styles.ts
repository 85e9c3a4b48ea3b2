import type { ICellData, IStyleData } from "@univerjs/core";
import type { Area } from "./areas.ts";
import { workbookOf, type Book } from "./book.ts";
import { draftLook, draftRow, flushDrafts } from "./drafts.ts";
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
  for (let row = 0; row < area.rows; row++) {
    const draft = draftRow(book, area.sheet, area.row + row);
    for (let column = 0; column < area.columns; column++) {
      const style = styleOf(row, column);
      if (style !== null) draftLook(draft, area.column + column, style);
    }
  }
}

/** Takes every look away. Nothing gathered can say "first nothing, then this", so it goes to the grid at once. */
export function clearStyles(book: Book, area: Area): void {
  flushDrafts(book);
  const cellValue: Record<number, Record<number, ICellData>> = {};
  for (let row = area.row; row < area.row + area.rows; row++) {
    const line: Record<number, ICellData> = {};
    for (let column = area.column; column < area.column + area.columns; column++) line[column] = { s: null };
    cellValue[row] = line;
  }
  const shared = { unitId: book.unit, subUnitId: area.sheet };
  carryOut(book.grid, command.setValues, { ...shared, cellValue, trigger: styleTrigger });
}
