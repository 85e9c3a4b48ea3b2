import type { Covariance } from "./choice.ts";

/** Below this share of the classical standard error another one is rounding error about zero. */
const nothing = 1e-8;

/**
 * The first term whose standard error is zero but for rounding, which would call any coefficient shown.
 * @param classical - the classical covariance of the same fit, for the scale.
 * @returns its place among the terms, null where there is none.
 */
export function vanishingTerm(covariance: Covariance, classical: Covariance): number | null {
  const place = covariance.standardErrors.findIndex(
    (error, term) => !(error > nothing * classical.standardErrors[term]!),
  );
  return place < 0 ? null : place;
}
