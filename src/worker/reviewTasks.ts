import type { Report } from "../core/answer/question.ts";
import { type Result, success } from "../core/problem/result.ts";
import type { Book } from "../core/review/book.ts";
import type { Claim } from "../core/review/claim.ts";
import type { ClaimReview } from "../core/review/claimReview.ts";
import { type Asked, type BookClaims, claimsOf } from "../core/review/claimsOf.ts";
import { reviewClaim } from "../core/review/reviewClaim.ts";

export interface ReviewTasks {
  readonly listClaims: (asked: Asked & { readonly book: Book }, report: Report) => Result<BookClaims>;
  readonly review: (asked: { readonly claim: Claim }, report: Report) => Result<ClaimReview>;
}

export const reviewTasks: ReviewTasks = {
  listClaims: ({ book, ...asked }, report) => claimsOf(book, asked, report),
  review: ({ claim }, report) => success(reviewClaim(claim, report)),
};
