import type { Answer } from "../answer/answer.ts";
import type { Claim, ReportedNumber } from "./claim.ts";
import type { Finding } from "./finding.ts";

/** A reported number beside what the same cells give. */
export interface Comparison {
  readonly reported: ReportedNumber;
  /** Null where the number cannot be formed from the data as claimed. */
  readonly recomputed: number | null;
  readonly agrees: boolean;
}

/** A small change of the data or the model under which every reported number comes out. */
export interface Explanation {
  /** One or two names from the table of hypotheses: "rows-left-off-at-end", "no-constant". */
  readonly hypotheses: readonly string[];
  /** What was done, a full sentence: "The last row (Months!A98) was left off." */
  readonly sentence: string;
  readonly cells: readonly string[];
  readonly compared: readonly Comparison[];
}

/** Standard errors that reproduce the reported ones to their digits. */
export interface ErrorsFound {
  /** "classical", "White (HC3)", "Newey-West with 4 lags": every kind that fits, simplest first. */
  readonly kinds: readonly string[];
  /** Whether the evidence allows them, and why, as a full sentence. */
  readonly sentence: string;
  readonly allowed: boolean;
}

/** What a driver's reported figures were taken to say, and what the data say under the choice the evidence calls for. */
export interface Consequence {
  readonly driver: string;
  readonly asReported: string;
  readonly asItShouldBe: string;
  readonly changes: boolean;
}

/** Everything a review says of one regression. */
export interface ClaimReview {
  readonly claim: Claim;
  /** Against the cells exactly as claimed. */
  readonly compared: readonly Comparison[];
  /** Null where the cells as claimed reproduce everything, or nothing that was tried does. */
  readonly explanation: Explanation | null;
  /** Other changes that reproduce everything as well; the reported digits cannot tell them from the explanation. */
  readonly alternatives: readonly Explanation[];
  /** What was tried, in words, where nothing fits. */
  readonly tried: readonly string[];
  /** Null where no standard error, ratio, p-value or bound was reported, or none of the kinds known reproduces them. */
  readonly errors: ErrorsFound | null;
  readonly consequences: readonly Consequence[];
  /** The regression as it should be made: all rows, the choice the evidence calls for; null where it cannot be made. */
  readonly answer: Answer | null;
  readonly findings: readonly Finding[];
  /** The work as a whole in a sentence or two. */
  readonly verdict: string;
}

/** Everything a review says of a workbook. */
export interface BookReview {
  readonly claims: readonly ClaimReview[];
  /** Formulas that look like a regression and could not be read, and why. */
  readonly unread: readonly { readonly cell: string; readonly why: string }[];
  /** What is wrong with the sheets beside the regressions themselves, gravest first. */
  readonly craft: readonly Finding[];
}
