import type { Reviewer } from "../app/analyst.ts";
import { onThisThread } from "./onThisThread.ts";
import { type ReviewTasks, reviewTasks } from "./reviewTasks.ts";

/** Reviews on the calling thread. */
export const inlineReviewerOf = ({ listClaims, review }: ReviewTasks): Reviewer => ({
  listClaims: (book, asked, errand) => onThisThread(errand, (report) => listClaims({ ...asked, book }, report)),
  review: (claim, errand) => onThisThread(errand, (report) => review({ claim }, report)),
});

/** In Node; browsers where a worker cannot start load it late. */
export const inlineReviewer = inlineReviewerOf(reviewTasks);
