import type { SquareMatrix } from "./matrix.ts";
import { bilinear, matrixOf } from "./smallMatrix.ts";

/** A pivot below this share of its variance is rounding: the matrix is singular. */
const singular = 1e-12;

/**
 * x' V^-1 x for a covariance V, by Cholesky from its lower half; free of units, since each pivot is held against its own
 * variance.
 * @returns null where V is singular, so that nothing can be said of x in some direction.
 */
export function inverseForm({ size, values }: SquareMatrix, x: ArrayLike<number>): number | null {
  const lower = new Float64Array(size * size);
  const solved = new Float64Array(size);
  for (let i = 0; i < size; i++) {
    for (let j = 0; j < i; j++) lower[i * size + j] = (values[i * size + j]! - product(i, j)) / lower[j * size + j]!;
    const variance = values[i * size + i]!;
    const pivot = variance - product(i, i);
    if (!(pivot > singular * variance)) return null;
    lower[i * size + i] = Math.sqrt(pivot);
    solved[i] =
      (x[i]! - lower.subarray(i * size, i * size + i).reduce((sum, l, j) => sum + l * solved[j]!, 0)) /
      Math.sqrt(pivot);
  }
  return solved.reduce((sum, value) => sum + value * value, 0);

  function product(row: number, column: number): number {
    let sum = 0;
    for (let l = 0; l < column; l++) sum += lower[row * size + l]! * lower[column * size + l]!;
    return sum;
  }
}

/** Linear combinations of an estimate: R with m rows of k weights. */
export type Combinations = readonly (readonly number[])[];

/** R V R'. */
export const covarianceOfCombinations = (covariance: SquareMatrix, rows: Combinations): SquareMatrix =>
  matrixOf(rows.map((left) => rows.map((right) => bilinear(left, covariance, right))));

/** R b. */
export const combined = (rows: Combinations, values: ArrayLike<number>): number[] =>
  rows.map((row) => row.reduce((sum, weight, j) => sum + weight * values[j]!, 0));
