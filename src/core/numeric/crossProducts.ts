import { type Basis, basisBlockRows, visitBasis } from "./basis.ts";
import type { SquareMatrix } from "./matrix.ts";

/**
 * sum of w_i q_i q_i' over the rows of the orthonormal basis Q, for several sets of weights in one pass.
 * @param basis - n rows, k columns.
 * @param weightings - each n weights of at least 0.
 * @returns one k by k matrix a weighting, in the order given.
 */
export function weightedCrossProducts(basis: Basis, weightings: readonly Float64Array[]): SquareMatrix[] {
  const size = basis.columns.length;
  const sums = weightings.map(() => new Float64Array(size * size));
  const weighted = new Float64Array(size * basisBlockRows);
  visitBasis(basis, ({ values, first, rows }) => {
    weightings.forEach((weights, index) => {
      const roots = weights.subarray(first, first + rows).map(Math.sqrt);
      scaleRows({ values, rows, size }, roots, weighted);
      addCrossProducts(sums[index]!, { values: weighted, rows, size });
    });
  });
  return sums.map((values) => mirrored(values, size));
}

/** Rows of `size` columns: entry (i, j) is values[j * basisBlockRows + i]. */
interface RowBlock {
  readonly values: Float64Array;
  readonly rows: number;
  readonly size: number;
}

/** Each row of the block times its factor, into `to`. */
function scaleRows({ values, rows, size }: RowBlock, factors: Float64Array, to: Float64Array): void {
  for (let j = 0; j < size; j++) {
    const start = j * basisBlockRows;
    for (let i = 0; i < rows; i++) to[start + i] = values[start + i]! * factors[i]!;
  }
}

/** Adds the block's cross-products to the upper half of `sums`, two columns against two at a time. */
export function addCrossProducts(sums: Float64Array, block: RowBlock): void {
  const { size } = block;
  for (let a = 0; a < size; a += 2) {
    for (let b = a; b < size; b += 2) {
      if (b + 1 < size) addFourProducts(sums, block, { a, b });
      else addLastColumn(sums, block, a);
    }
  }
}

/** Columns a, a + 1 against b, b + 1. For a = b one product falls below the diagonal, where it is not read. */
function addFourProducts(
  sums: Float64Array,
  { values, rows, size }: RowBlock,
  { a, b }: { a: number; b: number },
): void {
  const a0 = a * basisBlockRows;
  const a1 = a0 + basisBlockRows;
  const b0 = b * basisBlockRows;
  const b1 = b0 + basisBlockRows;
  let sum00 = 0;
  let sum01 = 0;
  let sum10 = 0;
  let sum11 = 0;
  for (let i = 0; i < rows; i++) {
    const left0 = values[a0 + i]!;
    const left1 = values[a1 + i]!;
    const right0 = values[b0 + i]!;
    const right1 = values[b1 + i]!;
    sum00 += left0 * right0;
    sum01 += left0 * right1;
    sum10 += left1 * right0;
    sum11 += left1 * right1;
  }
  const entry = a * size + b;
  sums[entry]! += sum00;
  sums[entry + 1]! += sum01;
  sums[entry + size]! += sum10;
  sums[entry + size + 1]! += sum11;
}

/** Columns a and a + 1 (where there is one) against the last of an odd number of columns. */
function addLastColumn(sums: Float64Array, { values, rows, size }: RowBlock, a: number): void {
  const last = (size - 1) * basisBlockRows;
  for (let j = a; j < Math.min(a + 2, size); j++) {
    const start = j * basisBlockRows;
    let sum = 0;
    for (let i = 0; i < rows; i++) sum += values[start + i]! * values[last + i]!;
    sums[j * size + size - 1]! += sum;
  }
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
    for (let j = 0; j < size; j++) {
      const start = j * basisBlockRows;
      for (let i = 0; i < rows; i++) lengths[first + i]! += values[start + i]! * values[start + i]!;
    }
  });
  return lengths;
}

/** Q z, n values. */
export function basisTimes(basis: Basis, z: Float64Array): Float64Array<ArrayBuffer> {
  const product = new Float64Array(basis.columns[0]?.length ?? 0);
  visitBasis(basis, ({ values, first, rows }) => {
    z.forEach((weight, j) => {
      const start = j * basisBlockRows;
      for (let i = 0; i < rows; i++) product[first + i]! += weight * values[start + i]!;
    });
  });
  return product;
}
