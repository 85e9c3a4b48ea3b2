import { type Basis, basisBlockRows, visitBasis } from "./basis.ts";
import type { SquareMatrix } from "./matrix.ts";
import { arena } from "./vector/arena.ts";
import { place } from "./vector/place.ts";

/**
 * sum of w_i q_i q_i' over the rows of the orthonormal basis Q, for several sets of weights in one pass.
 * @param basis - n rows, k columns.
 * @param weightings - each n weights of at least 0.
 * @returns one k by k matrix a weighting, in the order given.
 */
export function weightedCrossProducts(basis: Basis, weightings: readonly Float64Array[]): SquareMatrix[] {
  const size = basis.columns.length;
  const sums = weightings.map(() => new Float64Array(size * size));
  visitBasis(basis, ({ values, first, rows }) => {
    weightings.forEach((weights, index) => {
      const factors = weights.subarray(first, first + rows).map(Math.sqrt);
      addCrossProducts(sums[index]!, { values, rows, size, factors });
    });
  });
  return sums.map((values) => ({ size, values }));
}

/** Rows of `size` columns: entry (i, j) is values[j * basisBlockRows + i], times factors[i] where there are factors. */
interface RowBlock {
  readonly values: Float64Array;
  readonly rows: number;
  readonly size: number;
  readonly factors?: Float64Array;
}

/** Adds the block's cross-products to `sums`, size by size. */
export function addCrossProducts(sums: Float64Array, { values, rows, size, factors }: RowBlock): void {
  const stride = basisBlockRows;
  const at = size * size + (size % 2);
  const space = arena.numbers(at + size * stride);
  space.set(sums);
  for (let j = 0; j < size; j++) {
    place(values.subarray(j * stride, j * stride + rows), space, at + j * stride);
    if (factors !== undefined) multiplyBy(factors, space, at + j * stride);
  }
  for (let b = 0; b < size; b += 2) {
    const right = at + b * stride;
    const paired = b + 1 < size;
    const next = paired ? right + stride : right;
    const count = paired ? b + 2 : b + 1;
    arena.kernels.addProducts({ left: at, count, right, next, rows, stride, sums: b * size, nextSums: (b + 1) * size });
  }
  for (let i = 0; i < size; i++) {
    for (let j = 0; j <= i; j++) sums[i * size + j] = sums[j * size + i] = space[i * size + j]!;
  }
}

function multiplyBy(factors: Float64Array, space: Float64Array, at: number): void {
  for (let i = 0; i < factors.length; i++) space[at + i]! *= factors[i]!;
}

/** The whole symmetric matrix from its upper half. */
export function mirrored(values: Float64Array, size: number): SquareMatrix {
  for (let i = 1; i < size; i++) for (let j = 0; j < i; j++) values[i * size + j] = values[j * size + i]!;
  return { size, values };
}

/** h_i = |q_i|^2: the leverage of each row. */
export function squaredRowLengths(basis: Basis): Float64Array<ArrayBuffer> {
  const size = basis.columns.length;
  const lengths = new Float64Array(basis.columns[0]?.length ?? 0);
  visitBasis(basis, ({ values, first, rows }) => {
    const sums = size * basisBlockRows;
    const space = arena.numbers(sums + basisBlockRows);
    space.set(values);
    space.fill(0, sums, sums + basisBlockRows);
    arena.kernels.addSquares({ block: 0, size, rows, stride: basisBlockRows, sums });
    lengths.set(space.subarray(sums, sums + rows), first);
  });
  return lengths;
}
