import type { Fit } from "../fit/fit.ts";
import { weightedCrossProducts } from "../numeric/crossProducts.ts";
import type { SquareMatrix } from "../numeric/matrix.ts";
import { basisOf } from "./basisOf.ts";
import type { Covariance, WhiteVersion } from "./choice.ts";
import { leverageOfOne } from "./leverageOfOne.ts";
import { memory } from "./memory.ts";
import { fromMeat } from "./sandwich.ts";

/** What a weight may depend on beside the row: rows, columns and the largest leverage. */
interface Size {
  readonly n: number;
  readonly k: number;
  readonly largest: number;
}

/** The weight of a row with residual u and leverage h. */
type Weight = (u: number, h: number, size: Size) => number;

const whiteWeight: Readonly<Record<WhiteVersion, Weight>> = {
  HC0: (u) => u ** 2,
  HC1: (u, _, { n, k }) => (u ** 2 * n) / (n - k),
  HC2: (u, h) => u ** 2 / (1 - h),
  HC3: (u, h) => (u / (1 - h)) ** 2,
  HC4: (u, h, { n, k }) => u ** 2 / (1 - h) ** Math.min(4, (n * h) / k),
  HC4m: (u, h, { n, k }) => u ** 2 / (1 - h) ** (Math.min(1, (n * h) / k) + Math.min(1.5, (n * h) / k)),
  HC5: (u, h, { n, k, largest }) =>
    u ** 2 / Math.sqrt((1 - h) ** Math.min((n * h) / k, Math.max(4, (0.7 * n * largest) / k))),
};

export const whiteVersions = Object.keys(whiteWeight) as readonly WhiteVersion[];

/** Versions that do not divide by 1 - h. */
const withoutLeverage: readonly WhiteVersion[] = ["HC0", "HC1"];

/**
 * White's covariance A (sum of w_i x_i x_i') A with A = (X'X)^-1, right under any uneven spread as n grows. The weights:
 * HC0 u^2; HC1 u^2 n/(n-k); HC2 u^2/(1-h); HC3 u^2/(1-h)^2; HC4 u^2/(1-h)^d, d = min(4, n h/k); HC4m the same with
 * d = min(1, n h/k) + min(1.5, n h/k); HC5 u^2/(1-h)^(d/2), d = min(n h/k, max(4, 0.7 n max(h)/k)).
 * @param fit - least squares fit of n rows on k columns.
 * @param version - which weights; where a row has a leverage of one, HC2 and later are undefined and HC1 takes
 *   their place, as `used` says.
 * @returns k by k, in the units of b b'.
 * @see White (1980), Econometrica 48, 817-838; Hinkley (1977), Technometrics 19, 285-292; MacKinnon and White (1985),
 *   J. Econometrics 29, 305-325; Cribari-Neto (2004), Comput. Stat. Data Anal. 45, 215-233; Cribari-Neto, Souza and
 *   Vasconcellos (2007), Commun. Stat. Theory Methods 36, 1877-1888; Cribari-Neto and da Silva (2011), AStA 95, 129-146.
 */
export function whiteCovariance(fit: Fit, version: WhiteVersion): Covariance {
  return whiteCovariances(fit, [version])[version]!;
}

/** Every version, in one pass over the rows. */
export const allWhite = (fit: Fit): Readonly<Record<WhiteVersion, Covariance>> =>
  whiteCovariances(fit, whiteVersions) as Readonly<Record<WhiteVersion, Covariance>>;

/** The versions asked for, in one pass over the rows. */
export function whiteCovariances(
  fit: Fit,
  versions: readonly WhiteVersion[],
): Readonly<Partial<Record<WhiteVersion, Covariance>>> {
  const fallback = leverageOfOne(fit);
  const instead = (version: WhiteVersion): WhiteVersion =>
    fallback === null || withoutLeverage.includes(version) ? version : "HC1";
  const meats = meatsOf(fit, [...new Set(versions.map(instead))]);
  return Object.fromEntries(
    versions.map((version) => {
      const used = instead(version);
      const sentence = used === version ? null : `${version} ${fallback ?? ""}`;
      const white = { choice: { kind: "white", version }, used: { version: used, fallback: sentence } } as const;
      return [version, fromMeat(fit, meats(used), white)];
    }),
  );
}

const known = memory<SquareMatrix>();

/** The meats of the versions in the basis Q; those not known yet in one pass. */
function meatsOf(fit: Fit, versions: readonly WhiteVersion[]): (version: WhiteVersion) => SquareMatrix {
  const missing = versions.filter((version) => known.find(fit, version) === null);
  if (missing.length > 0) {
    const weightings = missing.map((version) => weightsOf(fit, version));
    weightedCrossProducts(basisOf(fit), weightings).forEach((meat, index) => known.keep(fit, missing[index]!, meat));
  }
  return (version) => known.find(fit, version)!;
}

function weightsOf({ residuals, leverages, rowCount, columnCount }: Fit, version: WhiteVersion): Float64Array {
  const weight = whiteWeight[version];
  const largest = leverages.reduce((most, h) => Math.max(most, h), 0);
  const size = { n: rowCount, k: columnCount, largest };
  return residuals.map((u, i) => weight(u, leverages[i]!, size));
}
