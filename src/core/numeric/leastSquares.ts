import type { SquareMatrix } from "./matrix.ts";
import { refine } from "./refine.ts";
import { sharpen } from "./sharpen.ts";
import { columnLengths, invertTriangle, leading, solveTriangle } from "./triangle.ts";
import { triangularFactor } from "./triangularFactor.ts";

/** The least squares solution of y on the columns X. */
export interface Solution {
  readonly kind: "solved";
  readonly coefficients: Float64Array<ArrayBuffer>;
  readonly residuals: Float64Array<ArrayBuffer>;
  /** R of X = QR. */
  readonly triangle: SquareMatrix;
  readonly inverseTriangle: SquareMatrix;
  readonly rss: number;
  /** The condition number of X with its columns scaled to equal length, at most a factor sqrt(k) too large. */
  readonly condition: number;
}

/** The first column that those before it make up, and how: x_column = sum of coefficient x_other. */
export interface Dependency {
  readonly kind: "dependent";
  readonly column: number;
  readonly madeOf: readonly { readonly column: number; readonly coefficient: number }[];
}

/**
 * A column whose part outside the earlier ones is below this share of its length says nothing new. Exact combinations
 * leave 1e-14, the worst of the published ill-conditioned problems 5e-8.
 */
export const dependenceTolerance = 1e-11;

/** From this condition number on the rounding of R alone would reach the tenth digit of a standard error. */
const sharpenFrom = 1e5;

/**
 * Least squares by Householder QR of [X | y] and refinement in double-double: the coefficients are those of the
 * doubles as given, to the last digit but one, up to condition numbers of about 1e14.
 * @param columns - k columns of n >= k rows; entries below 1e145 in size.
 * @param y - n values.
 */
export function leastSquares(columns: readonly Float64Array[], y: Float64Array): Solution | Dependency {
  const factor = triangularFactor([...columns, y]);
  const rough = leading(factor, columns.length);
  const dependent = firstDependency(rough);
  if (dependent !== null) return dependent;
  const condition = conditionOf(rough);
  const triangle = condition > sharpenFrom ? sharpen(columns, rough) : rough;
  const start = solveTriangle(rough, lastColumn(factor));
  return {
    kind: "solved",
    ...refine({ columns, y, triangle, condition }, start),
    triangle,
    inverseTriangle: invertTriangle(triangle),
    condition,
  };
}

const lastColumn = ({ size, values }: SquareMatrix): Float64Array =>
  Float64Array.from({ length: size - 1 }, (_, i) => values[i * size + size - 1]!);

function firstDependency(triangle: SquareMatrix): Dependency | null {
  const { size, values } = triangle;
  const lengths = columnLengths(triangle);
  const column = lengths.findIndex((length, j) => Math.abs(values[j * size + j]!) <= dependenceTolerance * length);
  if (column < 0) return null;
  const right = Float64Array.from({ length: column }, (_, i) => values[i * size + column]!);
  const weights = solveTriangle(leading(triangle, column), right);
  const madeOf = [...weights]
    .map((coefficient, j) => ({ column: j, coefficient }))
    .filter((part) => Math.abs(part.coefficient) * lengths[part.column]! > partTolerance * lengths[column]!);
  return { kind: "dependent", column, madeOf };
}

/** Smaller parts of a dependent column are rounding. */
const partTolerance = 1e-9;

/** The condition number in the Frobenius norm of the triangle with columns of length one. */
function conditionOf(triangle: SquareMatrix): number {
  const { size, values: inverse } = invertTriangle(triangle);
  const lengths = columnLengths(triangle);
  const square = inverse.reduce((sum, value, index) => sum + (value * lengths[Math.floor(index / size)]!) ** 2, 0);
  return Math.sqrt(size * square);
}
