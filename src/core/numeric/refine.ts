import { settle, type Wide } from "./wide.ts";
import type { SquareMatrix } from "./matrix.ts";
import { arena } from "./vector/arena.ts";
import { place } from "./vector/place.ts";
import { solveTransposedTriangle, solveTriangle } from "./triangle.ts";

/** Rows taken at a time. */
const blockRows = 512;

export interface Equations {
  readonly columns: readonly Float64Array[];
  readonly y: Float64Array;
  /** R of X = QR. */
  readonly triangle: SquareMatrix;
  /** The condition number of X with its columns scaled to equal length, at most a small factor off. */
  readonly condition: number;
}

export interface Refined {
  readonly coefficients: Float64Array<ArrayBuffer>;
  readonly residuals: Float64Array<ArrayBuffer>;
  readonly rss: number;
}

/** Each step shrinks the error by about machine epsilon times the condition number; three reach the limit. */
const mostSteps = 3;

/**
 * Corrects least squares coefficients by steps of the seminormal equations R'R d = X'(y - X b), the right side
 * in double-double, until nothing changes; the coefficients keep a low word meanwhile.
 * @see Bjorck (1987), Linear Algebra Appl. 88/89, 31-48.
 */
export function refine(equations: Equations, start: Float64Array): Refined {
  const { triangle, condition } = equations;
  const b: Wide = { high: Float64Array.from(start), low: new Float64Array(start.length) };
  for (let step = 0; step < mostSteps; step++) {
    const { gradient } = residualPass(equations, b, "with gradient");
    const change = solveTriangle(triangle, solveTransposedTriangle(triangle, gradient));
    change.forEach((value, j) => (b.low[j]! += value));
    settle(b);
    if (largestChange(change, b.high) * condition * Number.EPSILON * 10 < Number.EPSILON / 10) break;
  }
  const { residuals, rss } = residualPass(equations, b, "residuals");
  return { coefficients: Float64Array.from(b.high), residuals, rss };
}

/** The largest relative change; a coefficient that is nothing beside the others is measured against them. */
function largestChange(change: Float64Array, b: Float64Array): number {
  return change.reduce((most, value, j) => {
    const size = Math.abs(b[j]!);
    return value === 0 || size === 0 ? most : Math.max(most, Math.abs(value) / size);
  }, 0);
}

interface Pass {
  /** X'(y - X b); zero where it was not asked for. */
  readonly gradient: Float64Array<ArrayBuffer>;
  readonly residuals: Float64Array<ArrayBuffer>;
  readonly rss: number;
}

/** Places in the arena: y - X b in two words, the sums of two words each, and the columns. */
interface Places {
  readonly high: number;
  readonly low: number;
  readonly sums: number;
  readonly columns: number;
}

const placesFor = (count: number): Places => ({
  high: 0,
  low: blockRows,
  sums: 2 * blockRows,
  columns: 2 * blockRows + 2 * (count + 1),
});

function residualPass({ columns, y }: Equations, b: Wide, wanted: "with gradient" | "residuals"): Pass {
  const residuals = new Float64Array(y.length);
  const at = placesFor(columns.length);
  const space = arena.numbers(at.columns + columns.length * blockRows);
  space.fill(0, at.sums, at.columns);
  for (let first = 0; first < y.length; first += blockRows) {
    const last = Math.min(first + blockRows, y.length);
    place(y.subarray(first, last), space, at.high);
    columns.forEach((column, j) => {
      place(column.subarray(first, last), space, at.columns + j * blockRows);
    });
    residualsInPlace(space, at, { b, rows: last - first });
    residuals.set(space.subarray(at.high, at.high + last - first), first);
    const { high, low } = at;
    const x = (j: number): number => (wanted === "residuals" ? high : at.columns + j * blockRows);
    const count = wanted === "residuals" ? 1 : columns.length;
    for (let j = 0; j < count; j++) {
      arena.kernels.addInnerProduct({ sum: at.sums + 2 * j, x: x(j), high, low, rows: last - first });
    }
  }
  const sums = columns.map((_, j) => space[at.sums + 2 * j]! + space[at.sums + 2 * j + 1]!);
  return { gradient: Float64Array.from(sums), residuals, rss: sums[0] ?? 0 };
}

/** Takes X b from y and folds what it can of the low words into the high ones. */
function residualsInPlace(
  space: Float64Array,
  { high, low, columns }: Places,
  { b, rows }: { readonly b: Wide; readonly rows: number },
): void {
  space.fill(0, low, low + blockRows);
  b.high.forEach((factor, j) => {
    const x = columns + j * blockRows;
    arena.kernels.subtractMultiple({ high, low, x, rows, factor, factorLow: b.low[j]! });
  });
  settle({ high: space.subarray(high, high + rows), low: space.subarray(low, low + rows) });
}
