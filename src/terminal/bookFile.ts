import type { BookData } from "../desk/book/bookData.ts";
import { openCsv } from "../desk/files/openCsv.ts";
import { openXlsx } from "../desk/files/openXlsx.ts";
import { type Result, failure, success } from "../core/problem/result.ts";
import type { FileAccess } from "./fileAccess.ts";

/** A workbook read from a file; `original` holds the bytes of an .xlsx file, so that a copy can keep all of it. */
export interface BookFile {
  readonly book: BookData;
  readonly original: Uint8Array | null;
}

/** Opens an .xlsx or .csv file. @returns Problem "unreadable-file" with the reason. */
export async function openBookFile(file: string, files: FileAccess): Promise<Result<BookFile>> {
  const read = await files.read(file);
  if (!read.ok) return failure({ code: "unreadable-file", file, because: read.because });
  const separated = /\.(csv|txt|tsv)$/i.test(file);
  const opened = separated ? openCsv(read.value, sheetNameFrom(file)) : await openXlsx(read.value);
  if (!opened.ok) return failure({ code: "unreadable-file", file, because: opened.because });
  return success({ book: opened.value, original: separated ? null : read.value });
}

const longestName = 31;

/** The file's own name without folder and ending, as a sheet name. */
const sheetNameFrom = (file: string): string =>
  (file.split(/[\\/]/).at(-1) ?? file)
    .replace(/\.[^.]*$/, "")
    .replaceAll(/[\\/?*[\]:']/g, " ")
    .slice(0, longestName)
    .trim() || "Data";
