import { type Basis, basisBlockRows, visitBasis } from "./basis.ts";
import type { SquareMatrix } from "./matrix.ts";

/**
 * The products q_a q_b, a <= b, of the columns of an orthonormal basis whose first column is the constant span the
 * squares and cross-products of its columns. They are numbered by their larger index: (0,0), (0,1), (1,1), (0,2), ...
 */
export const productCount = (columns: number): number => (columns * (columns + 1)) / 2;

const productIndex = (a: number, b: number): number => (b * (b + 1)) / 2 + a;

/** The products as columns of n values, for designs small enough to hold them. */
export function productColumns(basis: Basis): Float64Array<ArrayBuffer>[] {
  const size = basis.columns.length;
  const rowCount = basis.columns[0]!.length;
  const columns = Array.from({ length: productCount(size) }, () => new Float64Array(rowCount));
  const block = blockOf(size);
  visitBasis(basis, ({ values, first, rows }) => {
    multiplyColumns(values, { ...block, rows, scale: rowCount });
    columns.forEach((column, index) => {
      const start = index * basisBlockRows;
      column.set(block.products.subarray(start, start + rows), first);
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
  const block = blockOf(size);
  const fourth = Array.from({ length: size }, (_, c) => new Float64Array(productCount(c + 1) * (size - c)));
  const withY = new Float64Array(count + 1);
  visitBasis(basis, ({ values, first, rows }) => {
    multiplyColumns(values, { ...block, rows, scale: y.length });
    block.products.set(y.subarray(first, first + rows), count * basisBlockRows);
    for (let c = 0; c < size; c++) addFourthMoments(fourth[c]!, { ...block, rows, c });
    for (let i = 0; i <= count; i++) withY[i]! += columnProduct(block.products, { i, j: count, rows });
  });
  return assembled(fourth, withY);
}

interface ProductBlock {
  readonly size: number;
  /** One column of basisBlockRows a product, and one more for y. */
  readonly products: Float64Array;
}

const blockOf = (size: number): ProductBlock => ({
  size,
  products: new Float64Array((productCount(size) + 1) * basisBlockRows),
});

/** Entries of Q are of the size 1 / sqrt(n): each product is multiplied by n. */
function multiplyColumns(
  values: Float64Array,
  { size, products, rows, scale }: ProductBlock & { readonly rows: number; readonly scale: number },
): void {
  for (let b = 0; b < size; b++) {
    for (let a = 0; a <= b; a++) {
      const [left, right, to] = [a * basisBlockRows, b * basisBlockRows, productIndex(a, b) * basisBlockRows];
      for (let i = 0; i < rows; i++) products[to + i] = values[left + i]! * values[right + i]! * scale;
    }
  }
}

interface Pass extends ProductBlock {
  readonly rows: number;
  readonly c: number;
}

/** Moments of four indices a <= b <= c <= d: the products (a, b) against the products (c, d), two against two at a time. */
function addFourthMoments(moments: Float64Array, pass: Pass): void {
  const { size, c } = pass;
  const left = productCount(c + 1);
  for (let d = c; d < size; d += 2) {
    const paired = d + 1 < size;
    const right = productIndex(c, d) * basisBlockRows;
    const next = paired ? productIndex(c, d + 1) * basisBlockRows : right;
    addAgainstTwo(moments, pass, { left, right, next, entry: (d - c) * left, paired });
  }
}

/** Two columns on the right, against which all on the left are taken. */
interface Right {
  readonly left: number;
  readonly right: number;
  readonly next: number;
  readonly entry: number;
  readonly paired: boolean;
}

function addAgainstTwo(
  moments: Float64Array,
  { products, rows }: Pass,
  { left, right, next, entry, paired }: Right,
): void {
  for (let l = 0; l < left; l += 2) {
    const x0 = l * basisBlockRows;
    const x1 = l + 1 < left ? x0 + basisBlockRows : x0;
    let s00 = 0;
    let s10 = 0;
    let s01 = 0;
    let s11 = 0;
    for (let i = 0; i < rows; i++) {
      const p0 = products[x0 + i]!;
      const p1 = products[x1 + i]!;
      const r0 = products[right + i]!;
      const r1 = products[next + i]!;
      s00 += p0 * r0;
      s10 += p1 * r0;
      s01 += p0 * r1;
      s11 += p1 * r1;
    }
    moments[entry + l]! += s00;
    if (paired) moments[entry + left + l]! += s01;
    if (x1 === x0) continue;
    moments[entry + l + 1]! += s10;
    if (paired) moments[entry + left + l + 1]! += s11;
  }
}

function columnProduct(products: Float64Array, { i, j, rows }: { i: number; j: number; rows: number }): number {
  const [left, right] = [i * basisBlockRows, j * basisBlockRows];
  let sum = 0;
  for (let t = 0; t < rows; t++) sum += products[left + t]! * products[right + t]!;
  return sum;
}

function assembled(fourth: readonly Float64Array[], withY: Float64Array): SquareMatrix {
  const columns = fourth.length;
  const size = withY.length;
  const values = new Float64Array(size * size);
  const pairs = Array.from({ length: columns }, (_, b) =>
    Array.from({ length: b + 1 }, (__, a) => [a, b] as const),
  ).flat();
  pairs.forEach((one, i) => {
    pairs.slice(0, i + 1).forEach((other, j) => {
      const [a, b, c, d] = [...one, ...other].sort((x, y) => x - y) as [number, number, number, number];
      const entry = (d - c) * productCount(c + 1) + productIndex(a, b);
      values[i * size + j] = values[j * size + i] = fourth[c]![entry]!;
    });
  });
  withY.forEach((value, i) => (values[i * size + size - 1] = values[(size - 1) * size + i] = value));
  return { size, values };
}
