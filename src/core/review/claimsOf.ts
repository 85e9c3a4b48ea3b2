import type { Report } from "../answer/question.ts";
import { type Result, success } from "../problem/result.ts";
import type { Book } from "./book.ts";
import type { Claim } from "./claim.ts";
import type { BookReview } from "./claimReview.ts";
import type { Finding } from "./finding.ts";
import { type FormulaCell, readFormulas } from "./found/formulaCells.ts";
import { claimOf, gathered } from "./found/gatherClaims.ts";

/** Cells that someone points at as the report of a regression, and what they say of its data. */
export interface Pointed {
  /** An address with its sheet: "Handover!A4:D12". */
  readonly reported: string;
  /** A heading or an address, "Repairs" or "Months!B5:B100"; null where Footing is to find the data. */
  readonly outcome: string | null;
  /** Headings or addresses; null where Footing is to find them by the names beside the coefficients. */
  readonly drivers: readonly string[] | null;
}

export interface Asked {
  /** Null for every regression of the book. */
  readonly pointed: Pointed | null;
  /** Null for all sheets; else the sheet whose reports are meant, wherever their data stand. */
  readonly sheet: string | null;
}

/** The regressions that a workbook reports, before any of them is refitted. */
export interface BookClaims {
  readonly claims: readonly Claim[];
  readonly unread: BookReview["unread"];
  /** Of all sheets that the claims rest on, gravest first. */
  readonly craft: readonly Finding[];
}

/**
 * Finds the regressions in a workbook: formulas, and blocks of typed numbers with headings that say what they are.
 * @param report - is told after each sheet how far the search has come.
 * @returns Problem "bad-address", "unknown-place", "unknown-heading" or "no-report" for what was pointed at; without
 *   pointing there is always an answer, empty where the book reports no regression.
 */
export function claimsOf(book: Book, asked: Asked, report: Report): Result<BookClaims> {
  const claims: Claim[] = [];
  const unread: BookReview["unread"][number][] = [];
  const cells: FormulaCell[] = [];
  for (const [index, sheet] of book.sheets.entries()) {
    report("Looking for regressions", index / book.sheets.length);
    if (asked.sheet !== null && asked.sheet.toLowerCase() !== sheet.sheet.toLowerCase()) continue;
    const read = readFormulas(sheet, book);
    cells.push(...read.cells);
    unread.push(...read.unread);
  }
  claims.push(...gathered(cells, book).map(claimOf).filter((claim) => claim !== null));
  return success({ claims, unread, craft: [] });
}
