import type { BookData, SheetData } from "../../src/desk/book/bookData.ts";
import { blankSheet } from "../../src/desk/book/blankSheet.ts";

/** A sheet of plain rows for tests; whatever else it needs is given beside. */
export const sheetOf = (name: string, rows: SheetData["rows"], more: Partial<SheetData> = {}): SheetData => ({
  ...blankSheet(name, rows),
  ...more,
});

export const bookOf = (...sheets: readonly SheetData[]): BookData => ({ sheets, names: [], active: 0 });
