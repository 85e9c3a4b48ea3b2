import { chiSquareTail, fTail } from "../numeric/distributions.ts";
import type { Explained } from "../numeric/explain.ts";
import { isPerfect } from "../numeric/perfect.ts";
import { type TestName, type TestOutcome, computed, notApplicable } from "./outcome.ts";

/** An LM test by its auxiliary regression. */
export interface AuxiliaryRegression {
  readonly test: TestName;
  readonly form?: string;
  readonly order?: number;
  readonly rowCount: number;
  readonly explained: Explained;
  /** The sum of squares about zero of what is explained: where its variation is rounding beside it, there is none. */
  readonly size: number;
  /** Columns that the null hypothesis leaves in: 1 for the constant, k where the terms themselves stay. */
  readonly underNull: number;
}

/**
 * The two forms of an LM test: n R^2 of the auxiliary regression, chi-square with as many degrees of freedom as there
 * are independent columns beyond those under the null hypothesis; and F of the same columns.
 * @returns not-applicable where no column is left to test, or no row beyond the columns.
 */
export function lagrangeMultiplier(regression: AuxiliaryRegression): TestOutcome {
  const { test, form = null, order = null, rowCount, explained, size, underNull } = regression;
  const df = explained.rank - underNull;
  const rest = rowCount - explained.rank;
  if (isPerfect(explained.total, size)) return notApplicable(test, "the squared residuals are all equal", order);
  if (df < 1) return notApplicable(test, "nothing that could show it varies", order);
  if (rest < 1 || isPerfect(explained.residual, explained.total))
    return notApplicable(test, fewRows(rowCount, explained.rank), order);
  const statistic = rowCount * (explained.explained / explained.total);
  const f = explained.explained / df / (explained.residual / rest);
  return computed({
    test,
    form,
    order,
    figure: { statistic, law: "chi-square", df: [df], pValue: chiSquareTail(statistic, df) },
    fForm: { statistic: f, law: "F", df: [df, rest], pValue: fTail(f, df, rest) },
    details: {},
  });
}

/** Why a regression cannot be run on so few rows. */
export const fewRows = (rows: number, columns: number): string =>
  `${rows} rows are too few for the ${columns} columns of its auxiliary regression`;
