import type { SquareMatrix } from "./matrix.ts";

/** Rows of a block: with twenty columns it stays in the first-level caches. */
export const basisBlockRows = 256;

/**
 * The orthonormal basis Q = X R^-1 of the columns X, met block by block and never stored whole. It is formed by
 * substitution, row by row as accurate as R itself.
 */
export interface Basis {
  readonly columns: readonly Float64Array[];
  /** R of X = QR. */
  readonly triangle: SquareMatrix;
}

/** Some rows of Q: entry (i, j) is values[j * basisBlockRows + i], for the rows first..first + rows - 1 of X. */
export interface BasisBlock {
  readonly values: Float64Array;
  readonly first: number;
  readonly rows: number;
}

/** Calls `visit` on each block in order; the block's values are overwritten after each call. */
export function visitBasis(basis: Basis, visit: (block: BasisBlock) => void): void {
  const rowCount = basis.columns[0]?.length ?? 0;
  const values = new Float64Array(basis.columns.length * basisBlockRows);
  for (let first = 0; first < rowCount; first += basisBlockRows) {
    const block = { values, first, rows: Math.min(basisBlockRows, rowCount - first) };
    fillBasis(basis, block);
    visit(block);
  }
}

/** Writes the rows that `block` names into its values. */
export function fillBasis({ columns, triangle: { size, values: triangle } }: Basis, block: BasisBlock): void {
  const { values, first, rows } = block;
  for (let j = 0; j < size; j++) {
    const to = j * basisBlockRows;
    values.set(columns[j]!.subarray(first, first + rows), to);
    let i = 0;
    for (; i + 3 < j; i += 4)
      subtractFour(block, to, { from: i * basisBlockRows, triangle, entry: i * size + j, size });
    for (; i < j; i++) subtractOne(block, to, { from: i * basisBlockRows, factor: triangle[i * size + j]! });
    const divisor = triangle[j * size + j]!;
    for (let t = to; t < to + rows; t++) values[t]! /= divisor;
  }
}

function subtractOne(
  { values, rows }: BasisBlock,
  to: number,
  { from, factor }: { from: number; factor: number },
): void {
  for (let t = 0; t < rows; t++) values[to + t]! -= factor * values[from + t]!;
}

interface FourEntries {
  readonly from: number;
  readonly triangle: Float64Array;
  readonly entry: number;
  readonly size: number;
}

function subtractFour({ values, rows }: BasisBlock, to: number, { from, triangle, entry, size }: FourEntries): void {
  const r0 = triangle[entry]!;
  const r1 = triangle[entry + size]!;
  const r2 = triangle[entry + 2 * size]!;
  const r3 = triangle[entry + 3 * size]!;
  const q1 = from + basisBlockRows;
  const q2 = q1 + basisBlockRows;
  const q3 = q2 + basisBlockRows;
  for (let t = 0; t < rows; t++) {
    values[to + t]! -= r0 * values[from + t]! + r1 * values[q1 + t]! + r2 * values[q2 + t]! + r3 * values[q3 + t]!;
  }
}
