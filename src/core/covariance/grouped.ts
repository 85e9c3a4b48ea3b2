import type { RowOrder } from "../design/design.ts";
import type { Fit } from "../fit/fit.ts";
import { addScore, visitGroups } from "../numeric/groupParts.ts";
import type { SquareMatrix } from "../numeric/matrix.ts";
import { ascendingRows, inOrder, isAscending, pairNumbers } from "../numeric/ordering.ts";
import { type RowSource, basisRows } from "../numeric/rowSource.ts";
import { addOuterProduct, plus, scaled, symmetricFunction } from "../numeric/smallMatrix.ts";
import { symmetricEigenvalues } from "../numeric/symmetricEigenvalues.ts";
import { adjustingGroups } from "./adjustedGroup.ts";
import { basisOf } from "./basisOf.ts";
import { type BasisWeights, eachCoefficient } from "./basisWeights.ts";
import type { Covariance, GroupedVersion } from "./choice.ts";
import { memory } from "./memory.ts";
import { fromMeat } from "./sandwich.ts";
import { satterthwaite } from "./satterthwaite.ts";

type Groups = Extract<RowOrder, { kind: "groups" }>;

/**
 * The cluster-robust covariance A (sum over groups of s_g s_g') A, A = (X'X)^-1, s_g = X_g' W_g e_g: right under any
 * spread and any correlation within groups, as the number of groups G grows. CR0: W = I; CR1: the whole times
 * G/(G-1) (n-1)/(n-k); CR2: W_g = (I - H_gg)^(-1/2), the symmetric root, zero along directions that the group alone
 * determines. With a second grouping V_1 + V_2 - V_12, each with its own factor.
 * @param fit - least squares fit of n rows on k columns.
 * @returns k by k, in the units of b b'; degrees of freedom G - 1 (of the smaller G with two groupings), for CR2 with one
 *   grouping those of Satterthwaite under equal and uncorrelated errors. A difference that comes out indefinite has its
 *   negative eigenvalues set to zero, as `used` says.
 * @see Liang and Zeger (1986), Biometrika 73, 13-22; Bell and McCaffrey (2002), Survey Methodology 28, 169-181;
 *   Cameron, Gelbach and Miller (2011), J. Business Econ. Stat. 29, 238-249; Imbens and Kolesar (2016), Rev. Econ. Stat.
 *   98, 701-712; Pustejovsky and Tipton (2018), J. Business Econ. Stat. 36, 672-683.
 */
export function groupedCovariance(
  fit: Fit,
  { version, order }: { readonly version: GroupedVersion; readonly order: Groups },
): Covariance {
  const choice = { kind: "grouped", version } as const;
  const first = oneWay(fit, version, { way: "first", groups: () => order.groups });
  if (order.second === null) {
    return { ...fromMeat(fit, first.meat, { choice, used: { version } }), degreesOfFreedom: first.degreesOfFreedom };
  }
  const { groups } = order.second;
  const second = oneWay(fit, version, { way: "second", groups: () => groups });
  const both = oneWay(fit, version, { way: "both", groups: () => pairNumbers(order.groups, groups) });
  const difference = plus(plus(first.meat, second.meat), scaled(both.meat, -1));
  const { meat, fallback } = notIndefinite(difference);
  const fewer = Math.min(first.groupCount, second.groupCount) - 1;
  return {
    ...fromMeat(fit, meat, { choice, used: { version, fallback } }),
    degreesOfFreedom: new Float64Array(fit.columnCount).fill(fewer),
  };
}

/** Satterthwaite's degrees of freedom of combinations of the coefficients under CR2 with one grouping. */
export const adjustedDegrees = (fit: Fit, groups: Int32Array, weights: BasisWeights): Float64Array<ArrayBuffer> =>
  adjustedSums(fit, groups, weights).degreesOfFreedom;

interface OneWay {
  /** In the basis Q. */
  readonly meat: SquareMatrix;
  readonly groupCount: number;
  readonly degreesOfFreedom: Float64Array<ArrayBuffer>;
}

interface Grouping {
  readonly way: "first" | "second" | "both";
  readonly groups: () => Int32Array;
}

const known = memory<OneWay>();

/** One grouping, with the factor of CR1 in it. */
function oneWay(fit: Fit, version: GroupedVersion, { way, groups }: Grouping): OneWay {
  const pass = version === "CR2" ? adjustedSums : plainSums;
  const key = `${way} ${version === "CR2" ? "adjusted" : "plain"}`;
  const found = known.find(fit, key) ?? known.keep(fit, key, pass(fit, groups()));
  if (version !== "CR1") return found;
  const { rowCount: n, degreesOfFreedom } = fit;
  const factor = (found.groupCount / (found.groupCount - 1)) * ((n - 1) / degreesOfFreedom);
  return { ...found, meat: scaled(found.meat, factor) };
}

/** sum of s_g s_g', s_g = sum of e_i q_i over the group. */
function plainSums(fit: Fit, groups: Int32Array): OneWay {
  const size = fit.columnCount;
  const sums = new Float64Array(size * size);
  const score = new Float64Array(size);
  let groupCount = 0;
  const { rows, residuals, groups: inTurn } = inRuns(fit, groups);
  visitGroups(rows, inTurn, (part) => {
    addScore(score, part, residuals);
    if (!part.last) return;
    groupCount++;
    addOuterProduct(sums, score);
    score.fill(0);
  });
  const degreesOfFreedom = new Float64Array(size).fill(groupCount - 1);
  return { meat: { size, values: sums }, groupCount, degreesOfFreedom };
}

/** The same with A_g before e_g, and Satterthwaite's degrees of freedom of the combinations. */
function adjustedSums(fit: Fit, groups: Int32Array, weights = eachCoefficient(fit)): OneWay {
  const size = fit.columnCount;
  const sums = new Float64Array(size * size);
  const approximation = satterthwaite(weights.count, size);
  let groupCount = 0;
  const { rows, residuals, groups: inTurn } = inRuns(fit, groups);
  const adjust = adjustingGroups(size, residuals, weights);
  visitGroups(rows, inTurn, (part) => {
    const group = adjust(part);
    if (group === null) return;
    groupCount++;
    approximation.add(group);
    addOuterProduct(sums, group.score);
  });
  return { meat: { size, values: sums }, groupCount, degreesOfFreedom: approximation.degreesOfFreedom() };
}

interface InRuns {
  readonly rows: RowSource;
  readonly residuals: Float64Array;
  readonly groups: Int32Array;
}

/** The basis and the residuals in an order in which rows of one group stand together. */
function inRuns(fit: Fit, groups: Int32Array): InRuns {
  const { columns, triangle } = basisOf(fit);
  if (isAscending(groups)) return { rows: basisRows({ columns, triangle }), residuals: fit.residuals, groups };
  const order = ascendingRows(groups);
  const moved = columns.map((column) => inOrder(column, order));
  return {
    rows: basisRows({ columns: moved, triangle }),
    residuals: inOrder(fit.residuals, order),
    groups: order.map((row) => groups[row]!),
  };
}

/** Cameron, Gelbach and Miller (2011), p. 241: negative eigenvalues set to zero; here in the unit-free basis. */
function notIndefinite(meat: SquareMatrix): { readonly meat: SquareMatrix; readonly fallback: string | null } {
  const eigenvalues = symmetricEigenvalues(meat);
  if (eigenvalues.at(0)! >= -1e-12 * eigenvalues.at(-1)!) return { meat, fallback: null };
  return {
    meat: symmetricFunction(meat, (eigenvalue) => Math.max(0, eigenvalue)),
    fallback: "The two-way covariance came out indefinite, so its negative part was set to zero.",
  };
}
