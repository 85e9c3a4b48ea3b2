import { isDateFormat, writeCsv, type CellValue } from "hucre";
import type { BookCell, SheetData } from "../book/bookData.ts";
import { isStyled, valueOf } from "./cells.ts";
import { writeIsoDate } from "./isoDates.ts";

/**
 * A sheet as text, comma-separated: numbers in full, dates as 2016-01-31, with the mark by which spreadsheets
 * know the encoding. Text that a spreadsheet would take for a formula stands behind an apostrophe.
 */
export function saveCsv({ rows }: SheetData): string {
  return writeCsv(
    rows.map((row) => row.map(toField)),
    { bom: true },
  );
}

const formulaStart = /^[=+\-@\t\r]/;

function toField(cell: BookCell): CellValue {
  const value = valueOf(cell);
  if (typeof value === "number") return isDate(cell) ? writeIsoDate(value) : value;
  if (typeof value === "boolean") return value ? "TRUE" : "FALSE";
  if (typeof value === "string") return formulaStart.test(value) ? `'${value}` : value;
  return value === null ? null : value.error;
}

function isDate(cell: BookCell): boolean {
  const format = isStyled(cell) ? cell.style?.numberFormat : undefined;
  return format !== undefined && isDateFormat(format);
}
