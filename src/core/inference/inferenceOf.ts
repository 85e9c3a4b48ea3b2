import type { Covariance } from "../covariance/choice.ts";
import type { Fit } from "../fit/fit.ts";
import { normalTwoSided, tTwoSided } from "../numeric/distributions.ts";
import type { InferenceTable } from "./inference.ts";
import { criticalValue, lawAt, pValueOf } from "./ratioLaw.ts";
import type { Reference } from "./reference.ts";

export interface InferenceSettings {
  readonly reference: Reference;
  /** b0, one value a coefficient. */
  readonly against: readonly number[];
  /** Two-sided, in (0, 1): 0.05 for 95 % intervals. */
  readonly level: number;
  /** t degrees of freedom of each coefficient, such as those of Bell and McCaffrey; they take the place of a t reference's own. */
  readonly degreesOfFreedom?: ArrayLike<number>;
}

/**
 * Ratios, p-values and intervals of all coefficients.
 * H0 of each ratio: the coefficient is b0. A p-value below the level and b0 outside the interval are the same statement.
 * @param covariance - of the fit's coefficients, any kind, each variance above zero.
 * @returns one entry a coefficient, in the order of the design's terms.
 */
export function inferenceOf(fit: Fit, covariance: Covariance, settings: InferenceSettings): InferenceTable {
  const { reference, against, level, degreesOfFreedom } = settings;
  const coefficients = [...fit.coefficients];
  const standardErrors = [...covariance.standardErrors];
  const ratio = coefficients.map((b, j) => (b - against[j]!) / standardErrors[j]!);
  const laws = coefficients.map((_, j) => lawAt(settings, j));
  const reach = laws.map((law, j) => criticalValue(level, law) * standardErrors[j]!);
  return {
    reference,
    ...(degreesOfFreedom && { degreesOfFreedom: Array.from(degreesOfFreedom) }),
    standardErrors,
    ratio,
    pValue: ratio.map((r, j) => pValueOf(r, laws[j]!)),
    pValueT: ratio.map((r) => tTwoSided(r, fit.degreesOfFreedom)),
    pValueNormal: ratio.map(normalTwoSided),
    low: coefficients.map((b, j) => b - reach[j]!),
    high: coefficients.map((b, j) => b + reach[j]!),
  };
}
