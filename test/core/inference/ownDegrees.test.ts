import { describe, expect, it } from "vitest";
import type { Covariance, ErrorsChoice } from "../../../src/core/covariance/choice.ts";
import { covarianceOf } from "../../../src/core/covariance/covarianceOf.ts";
import { degreesOfCombinations } from "../../../src/core/covariance/degreesOfCombinations.ts";
import type { RowOrder } from "../../../src/core/design/design.ts";
import type { Fit } from "../../../src/core/fit/fit.ts";
import { combinationOf } from "../../../src/core/inference/functionOf.ts";
import { inferenceOf } from "../../../src/core/inference/inferenceOf.ts";
import { predict } from "../../../src/core/inference/predict.ts";
import { criticalValue } from "../../../src/core/inference/ratioLaw.ts";
import { tTwoSided } from "../../../src/core/numeric/distributions.ts";
import { randomFrom } from "../../support/random.ts";
import { expectDigits } from "../../support/digits.ts";
import { errorsOf, expectAllDigits, orderedFit, referenceErrors } from "../../support/referenceErrors.ts";
import { designOf, fitOf, inGroups } from "../../support/referenceFit.ts";

const bellMcCaffrey: ErrorsChoice = { kind: "white", version: "HC2", degrees: "bell-mccaffrey" };
const cr2: ErrorsChoice = { kind: "grouped", version: "CR2" };

function covarianceFor(fit: Fit, choice: ErrorsChoice): Covariance {
  const found = covarianceOf(fit, choice);
  if (!found.ok) throw new Error(found.problem.code);
  return found.value;
}

const random = randomFrom(52);
const n = 40;
const draws = (): number[] => Array.from({ length: n }, () => random.normal());
const [y, a, b] = [draws(), draws().map((value) => Math.exp(value)), draws()];
const inEights = inGroups(Array.from({ length: n }, (_, i) => Math.floor(i / 8)));
const fitWith = (columns: readonly number[][], order: RowOrder = { kind: "cases" }): Fit =>
  fitOf(designOf(y, columns, { order }));

describe("HC2 with the degrees of freedom of Bell and McCaffrey", () => {
  // Standard errors and degrees of freedom by R (clubSandwich); test/reference/direct.json agrees at 60 digits.
  it.each(["mtcars", "public-schools"])("tests the coefficients of %s each against its own t", (id) => {
    const fit = orderedFit(id);
    const { se, df } = referenceErrors(id).HC2_bell_mccaffrey!;
    const covariance = covarianceFor(fit, bellMcCaffrey);
    expectAllDigits(covariance.standardErrors, se, 10);
    expectAllDigits(covariance.degreesOfFreedom!, df, 10);
    const reference = { law: "t", degreesOfFreedom: fit.degreesOfFreedom } as const;
    const settings = {
      reference,
      against: se.map(() => 0),
      level: 0.05,
      degreesOfFreedom: covariance.degreesOfFreedom!,
    };
    const { pValue, low } = inferenceOf(fit, covariance, settings);
    df.forEach((degrees, j) => {
      expectDigits(pValue[j]!, tTwoSided(fit.coefficients[j]! / se[j]!, degrees), 8);
      const reach = criticalValue(0.05, { law: "t", degreesOfFreedom: degrees }) * se[j]!;
      expectDigits(low[j]!, fit.coefficients[j]! - reach, 8);
    });
  });

  it("falls back to HC1 and the usual degrees of freedom where a row fits itself", () => {
    const alone = Array.from({ length: n }, (_, i) => (i === 3 ? 1 : 0));
    const covariance = covarianceFor(fitWith([a, alone]), bellMcCaffrey);
    expect(covariance.degreesOfFreedom).toBeNull();
    expect(covariance.used.version).toBe("HC1");
    expect(covariance.used.fallback).toContain("HC2 cannot be computed");
    expect(covariance.choice).toEqual(bellMcCaffrey);
  });

  it("leaves HC2 without them as it is", () => {
    const fit = fitWith([a, b]);
    const plain = covarianceFor(fit, { kind: "white", version: "HC2" });
    expect(plain.degreesOfFreedom).toBeNull();
    expect([...errorsOf(fit, bellMcCaffrey)]).toEqual([...plain.standardErrors]);
  });
});

describe.each([
  ["HC2 of Bell and McCaffrey", bellMcCaffrey, { kind: "cases" }],
  ["CR2 of Satterthwaite", cr2, inEights],
] as const)("degrees of freedom of combinations, %s", (_, choice, order) => {
  const fit: Fit = fitWith([a, b], order);
  const covariance = covarianceFor(fit, choice);
  const zero = { against: 0, side: "both", level: 0.1, reference: { law: "t", degreesOfFreedom: 37 } } as const;

  it("are the coefficients' own for each by itself", () => {
    const each = [0, 1, 2].map((j) => [0, 1, 2].map((i) => (i === j ? 2.5 : 0)));
    expectAllDigits(degreesOfCombinations(fit, covariance, each)!, [...covariance.degreesOfFreedom!], 12);
  });

  it("are those of the coefficient that the combination becomes in other columns", () => {
    // a b_a + b b_b = a (b_a + b_b) + (b - a) b_b.
    const turned = fitWith([a, b.map((value, i) => value - a[i]!)], order);
    const expected = covarianceFor(turned, choice);
    const estimate = combinationOf({ fit, covariance, settings: zero }, { offset: 0, weights: [0, 1, 1] });
    expectDigits(estimate.standardError, expected.standardErrors[1]!, 11);
    expectDigits(estimate.pValue, tTwoSided(estimate.ratio, expected.degreesOfFreedom![1]!), 9);
    const reach = criticalValue(0.1, { law: "t", degreesOfFreedom: expected.degreesOfFreedom![1]! });
    expectDigits(estimate.high, estimate.value + reach * estimate.standardError, 10);
  });

  it("are, of a prediction, those of the constant when the columns count from the new row", () => {
    const centred = fitWith([a.map((value) => value - 3), b.map((value) => value + 1)], order);
    const expected = covarianceFor(centred, choice);
    const reach = criticalValue(0.1, { law: "t", degreesOfFreedom: expected.degreesOfFreedom![0]! });
    const settings = { level: 0.1, reference: zero.reference, spread: "even" } as const;
    const [row] = predict({ fit, covariance }, [[1, 3, -1]], settings).rows;
    expectDigits(row!.high - row!.value, reach * expected.standardErrors[0]!, 10);
    const single = criticalValue(0.1, zero.reference) * Math.hypot(fit.sigma, row!.standardError);
    expectDigits(row!.single!.high - row!.value, single, 10);
  });
});

describe("degrees of freedom that no combination has for itself", () => {
  it("are the groups less one, and none where the kind has none", () => {
    const fit = fitWith([a, b], inEights);
    const weights = [
      [0, 1, 1],
      [1, 0, 0],
    ];
    expect([...degreesOfCombinations(fit, covarianceFor(fit, { kind: "grouped", version: "CR1" }), weights)!]).toEqual([
      4, 4,
    ]);
    expect(degreesOfCombinations(fit, covarianceFor(fit, { kind: "classical" }), weights)).toBeNull();
    const second = {
      groups: Int32Array.from({ length: n }, (_, i) => i % 8),
      labels: "abcdefgh".split(""),
      by: "Year",
    };
    const crossed = fitWith([a, b], { ...inEights, second } as RowOrder);
    expect([...degreesOfCombinations(crossed, covarianceFor(crossed, cr2), weights)!]).toEqual([4, 4]);
  });
});
