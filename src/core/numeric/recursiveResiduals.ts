import { extremes } from "./sums.ts";
import { arena } from "./vector/arena.ts";

/** A pivot below this share of its column's largest value is rounding left over from the rotations, not a new direction. */
const dependent = 1e-11;

export interface Regression {
  /** k columns of n values. */
  readonly columns: readonly Float64Array[];
  readonly outcome: Float64Array;
}

export interface RecursiveResiduals {
  /**
   * w_t = (y_t - x_t' b_(t-1)) / sqrt(1 + x_t' (X'X)_(t-1)^-1 x_t), one a row; 0 where the row raised the
   * rank, since no earlier row says anything about its new direction.
   */
  readonly residuals: Float64Array<ArrayBuffer>;
  /** The rank of the rows so far, this one included. */
  readonly ranks: Int32Array<ArrayBuffer>;
}

/**
 * Recursive residuals from rotating one row after the other into the triangle. The sum of their squares up to a row is
 * the residual sum of squares of the regression on the rows so far.
 * @param walk - "forwards" from the first row, "backwards" from the last; the results stand in row order either way.
 * @see Gentleman (1974), Applied Statistics 23, 448-454; Brown, Durbin and Evans (1975), J. Royal Stat. Society B 37, 149-192.
 */
export function recursiveResiduals(regression: Regression, walk: "forwards" | "backwards"): RecursiveResiduals {
  const { columns, outcome } = regression;
  const n = outcome.length;
  const k = columns.length;
  const residuals = new Float64Array(n);
  const ranks = new Int32Array(n);
  const at = placesFor(k);
  const space = arena.numbers(at.raised + blockRows);
  space.fill(0, at.triangle, at.floors);
  columns.forEach((column, j) => (space[at.floors + j] = dependent * largest(column)));
  let rank = 0;
  for (let step = 0; step < n; step += blockRows) {
    const rows = Math.min(blockRows, n - step);
    const rowAt = (i: number): number => (walk === "forwards" ? step + i : n - 1 - step - i);
    for (let i = 0; i < rows; i++) placeRow(regression, rowAt(i), space.subarray(at.block + i * (k + 1)));
    arena.kernels.rotateRows({ ...at, size: k, rows });
    for (let i = 0; i < rows; i++) {
      if (space[at.raised + i] === 1) rank += 1;
      else residuals[rowAt(i)] = space[at.block + i * (k + 1) + k]!;
      ranks[rowAt(i)] = rank;
    }
  }
  return { residuals, ranks };
}

/** Rows rotated at a time. */
const blockRows = 256;

const placesFor = (k: number) => {
  const floors = k * (k + 1);
  const block = floors + k;
  return { triangle: 0, floors, block, raised: block + blockRows * (k + 1) };
};

function largest(column: Float64Array): number {
  const { least, greatest } = extremes(column);
  return Math.max(greatest, -least);
}

/** The numbers of one row, its outcome last. */
function placeRow({ columns, outcome }: Regression, row: number, to: Float64Array): void {
  for (let j = 0; j < columns.length; j++) to[j] = columns[j]![row]!;
  to[columns.length] = outcome[row]!;
}
