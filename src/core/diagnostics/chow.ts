import type { Fit } from "../fit/fit.ts";
import { fTail } from "../numeric/distributions.ts";
import { explain, type Explained } from "../numeric/explain.ts";
import { isPerfect } from "../numeric/perfect.ts";
import { type TestOutcome, computed, notApplicable } from "./outcome.ts";
import { noTime } from "./timeLine.ts";

/**
 * Chow test of the same coefficients before and after a row.
 * H0: the coefficients are the same in both parts. F = ((RSS - RSS_1 - RSS_2) / k) / ((RSS_1 + RSS_2) / (n - 2k));
 * under H0 and normal errors of even spread exactly F(k, n - 2k). A part with fewer rows than coefficients is held
 * against the forecasts of the other, which is Chow's second test.
 * @param firstRows - how many rows, in the order of time, stand before the break.
 * @returns F; fewer degrees of freedom where a part has dependent columns or few rows; not-applicable where rows do not
 *   run through time, a part is empty or nothing is left over. Details `firstRows`.
 * @see Chow (1960), Econometrica 28, 591-605.
 */
export function chow(fit: Fit, firstRows: number): TestOutcome {
  const { design, rowCount, columnCount } = fit;
  if (design.order.kind !== "time") return notApplicable("chow", noTime);
  if (firstRows >= rowCount)
    return notApplicable("chow", `there are only ${rowCount} rows, so none comes after row ${firstRows}`);
  const [before, after] = [part(fit, 0, firstRows), part(fit, firstRows, rowCount)];
  const residual = before.residual + after.residual;
  const df = [before.rank + after.rank - columnCount, rowCount - before.rank - after.rank] as const;
  if (df[0] < 1 || df[1] < 1 || isPerfect(residual, fit.residualSumOfSquares)) {
    return notApplicable("chow", `${rowCount} rows parted after row ${firstRows} leave too few on a side`);
  }
  const statistic = (before.explained + after.explained) / df[0] / (residual / df[1]);
  const figure = { statistic, law: "F", df, pValue: fTail(statistic, ...df) } as const;
  const form = `first ${firstRows} rows, then the rest`;
  return computed({ test: "chow", form, order: null, figure, fForm: null, details: { firstRows } });
}

/** What the terms explain of the whole fit's residuals within a stretch of rows: RSS less the stretch's own. */
const part = ({ design, residuals }: Fit, from: number, to: number): Explained =>
  explain(
    design.terms.map(({ values }) => values.subarray(from, to)),
    residuals.subarray(from, to),
    "zero",
  );
