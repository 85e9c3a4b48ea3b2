import type { ErrorsChoice } from "../covariance/choice.ts";
import { covarianceOf } from "../covariance/covarianceOf.ts";
import type { Design, Term } from "../design/design.ts";
import type { Fit } from "../fit/fit.ts";
import { fitLeastSquares } from "../fit/fitLeastSquares.ts";
import { chiSquareTail, fTail } from "../numeric/distributions.ts";
import { explain } from "../numeric/explain.ts";
import { combined, covarianceOfCombinations, inverseForm } from "../numeric/inverseForm.ts";
import { powersOfFitted } from "./auxiliary.ts";
import { type TestOutcome, computed, notApplicable } from "./outcome.ts";
import { noPower } from "./reset.ts";

/**
 * RESET test for a missing curve with the covariance in force, for errors of uneven spread or that follow on.
 * H0: the square and cube of the fitted values add nothing. Wald statistic of their coefficients in the regression with
 * them, under the chosen kind of covariance; chi-square(2) as n grows.
 * @param choice - the kind of covariance, computed anew for the regression with the powers.
 * @returns the Wald statistic and, divided by its degrees of freedom, an F form; not-applicable where no power says
 *   anything new, too few rows are left or the covariance of the two is singular.
 * @see Ramsey (1969), J. Royal Stat. Society B 31, 350-371; White (1980), Econometrica 48, 817-838.
 */
export function resetRobust(fit: Fit, choice: ErrorsChoice): TestOutcome {
  const powers = independentPowers(fit);
  if (powers.length === 0) return notApplicable("reset-robust", noPower);
  const curved = fitLeastSquares(withTerms(fit.design, powers));
  if (!curved.ok)
    return notApplicable("reset-robust", `${fit.rowCount} rows are too few for ${powers.length} more columns`);
  const covariance = covarianceOf(curved.value, withoutDegrees(choice));
  if (!covariance.ok)
    return notApplicable("reset-robust", "its standard errors cannot be had for the regression with the powers");
  const df = powers.length;
  const lastOnes = Array.from({ length: df }, (_, i) =>
    Array.from({ length: curved.value.columnCount }, (__, j) => (j === fit.columnCount + i ? 1 : 0)),
  );
  const statistic = inverseForm(
    covarianceOfCombinations(covariance.value.matrix, lastOnes),
    combined(lastOnes, curved.value.coefficients),
  );
  if (statistic === null)
    return notApplicable("reset-robust", "the covariance of the powers' coefficients is singular");
  const rest = curved.value.degreesOfFreedom;
  return computed({
    test: "reset-robust",
    form: null,
    order: null,
    figure: { statistic, law: "chi-square", df: [df], pValue: chiSquareTail(statistic, df) },
    fForm: { statistic: statistic / df, law: "F", df: [df, rest], pValue: fTail(statistic / df, df, rest) },
    details: {},
  });
}

/** The Wald statistic needs the covariance alone: degrees of freedom by coefficient would be work for nothing. */
const withoutDegrees = (choice: ErrorsChoice): ErrorsChoice =>
  choice.kind === "white" ? { kind: choice.kind, version: choice.version } : choice;

/** The powers that the terms, and the square before the cube, do not make up. */
function independentPowers(fit: Fit): Float64Array<ArrayBuffer>[] {
  const kept: Float64Array<ArrayBuffer>[] = [];
  for (const power of powersOfFitted(fit)) {
    const columns = [...fit.design.terms.map(({ values }) => values), ...kept, power];
    if (explain(columns, fit.residuals, "zero").rank === columns.length) kept.push(power);
  }
  return kept;
}

const withTerms = (design: Design, columns: readonly Float64Array<ArrayBuffer>[]): Design => ({
  ...design,
  terms: [...design.terms, ...columns.map((values, index) => powerTerm(values, index + 2))],
});

const powerTerm = (values: Float64Array<ArrayBuffer>, power: number): Term => ({
  name: `fitted value to the power ${power}`,
  meaning: { kind: "number", column: "fitted value", transform: { kind: "none" } },
  values,
});
