import { resolve } from "node:path";
import type { Problem } from "../core/problem/problem.ts";

/** What speaks against the name of the copy: it is no workbook's, or the workbook itself would be written over. */
export function saveFault({ book, save }: { readonly book: string; readonly save: string | null }): Problem | null {
  if (save === null) return null;
  if (resolve(save) === resolve(book)) return unwritable(save, "it is the workbook that is read, which stays as it is");
  return /\.xlsx$/i.test(save) ? null : unwritable(save, "the name of a workbook ends in .xlsx");
}

const unwritable = (file: string, because: string): Problem => ({ code: "unwritable-file", file, because });
