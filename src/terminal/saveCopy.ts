import { type Result, failure, success } from "../core/problem/result.ts";
import type { BookData } from "../desk/book/bookData.ts";
import { addSheets } from "../desk/files/addSheets.ts";
import { takeApart } from "../desk/files/elements/takeApart.ts";
import { saveXlsx } from "../desk/files/saveXlsx.ts";
import type { BookFile } from "./bookFile.ts";
import type { OpenBook } from "./deskBook.ts";
import type { FileAccess } from "./fileAccess.ts";

/** What a workbook is to look like for the spreadsheet that is to show it. */
export const forms = {
  excel: (book: BookData): BookData => book,
  libreOffice: (book: BookData): BookData => takeApart(book).book,
} as const;

interface Copy {
  readonly opened: OpenBook;
  readonly file: BookFile;
  /** The sheet that was written and is to be in the copy. */
  readonly sheet: string;
  readonly from: string;
  readonly to: string;
  readonly form: (book: BookData) => BookData;
}

/** Puts a sheet that was written in the desk into a copy of the file. @returns the sheet's name. */
export async function saveCopy(copy: Copy, files: FileAccess): Promise<Result<string>> {
  const { opened, file, sheet, from, to, form } = copy;
  const bytes = await copyWith(form(await opened.snapshot()), file, sheet);
  if (!bytes.ok) return failure({ code: "unreadable-file", file: from, because: bytes.because });
  const stored = await files.write(to, bytes.value);
  return stored.ok ? success(sheet) : failure({ code: "unwritable-file", file: to, because: stored.because });
}

/** A copy of an .xlsx file keeps all that is in it; a .csv file becomes a workbook. */
async function copyWith(book: BookData, { original }: BookFile, sheet: string): ReturnType<typeof addSheets> {
  if (original === null) return { ok: true, value: await saveXlsx(book) };
  return addSheets(original, { ...book, sheets: book.sheets.filter(({ name }) => name === sheet) });
}
