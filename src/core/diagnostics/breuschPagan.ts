import type { Fit } from "../fit/fit.ts";
import { chiSquareTail } from "../numeric/distributions.ts";
import { explain } from "../numeric/explain.ts";
import { constantAndDrivers, relativeSquares } from "./auxiliary.ts";
import { type TestOutcome, computed, notApplicable } from "./outcome.ts";

/**
 * Breusch-Pagan test for uneven spread as first published, for normal errors.
 * H0: the error variance does not depend on the drivers. LM = half the explained sum of squares of e^2 / (RSS / n) on a
 * constant and the drivers; under H0 and normal errors chi-square with as many degrees of freedom as drivers.
 * @param fit - least squares fit of n rows on k columns.
 * @returns LM >= 0 (unit-free); not-applicable without a driver.
 * @see Breusch and Pagan (1979), Econometrica 47, 1287-1294.
 */
export function breuschPagan(fit: Fit): TestOutcome {
  const { explained, rank } = explain(constantAndDrivers(fit), relativeSquares(fit));
  const df = rank - 1;
  if (df < 1) return notApplicable("breusch-pagan", "there is no driver that varies");
  const statistic = explained / 2;
  const figure = { statistic, law: "chi-square", df: [df], pValue: chiSquareTail(statistic, df) } as const;
  return computed({ test: "breusch-pagan", form: null, order: null, figure, fForm: null, details: {} });
}
