import type { Explained } from "./explain.ts";
import type { SquareMatrix } from "./matrix.ts";

/**
 * A pivot below this share of its diagonal is a dependent column. A square in rounding is 1e-14 of it, so that columns
 * of which less than 1e-5 lies outside the others cannot be told from dependent ones here.
 */
const dependentPivot = 1e-10;

/**
 * How much of y's sum of squares about its mean some columns explain, from their cross-products by Cholesky.
 * @param moments - cross-products of [columns | y], the constant first, y last.
 * @param total - y's sum of squares about its mean, which is not to be had from moments without loss.
 */
export function explainFromMoments({ size, values }: SquareMatrix, total: number): Explained {
  const lower = new Float64Array(size * size);
  let explained = 0;
  let rank = 0;
  for (let j = 0; j < size - 1; j++) {
    const pivot = values[j * size + j]! - dot(lower, { i: j, j, size });
    if (pivot <= dependentPivot * values[j * size + j]!) continue;
    const root = Math.sqrt(pivot);
    for (let i = j + 1; i < size; i++) {
      lower[i * size + j] = (values[i * size + j]! - dot(lower, { i, j, size })) / root;
    }
    lower[j * size + j] = root;
    if (rank > 0) explained += lower[(size - 1) * size + j]! ** 2;
    rank += 1;
  }
  return { explained, residual: total - explained, total, rank };
}

/** Rows i and j of the lower triangle so far; a dropped column left zeros. */
function dot(lower: Float64Array, { i, j, size }: { i: number; j: number; size: number }): number {
  let sum = 0;
  for (let l = 0; l < j; l++) sum += lower[i * size + l]! * lower[j * size + l]!;
  return sum;
}
