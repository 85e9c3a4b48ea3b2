import type { Fit } from "../fit/fit.ts";
import { combinationMoments } from "../numeric/combinationMoments.ts";
import { sumOfSquares } from "../numeric/sums.ts";
import { basisOf } from "./basisOf.ts";
import { eachCoefficient } from "./basisWeights.ts";
import { selfFittingRows } from "./leverageOfOne.ts";

/**
 * Degrees of freedom of the HC2 variance of combinations of the coefficients under equal errors: the variance is e'De with
 * d_i = c_i^2 / (1 - h_i), c = X (X'X)^-1 l = Q z, so that by Satterthwaite they are (tr MD)^2 / tr(MDMD) with M = I - H:
 * (sum c_i^2)^2 / (sum d_i^2 (1 - 2 h_i) + |Q'DQ|^2).
 * @param fit - least squares fit of n rows on k columns.
 * @param weights - of the combinations in the basis; each coefficient by itself where none are given.
 * @returns one value a combination from 1 to n - k, or null where a row has a leverage of one and HC2 does not exist.
 * @see Bell and McCaffrey (2002), Survey Methodology 28, 169-181; Imbens and Kolesar (2016), Rev. Econ. Stat. 98, 701-712.
 */
export function bellMcCaffreyDegrees(fit: Fit, weights = eachCoefficient(fit)): Float64Array<ArrayBuffer> | null {
  if (selfFittingRows(fit).length > 0) return null;
  const size = fit.columnCount;
  const { count, values } = weights;
  const combinations = Array.from({ length: count }, (_, l) => values.subarray(l * size, (l + 1) * size));
  const divisors = fit.leverages.map((h) => 1 - h);
  const factors = fit.leverages.map((h) => 1 - 2 * h);
  const moments = combinationMoments(basisOf(fit), combinations, { divisors, factors });
  return Float64Array.from(
    moments,
    ({ squares, inside }, l) => sumOfSquares(combinations[l]!) ** 2 / (squares + sumOfSquares(inside.values)),
  );
}
