import type { BookData } from "../book/bookData.ts";
import { takeApart } from "./elements/takeApart.ts";
import { saveXlsx } from "./saveXlsx.ts";

export interface SavedForLibreOffice {
  readonly bytes: Uint8Array;
  /** Results that LibreOffice shows as #NAME? all the same. */
  readonly left: readonly string[];
}

/** Writes a workbook file that LibreOffice opens with every saved result in view, and the desk with every formula. */
export async function saveForLibreOffice(book: BookData): Promise<SavedForLibreOffice> {
  const { book: apart, left } = takeApart(book);
  return { bytes: await saveXlsx(apart), left };
}
