import { analyse } from "../core/answer/analyse.ts";
import type { Answer } from "../core/answer/answer.ts";
import { type Finding, type Inquiry, inquire } from "../core/answer/inquire.ts";
import type { Question, Report } from "../core/answer/question.ts";
import { type Result, success } from "../core/problem/result.ts";
import type { Book } from "../core/review/book.ts";
import type { Claim } from "../core/review/claim.ts";
import type { ClaimReview } from "../core/review/claimReview.ts";
import { type Asked as AskedOfBook, type BookClaims, claimsOf } from "../core/review/claimsOf.ts";
import { reviewClaim } from "../core/review/reviewClaim.ts";

/** What can be computed off the main thread: each task takes what is asked and says how far it has come. */
export interface Tasks {
  readonly analyse: (asked: Question, report: Report) => Result<Answer>;
  readonly inquire: (asked: Question & { readonly inquiry: Inquiry }, report: Report) => Result<Finding>;
  readonly listClaims: (asked: AskedOfBook & { readonly book: Book }, report: Report) => Result<BookClaims>;
  readonly review: (asked: { readonly claim: Claim }, report: Report) => Result<ClaimReview>;
}

export type TaskName = keyof Tasks;
export type Asked<Name extends TaskName> = Parameters<Tasks[Name]>[0];
export type Computed<Name extends TaskName> = ReturnType<Tasks[Name]>;

export const tasks: Tasks = {
  analyse,
  inquire: ({ inquiry, ...question }, report) => {
    report("Fitting", 0);
    return inquire(question, inquiry);
  },
  listClaims: ({ book, ...asked }, report) => claimsOf(book, asked, report),
  review: ({ claim }, report) => success(reviewClaim(claim, report)),
};
