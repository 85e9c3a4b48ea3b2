import type { Fit } from "../fit/fit.ts";
import { chiSquareTail } from "../numeric/distributions.ts";
import { earlierRows, valuesAt } from "../numeric/earlierRows.ts";
import { innerProduct } from "../numeric/sums.ts";
import { type TestOutcome, computed, notApplicable } from "./outcome.ts";
import { noTime, timeLineOf } from "./timeLine.ts";

/**
 * Ljung-Box test of the residuals' correlations with their own past, for each order asked for.
 * H0: the errors are not correlated with those 1..p periods before. Q = n (n + 2) sum of r_l^2 / (n - l) over
 * l = 1..p, r_l the sum of e_t e_(t-l) over the sum of e_t^2; under H0 chi-square(p) as n grows, if the outcome's own
 * past is not among the drivers. A period without a row counts as zero.
 * @param orders - each p >= 1, in periods.
 * @returns one outcome an order; not-applicable where rows do not run through time or p >= n.
 * @see Ljung and Box (1978), Biometrika 65, 297-303.
 */
export function ljungBox(
  { design, residuals, rowCount, residualSumOfSquares }: Fit,
  orders: readonly number[],
): TestOutcome[] {
  const line = timeLineOf(design.order);
  if (line === null) return orders.map((order) => notApplicable("ljung-box", noTime, order));
  const most = Math.min(Math.max(...orders), rowCount - 1);
  const parts = Array.from({ length: most }, (_, index) => {
    const lag = index + 1;
    const r = innerProduct(residuals, valuesAt(residuals, earlierRows(line, lag))) / residualSumOfSquares;
    return r ** 2 / (rowCount - lag);
  });
  return orders.map((order) => {
    if (order >= rowCount) return notApplicable("ljung-box", `${rowCount} rows are too few for ${order} lags`, order);
    const statistic = rowCount * (rowCount + 2) * parts.slice(0, order).reduce((sum, part) => sum + part, 0);
    const figure = { statistic, law: "chi-square", df: [order], pValue: chiSquareTail(statistic, order) } as const;
    return computed({ test: "ljung-box", form: null, order, figure, fForm: null, details: {} });
  });
}
