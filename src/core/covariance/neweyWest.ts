import type { Fit } from "../fit/fit.ts";
import { filterColumns } from "../numeric/fourier.ts";
import type { SquareMatrix } from "../numeric/matrix.ts";
import { movingWindowProducts } from "../numeric/movingWindows.ts";
import { columnsOf } from "../numeric/rowSource.ts";
import { sandwich, scaled } from "../numeric/smallMatrix.ts";
import { innerProduct } from "../numeric/sums.ts";
import { onGrid } from "../numeric/timeGrid.ts";
import { type Result, failure, success } from "../problem/result.ts";
import { bandwidthFrom, looksAtScores } from "./bandwidth.ts";
import type { Covariance, ErrorsChoice, LagRule } from "./choice.ts";
import { lagWeights } from "./kernels.ts";
import { lagsOf, lagsWithin } from "./lags.ts";
import { memory } from "./memory.ts";
import { fromMeat } from "./sandwich.ts";
import { type Scores, plainScores, prewhitenedScores } from "./scores.ts";
import { type Timeline, timelineOf } from "./timeline.ts";

type NeweyWestChoice = Extract<ErrorsChoice, { kind: "newey-west" }>;

/**
 * Newey and West's covariance A (G_0 + sum over l = 1..L of w_l (G_l + G_l')) A, A = (X'X)^-1, G_l = sum of
 * u_t u_(t-l)' over the scores u_t = e_t x_t: right where errors follow on and spread unevenly, as n grows.
 * w_l = 1 - l/(L + 1); under Andrews's rule the kernel's weight at l / bandwidth. A period without a row has a zero score
 * and keeps its place; no lag crosses from one group into the next.
 * @param fit - least squares fit of n rows on k columns.
 * @param choice - how the lags are found, and whether the whole is multiplied by n / (n - k).
 * @returns k by k, in the units of b b', never indefinite; Problem too-many-lags where a given number is n or more.
 * @see Newey and West (1987), Econometrica 55, 703-708; Andrews (1991), Econometrica 59, 817-858; Andrews and Monahan
 *   (1992), Econometrica 60, 953-966; gaps: Parzen (1963), Sankhya A 25, 383-392; Datta and Du (2012), Fed IFDP 1060.
 */
export function neweyWestCovariance(fit: Fit, choice: NeweyWestChoice): Result<Covariance> {
  const { lags: rule, adjusted } = choice;
  const timeline = timelineOf(fit);
  if (rule.kind === "given" && rule.lags >= timeline.rows) {
    return failure({ code: "too-many-lags", lags: rule.lags, rows: timeline.rows });
  }
  const { meat, used } = known.find(fit, keyOf(rule)) ?? known.keep(fit, keyOf(rule), longRun(fit, rule, timeline));
  const factor = adjusted ? fit.rowCount / fit.degreesOfFreedom : 1;
  return success(fromMeat(fit, scaled(meat, factor), { choice, used }));
}

/** The sum over lags in the basis Q, and how it was found. */
interface LongRun {
  readonly meat: SquareMatrix;
  readonly used: Pick<Covariance["used"], "lags" | "bandwidth" | "fallback">;
}

const known = memory<LongRun>();
const keyOf = (rule: LagRule): string => JSON.stringify(Object.entries(rule).sort());

function longRun(fit: Fit, rule: LagRule, timeline: Timeline): LongRun {
  if (!looksAtScores(rule)) {
    const lags = lagsOf(fit, rule);
    const meat = bartlettMeat(plainScores(fit, timeline), lags);
    return { meat, used: { lags, bandwidth: null, fallback: null } };
  }
  const scores = rule.prewhiten ? prewhitenedScores(fit, timeline) : plainScores(fit, timeline);
  const bandwidth = bandwidthFrom(scores, fit, rule);
  const lags = lagsWithin(bandwidth, rule, timeline.span);
  const filtered =
    rule.kind === "andrews 1991"
      ? kernelMeat(scores, lagWeights(rule.kernel, bandwidth, timeline.span))
      : bartlettMeat(scores, lags);
  const meat = scores.recolouring === null ? filtered : sandwich(scores.recolouring, filtered);
  return { meat, used: { lags, bandwidth, fallback: scores.caution } };
}

const bartlettMeat = ({ source, positions }: Scores, lags: number): SquareMatrix =>
  scaled(movingWindowProducts(source, positions(lags), lags), 1 / (lags + 1));

/** sum over l of weight_|l| G_l for any kernel: each score times the others, filtered by the weights. */
function kernelMeat({ source, positions }: Scores, weights: Float64Array): SquareMatrix {
  const apart = positions(weights.length);
  const columns = columnsOf(source).map((column) => onGrid(column, apart));
  const filtered = filterColumns(columns, weights);
  const { size } = source;
  const values = new Float64Array(size * size);
  for (let i = 0; i < size; i++) {
    for (let j = 0; j <= i; j++) {
      const product = innerProduct(columns[i]!, filtered[j]!);
      values[i * size + j] = product;
      values[j * size + i] = product;
    }
  }
  return { size, values };
}
