import type { Fit } from "../fit/fit.ts";
import { fTail } from "../numeric/distributions.ts";
import { explain } from "../numeric/explain.ts";
import { isPerfect } from "../numeric/perfect.ts";
import { powersOfFitted } from "./auxiliary.ts";
import { type TestOutcome, computed, notApplicable } from "./outcome.ts";
import { fewRows } from "./lagrangeMultiplier.ts";

/**
 * RESET test for a missing curve.
 * H0: the square and cube of the fitted values add nothing. F test of the two in the regression on the terms and them.
 * @returns F with 2 degrees of freedom (fewer where a power is made up of the other columns) and n - k less as many;
 *   not-applicable where no power says anything new or too few rows are left.
 * @see Ramsey (1969), J. Royal Stat. Society B 31, 350-371.
 */
export function reset(fit: Fit): TestOutcome {
  const terms = fit.design.terms.map(({ values }) => values);
  const { explained, residual, rank } = explain([...terms, ...powersOfFitted(fit)], fit.residuals, "zero");
  const df = [rank - fit.columnCount, fit.rowCount - rank] as const;
  if (df[0] < 1) return notApplicable("reset", noPower);
  if (df[1] < 1 || isPerfect(residual, fit.residualSumOfSquares))
    return notApplicable("reset", fewRows(fit.rowCount, rank));
  const statistic = explained / df[0] / (residual / df[1]);
  const figure = { statistic, law: "F", df, pValue: fTail(statistic, ...df) } as const;
  return computed({ test: "reset", form: null, order: null, figure, fForm: null, details: {} });
}

/** Why there is nothing to test: with indicators alone every power is a combination of them. */
export const noPower = "powers of the fitted values are combinations of the drivers already there";
