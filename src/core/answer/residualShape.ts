import { residualCorrelations } from "../diagnostics/residualCorrelations.ts";
import type { Fit } from "../fit/fit.ts";
import { normalQuantile } from "../numeric/distributions.ts";
import type { ResidualShape } from "./answer.ts";

const usualLags = 12;
const mostLags = 40;
/** Two seasons show whether one follows on from the other. */
const seasons = 2;
/** Lags beyond a quarter of the rows rest on too few pairs (common practice, Box and Jenkins 1970). */
const shareOfRows = 4;

/** Two-sided 5 % of the normal: under no correlation r_l is about N(0, 1/n) (Bartlett 1946); near enough for residuals. */
const normalLimit = 1.96;

/** What the pictures of the residuals' correlations and quantiles show, from all rows. */
export function residualShape(fit: Fit): ResidualShape {
  const { design, rowCount } = fit;
  const season = design.order.kind === "time" ? design.order.period.season : 1;
  const wanted = Math.min(season > 1 ? seasons * season : usualLags, mostLags, Math.floor(rowCount / shareOfRows));
  const values = wanted < 1 ? null : residualCorrelations(fit, wanted);
  return {
    correlations: values === null ? null : { values, bound: normalLimit / Math.sqrt(rowCount) },
    quantiles: quantilesOf(fit),
  };
}

/** More points than this make the picture slower, not clearer. */
const mostPoints = 200;

/** Residuals in order, and where a normal law of the same spread would put them: ranks i at (i - 1/2) / n (Hazen 1914). */
function quantilesOf({ residuals, rowCount: n, sigma }: Fit): ResidualShape["quantiles"] {
  const sorted = Float64Array.from(residuals).sort();
  const count = Math.min(n, mostPoints);
  const ranks = Array.from({ length: count }, (_, index) => Math.round((index * (n - 1)) / Math.max(1, count - 1)));
  return {
    residuals: ranks.map((rank) => sorted[rank]!),
    normal: ranks.map((rank) => sigma * normalQuantile((rank + 0.5) / n)),
  };
}
