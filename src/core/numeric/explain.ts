import type { SquareMatrix } from "./matrix.ts";
import { dependenceTolerance } from "./leastSquares.ts";
import { columnLengths } from "./triangle.ts";
import { triangularFactor } from "./triangularFactor.ts";

/** How much of y's sum of squares some columns explain. */
export interface Explained {
  readonly explained: number;
  readonly residual: number;
  /** explained + residual: about the mean or about zero. */
  readonly total: number;
  /** How many of the columns are independent; the others were passed over. */
  readonly rank: number;
}

/** About the mean: the first column must be the constant, and what it explains is left out of both sums. */
export type About = "mean" | "zero";

/**
 * An auxiliary regression of y on columns that may be dependent: only what a test statistic needs. The explained sum
 * of squares is read from Q'y, never as a difference of two large sums.
 */
export function explain(columns: readonly Float64Array[], y: Float64Array, about: About = "mean"): Explained {
  const drivers = columns.map((_, j) => j);
  return explainWithin(triangularFactor([...columns, y]), { drivers, target: columns.length, about });
}

/** Which columns of a factored matrix explain which. */
export interface Regression {
  readonly drivers: readonly number[];
  readonly target: number;
  readonly about: About;
}

/**
 * The same from the triangle of all columns at once, so that many regressions among them cost one pass over the rows.
 * @param factor - the triangle of X, columns in any order.
 */
export function explainWithin(factor: SquareMatrix, { drivers, target, about }: Regression): Explained {
  const lengths = columnLengths(factor);
  const y = columnOf(factor, target);
  const directions: Float64Array[] = [];
  let explained = 0;
  for (const driver of drivers) {
    const direction = columnOf(factor, driver);
    // Twice is enough to be orthogonal to the last digit (Kahan, in Parlett 1980).
    for (let round = 0; round < 2; round++) for (const earlier of directions) removePart(direction, earlier);
    const length = Math.hypot(...direction);
    if (length <= dependenceTolerance * lengths[driver]!) continue;
    direction.forEach((value, i) => (direction[i] = value / length));
    const part = removePart(y, direction);
    if (about === "zero" || directions.length > 0) explained += part * part;
    directions.push(direction);
  }
  const residual = y.reduce((sum, value) => sum + value * value, 0);
  return { explained, residual, total: explained + residual, rank: directions.length };
}

const columnOf = ({ size, values }: SquareMatrix, column: number): Float64Array =>
  Float64Array.from({ length: size }, (_, i) => values[i * size + column]!);

/** Takes the part along a direction of length one out of a vector and says how large it was. */
function removePart(vector: Float64Array, direction: Float64Array): number {
  let part = 0;
  for (let i = 0; i < vector.length; i++) part += vector[i]! * direction[i]!;
  for (let i = 0; i < vector.length; i++) vector[i]! -= part * direction[i]!;
  return part;
}
