import type { BookData, BookCell, SheetData } from "../../src/desk/book/bookData.ts";

/** A sheet of plain rows for tests; whatever else it needs is given beside. */
export function sheetOf(
  name: string,
  rows: readonly (readonly BookCell[])[],
  more: Partial<SheetData> = {},
): SheetData {
  return {
    name,
    rows,
    columnWidths: [],
    merges: [],
    frozenRows: 0,
    hidden: false,
    hiddenRows: [],
    protected: false,
    tables: [],
    charts: [],
    printArea: null,
    onePageWide: false,
    links: [],
    ...more,
  };
}

export const bookOf = (...sheets: readonly SheetData[]): BookData => ({ sheets, names: [], active: 0 });
