import type { Fit } from "../fit/fit.ts";
import { type TimeLine, earlierRows, valuesAt } from "../numeric/earlierRows.ts";
import { explainWithin } from "../numeric/explain.ts";
import { triangularFactor } from "../numeric/triangularFactor.ts";
import { lagrangeMultiplier } from "./lagrangeMultiplier.ts";
import { type TestOutcome, notApplicable } from "./outcome.ts";
import { noTime, timeLineOf } from "./timeLine.ts";

/**
 * LM test of Breusch and Godfrey for errors that follow on, up to one order; see `breuschGodfreyOrders`.
 * @param order - p >= 1, in periods.
 */
export function breuschGodfrey(fit: Fit, order: number): TestOutcome {
  return breuschGodfreyOrders(fit, [order])[0]!;
}

/**
 * LM test of Breusch and Godfrey for errors that follow on, for several orders in one pass over the rows.
 * H0: the errors are not correlated with those 1..p periods before. LM = n R^2 of the residuals on the terms and the
 * residuals of the p periods before; under H0 chi-square(p) as n grows, whether or not the outcome's own past is among
 * the drivers. What lies before the first period counts as zero, and so does a period without a row: two rows that are
 * not neighbours in time are never treated as neighbours, nor rows of two groups.
 * @param orders - each p >= 1, in periods.
 * @returns one outcome an order: LM >= 0 and the F form, df = p less the lags that no row has;
 *   not-applicable where rows do not run through time or are too few.
 * @see Breusch (1978), Australian Economic Papers 17, 334-355; Godfrey (1978), Econometrica 46, 1293-1301.
 */
export function breuschGodfreyOrders(fit: Fit, orders: readonly number[]): TestOutcome[] {
  const line = timeLineOf(fit.design.order);
  if (line === null) return orders.map((order) => notApplicable("breusch-godfrey", noTime, order));
  const terms = fit.design.terms.map(({ values }) => values);
  const lagged = laggedResiduals(fit, line, Math.max(...orders));
  const factor = triangularFactor([...terms, ...lagged, fit.residuals]);
  return orders.map((order) => {
    const drivers = Array.from({ length: terms.length + order }, (_, j) => j);
    const explained = explainWithin(factor, { drivers, target: factor.size - 1, about: "zero" });
    const { rowCount, columnCount: underNull } = fit;
    const size = explained.total;
    return lagrangeMultiplier({ test: "breusch-godfrey", order, rowCount, explained, size, underNull });
  });
}

const laggedResiduals = ({ residuals }: Fit, line: TimeLine, most: number): Float64Array[] =>
  Array.from({ length: most }, (_, index) => valuesAt(residuals, earlierRows(line, index + 1)));
