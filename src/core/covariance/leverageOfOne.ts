import type { Fit } from "../fit/fit.ts";
import { solveTransposedTriangle } from "../numeric/triangle.ts";
import { rowsAbove } from "../numeric/ordering.ts";
import { timesVector } from "../numeric/smallMatrix.ts";

/** A row this close to a leverage of one fits itself: what is left of its residual is rounding. */
const nearOne = 1 - 1e-10;

/** The rows, counted from 0, that the fit passes through whatever their outcome is. */
export const selfFittingRows = ({ leverages }: Fit): readonly number[] => rowsAbove(leverages, nearOne);

/**
 * Why weights that divide by 1 - h cannot be had: the first row with a leverage of one and the term that it alone
 * determines; null where there is no such row.
 */
export function leverageOfOne(fit: Fit): string | null {
  const rows = selfFittingRows(fit);
  const first = rows[0];
  if (first === undefined) return null;
  const others = rows.length === 1 ? "" : ` (and ${rows.length - 1} more like it)`;
  const place = `row ${fit.design.sourceRows[first]! + 1} of the data${others}`;
  return `cannot be computed because ${place} alone determines the coefficient of "${termOf(fit, first)}" (its leverage is 1); HC1 is used instead.`;
}

/**
 * With h_i = 1 the unit vector of row i is X a with a = (X'X)^-1 x_i: the term that contributes most to it is the one
 * that nothing but this row determines. The constant is named only where there is no other.
 */
function termOf({ design, triangle, inverseTriangle }: Fit, row: number): string {
  const x = Float64Array.from(design.terms, ({ values }) => values[row]!);
  const weights = timesVector(inverseTriangle, solveTransposedTriangle(triangle, x));
  const shares = design.terms.map(({ name, meaning }, j) => ({
    name,
    share: meaning.kind === "constant" ? 0 : Math.abs(weights[j]! * x[j]!),
  }));
  return shares.reduce((most, term) => (term.share > most.share ? term : most)).name;
}
