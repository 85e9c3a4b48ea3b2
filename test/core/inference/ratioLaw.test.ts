import { readFileSync } from "node:fs";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { fixedBStretch } from "../../../src/core/inference/fixedB.ts";
import { criticalValue, pValueOf, sidedPValueOf } from "../../../src/core/inference/ratioLaw.ts";
import type { Reference } from "../../../src/core/inference/reference.ts";
import { normalQuantile, normalTwoSided, tQuantile, tTwoSided } from "../../../src/core/numeric/distributions.ts";

const fixedB = (b: number, degreesOfFreedom: number): Reference => ({ law: "fixed-b", b, degreesOfFreedom });
const polynomial = (b: number): number => 1.96 + 2.9694 * b + 0.416 * b ** 2 - 0.5324 * b ** 3;

const law = JSON.parse(readFileSync(new URL("../../reference/fixed-b/law.json", import.meta.url), "utf8")) as {
  readonly simulated: readonly { b: number; x: number; tail: number; standardError: number }[];
};

describe("reference laws of a ratio", () => {
  it("takes the tails of t and normal as they are", () => {
    expect(pValueOf(-2.1, { law: "normal" })).toBe(normalTwoSided(2.1));
    expect(pValueOf(2.1, { law: "t", degreesOfFreedom: 17 })).toBe(tTwoSided(2.1, 17));
    expect(criticalValue(0.05, { law: "normal" })).toBeCloseTo(1.959963984540054, 13);
    expect(criticalValue(0.1, { law: "t", degreesOfFreedom: 9 })).toBeCloseTo(1.8331129326562365, 12);
  });

  it("is the published polynomial times t / 1.96 at 5 %", () => {
    for (const b of [0.003, 0.0171, 0.09, 0.135, 0.333, 0.71, 1]) {
      for (const df of [3, 16, 92, 4000]) {
        const published = (polynomial(b) * tQuantile(0.975, df)) / 1.96;
        expect(criticalValue(0.05, fixedB(b, df)) / published).toBeCloseTo(1, 12);
        expect(pValueOf(published, fixedB(b, df))).toBeCloseTo(0.05, 11);
      }
    }
  });

  it("is the t law where b vanishes, and near it where b is small", () => {
    expect(pValueOf(2.3, fixedB(0, 40))).toBeCloseTo(tTwoSided(2.3, 40), 14);
    expect(pValueOf(2.3, fixedB(1e-6, 40))).toBeCloseTo(tTwoSided(2.3, 40), 6);
  });

  it("agrees with simulated tails: the polynomial is never too small and at most 1.2 % too large", () => {
    for (const { b, x, tail, standardError } of law.simulated) {
      const z = -normalQuantile(tail / 2);
      const error = standardError / tail / z ** 2;
      const excess = (z * fixedBStretch(b)(z)) / x - 1;
      expect(excess, `b ${b}, x ${x}`).toBeGreaterThan(-0.002 - 4 * error);
      expect(excess, `b ${b}, x ${x}`).toBeLessThan(0.012 + 4 * error);
    }
  });

  it("wants more of the ratio as the bandwidth grows and as the level falls", () => {
    const levels = [0.9, 0.5, 0.2, 0.1, 0.05, 0.02, 0.01, 1e-3, 1e-4, 1e-6, 1e-9, 1e-14, 1e-40, 1e-200];
    const shares = Array.from({ length: 60 }, (_, i) => i / 59);
    for (const b of shares) {
      const values = levels.map((level) => criticalValue(level, fixedB(b, 25)));
      expect(values).toEqual([...values].sort((one, other) => one - other));
    }
    for (const level of levels) {
      const values = shares.map((b) => criticalValue(level, fixedB(b, 25)));
      expect(values).toEqual([...values].sort((one, other) => one - other));
    }
  });

  const references: fc.Arbitrary<Reference> = fc.oneof(
    fc.constant<Reference>({ law: "normal" }),
    fc.integer({ min: 1, max: 3000 }).map((df): Reference => ({ law: "t", degreesOfFreedom: df })),
    fc.double({ min: 2.3, max: 60, noNaN: true }).map((df): Reference => ({ law: "t", degreesOfFreedom: df })),
    fc
      .tuple(fc.double({ min: 1e-5, max: 1, noNaN: true }), fc.integer({ min: 1, max: 3000 }))
      .map(([b, df]) => fixedB(b, df)),
  );

  it("puts the p-value below the level if and only if the ratio is beyond the critical value", () => {
    fc.assert(
      fc.property(
        references,
        fc.double({ min: -12, max: 12, noNaN: true }),
        fc.constantFrom(0.01, 0.05, 0.1, 0.5),
        (reference, ratio, level) =>
          pValueOf(ratio, reference) < level === Math.abs(ratio) > criticalValue(level, reference),
      ),
      { seed: 19500301, numRuns: 4000 },
    );
  });

  it("stays in [0, 1] for any finite ratio", () => {
    for (const ratio of [0, 1e-300, 1e-8, 40, 1e8, 1e150, Number.MAX_VALUE]) {
      for (const reference of [fixedB(0.2, 5), fixedB(0.9, 400), fixedB(1, 1)]) {
        const p = pValueOf(ratio, reference);
        expect(p >= 0 && p <= 1, `${ratio}: ${p}`).toBe(true);
      }
    }
  });

  it("halves the two-sided p-value on the side the ratio lies on", () => {
    for (const reference of [{ law: "normal" }, { law: "t", degreesOfFreedom: 6 }, fixedB(0.3, 20)] as const) {
      const two = pValueOf(1.7, reference);
      expect(sidedPValueOf(1.7, reference, "above")).toBeCloseTo(two / 2, 14);
      expect(sidedPValueOf(1.7, reference, "below")).toBeCloseTo(1 - two / 2, 14);
      expect(sidedPValueOf(-1.7, reference, "below")).toBeCloseTo(two / 2, 14);
      expect(sidedPValueOf(-1.7, reference, "both")).toBe(two);
    }
  });
});
