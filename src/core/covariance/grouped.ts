import type { RowOrder } from "../design/design.ts";
import type { Fit } from "../fit/fit.ts";
import { mirrored } from "../numeric/crossProducts.ts";
import { visitGroups } from "../numeric/groupMoments.ts";
import type { SquareMatrix } from "../numeric/matrix.ts";
import { ascendingRows, inOrder, isAscending, pairNumbers } from "../numeric/ordering.ts";
import { basisRows } from "../numeric/rowSource.ts";
import {
  addOuterProduct,
  plus,
  scaled,
  symmetricEigen,
  symmetricFunction,
  timesVector,
} from "../numeric/smallMatrix.ts";
import { basisOf } from "./basisOf.ts";
import type { Covariance, GroupedVersion } from "./choice.ts";
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
  const first = oneWay(fit, order.groups, version);
  if (order.second === null) {
    return { ...fromMeat(fit, first.meat, { choice, used: { version } }), degreesOfFreedom: first.degreesOfFreedom };
  }
  const second = oneWay(fit, order.second.groups, version);
  const both = oneWay(fit, pairNumbers(order.groups, order.second.groups), version);
  const difference = plus(plus(first.meat, second.meat), scaled(both.meat, -1));
  const { meat, fallback } = notIndefinite(difference);
  const fewer = Math.min(first.groupCount, second.groupCount) - 1;
  return {
    ...fromMeat(fit, meat, { choice, used: { version, fallback } }),
    degreesOfFreedom: new Float64Array(fit.columnCount).fill(fewer),
  };
}

interface OneWay {
  /** In the basis Q, with the factor of CR1 in it. */
  readonly meat: SquareMatrix;
  readonly groupCount: number;
  readonly degreesOfFreedom: Float64Array<ArrayBuffer>;
}

function oneWay(fit: Fit, groups: Int32Array, version: GroupedVersion): OneWay {
  const { columns, factors, runs } = inRuns(fit, groups);
  const size = fit.columnCount;
  const sums = new Float64Array(size * size);
  const approximation = satterthwaite(fit.inverseTriangle);
  let groupCount = 0;
  visitGroups(basisRows({ columns, triangle: fit.triangle }), { factors, groups: runs }, ({ score, gram }) => {
    groupCount++;
    if (version !== "CR2") {
      addOuterProduct(sums, score);
      return;
    }
    const within = mirrored(Float64Array.from(gram), size);
    const adjustment = symmetricFunction(within, inverseRootOfRest);
    approximation.add(within, adjustment);
    addOuterProduct(sums, timesVector(adjustment, score));
  });
  const { rowCount: n, degreesOfFreedom } = fit;
  const factor = version === "CR1" ? (groupCount / (groupCount - 1)) * ((n - 1) / degreesOfFreedom) : 1;
  return {
    meat: scaled({ size, values: sums }, factor),
    groupCount,
    degreesOfFreedom:
      version === "CR2" ? approximation.degreesOfFreedom() : new Float64Array(size).fill(groupCount - 1),
  };
}

/** The fit's columns and residuals in an order in which rows of one group stand together. */
function inRuns(
  fit: Fit,
  groups: Int32Array,
): { columns: readonly Float64Array[]; factors: Float64Array; runs: Int32Array } {
  const { columns } = basisOf(fit);
  if (isAscending(groups)) return { columns, factors: fit.residuals, runs: groups };
  const rows = ascendingRows(groups);
  return {
    columns: columns.map((column) => inOrder(column, rows)),
    factors: inOrder(fit.residuals, rows),
    runs: rows.map((row) => groups[row]!),
  };
}

/**
 * (1 - l)^(-1/2) for an eigenvalue l of Q_g'Q_g, which is one of H_gg too: because H_gg = Q_g Q_g', the root of
 * I - H_gg acts on X_g as this k by k function does on its coordinates. A group that alone determines a direction
 * has l = 1 there and a residual of zero.
 */
const inverseRootOfRest = (eigenvalue: number): number => (1 - eigenvalue < 1e-10 ? 0 : 1 / Math.sqrt(1 - eigenvalue));

/** Cameron, Gelbach and Miller (2011), p. 241: negative eigenvalues set to zero; here in the unit-free basis. */
function notIndefinite(meat: SquareMatrix): { readonly meat: SquareMatrix; readonly fallback: string | null } {
  const { values } = symmetricEigen(meat);
  if (values.at(0)! >= -1e-12 * values.at(-1)!) return { meat, fallback: null };
  return {
    meat: symmetricFunction(meat, (eigenvalue) => Math.max(0, eigenvalue)),
    fallback: "The two-way covariance came out indefinite, so its negative part was set to zero.",
  };
}
