/** start + sum of weight_j x_j, row by row. */
export function plusCombination(
  start: Float64Array,
  columns: readonly Float64Array[],
  weights: ArrayLike<number>,
): Float64Array<ArrayBuffer> {
  const sums = Float64Array.from(start);
  columns.forEach((column, j) => {
    const weight = weights[j]!;
    if (weight === 0) return;
    for (let i = 0; i < sums.length; i++) sums[i]! += weight * column[i]!;
  });
  return sums;
}
