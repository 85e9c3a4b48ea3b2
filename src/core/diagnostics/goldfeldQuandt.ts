import type { Fit } from "../fit/fit.ts";
import { fTail } from "../numeric/distributions.ts";
import { explain } from "../numeric/explain.ts";
import { isPerfect } from "../numeric/perfect.ts";
import { inOrder, smallestRows } from "../numeric/ordering.ts";
import { fittedValues } from "./auxiliary.ts";
import { type TestOutcome, computed, notApplicable } from "./outcome.ts";

/**
 * Goldfeld-Quandt test for a spread that grows with the fitted value.
 * H0: the error variance is the same among the half of the rows with the smaller fitted values and the half with the
 * larger. F = (RSS_2 / (n_2 - k)) / (RSS_1 / (n_1 - k)) of the regressions on either half, one-sided; no rows between
 * them are left out, n_1 = floor(n / 2); rows of equal fitted value keep their order.
 * @returns not-applicable where a half has no row beyond its independent columns, or fits perfectly.
 * @see Goldfeld and Quandt (1965), J. American Stat. Association 60, 539-547.
 */
export function goldfeldQuandt(fit: Fit): TestOutcome {
  const halves = smallestRows(fittedValues(fit), Math.floor(fit.rowCount / 2));
  const [smaller, larger] = [varianceOn(fit, halves[0]), varianceOn(fit, halves[1])];
  if (smaller.df < 1 || larger.df < 1) {
    return notApplicable(
      "goldfeld-quandt",
      `half of the ${fit.rowCount} rows are too few for a regression of their own`,
    );
  }
  if (isPerfect(smaller.rss, fit.residualSumOfSquares))
    return notApplicable("goldfeld-quandt", "the rows with small fitted values fit perfectly");
  const statistic = larger.rss / larger.df / (smaller.rss / smaller.df);
  const df = [larger.df, smaller.df] as const;
  const figure = { statistic, law: "F", df, pValue: fTail(statistic, ...df) } as const;
  return computed({ test: "goldfeld-quandt", form: null, order: null, figure, fForm: null, details: {} });
}

/** Regressing the residuals leaves the same residuals as regressing the outcome, with less rounding. */
function varianceOn(fit: Fit, rows: Int32Array): { rss: number; df: number } {
  const columns = fit.design.terms.map(({ values }) => inOrder(values, rows));
  const { residual, rank } = explain(columns, inOrder(fit.residuals, rows), "zero");
  return { rss: residual, df: rows.length - rank };
}
