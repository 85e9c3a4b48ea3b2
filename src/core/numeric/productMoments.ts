import { type Basis, type BasisBlock, basisBlockRows, visitBasis } from "./basis.ts";
import type { SquareMatrix } from "./matrix.ts";
import { arena } from "./vector/arena.ts";
import { place } from "./vector/place.ts";

/**
 * The products q_a q_b, a <= b, of the columns of an orthonormal basis whose first column is the constant span the
 * squares and cross-products of its columns. They are numbered by their larger index: (0,0), (0,1), (1,1), (0,2), ...
 */
export const productCount = (columns: number): number => (columns * (columns + 1)) / 2;

const productIndex = (a: number, b: number): number => (b * (b + 1)) / 2 + a;

/** The products as columns of n values, for designs small enough to hold them. */
export function productColumns(basis: Basis): Float64Array<ArrayBuffer>[] {
  const rowCount = basis.columns[0]!.length;
  const columns = Array.from({ length: productCount(basis.columns.length) }, () => new Float64Array(rowCount));
  visitBasis(basis, (block) => {
    const space = arena.numbers(spaceFor(basis.columns.length));
    multiplyColumns(space, block, { size: basis.columns.length, products: 0, scale: rowCount });
    columns.forEach((column, index) => {
      const start = index * basisBlockRows;
      column.set(space.subarray(start, start + block.rows), block.first);
    });
  });
  return columns;
}

/**
 * The cross-products of the columns [q_a q_b | y], from the distinct fourth moments alone: with 21 columns 10,626 of
 * them instead of the 26,796 entries of the matrix.
 * @param basis - n rows, k columns.
 * @param y - n values.
 * @returns (k (k + 1) / 2 + 1) squared, y last.
 */
export function productMoments(basis: Basis, y: Float64Array): SquareMatrix {
  const size = basis.columns.length;
  const count = productCount(size);
  const moments = new Float64Array(momentStart(size, size) + count + 1);
  const products = moments.length + (moments.length % 2);
  visitBasis(basis, (block) => {
    const space = arena.numbers(products + spaceFor(size));
    space.set(moments);
    multiplyColumns(space, block, { size, products, scale: y.length });
    place(y.subarray(block.first, block.first + block.rows), space, products + count * basisBlockRows);
    addMoments({ size, products, rows: block.rows });
    moments.set(space.subarray(0, moments.length));
  });
  return assembled(moments, size);
}

/** A column a product, one for y and, while they are formed, the block of the basis. */
const spaceFor = (size: number): number => (productCount(size) + 1 + size) * basisBlockRows;

interface ProductBlock {
  readonly size: number;
  /** Where the products stand in the arena. */
  readonly products: number;
}

/** Entries of Q are of the size 1 / sqrt(n): each product is multiplied by n. */
function multiplyColumns(
  space: Float64Array,
  { values, rows }: BasisBlock,
  { size, products, scale }: ProductBlock & { readonly scale: number },
): void {
  const factors = products + (productCount(size) + 1) * basisBlockRows;
  const root = Math.sqrt(scale);
  for (let a = 0; a < size; a++) {
    const start = a * basisBlockRows;
    place(
      values.subarray(start, start + rows).map((value) => value * root),
      space,
      factors + start,
    );
  }
  for (let b = 0; b < size; b++) {
    for (let a = 0; a <= b; a++) {
      const [x, y] = [factors + a * basisBlockRows, factors + b * basisBlockRows];
      arena.kernels.multiply({ x, y, product: products + productIndex(a, b) * basisBlockRows, rows });
    }
  }
}

/** Where the moments with third index c begin: those of (a, b) against (c, d), d by d, and (a, b) within each. */
function momentStart(size: number, c: number): number {
  let start = 0;
  for (let i = 0; i < c; i++) start += productCount(i + 1) * (size - i);
  return start;
}

/** Moments of four indices a <= b <= c <= d: the products (a, b) against the products (c, d), two of these at a time. */
function addMoments({ size, products, rows }: ProductBlock & { readonly rows: number }): void {
  const stride = basisBlockRows;
  const columnAt = (index: number): number => products + index * stride;
  let sums = 0;
  for (let c = 0; c < size; c++) {
    const count = productCount(c + 1);
    for (let d = c; d < size; d += 2) {
      const right = columnAt(productIndex(c, d));
      const next = d + 1 < size ? columnAt(productIndex(c, d + 1)) : right;
      arena.kernels.addProducts({ left: products, count, right, next, rows, stride, sums, nextSums: sums + count });
      sums += next === right ? count : 2 * count;
    }
  }
  const y = columnAt(productCount(size));
  const count = productCount(size) + 1;
  arena.kernels.addProducts({ left: products, count, right: y, next: y, rows, stride, sums, nextSums: sums });
}

function assembled(moments: Float64Array, columns: number): SquareMatrix {
  const count = productCount(columns);
  const size = count + 1;
  const values = new Float64Array(size * size);
  const starts = Array.from({ length: columns }, (_, c) => momentStart(columns, c));
  const pairs = Array.from({ length: columns }, (_, b) =>
    Array.from({ length: b + 1 }, (__, a) => [a, b] as const),
  ).flat();
  pairs.forEach((one, i) => {
    pairs.slice(0, i + 1).forEach((other, j) => {
      const [a, b, c, d] = [...one, ...other].sort((x, y) => x - y) as [number, number, number, number];
      const entry = starts[c]! + (d - c) * productCount(c + 1) + productIndex(a, b);
      values[i * size + j] = values[j * size + i] = moments[entry]!;
    });
  });
  const withY = moments.subarray(moments.length - size);
  withY.forEach((value, i) => (values[i * size + count] = values[count * size + i] = value));
  return { size, values };
}
