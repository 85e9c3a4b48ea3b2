import { addInnerProduct, settle, subtractMultiple, wide, type Wide } from "./doubleDouble.ts";
import type { SquareMatrix } from "./matrix.ts";
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
    settle(b, start.length);
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

function residualPass({ columns, y }: Equations, b: Wide, wanted: "with gradient" | "residuals"): Pass {
  const residuals = new Float64Array(y.length);
  const gradient = wide(columns.length);
  const squares = wide(1);
  const r = wide(blockRows);
  for (let first = 0; first < y.length; first += blockRows) {
    const last = Math.min(first + blockRows, y.length);
    r.high.set(y.subarray(first, last));
    r.low.fill(0);
    columns.forEach((column, j) =>
      subtractMultiple(r, column.subarray(first, last), { high: b.high[j]!, low: b.low[j]! }),
    );
    settle(r, last - first);
    residuals.set(r.high.subarray(0, last - first), first);
    if (wanted === "with gradient") {
      columns.forEach((column, j) => addInnerProduct(gradient, j, { x: column.subarray(first, last), r }));
    } else {
      addInnerProduct(squares, 0, { x: r.high.subarray(0, last - first), r });
    }
  }
  settle(gradient, columns.length);
  return { gradient: Float64Array.from(gradient.high), residuals, rss: squares.high[0]! + squares.low[0]! };
}
