import type { Design, Term } from "../design/design.ts";
import { squaredRowLengths } from "../numeric/crossProducts.ts";
import { type Dependency, type Solution, leastSquares } from "../numeric/leastSquares.ts";
import type { SquareMatrix } from "../numeric/matrix.ts";
import { timesTransposed } from "../numeric/smallMatrix.ts";
import { mean, sumOfSquares } from "../numeric/sums.ts";
import { columnLengths } from "../numeric/triangle.ts";
import type { Problem } from "../problem/problem.ts";
import { type Result, failure, success } from "../problem/result.ts";
import type { Fit } from "./fit.ts";

/**
 * Ordinary least squares of the outcome on the design's terms: b minimises the sum of (y - X b)^2.
 * The log-likelihood is that of normal errors, -n/2 (ln(2 pi RSS/n) + 1); AIC and BIC count k + 1 parameters,
 * the error variance among them. Without a constant the total sum of squares and R^2 are about zero.
 * @param design - n rows, k terms.
 * @returns the fit; Problems too-few-rows (n < k + 1), constant-outcome,
 *   numbers-too-large (a column of nothing but tiny numbers), constant-column, dependent-columns, perfect-fit.
 * @see Akaike (1974), IEEE Trans. Automatic Control 19, 716-723; Schwarz (1978), Annals of Statistics 6, 461-464.
 */
export function fitLeastSquares(design: Design): Result<Fit> {
  const problem = unfit(design);
  if (problem !== null) return failure(problem);
  const columns = design.terms.map(({ values }) => values);
  const solution = leastSquares(columns, design.outcome.values);
  if (solution.kind === "dependent") return failure(dependentColumns(design.terms, solution));
  if (reproduces(design, solution)) return failure({ code: "perfect-fit", column: design.outcome.name });
  return success(fitFrom(design, solution));
}

/** What can be seen before anything is solved. */
function unfit({ terms, outcome, hasConstant, rowCount, leftOutCount, sourceRows }: Design): Problem | null {
  const needed = terms.length + 1;
  if (rowCount < needed) return { code: "too-few-rows", rows: rowCount, needed, leftOut: leftOutCount };
  if (!varies(outcome.values)) return { code: "constant-outcome", column: outcome.name };
  const tiny = tooSmall([{ name: outcome.name, values: outcome.values }, ...terms], sourceRows);
  if (tiny !== null) return tiny;
  const idle = terms.find(({ meaning, values }) => meaning.kind !== "constant" && !varies(values));
  return hasConstant && idle !== undefined ? { code: "constant-column", column: idle.name } : null;
}

/** A column whose largest number is smaller has squares, or the inverse of them, outside the range of doubles. */
const smallest = 1e-140;

function tooSmall(columns: readonly Pick<Term, "name" | "values">[], sourceRows: Int32Array): Problem | null {
  const column = columns.find(
    ({ values }) => values.every((value) => Math.abs(value) < smallest) && values.some((value) => value !== 0),
  );
  if (column === undefined) return null;
  const row = column.values.findIndex((value) => value !== 0);
  return {
    code: "numbers-too-large",
    column: column.name,
    cell: `row ${sourceRows[row]! + 1} of the data`,
    value: column.values[row]!,
  };
}

const varies = (values: Float64Array): boolean => values.some((value) => value !== values[0]);

const dependentColumns = (terms: readonly Term[], { column, madeOf }: Dependency): Problem => ({
  code: "dependent-columns",
  column: terms[column]!.name,
  madeOf: madeOf.map((part) => terms[part.column]!.name),
});

/**
 * Whether the residuals are no more than the rounding of cells and formulas: their root mean square is below
 * `roundingShare` of that of the largest numbers that were added up.
 */
function reproduces({ outcome }: Design, { coefficients, triangle, rss }: Solution): boolean {
  const lengths = columnLengths(triangle).map((length, j) => length * Math.abs(coefficients[j]!));
  return Math.sqrt(rss) <= roundingShare * Math.max(Math.sqrt(sumOfSquares(outcome.values)), ...lengths);
}

/** Sixteen units in the last place: a sheet keeps 15 to 17 digits, and a formula of a few terms loses one or two bits. */
const roundingShare = 16 * Number.EPSILON;

function fitFrom(design: Design, solution: Solution): Fit {
  const { coefficients, residuals, triangle, inverseTriangle, rss } = solution;
  const { rowCount, hasConstant, outcome } = design;
  const columnCount = design.terms.length;
  const degreesOfFreedom = rowCount - columnCount;
  const total = sumOfSquares(outcome.values, hasConstant ? mean(outcome.values) : 0);
  const rSquared = 1 - rss / total;
  const totalDegrees = rowCount - (hasConstant ? 1 : 0);
  return {
    design,
    rowCount,
    columnCount,
    degreesOfFreedom,
    coefficients,
    residuals,
    leverages: leveragesOf(design, triangle),
    triangle,
    inverseTriangle,
    bread: timesTransposed(inverseTriangle),
    sigma: Math.sqrt(rss / degreesOfFreedom),
    residualSumOfSquares: rss,
    totalSumOfSquares: total,
    rSquared,
    adjustedRSquared: 1 - ((1 - rSquared) * totalDegrees) / degreesOfFreedom,
    uncentred: !hasConstant,
    ...likelihood(rss, rowCount, columnCount + 1),
  };
}

/** Rounding may carry a leverage of one beyond it. */
const leveragesOf = ({ terms }: Design, triangle: SquareMatrix): Float64Array<ArrayBuffer> =>
  squaredRowLengths({ columns: terms.map(({ values }) => values), triangle }).map((h) => Math.min(1, h));

function likelihood(rss: number, n: number, parameters: number): Pick<Fit, "logLikelihood" | "aic" | "bic"> {
  const logLikelihood = (-n / 2) * (Math.log((2 * Math.PI * rss) / n) + 1);
  return {
    logLikelihood,
    aic: 2 * parameters - 2 * logLikelihood,
    bic: Math.log(n) * parameters - 2 * logLikelihood,
  };
}
