import { type Moved, packedLength } from "./runningMoments.ts";

/** Which columns of some moments are regressed on which; columns count from 1, the constant is column 0. */
export interface MomentModel {
  readonly outcome: number;
  readonly drivers: readonly number[];
  readonly constant: boolean;
}

/**
 * What moments tell of a regression, in the units of the columns as given. One object serves all solutions of a solver:
 * a search looks at millions of them and keeps none.
 */
export interface MomentSolution {
  rows: number;
  /** The constant's, 0 where there is none. */
  constant: number;
  /** One slope a driver, in the order of the model. */
  readonly slopes: Float64Array;
  /** The size of what was added up to the constant: its rounding is a share of this. */
  constantScale: number;
  rss: number;
  /** About the mean with a constant, about zero without. */
  tss: number;
  /** (X'X)^-1 at each driver. */
  readonly breads: Float64Array;
}

export interface MomentSolver {
  /** @returns null where columns depend on one another or rows are too few. */
  readonly solve: (moments: Float64Array, of: Moved, model: MomentModel) => MomentSolution | null;
  /** Fills in the breads of the solution just found. */
  readonly fillBreads: () => void;
}

/** A pivot below this share of its diagonal is a dependent column, as far as moments can tell. */
const dependentPivot = 1e-11;

/**
 * Regressions from packed moments by Cholesky: a sieve, good to some seven digits of well-conditioned columns. What it
 * lets through is fitted by `leastSquares`.
 * @param most - the most columns of any model, constant and outcome included.
 */
export function momentSolver(most: number): MomentSolver {
  const work: Work = {
    lower: new Float64Array(most * most),
    weights: new Float64Array(most),
    columns: new Int32Array(most),
    scales: new Float64Array(most),
    count: 0,
    most,
  };
  const solution: MomentSolution = {
    rows: 0,
    constant: 0,
    slopes: new Float64Array(most),
    constantScale: 0,
    rss: 0,
    tss: 0,
    breads: new Float64Array(most),
  };
  let withConstant = false;
  return {
    solve: (moments, of, model) => {
      withConstant = model.constant;
      select(work, model);
      if (!(moments[0]! > work.count - 1)) return null;
      fillLower(work, moments, model.constant ? null : of);
      return factored(work) ? solved(work, of, { moments, model, solution }) : null;
    },
    fillBreads: () => fillBreads(work, solution, withConstant ? 1 : 0),
  };
}

interface Work {
  /** Row by row, `most` wide: first the moments, then their Cholesky factor. */
  readonly lower: Float64Array;
  readonly weights: Float64Array;
  /** The columns in the order they are solved in, the outcome last. */
  readonly columns: Int32Array;
  readonly scales: Float64Array;
  count: number;
  readonly most: number;
}

function select(work: Work, { outcome, drivers, constant }: MomentModel): void {
  let count = 0;
  if (constant) work.columns[count++] = 0;
  for (const driver of drivers) work.columns[count++] = driver;
  work.columns[count++] = outcome;
  work.count = count;
}

const entryOf = (i: number, j: number): number => (i >= j ? packedLength(i) + j : packedLength(j) + i);

/** @param about - the moves to undo where the model has no constant, which would take them up. */
function fillLower({ lower, columns, count, most }: Work, moments: Float64Array, about: Moved | null): void {
  for (let i = 0; i < count; i++) {
    for (let j = 0; j <= i; j++) {
      const [a, b] = [columns[i]!, columns[j]!];
      let product = moments[entryOf(a, b)]!;
      if (about !== null) {
        const [shiftA, shiftB] = [about.centres[a]! / about.scales[a]!, about.centres[b]! / about.scales[b]!];
        product += shiftA * moments[entryOf(b, 0)]! + shiftB * moments[entryOf(a, 0)]! + shiftA * shiftB * moments[0]!;
      }
      lower[i * most + j] = product;
    }
  }
}

/** The Cholesky factor in place; the last row belongs to the outcome and its last entry keeps the residual. */
function factored({ lower, count, most }: Work): boolean {
  for (let j = 0; j < count; j++) {
    const own = lower[j * most + j]!;
    let pivot = own;
    for (let l = 0; l < j; l++) pivot -= lower[j * most + l]! ** 2;
    if (j === count - 1) {
      lower[j * most + j] = Math.max(pivot, 0);
      return own > 0;
    }
    if (!(pivot > dependentPivot * own)) return false;
    const root = Math.sqrt(pivot);
    lower[j * most + j] = root;
    for (let i = j + 1; i < count; i++) {
      let rest = lower[i * most + j]!;
      for (let l = 0; l < j; l++) rest -= lower[i * most + l]! * lower[j * most + l]!;
      lower[i * most + j] = rest / root;
    }
  }
  return false;
}

interface Solving {
  readonly moments: Float64Array;
  readonly model: MomentModel;
  readonly solution: MomentSolution;
}

function solved(work: Work, of: Moved, { moments, model, solution }: Solving): MomentSolution {
  const { lower, weights, count, most } = work;
  const last = count - 1;
  for (let i = last - 1; i >= 0; i--) {
    let rest = lower[last * most + i]!;
    for (let l = i + 1; l < last; l++) rest -= lower[l * most + i]! * weights[l]!;
    weights[i] = rest / lower[i * most + i]!;
  }
  const scale = of.scales[model.outcome]!;
  let squares = 0;
  for (let l = model.constant ? 1 : 0; l < last; l++) squares += lower[last * most + l]! ** 2;
  solution.rows = moments[0]!;
  solution.rss = lower[last * most + last]! * scale ** 2;
  solution.tss = solution.rss + squares * scale ** 2;
  inUnits(work, of, { moments, model, solution });
  return solution;
}

function inUnits({ weights, scales }: Work, { centres, scales: units }: Moved, solving: Solving): void {
  const { model, solution } = solving;
  const first = model.constant ? 1 : 0;
  const unit = units[model.outcome]!;
  let constant = model.constant ? centres[model.outcome]! + unit * weights[0]! : 0;
  solution.constantScale = Math.abs(constant);
  for (let j = 0; j < model.drivers.length; j++) {
    const driver = model.drivers[j]!;
    const slope = (weights[first + j]! * unit) / units[driver]!;
    solution.slopes[j] = slope;
    scales[j] = units[driver]!;
    if (!model.constant) continue;
    constant -= slope * centres[driver]!;
    solution.constantScale += Math.abs(slope * centres[driver]!);
  }
  solution.constant = constant;
}

/** Each driver's entry of the inverse, by solving with the factor from its own row down. */
function fillBreads({ lower, count, most, weights, scales }: Work, { breads }: MomentSolution, first: number): void {
  const last = count - 1;
  for (let j = first; j < last; j++) {
    let square = 0;
    for (let i = j; i < last; i++) {
      let rest = i === j ? 1 : 0;
      for (let l = j; l < i; l++) rest -= lower[i * most + l]! * weights[l]!;
      weights[i] = rest / lower[i * most + i]!;
      square += weights[i]! ** 2;
    }
    breads[j - first] = square / scales[j - first]! ** 2;
  }
}
