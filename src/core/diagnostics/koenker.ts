import type { Fit } from "../fit/fit.ts";
import { explain } from "../numeric/explain.ts";
import { sumOfSquares } from "../numeric/sums.ts";
import { constantAndDrivers, relativeSquares } from "./auxiliary.ts";
import { lagrangeMultiplier } from "./lagrangeMultiplier.ts";
import type { TestOutcome } from "./outcome.ts";

/**
 * Breusch-Pagan test for uneven spread in Koenker's studentised form.
 * H0: the error variance does not depend on the drivers. LM = n R^2 of the squared residuals on a constant and the
 * drivers; under H0 chi-square with as many degrees of freedom as drivers as n grows, without normal errors.
 * @param fit - least squares fit of n rows on k columns; where it has no constant the auxiliary regression has one.
 * @returns LM >= 0 (unit-free) and the F form; not-applicable without a driver or with too few rows.
 * @see Koenker (1981), J. Econometrics 17, 107-112; Breusch and Pagan (1979), Econometrica 47, 1287-1294.
 */
export function koenker(fit: Fit): TestOutcome {
  const squares = relativeSquares(fit);
  const explained = explain(constantAndDrivers(fit), squares);
  const { rowCount } = fit;
  return lagrangeMultiplier({ test: "koenker", rowCount, explained, size: sumOfSquares(squares), underNull: 1 });
}
