import { type Basis, basisBlockRows, visitBasis } from "./basis.ts";
import type { SquareMatrix } from "./matrix.ts";

/** The row that moves a coordinate most, and by how much (with its sign). */
export interface Shift {
  readonly row: number;
  readonly shift: number;
}

/**
 * For each j the largest |(R^-1 q_i)_j w_i| over the rows i of the basis Q = X R^-1: with w_i = e_i / (1 - h_i) it is
 * what the coefficient loses when row i is left out.
 * @param inverseTriangle - R^-1, k by k.
 * @param weights - n values.
 */
export function largestShifts(basis: Basis, inverseTriangle: SquareMatrix, weights: Float64Array): Shift[] {
  const { size, values: inverse } = inverseTriangle;
  const found = Array.from({ length: size }, () => ({ row: 0, shift: 0 }));
  const moved = new Float64Array(basisBlockRows);
  visitBasis(basis, ({ values, first, rows }) => {
    found.forEach((largest, j) => {
      moved.fill(0);
      for (let l = j; l < size; l++) {
        const factor = inverse[j * size + l]!;
        const start = l * basisBlockRows;
        for (let i = 0; i < rows; i++) moved[i]! += factor * values[start + i]!;
      }
      for (let i = 0; i < rows; i++) {
        const shift = moved[i]! * weights[first + i]!;
        if (Math.abs(shift) > Math.abs(largest.shift)) Object.assign(largest, { row: first + i, shift });
      }
    });
  });
  return found;
}
