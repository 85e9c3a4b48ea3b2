import { type Result } from "../../core/problem/result.ts";
import type { Asked, BookClaims } from "../../core/review/claimsOf.ts";
import type { Reviewer } from "../analyst.ts";
import type { Errand } from "../errand.ts";
import type { Host } from "../host.ts";

/** What it takes to find regressions and to review them. */
export interface Reviewing {
  readonly host: Pick<Host, "readBook">;
  readonly analyst: Reviewer;
}

/** Reads the workbook and finds what it reports: all of it, or what is pointed at. */
export async function findRegressions(
  { host, analyst }: Reviewing,
  asked: Asked,
  errand: Errand,
): Promise<Result<BookClaims>> {
  const book = await host.readBook(errand);
  return book.ok ? analyst.listClaims(book.value, asked, errand) : book;
}
