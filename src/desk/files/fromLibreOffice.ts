import type { BookCell, BookData } from "../book/bookData.ts";
import { isStyled } from "./cells.ts";
import { partsMatching, textOf } from "./parts.ts";
import { withPlainTruths } from "./storedFormulas.ts";

/** Whether LibreOffice was the last to save a workbook file. */
export function isFromLibreOffice(bytes: Uint8Array): boolean {
  const [part] = Object.values(partsMatching(bytes, /^docProps\/app\.xml$/));
  return part !== undefined && /<Application>LibreOffice\b/.test(textOf(part));
}

/** The workbook with formulas as they were before LibreOffice saved it: it writes every TRUE as TRUE(). */
export const asBeforeLibreOffice = (book: BookData): BookData => ({
  ...book,
  sheets: book.sheets.map((sheet) => ({ ...sheet, rows: sheet.rows.map((row) => row.map(withTruths)) })),
});

const withTruths = (cell: BookCell): BookCell =>
  isStyled(cell) && cell.formula !== undefined ? { ...cell, formula: withPlainTruths(cell.formula) } : cell;
