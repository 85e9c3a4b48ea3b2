import { describe, expect, it } from "vitest";
import { bellMcCaffreyDegrees } from "../../../src/core/covariance/bellMcCaffrey.ts";
import type { Covariance, ErrorsChoice } from "../../../src/core/covariance/choice.ts";
import { covarianceOf } from "../../../src/core/covariance/covarianceOf.ts";
import type { Fit } from "../../../src/core/fit/fit.ts";
import { inferenceOf } from "../../../src/core/inference/inferenceOf.ts";
import { criticalValue } from "../../../src/core/inference/ratioLaw.ts";
import type { Reference } from "../../../src/core/inference/reference.ts";
import { expectDigits } from "../../support/digits.ts";
import { reference, referenceFit, referenceIds } from "../../support/referenceFit.ts";

interface Ratios {
  readonly t: readonly number[];
  readonly p_t: readonly number[];
  readonly p_normal: readonly number[];
}
type Interval = Readonly<Record<"low_t" | "high_t" | "low_normal" | "high_normal", readonly number[]>>;
interface Known {
  readonly ratio: Readonly<Record<"classical" | "HC3", Ratios>>;
  readonly interval95: Readonly<Record<"classical" | "HC3", Interval>>;
}

const choices: Readonly<Record<"classical" | "HC3", ErrorsChoice>> = {
  classical: { kind: "classical" },
  HC3: { kind: "white", version: "HC3" },
};

function covarianceFor(fit: Fit, choice: ErrorsChoice): Covariance {
  const found = covarianceOf(fit, choice);
  if (!found.ok) throw new Error(found.problem.code);
  return found.value;
}

const zeros = (fit: Fit): number[] => Array.from(fit.coefficients, () => 0);
const expectAll = (found: readonly number[], expected: readonly number[], digits: number): void =>
  expected.forEach((value, j) => {
    if (Math.abs(value) > 1e-300) expectDigits(found[j]!, value, digits);
  });

describe.each(referenceIds)("%s", (id) => {
  const fit = referenceFit(id);
  const known = reference(id) as unknown as Known;
  // The library's HC3 of longley is itself good to eight digits only.
  const digits = (kind: string): number => (id === "longley" && kind === "HC3" ? 7 : 10);
  const t: Reference = { law: "t", degreesOfFreedom: fit.degreesOfFreedom };

  it.each(["classical", "HC3"] as const)("ratios, p-values and intervals: %s", (kind) => {
    const covariance = covarianceFor(fit, choices[kind]);
    const table = inferenceOf(fit, covariance, { reference: t, against: zeros(fit), level: 0.05 });
    const normal = inferenceOf(fit, covariance, { reference: { law: "normal" }, against: zeros(fit), level: 0.05 });
    const [ratio, interval] = [known.ratio[kind], known.interval95[kind]];
    expectAll(table.ratio, ratio.t, digits(kind));
    expectAll(table.pValue, ratio.p_t, digits(kind) - 1);
    expectAll(table.pValueNormal, ratio.p_normal, digits(kind) - 1);
    expectAll(table.low, interval.low_t, digits(kind) - 1);
    expectAll(table.high, interval.high_t, digits(kind) - 1);
    expectAll(normal.low, interval.low_normal, digits(kind) - 1);
    expectAll(normal.high, interval.high_normal, digits(kind) - 1);
    expect(normal.pValue).toEqual(table.pValueNormal);
    expect(table.pValueT).toEqual(table.pValue);
  });

  const own = reference(id).HC2_bell_mccaffrey;
  if (own !== undefined) {
    it("HC2 with degrees of freedom for each coefficient", () => {
      const degrees = bellMcCaffreyDegrees(fit);
      const covariance = covarianceFor(fit, { kind: "white", version: "HC2" });
      const settings = {
        reference: t,
        against: zeros(fit),
        level: 0.05,
        ...(degrees && { degreesOfFreedom: degrees }),
      };
      const table = inferenceOf(fit, covariance, settings);
      // The library finds the degrees of freedom by numerical work that keeps some eight digits.
      expectAll(table.degreesOfFreedom ?? [], own.df, 5);
      expectAll(table.pValue, own.p, 5);
      table.low.forEach((low, j) => {
        const reach = criticalValue(0.05, { law: "t", degreesOfFreedom: degrees![j]! }) * table.standardErrors[j]!;
        expectDigits(fit.coefficients[j]! - low, reach, 9);
      });
    });
  }
});

describe("inference", () => {
  it("is against any value, and a p-value below the level is a value outside the interval", () => {
    const fit = referenceFit("nile-trend");
    const covariance = covarianceFor(fit, { kind: "newey-west", lags: { kind: "careful" }, adjusted: true });
    const references: Reference[] = [
      { law: "t", degreesOfFreedom: 98 },
      { law: "normal" },
      { law: "fixed-b", b: 0.13, degreesOfFreedom: 98 },
    ];
    for (const law of references) {
      for (const level of [0.01, 0.05, 0.1]) {
        const { low, high } = inferenceOf(fit, covariance, { reference: law, against: [0, 0], level });
        for (const end of [low[1]!, high[1]!]) {
          const step = (high[1]! - low[1]!) * 1e-9 * (end === low[1] ? 1 : -1);
          const within = inferenceOf(fit, covariance, { reference: law, against: [0, end + step], level });
          const without = inferenceOf(fit, covariance, { reference: law, against: [0, end - step], level });
          expect(within.pValue[1]).toBeGreaterThan(level);
          expect(without.pValue[1]).toBeLessThan(level);
        }
      }
    }
  });
});
