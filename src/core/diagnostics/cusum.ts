import type { Fit } from "../fit/fit.ts";
import { type TestOutcome, computed, notApplicable } from "./outcome.ts";
import { noTime } from "./timeLine.ts";

/**
 * CUSUM test on the residuals of the whole regression.
 * H0: the coefficients are the same throughout. The statistic is the largest |e_1 + ... + e_t| / (s sqrt n); under H0
 * its law tends to that of the largest size of a Brownian bridge, Kolmogorov's.
 * @returns not-applicable where rows do not run through time, or there is no constant.
 * @see Ploberger and Kramer (1992), Econometrica 60, 271-285; Kolmogorov (1933), Giornale Ist. Ital. Attuari 4, 83-91.
 */
export function cusum({ design, residuals, rowCount, sigma }: Fit): TestOutcome {
  if (design.order.kind !== "time") return notApplicable("cusum", noTime);
  if (!design.hasConstant) return notApplicable("cusum", "without a constant the residuals do not sum to zero");
  let sum = 0;
  const largest = residuals.reduce((most, u) => Math.max(most, Math.abs((sum += u))), 0);
  const statistic = largest / (sigma * Math.sqrt(rowCount));
  const figure = { statistic, law: "limit", df: [], pValue: bridgeTail(statistic) } as const;
  return computed({ test: "cusum", form: null, order: null, figure, fForm: null, details: {} });
}

/** Below this the first of the two series takes more terms than the second. */
const seriesMeet = 1;
/** Either series then has terms below 1e-16 of the first. */
const terms = 6;

/** P(largest size of a Brownian bridge > x), by whichever of its two series falls faster. */
export function bridgeTail(x: number): number {
  const indices = Array.from({ length: terms }, (_, index) => index + 1);
  if (x >= seriesMeet) {
    return 2 * indices.reduce((total, j) => total - (-1) ** j * Math.exp(-2 * (j * x) ** 2), 0);
  }
  if (x === 0) return 1;
  const below = indices.reduce((total, j) => total + Math.exp(-(((2 * j - 1) * Math.PI) ** 2) / (8 * x * x)), 0);
  return 1 - (Math.sqrt(2 * Math.PI) / x) * below;
}
