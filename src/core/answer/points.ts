import type { Fit } from "../fit/fit.ts";
import { rowNumberOf } from "../table/place.ts";
import type { Source } from "../table/source.ts";
import type { ResidualPoints } from "./answer.ts";

/** More points than this make a picture slower, not clearer. */
const mostPoints = 2000;

/** Fitted values and residuals for the pictures, every so-many-th row where there are too many. */
export function residualPoints({ design, residuals, rowCount }: Fit, source: Source): ResidualPoints {
  const step = Math.ceil(rowCount / mostPoints);
  const picked = Array.from({ length: Math.ceil(rowCount / step) }, (_, index) => index * step);
  const place = source.columns.find(({ name }) => name === design.outcome.column)?.place;
  const { values } = design.outcome;
  return {
    fitted: picked.map((row) => values[row]! - residuals[row]!),
    residuals: picked.map((row) => residuals[row]!),
    rows: picked.map((row) =>
      place === undefined ? design.sourceRows[row]! + 1 : rowNumberOf(place, design.sourceRows[row]!),
    ),
    thinned: step > 1,
  };
}
