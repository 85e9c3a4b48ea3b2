import type { Fit } from "../fit/fit.ts";
import { centralMoments } from "../numeric/centralMoments.ts";
import { chiSquareTail } from "../numeric/distributions.ts";
import { type TestOutcome, computed, notApplicable } from "./outcome.ts";

/** A variance about the mean, in units of s^2, that rounding alone leaves. */
const equalBut = 1e-20;

/**
 * Jarque-Bera test of the shape of the errors.
 * H0: the errors are normal. JB = n/6 (S^2 + (K - 3)^2 / 4), S and K the skewness and kurtosis of the residuals with
 * moments divided by n; under H0 chi-square with 2 degrees of freedom as n grows, slowly.
 * @returns JB >= 0; details `skewness`, `kurtosis`; not-applicable where all residuals are equal (without a constant).
 * @see Jarque and Bera (1980), Economics Letters 6, 255-259.
 */
export function jarqueBera({ residuals, rowCount, sigma }: Fit): TestOutcome {
  const { second, third, fourth } = centralMoments(residuals.map((u) => u / sigma));
  if (second < equalBut) return notApplicable("jarque-bera", "all residuals are equal, so that they have no shape");
  const skewness = third / second ** 1.5;
  const kurtosis = fourth / second ** 2;
  const statistic = (rowCount / 6) * (skewness ** 2 + (kurtosis - 3) ** 2 / 4);
  return computed({
    test: "jarque-bera",
    form: null,
    order: null,
    figure: { statistic, law: "chi-square", df: [2], pValue: chiSquareTail(statistic, 2) },
    fForm: null,
    details: { skewness, kurtosis },
  });
}
