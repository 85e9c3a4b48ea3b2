import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { durbinWatson } from "../../../src/core/diagnostics/durbinWatson.ts";
import type { TestOutcome } from "../../../src/core/diagnostics/outcome.ts";
import { fTail } from "../../../src/core/numeric/distributions.ts";
import { quadraticFormTail } from "../../../src/core/numeric/quadraticFormTail.ts";
import { randomFrom } from "../../support/random.ts";
import { expectDigits } from "../../support/digits.ts";
import { designOf, fitOf, inGroups, referenceFit, throughTime } from "../../support/referenceFit.ts";

function computedOf(outcome: TestOutcome): Extract<TestOutcome, { kind: "computed" }> {
  if (outcome.kind !== "computed") throw new Error(outcome.because);
  return outcome;
}

const highPrecision = JSON.parse(
  readFileSync(new URL("../../reference/diagnostics/highPrecision.json", import.meta.url), "utf8"),
) as Readonly<Record<string, { readonly durbinWatson: number; readonly pPositive: number }>>;

describe("the law of a quadratic form", () => {
  it("is the F law where the weights are of two kinds", () => {
    // P(chi2(a) / a > f chi2(b) / b)
    for (const [a, b, f] of [
      [2, 3, 4],
      [10, 4, 1.7],
      [1, 1, 30],
      [30, 90, 2.5],
      [5, 200, 9],
      [3, 60, 60],
      [40, 40, 0.1],
    ] as const) {
      const weights = Float64Array.from({ length: a + b }, (_, i) => (i < a ? 1 / a : -f / b));
      expectDigits(quadraticFormTail(weights), fTail(f, a, b), 10);
    }
  });

  it("is known in closed form for pairs of weights", () => {
    // Pairs are exponentials: P(E_1 > c E_2) = 1 / (1 + c).
    expectDigits(quadraticFormTail(Float64Array.of(0.5, -3, 0.5, -3)), 1 / 7, 11);
    expectDigits(quadraticFormTail(Float64Array.of(1, 1, -1e-4, -1e-4)), 1 / 1.0001, 11);
  });

  it("has no doubt where all weights have one sign", () => {
    expect(quadraticFormTail(Float64Array.of(1, 2, 0))).toBe(1);
    expect(quadraticFormTail(Float64Array.of(-1, -2, 0))).toBe(0);
  });
});

describe("the Durbin-Watson test", () => {
  it.each(Object.entries(highPrecision))(
    "of %s agrees with 40 digits",
    (id, { durbinWatson: statistic, pPositive }) => {
      const { figure, form } = computedOf(durbinWatson(referenceFit(id)));
      expect(form).toBe("exact");
      expectDigits(figure.statistic, statistic, 12);
      expectDigits(figure.pValue, pPositive, 11);
    },
  );

  it("has the bounds of the tables", () => {
    // Savin and White (1977), Econometrica 45, 1989-1996, 5 % points d_L and d_U; from memory.
    const bounds = [
      [15, 1, 1.077, 1.361],
      [20, 2, 1.1, 1.537],
      [20, 5, 0.792, 1.991],
      [50, 3, 1.421, 1.674],
      [100, 1, 1.654, 1.694],
    ] as const;
    for (const [n, drivers, lower, upper] of bounds) {
      const eigenvalues = Array.from({ length: n - 1 }, (_, i) => 2 - 2 * Math.cos((Math.PI * (i + 1)) / n));
      const df = n - 1 - drivers;
      const levelOf = (d: number, values: readonly number[]): number =>
        quadraticFormTail(Float64Array.from(values, (v) => d - v));
      for (const [d, values] of [
        [lower, eigenvalues.slice(0, df)],
        [upper, eigenvalues.slice(-df)],
      ] as const) {
        expect(levelOf(d - 0.0011, values)).toBeLessThan(0.05);
        expect(levelOf(d + 0.0011, values)).toBeGreaterThan(0.05);
      }
    }
  });

  function series(n: number, follow: number) {
    const random = randomFrom(n);
    const x = Array.from({ length: n }, (_, i) => Math.sin(i / 7) + random.normal());
    let u = 0;
    const y = x.map((value) => 4 - value + (u = follow * u + random.normal()));
    return { x, y };
  }

  it("is near the normal law where it turns to it", () => {
    const at = (n: number, rows: number) => {
      const { x, y } = series(201, 0.2);
      return computedOf(durbinWatson(fitOf(designOf(y.slice(0, n), [x.slice(0, n)], { order: throughTime(rows) }))));
    };
    const [exact, normal] = [at(200, 200), at(201, 201)];
    expect([exact.form, normal.form]).toEqual(["exact", "normal"]);
    expect(exact.figure.pValue).toBeGreaterThan(1e-4);
    expect(Math.abs(Math.log(exact.figure.pValue / normal.figure.pValue))).toBeLessThan(0.35);
  });

  it("takes only neighbours in time as neighbours", () => {
    const { x, y } = series(60, 0.5);
    const positions = x.map((_, i) => (i < 25 ? i : i + 3));
    const gapped = fitOf(designOf(y, [x], { order: throughTime(60, positions) }));
    const steps = gapped.residuals.reduce(
      (sum, u, i) => (i === 0 || i === 25 ? sum : sum + (u - gapped.residuals[i - 1]!) ** 2),
      0,
    );
    const { figure } = computedOf(durbinWatson(gapped));
    expectDigits(figure.statistic, steps / gapped.residualSumOfSquares, 12);
    const groups = x.map((_, i) => (i < 25 ? 0 : 1));
    const grouped = fitOf(
      designOf(y, [x], {
        order: inGroups(
          groups,
          x.map((_, i) => (i < 25 ? i : i - 25)),
        ),
      }),
    );
    expectDigits(computedOf(durbinWatson(grouped)).figure.pValue, figure.pValue, 12);
  });

  it("has the p-value that simulation gives, gaps and all", () => {
    const random = randomFrom(12);
    const n = 21;
    const positions = Array.from({ length: n }, (_, i) => (i < 9 ? i : i + 2));
    const x = positions.map((position) => position ** 2);
    const fitFor = (y: readonly number[]) => fitOf(designOf(y, [x], { order: throughTime(n, positions) }));
    const first = computedOf(durbinWatson(fitFor(x.map(() => random.normal()))));
    const draws = 3000;
    let below = 0;
    for (let draw = 0; draw < draws; draw++) {
      const fit = fitFor(x.map(() => random.normal()));
      const steps = fit.residuals.reduce(
        (sum, u, i) => (i === 0 || i === 9 ? sum : sum + (u - fit.residuals[i - 1]!) ** 2),
        0,
      );
      if (steps / fit.residualSumOfSquares < first.figure.statistic) below += 1;
    }
    const p = first.figure.pValue;
    expect(Math.abs(below / draws - p)).toBeLessThan(4 * Math.sqrt((p * (1 - p)) / draws));
  });

  it("says why it does not apply", () => {
    expect(durbinWatson(referenceFit("mtcars"))).toMatchObject({ kind: "not-applicable", test: "durbin-watson" });
    const { x, y } = series(12, 0);
    const apart = fitOf(
      designOf(y, [x], {
        order: throughTime(
          12,
          x.map((_, i) => 2 * i),
        ),
      }),
    );
    expect(durbinWatson(apart)).toMatchObject({ kind: "not-applicable" });
  });
});
