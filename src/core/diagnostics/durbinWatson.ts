import { basisOf } from "../covariance/basisOf.ts";
import type { Fit } from "../fit/fit.ts";
import { normalCdf } from "../numeric/distributions.ts";
import { earlierRows } from "../numeric/earlierRows.ts";
import { quadraticFormTail } from "../numeric/quadraticFormTail.ts";
import { basisRows, columnsOf } from "../numeric/rowSource.ts";
import { differenceMoments, residualDifferences } from "../numeric/successiveDifferences.ts";
import { symmetricEigenvalues } from "../numeric/symmetricEigenvalues.ts";
import { type Figure, type TestOutcome, computed, notApplicable } from "./outcome.ts";
import { noTime, timeLineOf } from "./timeLine.ts";

/** Up to so many rows the p-value is exact; the work grows as the cube of the rows, and the normal law is then near. */
const mostForExact = 200;

/**
 * Durbin-Watson test against errors that tend to keep the sign of the one before.
 * H0: neighbouring errors are not correlated. d = sum of (e_t - e_(t-1))^2 over neighbours in time / sum of e_t^2;
 * small values speak against H0. The p-value is that of normal errors, exact up to 200 rows and by the normal law with
 * the exact mean and variance of d above. It is blind where the outcome's own past is among the drivers.
 * @returns d in (0, 4), `form` "exact" or "normal", p one-sided against positive correlation;
 *   not-applicable where rows do not run through time or none has a neighbour.
 * @see Durbin and Watson (1950), Biometrika 37, 409-428, and (1951), 38, 159-178; Imhof (1961), Biometrika 48, 419-426.
 */
export function durbinWatson(fit: Fit): TestOutcome {
  const line = timeLineOf(fit.design.order);
  if (line === null) return notApplicable("durbin-watson", noTime);
  const linked = Uint8Array.from(earlierRows(line, 1), (row) => (row < 0 ? 0 : 1));
  if (!linked.includes(1)) return notApplicable("durbin-watson", "no row has a row one period before it");
  const statistic = sumOfSteps(fit.residuals, linked) / fit.residualSumOfSquares;
  const exact = fit.rowCount <= mostForExact;
  const figure = exact ? exactFigure(fit, linked, statistic) : normalFigure(fit, linked, statistic);
  return computed({
    test: "durbin-watson",
    form: exact ? "exact" : "normal",
    order: null,
    figure,
    fForm: null,
    details: {},
  });
}

const sumOfSteps = (residuals: Float64Array, linked: Uint8Array): number =>
  residuals.reduce((sum, u, i) => (linked[i] === 1 ? sum + (u - residuals[i - 1]!) ** 2 : sum), 0);

/** P(d < statistic) = P(sum of (statistic - v_i) z_i^2 > 0), v_i the n - k eigenvalues of A among the residuals. */
function exactFigure(fit: Fit, linked: Uint8Array, statistic: number): Figure {
  const columns = columnsOf(basisRows(basisOf(fit)));
  const descending = symmetricEigenvalues(residualDifferences(columns, linked)).toReversed();
  const weights = Float64Array.from({ length: fit.degreesOfFreedom }, (_, i) => statistic - (descending[i] ?? 0));
  return { statistic, law: "exact", df: [], pValue: Math.min(1, quadraticFormTail(weights)) };
}

function normalFigure(fit: Fit, linked: Uint8Array, statistic: number): Figure {
  const { cross, crossOfSquare, trace, traceOfSquare } = differenceMoments(basisOf(fit), linked);
  const df = fit.degreesOfFreedom;
  const first =
    trace - cross.values.reduce((sum, value, index) => (index % (cross.size + 1) === 0 ? sum + value : sum), 0);
  const second = traceOfSquare - 2 * crossOfSquare + cross.values.reduce((sum, value) => sum + value * value, 0);
  const variance = (2 * (second - first ** 2 / df)) / (df * (df + 2));
  return { statistic, law: "normal", df: [], pValue: normalCdf((statistic - first / df) / Math.sqrt(variance)) };
}
