import type { Fit } from "../fit/fit.ts";
import { inBasis } from "./basisWeights.ts";
import { bellMcCaffreyDegrees } from "./bellMcCaffrey.ts";
import type { Covariance } from "./choice.ts";
import { adjustedDegrees } from "./grouped.ts";

/**
 * The t law's degrees of freedom of linear combinations of the coefficients, where the kind of standard errors has its
 * own: Bell and McCaffrey's for HC2, Satterthwaite's for CR2 with one grouping, the groups less one otherwise.
 * @param combinations - each k weights, not all zero.
 * @returns one value a combination; null where the kind has none of its own.
 */
export function degreesOfCombinations(
  fit: Fit,
  { choice, degreesOfFreedom }: Covariance,
  combinations: readonly ArrayLike<number>[],
): Float64Array | null {
  if (degreesOfFreedom === null) return null;
  if (choice.kind === "white") return bellMcCaffreyDegrees(fit, inBasis(fit, combinations));
  const { order } = fit.design;
  if (choice.kind === "grouped" && choice.version === "CR2" && order.kind === "groups" && order.second === null) {
    return adjustedDegrees(fit, order.groups, inBasis(fit, combinations));
  }
  return new Float64Array(combinations.length).fill(degreesOfFreedom[0]!);
}
