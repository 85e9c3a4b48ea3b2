import type { Fit } from "../fit/fit.ts";
import { keepRows, takeLessEarlier } from "../numeric/lessEarlier.ts";
import type { SquareMatrix } from "../numeric/matrix.ts";
import { inOrder, rowsOf } from "../numeric/ordering.ts";
import { type RowSource, columnsOf, storedRows, weightedRows } from "../numeric/rowSource.ts";
import { identity, invert, plus, scaled, spectralRadius } from "../numeric/smallMatrix.ts";
import { rowsWithPredecessor, separated } from "../numeric/timeGrid.ts";
import { invertTriangle, leading } from "../numeric/triangle.ts";
import { triangularFactor } from "../numeric/triangularFactor.ts";
import { basisOf } from "./basisOf.ts";
import type { Timeline } from "./timeline.ts";

/** The scores e_i q_i in the orthonormal basis, or what is left of them after prewhitening. */
export interface Scores {
  readonly source: RowSource;
  /** The period of each score; groups stand further apart than `reach`. */
  readonly positions: (reach: number) => Float64Array<ArrayBuffer>;
  /** D with long-run covariance D S D', S that of the rows here; null where nothing was filtered. */
  readonly recolouring: SquareMatrix | null;
  /** A sentence where the filter had to be held back. */
  readonly caution: string | null;
}

export function plainScores(fit: Fit, { positions, groups }: Timeline): Scores {
  return {
    source: weightedRows(basisOf(fit), fit.residuals),
    positions: (reach) => separated(positions, groups, reach),
    recolouring: null,
    caution: null,
  };
}

/**
 * The residuals v_t = u_t - A u_(t-1) of a first-order vector autoregression of the scores, fitted by least squares
 * without a constant over the periods whose predecessor is there; D = (I - A)^-1 undoes the filter.
 * Should A's largest root reach 0.97, A is shrunk so that it stays there, or D would be all noise.
 * @see Andrews and Monahan (1992), Econometrica 60, 953-966.
 */
export function prewhitenedScores(fit: Fit, timeline: Timeline): Scores {
  const plain = plainScores(fit, timeline);
  const later = rowsWithPredecessor(plain.positions(1));
  const columns = columnsOf(plain.source);
  const { transition, caution } = heldBelowOne(autoregression(columns, later));
  takeLessEarlier(columns, transition);
  return {
    source: storedRows(keepRows(columns, later)),
    positions: (reach) => inOrder(plain.positions(reach), later),
    recolouring: invert(plus(identity(transition.size), scaled(transition, -1))),
    caution,
  };
}

/** A, row j holding how the j-th score follows from all scores one period before. */
function autoregression(columns: readonly Float64Array[], later: Int32Array): SquareMatrix {
  const size = columns.length;
  const before = columns.map((column) =>
    rowsOf(
      column,
      later.map((row) => row - 1),
    ),
  );
  const factor = triangularFactor([...before, ...columns.map((column) => rowsOf(column, later))]);
  const inverse = invertTriangle(leading(factor, size));
  const values = new Float64Array(size * size);
  for (let j = 0; j < size; j++) {
    for (let i = 0; i < size; i++) {
      for (let m = i; m < size; m++) {
        values[j * size + i]! += inverse.values[i * size + m]! * factor.values[m * 2 * size + size + j]!;
      }
    }
  }
  return { size, values };
}

const largestRoot = 0.97;

function heldBelowOne(transition: SquareMatrix): {
  readonly transition: SquareMatrix;
  readonly caution: string | null;
} {
  const root = spectralRadius(transition);
  if (root <= largestRoot) return { transition, caution: null };
  return {
    transition: scaled(transition, largestRoot / root),
    caution: `The scores follow on so strongly (largest root ${root.toFixed(2)}) that the prewhitening filter was held at 0.97.`,
  };
}
