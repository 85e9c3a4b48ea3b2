import type { Fit } from "../fit/fit.ts";

/** The columns of an auxiliary regression about the mean: a constant first, then every other term of the fit. */
export function constantAndDrivers({ design, rowCount }: Fit): Float64Array[] {
  const drivers = design.terms.filter(({ meaning }) => meaning.kind !== "constant");
  return [new Float64Array(rowCount).fill(1), ...drivers.map(({ values }) => values)];
}

/** e^2 / (RSS / n): squared residuals of mean one, so that no unit of the outcome is too large or too small to square. */
export function relativeSquares({ residuals, residualSumOfSquares, rowCount }: Fit): Float64Array<ArrayBuffer> {
  const scale = Math.sqrt(residualSumOfSquares / rowCount);
  return residuals.map((u) => (u / scale) ** 2);
}

/** y - e, one value a row. */
export const fittedValues = ({ design, residuals }: Fit): Float64Array<ArrayBuffer> =>
  residuals.map((u, i) => design.outcome.values[i]! - u);
