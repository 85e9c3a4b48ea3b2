import type { BookData } from "../book/bookData.ts";
import { openCsv } from "../files/openCsv.ts";
import { openXlsx } from "../files/openXlsx.ts";
import type { Reading } from "../files/reading.ts";
import { saveCsv } from "../files/saveCsv.ts";
import { saveForLibreOffice } from "../files/saveForLibreOffice.ts";
import { saveXlsx } from "../files/saveXlsx.ts";

/** Opens a file by its name's ending: separated text, or else a workbook. */
export async function readBook(file: File): Promise<Reading<BookData>> {
  const bytes = new Uint8Array(await file.arrayBuffer());
  return /\.(?:csv|tsv|txt)$/i.test(file.name)
    ? openCsv(bytes, baseName(file.name).slice(0, longestSheetName))
    : openXlsx(bytes);
}

const longestSheetName = 31;

const baseName = (name: string): string => name.replace(/\.[^.]*$/, "");

/** Keeps the two forms of a workbook apart where both lie in one folder. */
const forLibreOffice = " for LibreOffice";

/** What the workbook of a file is called, whatever it was saved for. */
export const bookName = (file: string): string => baseName(file).replace(new RegExp(`${forLibreOffice}$`), "");

const xlsxType = "application/vnd.openxmlformats-officedocument.spreadsheetml.sheet";

const downloadBytes = (bytes: Uint8Array, name: string): void =>
  download(new Blob([Uint8Array.from(bytes)], { type: xlsxType }), `${name}.xlsx`);

export async function downloadForExcel(book: BookData, name: string): Promise<void> {
  downloadBytes(await saveXlsx(book), name);
}

/** @returns results that LibreOffice does not show. */
export async function downloadForLibreOffice(book: BookData, name: string): Promise<readonly string[]> {
  const { bytes, left } = await saveForLibreOffice(book);
  downloadBytes(bytes, name + forLibreOffice);
  return left;
}

/** The sheet in front. */
export function downloadCsv(book: BookData): void {
  const sheet = book.sheets[book.active];
  if (sheet !== undefined) download(new Blob([saveCsv(sheet)], { type: "text/csv" }), `${sheet.name}.csv`);
}

function download(content: Blob, name: string): void {
  const link = document.createElement("a");
  link.href = URL.createObjectURL(content);
  link.download = name;
  link.click();
  URL.revokeObjectURL(link.href);
}
