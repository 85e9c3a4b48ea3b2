import type { ReportedNumber } from "../claim.ts";

/**
 * Two computations of one regression in doubles differ by rounding, and spreadsheets form some figures from sums of
 * squares: numbers given in full are taken to agree to this share of themselves.
 */
const rounding = 1e-9;

/**
 * Programs print tables rounded to one digit more first, and then again: 0.084914926 is shown as 0.08492 by way of
 * 0.084915. That moves a number by a tenth of half a unit at the most; either way of rounding a five is within it.
 */
export const roundedTwice = 1.1;

/** Whether a number, rounded as the reported one is shown, is the reported one. */
export const agrees = ({ value, halfUnit }: Pick<ReportedNumber, "value" | "halfUnit">, found: number): boolean =>
  Math.abs(found - value) <= halfUnit * roundedTwice + rounding * Math.max(Math.abs(found), Math.abs(value));
