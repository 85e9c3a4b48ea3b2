import { type Basis, basisBlockRows, visitBasis } from "./basis.ts";
import { addCrossProducts } from "./crossProducts.ts";
import type { SquareMatrix } from "./matrix.ts";

/** Sums over the rows of d_i = c_i^2 / r_i, c = Q z, for one combination z of the basis. */
export interface CombinationMoments {
  /** sum of d_i^2 s_i. */
  readonly squares: number;
  /** Q'DQ, k by k. */
  readonly inside: SquareMatrix;
}

/** r and s, n values each. */
export interface RowFactors {
  readonly divisors: Float64Array;
  readonly factors: Float64Array;
}

/**
 * The moments of several combinations in one pass over the rows.
 * @param combinations - each k weights z.
 */
export function combinationMoments(
  basis: Basis,
  combinations: readonly Float64Array[],
  { divisors, factors }: RowFactors,
): CombinationMoments[] {
  const size = basis.columns.length;
  const inside = combinations.map(() => new Float64Array(size * size));
  const squares = new Float64Array(combinations.length);
  const roots = new Float64Array(basisBlockRows);
  visitBasis(basis, ({ values, first, rows }) => {
    combinations.forEach((z, l) => {
      combine(roots, { values, rows }, z);
      let sum = 0;
      for (let i = 0; i < rows; i++) {
        const d = (roots[i]! * roots[i]!) / divisors[first + i]!;
        sum += d * d * factors[first + i]!;
        roots[i] = Math.sqrt(d);
      }
      squares[l]! += sum;
      addCrossProducts(inside[l]!, { values, rows, size, factors: roots.subarray(0, rows) });
    });
  });
  return inside.map((values, l) => ({ squares: squares[l]!, inside: { size, values } }));
}

function combine(
  sums: Float64Array,
  { values, rows }: { readonly values: Float64Array; readonly rows: number },
  z: Float64Array,
): void {
  sums.fill(0);
  z.forEach((weight, j) => {
    const start = j * basisBlockRows;
    for (let i = 0; i < rows; i++) sums[i]! += weight * values[start + i]!;
  });
}
