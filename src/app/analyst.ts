import type { Answer } from "../core/answer/answer.ts";
import type { Finding, Inquiry } from "../core/answer/inquire.ts";
import type { Question } from "../core/answer/question.ts";
import type { Result } from "../core/problem/result.ts";
import type { Book } from "../core/review/book.ts";
import type { Claim } from "../core/review/claim.ts";
import type { ClaimReview } from "../core/review/claimReview.ts";
import type { Asked, BookClaims } from "../core/review/claimsOf.ts";
import type { Errand } from "./errand.ts";

/** Who computes: the worker in the pane, the same code in line in Node. Faults of ours reject. */
export interface Analyst {
  readonly analyse: (question: Question, errand: Errand) => Promise<Result<Answer>>;
}

/** Who looks up what goes beyond an answer: figures row by row, covariances, joint tests, predictions. */
export interface Inquirer {
  readonly inquire: (question: Question, inquiry: Inquiry, errand: Errand) => Promise<Result<Finding>>;
}

/** Who checks regressions that someone else built. */
export interface Reviewer {
  /** Finds them in a workbook. */
  readonly listClaims: (book: Book, asked: Asked, errand: Errand) => Promise<Result<BookClaims>>;
  readonly review: (claim: Claim, errand: Errand) => Promise<Result<ClaimReview>>;
}
