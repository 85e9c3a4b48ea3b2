import type { SquareMatrix } from "../numeric/matrix.ts";
import { addOuterProduct, multiply } from "../numeric/smallMatrix.ts";

/** Gathers what Satterthwaite's degrees of freedom need, group by group. */
export interface SatterthwaiteSums {
  /** Adds a group with Q_g'Q_g and the k by k form B_g of its adjustment, so that A_g Q_g = Q_g B_g. */
  readonly add: (within: SquareMatrix, adjustment: SquareMatrix) => void;
  readonly degreesOfFreedom: () => Float64Array<ArrayBuffer>;
}

/**
 * Satterthwaite's degrees of freedom of each coefficient's CR2 variance under equal, uncorrelated errors:
 * (sum of p_g'p_g)^2 / (sum over g, h of (p_g'p_h)^2), p_g the vector with variance = sum of (p_g'e)^2. With
 * c_g = Q_g z the group's part of the coefficient's weights, t_g = Q_g'A_g c_g and a_g = |A_g c_g|^2:
 * p_g'p_g = a_g - |t_g|^2 and p_g'p_h = -t_g't_h, so that only k by k sums are kept.
 * @param inverseTriangle - R^-1, whose row l is z for coefficient l.
 * @see Bell and McCaffrey (2002), Survey Methodology 28, 169-181; Imbens and Kolesar (2016), Rev. Econ. Stat. 98, 701-712.
 */
export function satterthwaite(inverseTriangle: SquareMatrix): SatterthwaiteSums {
  const { size } = inverseTriangle;
  const sums = Array.from({ length: size }, () => ({ trace: 0, own: 0, cross: new Float64Array(size * size) }));
  return {
    add: (within, adjustment) => {
      // Row l of these is (B_g z)' and t_g' of coefficient l.
      const adjusted = multiply(inverseTriangle, adjustment);
      const seen = multiply(adjusted, within);
      sums.forEach((sum, l) => addGroup(sum, rowOf(adjusted, l), rowOf(seen, l)));
    },
    degreesOfFreedom: () => Float64Array.from(sums, degreesFrom),
  };
}

interface Sums {
  trace: number;
  /** What the terms with g = h have beyond (t_g't_g)^2. */
  own: number;
  /** sum of t_g t_g'. */
  readonly cross: Float64Array;
}

function addGroup(sum: Sums, weights: Float64Array, seen: Float64Array): void {
  const a = innerProduct(weights, seen);
  const t = innerProduct(seen, seen);
  sum.trace += a - t;
  sum.own += (a - t) ** 2 - t ** 2;
  addOuterProduct(sum.cross, seen);
}

/** A coefficient that one group alone determines leaves nothing to count: the fewest there can be, one. */
function degreesFrom({ trace, own, cross }: Sums): number {
  const squares = own + innerProduct(cross, cross);
  return trace ** 2 > 0 && squares > 0 ? Math.max(1, trace ** 2 / squares) : 1;
}

const innerProduct = (x: Float64Array, y: Float64Array): number => x.reduce((sum, value, i) => sum + value * y[i]!, 0);

const rowOf = ({ size, values }: SquareMatrix, row: number): Float64Array =>
  values.subarray(row * size, (row + 1) * size);
