import { outerProductSums } from "../numeric/outerProductSums.ts";
import { sumOfSquares } from "../numeric/sums.ts";

/** What one group adds to the variances of m combinations of the coefficients. */
export interface GroupShare {
  /** Row l is t_g = Q_g'A_g c_g of combination l, m by k. */
  readonly seen: Float64Array;
  /** a_g = |A_g c_g|^2, m values. */
  readonly lengths: Float64Array;
}

/** Gathers what Satterthwaite's degrees of freedom need, group by group. */
export interface SatterthwaiteSums {
  readonly add: (share: GroupShare) => void;
  readonly degreesOfFreedom: () => Float64Array<ArrayBuffer>;
}

/**
 * Satterthwaite's degrees of freedom of the CR2 variance of combinations of the coefficients under equal, uncorrelated
 * errors: (sum of p_g'p_g)^2 / (sum over g, h of (p_g'p_h)^2), p_g the vector with variance = sum of (p_g'e)^2. With
 * c_g = Q_g z the group's part of a combination's weights, t_g = Q_g'A_g c_g and a_g = |A_g c_g|^2:
 * p_g'p_g = a_g - |t_g|^2 and p_g'p_h = -t_g't_h, so that only k by k sums are kept.
 * @see Bell and McCaffrey (2002), Survey Methodology 28, 169-181; Imbens and Kolesar (2016), Rev. Econ. Stat. 98, 701-712.
 */
export function satterthwaite(combinations: number, size: number): SatterthwaiteSums {
  const traces = new Float64Array(combinations);
  /** What the terms with g = h have beyond (t_g't_g)^2. */
  const own = new Float64Array(combinations);
  const cross = outerProductSums(combinations, size);
  return {
    add: ({ seen, lengths }) => {
      cross.add(seen);
      for (let l = 0; l < combinations; l++) {
        let t = 0;
        for (let j = l * size; j < (l + 1) * size; j++) t += seen[j]! * seen[j]!;
        const length = lengths[l]! - t;
        traces[l]! += length;
        own[l]! += length * length - t * t;
      }
    },
    degreesOfFreedom: () =>
      Float64Array.from(cross.sums(), ({ values }, l) => degreesFrom(traces[l]!, own[l]! + sumOfSquares(values))),
  };
}

/** A combination that one group alone determines leaves nothing to count: the fewest there can be, one. */
const degreesFrom = (trace: number, squares: number): number =>
  trace ** 2 > 0 && squares > 0 ? Math.max(1, trace ** 2 / squares) : 1;
