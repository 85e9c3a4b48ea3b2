import type { Fit } from "../fit/fit.ts";
import { plusCombination } from "../numeric/combination.ts";
import { leastSquares } from "../numeric/leastSquares.ts";
import { rowsOf } from "../numeric/ordering.ts";
import { columnsOf, combinedRows } from "../numeric/rowSource.ts";
import { extremes } from "../numeric/sums.ts";
import { laggedProducts, onGrid, rowsWithPredecessor } from "../numeric/timeGrid.ts";
import type { Kernel, LagRule } from "./choice.ts";
import { type Scores, plainScores, prewhitenedScores } from "./scores.ts";
import { timelineOf } from "./timeline.ts";

/** Rules that look at the scores. */
export type DataRule = Extract<LagRule, { kind: "newey-west 1994" | "andrews 1991" }>;

export const looksAtScores = (rule: LagRule): rule is DataRule => "prewhiten" in rule;

/**
 * The bandwidth, in periods, that an automatic rule finds in the scores e_t x_t of all terms but the constant, each in
 * its own units and with weight one, after prewhitening where the rule says so.
 * @returns >= 0; for Newey-West 1994 the number of lags is its whole part.
 */
export function bandwidthOf(fit: Fit, rule: DataRule): number {
  const timeline = timelineOf(fit);
  return bandwidthFrom(rule.prewhiten ? prewhitenedScores(fit, timeline) : plainScores(fit, timeline), fit, rule);
}

/** The same, from scores that stand ready. */
export function bandwidthFrom(scores: Scores, fit: Fit, rule: DataRule): number {
  switch (rule.kind) {
    case "newey-west 1994":
      return neweyWest1994(fit, scores, rule.prewhiten ? 3 : 4);
    case "andrews 1991":
      return andrews1991(fit, scores, rule.kernel);
  }
}

/**
 * 1.1447 (s1/s0)^(2/3) n^(1/3), where s_q = sum over |l| <= m of |l|^q g_l and g_l are the autocovariances of the sum of
 * the scores; m = floor(c (n/100)^(2/9)), c = 4, or 3 after prewhitening. Bartlett kernel.
 * @see Newey and West (1994), Review of Economic Studies 61, 631-653, table II.
 */
function neweyWest1994(fit: Fit, { source, positions }: Scores, c: number): number {
  const most = Math.floor(c * (fit.rowCount / 100) ** (2 / 9));
  const weights = rawWeights(fit);
  const added = weights[0]!.map((_, i) => weights.reduce((total, weight) => total + weight[i]!, 0));
  const { values } = relative(combinedRows(source, added));
  const [g0 = 0, ...others] = laggedProducts(onGrid(values, positions(most)), most);
  const s0 = others.reduce((total, g) => total + 2 * g, g0);
  const s1 = others.reduce((total, g, index) => total + 2 * (index + 1) * g, 0);
  return 1.1447 * ((s1 / s0) ** 2 * fit.rowCount) ** (1 / 3);
}

/** The optimal bandwidth's constant, and which alpha it takes (q = 1 for Bartlett, 2 for the smooth kernels). */
const andrewsConstant: Readonly<Record<Kernel, { readonly factor: number; readonly q: 1 | 2 }>> = {
  bartlett: { factor: 1.1447, q: 1 },
  parzen: { factor: 2.6614, q: 2 },
  "quadratic spectral": { factor: 1.3221, q: 2 },
};

/**
 * factor (alpha(q) n)^(1/(2q+1)), alpha(q) from first-order autoregressions, with constant, of each score.
 * @see Andrews (1991), Econometrica 59, 817-858, equations 6.2 and 6.4.
 */
function andrews1991(fit: Fit, { source, positions }: Scores, kernel: Kernel): number {
  const { factor, q } = andrewsConstant[kernel];
  const later = rowsWithPredecessor(positions(1));
  const columns = columnsOf(source);
  const zeros = new Float64Array(source.rowCount);
  const raw = rawWeights(fit).map((weight) => firstOrder(plusCombination(zeros, columns, weight), later));
  const largest = raw.reduce((most, { scale }) => Math.max(most, scale), Number.MIN_VALUE);
  // The unit that all share makes no difference, and fourth powers of it stay in range.
  const models = raw.map(({ rho, variance, scale }) => ({ rho, variance: variance * (scale / largest) ** 2 }));
  const bottom = models.reduce((sum, { rho, variance }) => sum + variance ** 2 / (1 - rho) ** 4, 0);
  const top = models.reduce((sum, { rho, variance }) => {
    const curvature = q === 1 ? (1 - rho) ** 6 * (1 + rho) ** 2 : (1 - rho) ** 8;
    return sum + (4 * rho ** 2 * variance ** 2) / curvature;
  }, 0);
  return bottom === 0 ? 0 : factor * ((top / bottom) * source.rowCount) ** (1 / (2 * q + 1));
}

interface FirstOrder {
  readonly rho: number;
  /** In squares of the scale. */
  readonly variance: number;
  /** The size of the largest score. */
  readonly scale: number;
}

/** A larger root makes the bandwidth all noise (Andrews and Monahan 1992, p. 957). */
const largestRoot = 0.97;

/** z_t = a + rho z_(t-1) + v_t over the rows whose predecessor is there. */
function firstOrder(column: Float64Array, later: Int32Array): FirstOrder {
  const { values, scale } = relative(column);
  const now = rowsOf(values, later);
  const before = rowsOf(
    values,
    later.map((row) => row - 1),
  );
  const solution = leastSquares([new Float64Array(later.length).fill(1), before], now);
  if (solution.kind === "dependent") return { rho: 0, variance: 0, scale };
  const rho = Math.max(-largestRoot, Math.min(largestRoot, solution.coefficients[1]!));
  return { rho, variance: solution.rss / later.length, scale };
}

/**
 * The scores e_t x_t of each term but the constant, in their own units, as weights of the scores in the basis:
 * x_t = R'q_t.
 */
function rawWeights({ design, triangle: { size, values } }: Fit): Float64Array[] {
  const drivers = design.terms.flatMap(({ meaning }, j) => (meaning.kind === "constant" ? [] : [j]));
  const counted = drivers.length === 0 ? [0] : drivers;
  return counted.map((j) => Float64Array.from({ length: size }, (_, i) => values[i * size + j]!));
}

/** In parts of the largest entry: no rule depends on the unit, and fourth powers stay in range. */
function relative(column: Float64Array): { readonly values: Float64Array; readonly scale: number } {
  const { least, greatest } = extremes(column);
  const scale = Math.max(greatest, -least);
  return { values: scale === 0 ? column : column.map((value) => value / scale), scale };
}
