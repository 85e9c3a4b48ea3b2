import { readFileSync } from "node:fs";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { chow } from "../../../src/core/diagnostics/chow.ts";
import { bridgeTail, cusum } from "../../../src/core/diagnostics/cusum.ts";
import { crossingProbability, cusumRecursive } from "../../../src/core/diagnostics/cusumRecursive.ts";
import { largestChow, largestChowPValue } from "../../../src/core/diagnostics/largestChow.ts";
import type { TestOutcome } from "../../../src/core/diagnostics/outcome.ts";
import { explain } from "../../../src/core/numeric/explain.ts";
import { randomFrom } from "../../support/random.ts";
import { recursiveResiduals } from "../../../src/core/numeric/recursiveResiduals.ts";
import { expectDigits } from "../../support/digits.ts";
import { designOf, fitOf, reference, referenceFit, throughTime } from "../../support/referenceFit.ts";

function computedOf(outcome: TestOutcome): Extract<TestOutcome, { kind: "computed" }> {
  if (outcome.kind !== "computed") throw new Error(outcome.because);
  return outcome;
}

const highPrecision = JSON.parse(
  readFileSync(new URL("../../reference/diagnostics/highPrecision.json", import.meta.url), "utf8"),
) as Readonly<Record<string, { readonly cusumRecursive: number }>>;

/** A level that moves up by `step` after the first third. */
function drawn(seed: number, n: number, step: number) {
  const random = randomFrom(seed);
  const x = Array.from({ length: n }, () => 3 + random.normal());
  const y = x.map((value, i) => 1 + 2 * value + (i < n / 3 ? 0 : step) + random.normal());
  return fitOf(designOf(y, [x], { order: throughTime(n) }));
}

describe("recursive residuals", () => {
  it("square and sum to what the regression on the rows so far leaves, whatever their rank", () => {
    fc.assert(
      fc.property(fc.nat(9999), fc.integer({ min: 0, max: 6 }), (seed, late) => {
        const random = randomFrom(seed);
        const n = 24;
        const columns = [
          new Float64Array(n).fill(1),
          Float64Array.from({ length: n }, (_, i) => (i < late ? 0 : 19 + random.normal())),
          Float64Array.from({ length: n }, (_, i) => (i % 3 === 0 ? 1 : 0)),
        ];
        const outcome = Float64Array.from({ length: n }, () => 50 + random.normal());
        const { residuals, ranks } = recursiveResiduals({ columns, outcome }, "forwards");
        const back = recursiveResiduals({ columns, outcome }, "backwards");
        for (let m = 1; m <= n; m++) {
          const head = explain(
            columns.map((column) => column.slice(0, m)),
            outcome.slice(0, m),
            "zero",
          );
          const tail = explain(
            columns.map((column) => column.slice(m - 1)),
            outcome.slice(m - 1),
            "zero",
          );
          const sum = residuals.slice(0, m).reduce((total, w) => total + w * w, 0);
          const backSum = back.residuals.slice(m - 1).reduce((total, w) => total + w * w, 0);
          expect(ranks[m - 1]).toBe(head.rank);
          expect(back.ranks[m - 1]).toBe(tail.rank);
          expect(Math.abs(sum - head.residual)).toBeLessThan(1e-7);
          expect(Math.abs(backSum - tail.residual)).toBeLessThan(1e-7);
        }
      }),
      { seed: 19750612, numRuns: 60 },
    );
  });

  it("have the sign of the forecast error", () => {
    const columns = [new Float64Array(5).fill(-1)];
    const { residuals } = recursiveResiduals({ columns, outcome: Float64Array.of(2, 5, 1, 9, 4) }, "forwards");
    // (5 - 2) / sqrt(2), (1 - 3.5) / sqrt(1.5), (9 - 8/3) / sqrt(4/3), (4 - 17/4) / sqrt(5/4)
    const expected = [0, 3 / Math.sqrt(2), -2.5 / Math.sqrt(1.5), 19 / 3 / Math.sqrt(4 / 3), -0.25 / Math.sqrt(1.25)];
    expected.forEach((w, i) => expect(residuals[i]).toBeCloseTo(w, 14));
  });
});

describe("the CUSUM tests", () => {
  it.each(Object.entries(highPrecision))("of %s agree with 40 digits", (id, { cusumRecursive: expected }) => {
    expectDigits(computedOf(cusumRecursive(referenceFit(id))).figure.statistic, expected, id === "longley" ? 9 : 11);
  });

  it("have the critical values of the tables", () => {
    // Kolmogorov's law (table in Smirnov 1948) and Brown, Durbin and Evans (1975), p. 154; from memory.
    const bridge = [
      [0.1, 1.224],
      [0.05, 1.358],
      [0.01, 1.628],
    ] as const;
    for (const [level, x] of bridge) expect(bridgeTail(x)).toBeCloseTo(level, 3);
    const crossing = [
      [0.1, 0.85],
      [0.05, 0.948],
      [0.01, 1.143],
    ] as const;
    for (const [level, x] of crossing) expect(Math.abs(crossingProbability(x) / level - 1)).toBeLessThan(0.01);
  });

  it("join their series without a step and never leave [0, 1]", () => {
    for (const x of [0, 0.01, 0.1, 0.3, 0.6, 0.9, 2, 6, 40]) {
      expect(bridgeTail(x)).toBeGreaterThanOrEqual(0);
      expect(bridgeTail(x)).toBeLessThanOrEqual(1);
      expect(crossingProbability(x)).toBeGreaterThanOrEqual(0);
      expect(crossingProbability(x)).toBeLessThanOrEqual(1);
    }
    expectDigits(bridgeTail(1 - 1e-13), bridgeTail(1), 12);
    expect(crossingProbability(0.3 - 1e-9)).toBeCloseTo(crossingProbability(0.3), 3);
  });

  it("see a level that moves and do not change with a multiple of the driver", () => {
    const moved = drawn(3, 90, 3);
    expect(computedOf(cusum(moved)).figure.pValue).toBeLessThan(1e-4);
    expect(computedOf(cusumRecursive(moved)).figure.pValue).toBeLessThan(1e-3);
    const steady = drawn(3, 90, 0);
    expect(computedOf(cusum(steady)).figure.pValue).toBeGreaterThan(0.05);
    expect(computedOf(cusumRecursive(steady)).figure.pValue).toBeGreaterThan(0.05);
  });
});

describe("the Chow tests", () => {
  it("find the row at which the level moves", () => {
    const { details, figure } = computedOf(largestChow(drawn(5, 90, 4)));
    expect(details["firstRows"]).toBe(30);
    expect(figure.pValue).toBeLessThan(1e-6);
    expect(computedOf(largestChow(drawn(5, 90, 0))).figure.pValue).toBeGreaterThan(0.1);
  });

  it("are the same where only one place can be looked at", () => {
    const fit = referenceFit("longley");
    const [one, largest] = [computedOf(chow(fit, 8)), computedOf(largestChow(fit))];
    expectDigits(largest.figure.statistic, 7 * one.figure.statistic, 9);
    expectDigits(largest.figure.pValue, one.figure.pValue, 9);
  });

  it("forecast a part with fewer rows than coefficients", () => {
    const fit = referenceFit("nile-trend");
    const { y, X } = reference("nile-trend");
    const first = fitOf(designOf(y.slice(0, 99), [X[0]!.slice(0, 99)]));
    const forecast = (fit.residualSumOfSquares - first.residualSumOfSquares) / (first.residualSumOfSquares / 97);
    const { figure } = computedOf(chow(fit, 99));
    expect(figure.df).toEqual([1, 97]);
    expectDigits(figure.statistic, forecast, 9);
  });

  it("are largest at the largest of all rows in the middle", () => {
    const fit = drawn(11, 60, 1);
    const all = Array.from({ length: 60 - 9 - 9 + 1 }, (_, i) => computedOf(chow(fit, 9 + i)).figure.statistic);
    const { figure, details } = computedOf(largestChow(fit));
    expectDigits(figure.statistic, 2 * Math.max(...all), 11);
    expect(details["firstRows"]).toBe(9 + all.indexOf(Math.max(...all)));
  });

  it("have the critical values of the table", () => {
    // Andrews (2003), Econometrica 71, 395-397, table 1, trimming 0.15; from memory.
    const points = [
      [1, 0.1, 7.12],
      [1, 0.05, 8.68],
      [1, 0.01, 12.16],
      [2, 0.1, 10],
      [2, 0.05, 11.72],
      [2, 0.01, 15.56],
    ] as const;
    for (const [k, level, x] of points) expect(Math.abs(largestChowPValue(x, k, 0.15) - level)).toBeLessThan(0.006);
  });

  it("fall with the statistic and with the number of places left out", () => {
    for (const k of [1, 7, 40]) {
      for (const share of [0.02, 0.15, 0.31, 0.485, 0.495, 0.4999]) {
        const values = [0.1, 1, 5, 20, 60, 200].map((x) => largestChowPValue(x * k, k, share));
        expect(values).toEqual([...values].sort((a, b) => b - a));
        for (const value of values) expect(value >= 0 && value <= 1).toBe(true);
      }
      const shares = [0.02, 0.1, 0.2, 0.3, 0.4, 0.48, 0.495].map((share) => largestChowPValue(2 * k + 6, k, share));
      expect(shares).toEqual([...shares].sort((a, b) => b - a));
    }
  });

  it("say why they do not apply", () => {
    const short = fitOf(designOf([3, 5, 4, 8, 7], [[1, 2, 3, 4, 6]], { order: throughTime(5) }));
    expect(largestChow(short)).toMatchObject({ kind: "not-applicable", test: "largest-chow" });
    expect(chow(short, 0)).toMatchObject({ kind: "not-applicable", test: "chow" });
    const cases = referenceFit("mtcars");
    for (const test of [largestChow, cusum, cusumRecursive]) expect(test(cases).kind).toBe("not-applicable");
    expect(chow(cases, 16).kind).toBe("not-applicable");
    const bare = fitOf(designOf([3, 5, 4, 8, 7], [[1, 2, 3, 4, 6]], { order: throughTime(5), constant: false }));
    expect(cusum(bare).kind).toBe("not-applicable");
  });
});
