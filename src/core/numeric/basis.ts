import type { SquareMatrix } from "./matrix.ts";
import { arena } from "./vector/arena.ts";
import { place } from "./vector/place.ts";

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
export function fillBasis({ columns, triangle }: Basis, block: BasisBlock): void {
  const { values, first, rows } = block;
  const { size } = triangle;
  const start = size * size + (size % 2);
  const space = arena.numbers(start + size * basisBlockRows);
  space.set(triangle.values);
  columns.forEach((column, j) => {
    place(column.subarray(first, first + rows), space, start + j * basisBlockRows);
  });
  arena.kernels.substitute({ triangle: 0, block: start, size, rows, stride: basisBlockRows });
  values.set(space.subarray(start, start + size * basisBlockRows));
}
