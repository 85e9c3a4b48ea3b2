import { findRegressions } from "../../src/app/review/findRegressions.ts";
import { reviewEach } from "../../src/app/review/reviewEach.ts";
import type { BookReview } from "../../src/core/review/claimReview.ts";
import type { BookData } from "../../src/desk/book/bookData.ts";
import { inlineReviewer } from "../../src/worker/inlineReviewer.ts";
import { reviewClaim } from "../../src/core/review/reviewClaim.ts";
import { errand, openDeskHost } from "../support/deskHost.ts";
import { claimsIn, readOnDesk } from "../support/readBook.ts";
import type { FormulaBook } from "./formulas/books.ts";

/** Reviews a workbook by the whole way: the stand-in spreadsheet, the adapter's reading, the search for reports, the review. */
export async function reviewBook(book: BookData): Promise<BookReview> {
  const { desk, host } = await openDeskHost(book);
  const listed = await findRegressions({ host, analyst: inlineReviewer }, { pointed: null, sheet: null }, errand());
  if (!listed.ok) throw new Error(listed.problem.code);
  const { claims, unread, craft } = listed.value;
  const reviews = await reviewEach(claims, { analyst: inlineReviewer, errand: errand() });
  desk.close();
  if (!reviews.ok) throw new Error(reviews.problem.code);
  return { claims: reviews.value, unread, craft };
}

/** The same of many workbooks laid together as one, which is opened and read once: a review for each, in their order. */
export async function reviewTogether(books: readonly FormulaBook[]): Promise<BookReview[]> {
  const together = await readOnDesk({ sheets: books.flatMap(({ sheets }) => sheets), names: [], active: 1 });
  return books.map(({ sheets: [, report] }) => {
    const { claims, unread, craft } = claimsIn(together, { sheet: report.name });
    return { claims: claims.map((claim) => reviewClaim(claim, () => undefined)), unread, craft };
  });
}
