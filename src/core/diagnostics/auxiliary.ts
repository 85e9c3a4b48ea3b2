import type { Fit } from "../fit/fit.ts";
import { plusCombination } from "../numeric/combination.ts";
import { extremes, mean } from "../numeric/sums.ts";

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

/** X b, one value a row; equal rows have equal values to the last bit. */
export const fittedValues = ({ design, coefficients, rowCount }: Fit): Float64Array<ArrayBuffer> =>
  plusCombination(
    new Float64Array(rowCount),
    design.terms.map(({ values }) => values),
    coefficients,
  );

/**
 * The square and cube of the fitted values. With a constant they are taken about the middle, which spans the same
 * together with the terms and keeps the columns apart.
 */
export function powersOfFitted(fit: Fit): Float64Array<ArrayBuffer>[] {
  const fitted = fittedValues(fit);
  const centre = fit.design.hasConstant ? mean(fitted) : 0;
  const { least, greatest } = extremes(fitted);
  const reach = Math.max(greatest - centre, centre - least);
  const scaled = fitted.map((value) => (reach === 0 ? 0 : (value - centre) / reach));
  return [scaled.map((value) => value ** 2), scaled.map((value) => value ** 3)];
}
