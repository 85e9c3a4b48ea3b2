import type { Fit } from "../fit/fit.ts";
import { centralMoments } from "../numeric/centralMoments.ts";
import { normalCdf, normalTail } from "../numeric/distributions.ts";
import { recursiveResiduals } from "../numeric/recursiveResiduals.ts";
import { type TestOutcome, computed, notApplicable } from "./outcome.ts";
import { noTime } from "./timeLine.ts";

/**
 * CUSUM test on recursive residuals, the forecast errors of the regression on the rows before.
 * H0: the coefficients are the same throughout. With W_t the sum of the first of the m = n - k recursive residuals up to
 * a share t of them, over s sqrt m, the statistic is the largest |W_t| / (1 + 2t); s is their standard deviation about
 * their mean, so that a drift does not hide itself (Harvey's comment on the paper).
 * @returns not-applicable where rows do not run through time or fewer than two recursive residuals exist.
 * @see Brown, Durbin and Evans (1975), J. Royal Stat. Society B 37, 149-192.
 */
export function cusumRecursive({ design, residuals, rowCount, columnCount }: Fit): TestOutcome {
  if (design.order.kind !== "time") return notApplicable("cusum-recursive", noTime);
  const columns = design.terms.map(({ values }) => values);
  const found = recursiveResiduals({ columns, outcome: residuals }, "forwards");
  const errors = found.residuals.filter((_, i) => found.ranks[i] === (found.ranks[i - 1] ?? 0));
  const m = errors.length;
  if (m < 2)
    return notApplicable("cusum-recursive", `${rowCount} rows leave too few beyond the ${columnCount} coefficients`);
  const deviation = Math.sqrt((centralMoments(errors).second * m) / (m - 1));
  let sum = 0;
  const largest = errors.reduce((most, w, i) => Math.max(most, Math.abs((sum += w)) / (1 + (2 * (i + 1)) / m)), 0);
  const statistic = largest / (deviation * Math.sqrt(m));
  const figure = { statistic, law: "limit", df: [], pValue: crossingProbability(statistic) } as const;
  return computed({ test: "cusum-recursive", form: null, order: null, figure, fForm: null, details: {} });
}

/** Below this both lines are often crossed, which the formula counts twice; a straight line leads on to 1 at 0. */
const bothCrossed = 0.3;
const slopeBelow = 0.1465;

/** P(|W_t| > x (1 + 2t) for some t in (0, 1)), twice the probability of crossing the upper line. */
export function crossingProbability(x: number): number {
  if (x < bothCrossed) return 1 - slopeBelow * x;
  const around = normalCdf(x) - normalTail(5 * x);
  return 2 * (normalTail(3 * x) + Math.exp(-4 * x * x) * around - Math.exp(-16 * x * x) * normalTail(x));
}
