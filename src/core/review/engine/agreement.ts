import type { ReportedNumber } from "../claim.ts";

/**
 * Two computations of one regression in doubles differ by rounding, and spreadsheets form some figures from sums of
 * squares: numbers given in full are taken to agree to this share of themselves.
 */
const rounding = 1e-9;

/** Half a unit is met by either way of rounding a five, and the half unit itself is a double. */
const slack = 1e-6;

/** Whether a number, rounded as the reported one is shown, is the reported one. */
export const agrees = ({ value, halfUnit }: Pick<ReportedNumber, "value" | "halfUnit">, found: number): boolean =>
  Math.abs(found - value) <= halfUnit * (1 + slack) + rounding * Math.max(Math.abs(found), Math.abs(value));
