import { readFileSync } from "node:fs";
import type { ErrorsChoice, Kernel, WhiteVersion } from "../../src/core/covariance/choice.ts";
import { covarianceOf } from "../../src/core/covariance/covarianceOf.ts";
import type { Fit } from "../../src/core/fit/fit.ts";
import { expectDigits } from "./digits.ts";
import { designOf, fitOf, inGroups, reference, throughTime } from "./referenceFit.ts";

type Numbers = readonly number[];

/** The coefficients' figures in a data file, computed with R. */
export interface ReferenceErrors {
  readonly terms: readonly string[];
  readonly coefficients: Numbers;
  readonly sigma: number;
  readonly r2: number;
  readonly adj_r2: number;
  readonly rss: number;
  readonly logLik: number;
  readonly AIC: number;
  readonly BIC: number;
  readonly se: Readonly<Record<"classical" | WhiteVersion, Numbers>>;
  readonly cov: Readonly<Record<"classical" | "HC3", readonly Numbers[]>>;
  readonly newey_west?: readonly { readonly lag: number; readonly se: Numbers; readonly se_adjusted: Numbers }[];
  readonly newey_west_rule_of_thumb_lag?: number;
  readonly newey_west_1994?: {
    readonly bandwidth_noprewhite: number;
    readonly se_noprewhite_adjusted: Numbers;
    readonly bandwidth_prewhite: number;
    readonly se_prewhite: Numbers;
    readonly se_prewhite_adjusted: Numbers;
  };
  readonly andrews_1991?: Readonly<Record<`bandwidth_${"bartlett" | "qs" | "parzen"}`, number>> &
    Readonly<Record<`se_${"bartlett" | "qs" | "parzen"}_adjusted`, Numbers>>;
  readonly HC2_bell_mccaffrey?: { readonly se: Numbers; readonly df: Numbers };
  readonly cluster?: Readonly<Record<"CR0" | "CR1" | "CR2" | "CR2_df", Numbers>>;
}

/** The same figures from the definitions at 60 digits (scripts/direct.py). */
export interface DirectErrors {
  readonly coefficients: Numbers;
  readonly classical: Numbers;
  readonly white: Readonly<Record<WhiteVersion, Numbers>>;
  readonly bellMcCaffrey?: Numbers;
  readonly time?: {
    readonly "newey-west": readonly {
      readonly lags: number;
      readonly adjusted: Numbers;
      readonly unadjusted: Numbers;
    }[];
    readonly "newey-west 1994": readonly {
      readonly prewhiten: boolean;
      readonly bandwidth: number;
      readonly adjusted: Numbers;
    }[];
    readonly "andrews 1991": readonly {
      readonly kernel: Kernel;
      readonly prewhiten: boolean;
      readonly bandwidth: number;
      readonly adjusted: Numbers;
    }[];
  };
  readonly groups?: Readonly<Record<"CR0" | "CR1" | "CR2" | "CR2DegreesOfFreedom" | "two-way CR1", Numbers>>;
}

/** The same figures from statsmodels. */
export interface StatsmodelsErrors {
  readonly coefficients: Numbers;
  readonly logLikelihood: number;
  readonly rSquared: number;
  readonly adjustedRSquared: number;
  readonly classical: Numbers;
  readonly HC0: Numbers;
  readonly HC1: Numbers;
  readonly HC2: Numbers;
  readonly HC3: Numbers;
  readonly "newey-west"?: readonly {
    readonly lags: number;
    readonly adjusted: Numbers;
    readonly unadjusted: Numbers;
  }[];
  readonly CR0?: Numbers;
  readonly CR1?: Numbers;
  readonly "two-way CR0"?: Numbers;
  readonly "newey-west in groups"?: { readonly lags: number; readonly unadjusted: Numbers };
}

const read = (file: string): unknown =>
  JSON.parse(readFileSync(new URL(`../reference/${file}`, import.meta.url), "utf8")) as unknown;

export const referenceErrors = (id: string): ReferenceErrors => read(`${id}.json`) as ReferenceErrors;
export const directErrors = (read("direct.json") as { results: Readonly<Record<string, DirectErrors>> }).results;
export const statsmodelsErrors = (read("statsmodels.json") as { results: Readonly<Record<string, StatsmodelsErrors>> })
  .results;

/** How many years each group of a panel has, row after row. */
const panelYears: Readonly<Record<string, number>> = { grunfeld: 20, petersen: 10 };

/** The fit of a data file with its rows in the order that the file says: through time, or in groups by year. */
export function orderedFit(id: string, second: "one way" | "by year too" = "one way"): Fit {
  const { y, X, drivers, rows, group, n } = reference(id);
  const years = Array.from({ length: n }, (_, i) => i % (panelYears[id] ?? n));
  if (rows !== "group") {
    return fitOf(designOf(y, X, { names: drivers, order: rows === "time" ? throughTime(n) : { kind: "cases" } }));
  }
  const labels = [...new Set(group)];
  const order = inGroups(
    group!.map((label) => labels.indexOf(label)),
    years,
  );
  const byYear = { groups: Int32Array.from(years), labels: years.slice(0, panelYears[id]).map(String), by: "Year" };
  const both = order.kind === "groups" && second === "by year too" ? { ...order, second: byYear } : order;
  return fitOf(designOf(y, X, { names: drivers, order: both }));
}

export function errorsOf(fit: Fit, choice: ErrorsChoice): Float64Array {
  const covariance = covarianceOf(fit, choice);
  if (!covariance.ok) throw new Error(covariance.problem.code);
  return covariance.value.standardErrors;
}

/** Every entry to at least so many significant digits. */
export function expectAllDigits(found: ArrayLike<number>, expected: Numbers, digits: number): void {
  if (found.length !== expected.length) throw new Error(`${found.length} values against ${expected.length}`);
  expected.forEach((value, index) => expectDigits(found[index]!, value, digits));
}
