import type { Fit } from "../fit/fit.ts";
import type { ResidualPoints } from "./answer.ts";
import type { RowPlaces } from "./rowPlaces.ts";

/** More points than this make a picture slower, not clearer. */
const mostPoints = 2000;

/** Fitted values and residuals for the pictures, every so-many-th row where there are too many. */
export function residualPoints({ design, residuals, rowCount }: Fit, places: RowPlaces): ResidualPoints {
  const step = Math.ceil(rowCount / mostPoints);
  const picked = Array.from({ length: Math.ceil(rowCount / step) }, (_, index) => index * step);
  const { values } = design.outcome;
  const { order } = design;
  return {
    fitted: picked.map((row) => values[row]! - residuals[row]!),
    residuals: picked.map((row) => residuals[row]!),
    rows: picked.map(places.number),
    periods: order.kind === "time" ? picked.map((row) => order.positions[row]! + 1) : null,
    thinned: step > 1,
  };
}
