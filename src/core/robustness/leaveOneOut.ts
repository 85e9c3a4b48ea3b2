import { basisOf } from "../covariance/basisOf.ts";
import { selfFittingRows } from "../covariance/leverageOfOne.ts";
import type { Fit } from "../fit/fit.ts";
import { largestShifts } from "../numeric/largestShifts.ts";

/** The row whose leaving out changes a coefficient most. */
export interface LargestChange {
  /** In design order, from 0. */
  readonly row: number;
  /** The coefficient without the row. */
  readonly without: number;
  /** `without` less the coefficient. */
  readonly change: number;
}

/**
 * For each coefficient the largest change when any one row is left out, over all n rows by the closed form
 * b - b_(i) = (X'X)^-1 x_i e_i / (1 - h_i). A row with a leverage of one is passed over: without it a coefficient
 * could not be had at all.
 * @see Belsley, Kuh and Welsch (1980), Regression Diagnostics, Wiley, equation 2.1.
 */
export function leaveOneOut(fit: Fit): LargestChange[] {
  const { residuals, leverages, coefficients } = fit;
  const selfFitting = new Set(selfFittingRows(fit));
  const weights = residuals.map((u, i) => (selfFitting.has(i) ? 0 : u / (1 - leverages[i]!)));
  return largestShifts(basisOf(fit), fit.inverseTriangle, weights).map(({ row, shift }, j) => ({
    row,
    without: coefficients[j]! - shift,
    change: -shift,
  }));
}
