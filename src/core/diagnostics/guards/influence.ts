import type { Fit } from "../../fit/fit.ts";
import { tTwoSided } from "../../numeric/distributions.ts";
import { solveTransposedTriangle } from "../../numeric/triangle.ts";
import { diagonal, timesVector } from "../../numeric/smallMatrix.ts";
import { selfFittingRows } from "../../covariance/leverageOfOne.ts";

/** How much each row matters, n values a measure in design order; 0 for a row that fits itself. */
export interface Influence {
  /** Outside studentised residuals: e_i / (s_(i) sqrt(1 - h_i)), s_(i) found without the row. */
  readonly outside: Float64Array<ArrayBuffer>;
  /** D_i = e_i^2 h_i / (k s^2 (1 - h_i)^2). */
  readonly cook: Float64Array<ArrayBuffer>;
  /** The outside residual times sqrt(h_i / (1 - h_i)). */
  readonly dffits: Float64Array<ArrayBuffer>;
  /** Rows with a leverage of one: the fit passes through them whatever their outcome is. */
  readonly selfFitting: readonly number[];
}

/** One row's measures. */
export interface InfluentialRow {
  /** In design order, from 0. */
  readonly row: number;
  readonly leverage: number;
  readonly outside: number;
  readonly cook: number;
  readonly dffits: number;
  /** For each coefficient how many of its standard errors (found without the row) it changes by when the row comes in. */
  readonly dfbetas: readonly number[];
  /** That a residual as far out is met anywhere among n normal errors (Bonferroni). */
  readonly outlierPValue: number;
}

/**
 * Without this row hardly anything is left: the outside residual is then not told more finely than this share of the
 * residual variance allows.
 */
const leastRest = 1e-14;

/**
 * Influence measures of all rows in closed form, without refitting.
 * @returns null where no degree of freedom is left when a row is taken out.
 * @see Cook (1977), Technometrics 19, 15-18; Belsley, Kuh and Welsch (1980), Regression Diagnostics, Wiley, chapter 2.
 */
export function influence(fit: Fit): Influence | null {
  const { residuals, leverages, sigma, degreesOfFreedom: df, columnCount, rowCount } = fit;
  if (df < 2) return null;
  const selfFitting = selfFittingRows(fit);
  const fitsItself = new Set(selfFitting);
  const outside = new Float64Array(rowCount);
  const cook = new Float64Array(rowCount);
  const dffits = new Float64Array(rowCount);
  residuals.forEach((u, i) => {
    if (fitsItself.has(i)) return;
    const rest = 1 - leverages[i]!;
    const square = (u / sigma) ** 2 / rest;
    outside[i] = Math.sign(u) * Math.sqrt((square * (df - 1)) / Math.max(df - square, leastRest * df));
    cook[i] = (square * leverages[i]!) / (columnCount * rest);
    dffits[i] = outside[i] * Math.sqrt(leverages[i]! / rest);
  });
  return { outside, cook, dffits, selfFitting };
}

/**
 * The rows with the largest Cook's distances, the largest first.
 * @param count - how many at most.
 */
export function mostInfluential(fit: Fit, measures: Influence, count: number): InfluentialRow[] {
  const { cook, outside, dffits } = measures;
  const top: number[] = [];
  cook.forEach((distance, row) => {
    if (top.length === count && distance <= cook[top.at(-1)!]!) return;
    const place = top.findIndex((other) => cook[other]! < distance);
    top.splice(place < 0 ? top.length : place, 0, row);
    top.length = Math.min(top.length, count);
  });
  return top.map((row) => ({
    row,
    leverage: fit.leverages[row]!,
    outside: outside[row]!,
    cook: cook[row]!,
    dffits: dffits[row]!,
    dfbetas: dfbetasOf(fit, row, outside[row]!),
    outlierPValue: Math.min(1, fit.rowCount * tTwoSided(outside[row]!, fit.degreesOfFreedom - 1)),
  }));
}

/** (A x_i)_j e_i / (1 - h_i) over s_(i) sqrt(A_jj), written with the outside residual. */
function dfbetasOf(fit: Fit, row: number, outside: number): number[] {
  const x = Float64Array.from(fit.design.terms, ({ values }) => values[row]!);
  const direction = timesVector(fit.inverseTriangle, solveTransposedTriangle(fit.triangle, x));
  const variances = diagonal(fit.bread);
  const rest = Math.sqrt(Math.max(1 - fit.leverages[row]!, 0));
  return Array.from(direction, (d, j) => (rest === 0 ? 0 : (d * outside) / (rest * Math.sqrt(variances[j]!))));
}
