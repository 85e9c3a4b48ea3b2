import { type Result, success } from "../../core/problem/result.ts";
import type { Claim } from "../../core/review/claim.ts";
import type { ClaimReview } from "../../core/review/claimReview.ts";
import type { Reviewer } from "../analyst.ts";
import type { Errand } from "../errand.ts";

/**
 * Reviews regressions one after the other; what has been found so far is told at once.
 * @param found - is told each review as it is ready.
 * @returns the fault that stopped the round, or all reviews in the order of the claims.
 */
export async function reviewEach(
  claims: readonly Claim[],
  { analyst, errand }: { readonly analyst: Reviewer; readonly errand: Errand },
  found: (review: ClaimReview, index: number) => void = () => undefined,
): Promise<Result<readonly ClaimReview[]>> {
  const reviews: ClaimReview[] = [];
  for (const [index, claim] of claims.entries()) {
    const { signal } = errand;
    const progress: Errand["progress"] = ({ what, share }) =>
      errand.progress({
        what: `${claim.place}: ${what}`,
        share: share === null ? null : (index + share) / claims.length,
      });
    const reviewed = await analyst.review(claim, { signal, progress });
    if (!reviewed.ok) return reviewed;
    reviews.push(reviewed.value);
    found(reviewed.value, index);
  }
  return success(reviews);
}
