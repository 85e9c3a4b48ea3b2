import type { Fit } from "../fit/fit.ts";
import { type DataRule, bandwidthOf } from "./bandwidth.ts";
import type { LagRule } from "./choice.ts";
import { lagWeights } from "./kernels.ts";
import { timelineOf } from "./timeline.ts";

/**
 * The number of lags that a rule gives. Careful: ceil(1.3 n^(1/2)) - 1; thumb: floor(4 (n/100)^(2/9));
 * cube root: floor(0.75 n^(1/3)); Newey-West 1994: the whole part of the bandwidth found; Andrews 1991: the lags whose
 * weight is not zero.
 * @param fit - n rows; n is the length of the longest group where rows are in groups.
 * @returns whole, >= 0.
 * @see Lazarus, Lewis, Stock and Watson (2018), J. Business Econ. Stat. 36, 541-559; Newey and West (1994), Rev. Econ.
 *   Studies 61, 631-653; Stock and Watson (2019), Introduction to Econometrics, 15.4; Andrews (1991), Econometrica 59, 817-858.
 */
export function lagsOf(fit: Fit, rule: LagRule): number {
  switch (rule.kind) {
    case "given":
      return rule.lags;
    case "careful":
    case "thumb":
    case "cube root":
      return lagsForRows(timelineOf(fit).rows, rule.kind);
    case "newey-west 1994":
    case "andrews 1991":
      return lagsWithin(bandwidthOf(fit, rule), rule, timelineOf(fit).span);
  }
}

/** The number of lags that a bandwidth stands for. @param span - how many periods the longest sequence of rows spans. */
export function lagsWithin(bandwidth: number, rule: DataRule, span: number): number {
  return rule.kind === "andrews 1991" ? lagWeights(rule.kernel, bandwidth, span).length - 1 : Math.floor(bandwidth);
}

/** Rules that look at the number of rows alone. */
export function lagsForRows(rows: number, rule: "careful" | "thumb" | "cube root"): number {
  return rowRule[rule](rows);
}

const rowRule = {
  careful: (n: number) => Math.ceil((13 * Math.sqrt(n)) / 10) - 1,
  thumb: (n: number) => wholePart(4 * (n / 100) ** (2 / 9)),
  "cube root": (n: number) => wholePart(0.75 * Math.cbrt(n)),
} as const;

/** The whole part, where a value that should be whole may have come out a rounding error below. */
const wholePart = (value: number): number => Math.floor(value * (1 + 4 * Number.EPSILON));
