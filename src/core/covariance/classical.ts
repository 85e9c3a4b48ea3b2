import type { Fit } from "../fit/fit.ts";
import { scaled } from "../numeric/smallMatrix.ts";
import type { Covariance } from "./choice.ts";
import { fromMatrix } from "./sandwich.ts";

/**
 * The classical covariance s^2 (X'X)^-1: right where the errors have an even spread and do not follow on.
 * @param fit - least squares fit of n rows on k columns.
 * @returns k by k, in the units of b b'.
 */
export const classicalCovariance = (fit: Fit): Covariance =>
  fromMatrix(scaled(fit.bread, fit.sigma ** 2), { choice: { kind: "classical" } });
