import type { BookData } from "../book/bookData.ts";
import { openCsv } from "../files/openCsv.ts";
import { openXlsx } from "../files/openXlsx.ts";
import type { Reading } from "../files/reading.ts";
import { saveCsv } from "../files/saveCsv.ts";
import { saveXlsx } from "../files/saveXlsx.ts";

/** Opens a file by its name's ending: separated text, or else a workbook. */
export async function readBook(file: File): Promise<Reading<BookData>> {
  const bytes = new Uint8Array(await file.arrayBuffer());
  return /\.(?:csv|tsv|txt)$/i.test(file.name)
    ? openCsv(bytes, baseName(file.name).slice(0, longestSheetName))
    : openXlsx(bytes);
}

const longestSheetName = 31;

export const baseName = (name: string): string => name.replace(/\.[^.]*$/, "");

export async function downloadXlsx(book: BookData, name: string): Promise<void> {
  const type = "application/vnd.openxmlformats-officedocument.spreadsheetml.sheet";
  download(new Blob([Uint8Array.from(await saveXlsx(book))], { type }), `${name}.xlsx`);
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
