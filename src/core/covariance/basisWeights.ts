import type { Fit } from "../fit/fit.ts";

/** m combinations of the coefficients by their weights in the basis Q = X R^-1, row by row. */
export interface BasisWeights {
  readonly count: number;
  /** m by k. */
  readonly values: Float64Array;
}

/** Row l of R^-1 holds the weights of coefficient l. */
export const eachCoefficient = ({ inverseTriangle }: Fit): BasisWeights => ({
  count: inverseTriangle.size,
  values: inverseTriangle.values,
});

/** The weights z = R^-T w of the combinations w'b. @param combinations - each k weights of the coefficients. */
export function inBasis({ inverseTriangle }: Fit, combinations: readonly ArrayLike<number>[]): BasisWeights {
  const { size, values: inverse } = inverseTriangle;
  const values = new Float64Array(combinations.length * size);
  combinations.forEach((weights, row) => {
    for (let l = 0; l < size; l++) {
      for (let j = 0; j < size; j++) values[row * size + j]! += weights[l]! * inverse[l * size + j]!;
    }
  });
  return { count: combinations.length, values };
}
