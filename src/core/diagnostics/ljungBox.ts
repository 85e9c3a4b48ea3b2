import type { Fit } from "../fit/fit.ts";
import { chiSquareTail } from "../numeric/distributions.ts";
import { type TestOutcome, computed, notApplicable } from "./outcome.ts";
import { residualCorrelations } from "./residualCorrelations.ts";
import { noTime } from "./timeLine.ts";

/**
 * Ljung-Box test of the residuals' correlations with their own past, for each order asked for.
 * H0: the errors are not correlated with those 1..p periods before. Q = n (n + 2) sum of r_l^2 / (n - l) over
 * l = 1..p, r_l the sum of e_t e_(t-l) over the sum of e_t^2; under H0 chi-square(p) as n grows, if the outcome's own
 * past is not among the drivers. A period without a row counts as zero.
 * @param orders - each p >= 1, in periods.
 * @returns one outcome an order; not-applicable where rows do not run through time or p >= n.
 * @see Ljung and Box (1978), Biometrika 65, 297-303.
 */
export function ljungBox(fit: Fit, orders: readonly number[]): TestOutcome[] {
  const { rowCount } = fit;
  const correlations = residualCorrelations(fit, Math.min(Math.max(...orders), rowCount - 1));
  if (correlations === null) return orders.map((order) => notApplicable("ljung-box", noTime, order));
  const parts = correlations.map((r, index) => r ** 2 / (rowCount - index - 1));
  return orders.map((order) => {
    if (order >= rowCount) return notApplicable("ljung-box", `${rowCount} rows are too few for ${order} lags`, order);
    const statistic = rowCount * (rowCount + 2) * parts.slice(0, order).reduce((sum, part) => sum + part, 0);
    const figure = { statistic, law: "chi-square", df: [order], pValue: chiSquareTail(statistic, order) } as const;
    return computed({ test: "ljung-box", form: null, order, figure, fForm: null, details: {} });
  });
}
