import { describe, expect, it } from "vitest";
import type { ErrorsChoice, Kernel, LagRule } from "../../../src/core/covariance/choice.ts";
import { bandwidthOf } from "../../../src/core/covariance/bandwidth.ts";
import { covarianceOf } from "../../../src/core/covariance/covarianceOf.ts";
import { lagWeights } from "../../../src/core/covariance/kernels.ts";
import { lagsForRows, lagsOf } from "../../../src/core/covariance/lags.ts";
import type { RowOrder } from "../../../src/core/design/design.ts";
import type { Fit } from "../../../src/core/fit/fit.ts";
import { randomFrom } from "../../support/random.ts";
import { designOf, fitOf, inGroups, throughTime } from "../../support/referenceFit.ts";
import { errorsOf, expectAllDigits, orderedFit } from "../../support/referenceErrors.ts";

const neweyWest = (lags: LagRule, adjusted = false): ErrorsChoice => ({ kind: "newey-west", lags, adjusted });
const given = (lags: number): LagRule => ({ kind: "given", lags });

interface Placed {
  readonly positions: readonly number[];
  readonly groups?: readonly number[];
}

/** The covariance by its definition: every pair of rows of a group, weighted by how far apart in time they are. */
function byPairs(fit: Fit, { positions, groups }: Placed, weightOf: (distance: number) => number): number[] {
  const k = fit.columnCount;
  const scores = fit.design.terms.map(({ values }) => values.map((x, i) => x * fit.residuals[i]!));
  const meat = scores.map((left) =>
    scores.map((right) => {
      let sum = 0;
      positions.forEach((t, i) => {
        positions.forEach((s, j) => {
          if (groups === undefined || groups[i] === groups[j]) sum += weightOf(Math.abs(t - s)) * left[i]! * right[j]!;
        });
      });
      return sum;
    }),
  );
  const bread = (i: number, j: number): number => fit.bread.values[i * k + j]!;
  return Array.from({ length: k }, (_, l) => {
    let variance = 0;
    for (let i = 0; i < k; i++) for (let j = 0; j < k; j++) variance += bread(l, i) * meat[i]![j]! * bread(j, l);
    return Math.sqrt(variance);
  });
}

const bartlett = (lags: number) => (distance: number) => Math.max(0, 1 - distance / (lags + 1));

const random = randomFrom(77);
const draws = (n: number): number[] => Array.from({ length: n }, () => random.normal());

function fitWith(n: number, order: RowOrder): Fit {
  return fitOf(designOf(draws(n), [draws(n), draws(n).map((value) => 1000 + 50 * value)], { order }));
}

describe("gaps in time", () => {
  const positions = [0, 1, 2, 5, 6, 9, 10, 11, 12, 20, 21, 40, 41, 42, 43, 44, 45, 60];
  const fit = fitWith(18, throughTime(18, positions));

  it.each([0, 1, 2, 5, 17])("keep their place with %i lags", (lags) => {
    expectAllDigits(errorsOf(fit, neweyWest(given(lags))), byPairs(fit, { positions }, bartlett(lags)), 12);
  });

  it.each(["bartlett", "parzen", "quadratic spectral"] as const)("keep their place under the %s kernel", (kernel) => {
    const rule = { kind: "andrews 1991", kernel, prewhiten: false } as const;
    const covariance = covarianceOf(fit, neweyWest(rule));
    if (!covariance.ok) throw new Error(covariance.problem.code);
    const weights = lagWeights(kernel, covariance.value.used.bandwidth!, 61);
    expectAllDigits(
      covariance.value.standardErrors,
      byPairs(fit, { positions }, (distance) => weights[distance] ?? 0),
      11,
    );
    expect(covariance.value.used.lags).toBe(weights.length - 1);
  });

  it("are not what rows one after the other would be", () => {
    const dense = fitOf({ ...fit.design, order: throughTime(18) });
    const [gapped] = errorsOf(fit, neweyWest(given(3)));
    expect(Math.abs(errorsOf(dense, neweyWest(given(3)))[0]! / gapped! - 1)).toBeGreaterThan(1e-3);
  });
});

describe("groups", () => {
  const groups = [0, 0, 0, 0, 1, 1, 1, 1, 1, 2, 2, 2, 3, 4, 4, 4, 4, 4, 4];
  const positions = [0, 1, 2, 4, 0, 1, 2, 3, 9, 7, 8, 9, 2, 0, 1, 2, 3, 5, 6];
  const fit = fitWith(19, inGroups(groups, positions));

  it.each([0, 1, 3, 5])("are never crossed by %i lags", (lags) => {
    expectAllDigits(errorsOf(fit, neweyWest(given(lags))), byPairs(fit, { positions, groups }, bartlett(lags)), 12);
  });

  it("are never crossed by a kernel that reaches over all periods", () => {
    const covariance = covarianceOf(
      fit,
      neweyWest({ kind: "andrews 1991", kernel: "quadratic spectral", prewhiten: false }),
    );
    if (!covariance.ok) throw new Error(covariance.problem.code);
    const weights = lagWeights("quadratic spectral", covariance.value.used.bandwidth!, 10);
    const expected = byPairs(fit, { positions, groups }, (distance) => weights[distance] ?? 0);
    expectAllDigits(covariance.value.standardErrors, expected, 11);
  });

  it("count the rows of the longest for the lag rules", () => {
    expect(lagsOf(fit, { kind: "careful" })).toBe(lagsForRows(6, "careful"));
    expect(covarianceOf(fit, neweyWest(given(6)))).toEqual({
      ok: false,
      problem: { code: "too-many-lags", lags: 6, rows: 6 },
    });
  });

  it("without an order in time take rows as they stand", () => {
    const standing = fitOf({ ...fit.design, order: inGroups(groups) });
    const within = [0, 1, 2, 3, 0, 1, 2, 3, 4, 0, 1, 2, 0, 0, 1, 2, 3, 4, 5];
    expectAllDigits(
      errorsOf(standing, neweyWest(given(2))),
      byPairs(standing, { positions: within, groups }, bartlett(2)),
      12,
    );
  });
});

describe("lag rules", () => {
  it("count rows as their formulas say, whole results included", () => {
    expect([20, 100, 200, 400, 1600].map((n) => lagsForRows(n, "careful"))).toEqual([5, 12, 18, 25, 51]);
    expect([19, 50, 99, 100, 101, 51199, 51200].map((n) => lagsForRows(n, "thumb"))).toEqual([2, 3, 3, 4, 4, 15, 16]);
    expect([27, 63, 64, 65, 1000, 4096].map((n) => lagsForRows(n, "cube root"))).toEqual([2, 2, 3, 3, 7, 12]);
  });

  it("are whole-number exact for every square up to a full sheet", () => {
    for (let root = 1; root <= 1024; root++) {
      expect(lagsForRows(root ** 2, "careful")).toBe(Math.floor((13 * root + 9) / 10) - 1);
    }
  });

  it("refuse as many lags as rows, and take one fewer", () => {
    const fit = fitWith(12, throughTime(12));
    expect(covarianceOf(fit, neweyWest(given(12)))).toEqual({
      ok: false,
      problem: { code: "too-many-lags", lags: 12, rows: 12 },
    });
    expect(covarianceOf(fit, neweyWest(given(11))).ok).toBe(true);
  });

  it("say what they used", () => {
    const fit = orderedFit("investment");
    const used = (lags: LagRule) => {
      const covariance = covarianceOf(fit, neweyWest(lags, true));
      return covariance.ok ? covariance.value.used : null;
    };
    expect(used({ kind: "thumb" })).toEqual({ lags: 2, bandwidth: null, version: null, fallback: null });
    expect(used({ kind: "newey-west 1994", prewhiten: false })).toMatchObject({ lags: 1 });
    expect(used({ kind: "andrews 1991", kernel: "parzen", prewhiten: false })).toMatchObject({ lags: 5 });
    expect(used({ kind: "andrews 1991", kernel: "quadratic spectral", prewhiten: false })).toMatchObject({ lags: 18 });
  });
});

describe("lagsOf", () => {
  it("gives what the covariance uses, whatever the rule", () => {
    const fit = orderedFit("investment");
    const rules: LagRule[] = [
      { kind: "thumb" },
      { kind: "careful" },
      { kind: "cube root" },
      ...[false, true].flatMap((prewhiten): LagRule[] => [
        { kind: "newey-west 1994", prewhiten },
        { kind: "andrews 1991", kernel: "bartlett", prewhiten },
        { kind: "andrews 1991", kernel: "quadratic spectral", prewhiten },
      ]),
    ];
    const used = rules.map((rule) => {
      const covariance = covarianceOf(fit, neweyWest(rule));
      return covariance.ok ? covariance.value.used.lags : null;
    });
    expect(rules.map((rule) => lagsOf(fit, rule))).toEqual(used);
    expect(new Set(used).size).toBeGreaterThan(3);
  });
});

describe("automatic bandwidths", () => {
  it("hold in units so large that fourth powers of the scores would not be numbers", () => {
    const { design } = orderedFit("investment");
    const large = (values: Float64Array): number[] => [...values].map((value) => value * 2 ** 400);
    const [, ...drivers] = design.terms.map(({ values }) => large(values));
    const blown = fitOf(designOf(large(design.outcome.values), drivers, { order: throughTime(19) }));
    for (const kernel of ["bartlett", "parzen", "quadratic spectral"] as const) {
      const rule = { kind: "andrews 1991", kernel, prewhiten: false } as const;
      expectAllDigits([bandwidthOf(blown, rule)], [bandwidthOf(orderedFit("investment"), rule)], 12);
    }
  });
});

describe("prewhitening", () => {
  it("held at 0.97 multiplies what the filter leaves by 1 / 0.03", () => {
    const n = 200;
    const trending = draws(n).map((noise, t) => t + noise);
    const fit = fitOf(designOf(trending, [new Array<number>(n).fill(1)], { constant: false, order: throughTime(n) }));
    const covariance = covarianceOf(fit, neweyWest({ kind: "newey-west 1994", prewhiten: true }));
    if (!covariance.ok) throw new Error(covariance.problem.code);
    const { lags, fallback } = covariance.value.used;
    expect(fallback).not.toBeNull();
    const rest = [...fit.residuals.subarray(1)].map((u, i) => u - 0.97 * fit.residuals[i]!);
    let sum = 0;
    rest.forEach((left, t) =>
      rest.forEach((right, s) => (sum += Math.max(0, 1 - Math.abs(t - s) / (lags! + 1)) * left * right)),
    );
    expect(covariance.value.standardErrors[0]! / (Math.sqrt(sum) / 0.03 / n)).toBeCloseTo(1, 10);
  });

  it("is held back where the scores nearly have a unit root, and says so", () => {
    const covariance = covarianceOf(orderedFit("longley"), neweyWest({ kind: "newey-west 1994", prewhiten: true }));
    if (!covariance.ok) throw new Error(covariance.problem.code);
    expect(covariance.value.used.fallback).toMatch(/largest root \d\.\d\d.*held at 0\.97/);
    expect(covariance.value.standardErrors.every((value) => value > 0 && Number.isFinite(value))).toBe(true);
  });

  it("uses only periods whose predecessor has a row", () => {
    const positions = [0, 1, 2, 3, 4, 5, 6, 8, 9, 10, 11, 12, 13, 14, 15, 30, 31, 32, 33, 34];
    const fit = fitWith(20, throughTime(20, positions));
    const filtered = errorsOf(fit, neweyWest({ kind: "newey-west 1994", prewhiten: true }));
    const moved = fitOf({
      ...fit.design,
      order: throughTime(
        20,
        positions.map((t) => (t < 20 ? t : t + 70)),
      ),
    });
    // A longer gap between the same stretches changes nothing within the reach of the lags.
    expectAllDigits(errorsOf(moved, neweyWest({ kind: "newey-west 1994", prewhiten: true })), [...filtered], 12);
  });
});

describe("kernels", () => {
  const shapes: readonly [Kernel, number, number][] = [
    ["bartlett", 0.5, 0.5],
    ["parzen", 0.5, 0.25],
    ["parzen", 0.25, 0.71875],
    // 25 / (12 pi^2 x^2) (sin(6 pi x / 5) / (6 pi x / 5) - cos(6 pi x / 5)) at x = 5/6, where it is 3 / pi^2.
    ["quadratic spectral", 5 / 6, 3 / Math.PI ** 2],
  ];

  it.each(shapes)("%s at %d bandwidths weighs %d", (kernel, x, weight) => {
    expect(lagWeights(kernel, 1 / x, 2)[1] ?? 0).toBeCloseTo(weight, 14);
  });

  it("reach as far as their weight is not zero", () => {
    expect([...lagWeights("bartlett", 2.5, 100)]).toEqual([1, 0.6, expect.closeTo(0.2, 15)]);
    expect(lagWeights("bartlett", 3, 100)).toHaveLength(3);
    expect(lagWeights("parzen", 7.2, 5)).toHaveLength(5);
    expect(lagWeights("quadratic spectral", 2, 40)).toHaveLength(40);
    expect([...lagWeights("quadratic spectral", 0, 40)]).toEqual([1]);
  });

  it("keep all digits of the series near zero", () => {
    const z = 0.009;
    const [, weight] = lagWeights("quadratic spectral", (6 * Math.PI) / 5 / z, 2);
    // 3 / z^2 (sin z / z - cos z) term by term.
    expect(Math.abs(weight! - (1 - z ** 2 / 10 + z ** 4 / 280 - z ** 6 / 15120))).toBeLessThan(2e-16);
  });

  it("are continuous where the closed form gives way to its series", () => {
    const bandwidth = (6 * Math.PI) / 5 / 0.01;
    const [, below] = lagWeights("quadratic spectral", bandwidth * 1.000001, 2);
    const [, above] = lagWeights("quadratic spectral", bandwidth / 1.000001, 2);
    expect(Math.abs(below! - above!)).toBeLessThan(1e-9);
  });
});
