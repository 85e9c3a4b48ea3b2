import type { SheetData } from "./bookData.ts";

/** A sheet with these rows and nothing else. */
export function blankSheet(name: string, rows: SheetData["rows"]): SheetData {
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
  };
}
