import type { Covariance } from "../covariance/choice.ts";
import { degreesOfCombinations } from "../covariance/degreesOfCombinations.ts";
import type { Fit } from "../fit/fit.ts";
import { bilinear } from "../numeric/smallMatrix.ts";
import { criticalValue, lawAt } from "./ratioLaw.ts";
import type { Reference } from "./reference.ts";

export interface PredictionSettings {
  readonly reference: Reference;
  /** Two-sided: 0.05 for 95 % intervals. */
  readonly level: number;
  /** What the evidence says of the spread of the errors. */
  readonly spread: "even" | "uneven" | "not asked";
}

export interface Prediction {
  readonly value: number;
  /** Of the mean at these drivers. */
  readonly standardError: number;
  readonly low: number;
  readonly high: number;
  /** Interval for one new row; null where none can be given. */
  readonly single: { readonly low: number; readonly high: number } | null;
  /** Whether the row lies farther out than every row used: its leverage is above all of theirs. */
  readonly beyond: boolean;
}

export interface Predictions {
  readonly rows: readonly Prediction[];
  /** Why no interval for a single new row is given, as a sentence; null where it is. */
  readonly noSingle: string | null;
}

/**
 * What the regression expects of new rows: x'b, the interval for the mean at x from x'Vx, and, only where the spread of
 * the errors is even, the wider interval for one new row from s^2 + x'Vx.
 * @param covariance - V, of the kind in force.
 * @param rows - each k values in the order of the design's terms, the constant's 1 among them.
 * @see Haavelmo (1947), J. American Stat. Association 42, 105-122.
 */
export function predict(
  { fit, covariance }: { readonly fit: Fit; readonly covariance: Covariance },
  rows: readonly ArrayLike<number>[],
  settings: PredictionSettings,
): Predictions {
  const { level, reference } = settings;
  const degreesOfFreedom = degreesOfCombinations(fit, covariance, rows);
  const laws = { reference, ...(degreesOfFreedom && { degreesOfFreedom }) };
  const singleReach = criticalValue(level, reference);
  const farthest = fit.leverages.reduce((most, h) => Math.max(most, h), 0);
  const noSingle = whyNoSingle(settings.spread);
  const predicted = rows.map((x, row): Prediction => {
    const reach = criticalValue(level, lawAt(laws, row));
    const value = fit.coefficients.reduce((sum, b, j) => sum + b * x[j]!, 0);
    const variance = bilinear(x, covariance.matrix, x);
    const standardError = Math.sqrt(variance);
    const around = (distance: number): { low: number; high: number } => ({
      low: value - distance,
      high: value + distance,
    });
    const single = noSingle === null ? around(singleReach * Math.sqrt(fit.sigma ** 2 + variance)) : null;
    return {
      value,
      standardError,
      ...around(reach * standardError),
      single,
      beyond: bilinear(x, fit.bread, x) > farthest,
    };
  });
  return { rows: predicted, noSingle };
}

function whyNoSingle(spread: PredictionSettings["spread"]): string | null {
  switch (spread) {
    case "even":
      return null;
    case "uneven":
      return "No interval for a single new row: the spread of the errors is uneven, so how far one row strays depends on which row it is.";
    case "not asked":
      return "No interval for a single new row: whether the spread of the errors is even was not asked.";
  }
}
