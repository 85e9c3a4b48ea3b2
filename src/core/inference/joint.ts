import type { Covariance } from "../covariance/choice.ts";
import type { Fit } from "../fit/fit.ts";
import { chiSquareTail, fTail } from "../numeric/distributions.ts";
import { type Combinations, combined, covarianceOfCombinations, inverseForm } from "../numeric/inverseForm.ts";

/** m linear restrictions R b = r: m rows of k weights, m values. */
export interface Restrictions {
  readonly weights: Combinations;
  readonly equals: readonly number[];
}

export interface JointFigure {
  readonly statistic: number;
  readonly law: "chi-square" | "F";
  readonly df: readonly number[];
  readonly pValue: number;
}

export type JointOutcome =
  | {
      readonly kind: "computed";
      readonly figure: JointFigure;
      readonly chiSquare: JointFigure;
      readonly f: JointFigure;
    }
  | { readonly kind: "not-applicable"; readonly because: string };

/**
 * Wald test of linear restrictions.
 * H0: R b = r. W = (R b - r)' (R V R')^-1 (R b - r); under H0 chi-square(m) as n grows. With the classical covariance
 * W / m is exactly F(m, n - k) under normal errors, and is the figure quoted; with any other the chi-square form is.
 * @param covariance - V, of the fit's coefficients.
 * @returns both forms; not-applicable where the restrictions say the same thing twice or V is singular in their direction.
 * @see Wald (1943), Trans. American Math. Society 54, 426-482.
 */
export function jointTest(fit: Fit, covariance: Covariance, { weights, equals }: Restrictions): JointOutcome {
  const gaps = combined(weights, fit.coefficients).map((value, i) => value - equals[i]!);
  const statistic = inverseForm(covarianceOfCombinations(covariance.matrix, weights), gaps);
  if (statistic === null) {
    return {
      kind: "not-applicable",
      because: "the restrictions say the same thing twice, or nothing is known of one of them",
    };
  }
  const m = weights.length;
  const df = [m, fit.degreesOfFreedom] as const;
  const chiSquare = { statistic, law: "chi-square", df: [m], pValue: chiSquareTail(statistic, m) } as const;
  const f = { statistic: statistic / m, law: "F", df, pValue: fTail(statistic / m, ...df) } as const;
  return { kind: "computed", figure: covariance.choice.kind === "classical" ? f : chiSquare, chiSquare, f };
}

/** The restrictions that all coefficients but the constant are zero. */
export function allDriversZero({ design, columnCount }: Fit): Restrictions {
  const drivers = design.terms.flatMap(({ meaning }, j) => (meaning.kind === "constant" ? [] : [j]));
  const weights = drivers.map((driver) => Array.from({ length: columnCount }, (_, j) => (j === driver ? 1 : 0)));
  return { weights, equals: drivers.map(() => 0) };
}
