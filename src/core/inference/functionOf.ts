import type { Covariance } from "../covariance/choice.ts";
import { degreesOfCombinations } from "../covariance/degreesOfCombinations.ts";
import type { Fit } from "../fit/fit.ts";
import { bilinear } from "../numeric/smallMatrix.ts";
import { type Side, criticalValue, lawAt, sidedPValueOf } from "./ratioLaw.ts";
import type { Reference } from "./reference.ts";

/** offset + sum of weight_j b_j. */
export interface Combination {
  readonly offset: number;
  /** k weights. */
  readonly weights: readonly number[];
}

export interface EstimateSettings {
  readonly reference: Reference;
  /** The value tested against. */
  readonly against: number;
  readonly side: Side;
  /** Two-sided level of the interval. */
  readonly level: number;
}

/** A number made of the coefficients, and what is known of it. */
export interface Estimate {
  readonly value: number;
  readonly standardError: number;
  /** (value - against) / standardError. */
  readonly ratio: number;
  /** On the side asked for. */
  readonly pValue: number;
  readonly low: number;
  readonly high: number;
  /** A sentence where the approximation behind the interval is not to be trusted, else null. */
  readonly caution: string | null;
}

/** Coefficients with their covariance, and how numbers made of them are compared. */
export interface Estimation {
  readonly fit: Fit;
  readonly covariance: Covariance;
  readonly settings: EstimateSettings;
}

/** A linear combination of the coefficients, such as a sum of effects or a difference of two. */
export const combinationOf = (estimation: Estimation, combination: Combination): Estimate =>
  estimateOf(estimation, { value: valueOf(estimation.fit, combination), gradient: combination.weights });

/**
 * A ratio of two linear combinations by the delta method: the long-run effect b / (1 - rho), or the turning point
 * -b_1 / (2 b_2) of a curve. Its gradient is (numerator's weights - ratio denominator's weights) / denominator.
 * @returns null where the denominator is zero; with a caution where it cannot be told from zero, since the ratio's law
 *   is then nothing like the one it is compared with.
 * @see Doob (1935), Annals of Math. Stat. 6, 160-169; Fieller (1954), J. Royal Stat. Society B 16, 175-185.
 */
export function ratioOf(estimation: Estimation, numerator: Combination, denominator: Combination): Estimate | null {
  const { settings, fit } = estimation;
  const below = valueOf(fit, denominator);
  if (below === 0) return null;
  const value = valueOf(fit, numerator) / below;
  const gradient = numerator.weights.map((weight, j) => (weight - value * denominator.weights[j]!) / below);
  const zero = { ...settings, against: 0, side: "both" } as const;
  const denominatorAlone = combinationOf({ ...estimation, settings: zero }, denominator);
  return { ...estimateOf(estimation, { value, gradient }), caution: cautionOf(denominatorAlone, settings.level) };
}

const valueOf = ({ coefficients }: Fit, { offset, weights }: Combination): number =>
  weights.reduce((sum, weight, j) => sum + weight * coefficients[j]!, offset);

function estimateOf(
  { fit, covariance, settings }: Estimation,
  { value, gradient }: { readonly value: number; readonly gradient: readonly number[] },
): Estimate {
  const { reference, against, side, level } = settings;
  const degreesOfFreedom = degreesOfCombinations(fit, covariance, [gradient]);
  const law = lawAt({ reference, ...(degreesOfFreedom && { degreesOfFreedom }) }, 0);
  const standardError = Math.sqrt(bilinear(gradient, covariance.matrix, gradient));
  const ratio = (value - against) / standardError;
  const reach = criticalValue(level, law) * standardError;
  const pValue = sidedPValueOf(ratio, law, side);
  return { value, standardError, ratio, pValue, low: value - reach, high: value + reach, caution: null };
}

const cautionOf = ({ pValue }: Estimate, level: number): string | null =>
  pValue < level
    ? null
    : "What it is divided by cannot be told from zero, so this value may be anything and its interval is too narrow.";
