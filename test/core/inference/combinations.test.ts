import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import type { Covariance, ErrorsChoice } from "../../../src/core/covariance/choice.ts";
import { covarianceOf } from "../../../src/core/covariance/covarianceOf.ts";
import type { Fit } from "../../../src/core/fit/fit.ts";
import { type EstimateSettings, combinationOf, ratioOf } from "../../../src/core/inference/functionOf.ts";
import { allDriversZero, jointTest } from "../../../src/core/inference/joint.ts";
import { predict } from "../../../src/core/inference/predict.ts";
import { tTwoSided } from "../../../src/core/numeric/distributions.ts";
import { bilinear } from "../../../src/core/numeric/smallMatrix.ts";
import { expectDigits } from "../../support/digits.ts";
import { reference, referenceFit, referenceIds } from "../../support/referenceFit.ts";

function covarianceFor(fit: Fit, choice: ErrorsChoice): Covariance {
  const found = covarianceOf(fit, choice);
  if (!found.ok) throw new Error(found.problem.code);
  return found.value;
}

interface Found {
  readonly statistic: number;
  readonly p: number;
}
interface SecondLibrary {
  readonly f: Found;
  readonly chiSquareHC1: Found;
  readonly rows: readonly (readonly number[])[];
  readonly value: readonly number[];
  readonly meanLow: readonly number[];
  readonly meanHigh: readonly number[];
  readonly rowLow: readonly number[];
  readonly rowHigh: readonly number[];
  readonly meanLowHC1: readonly number[];
}

const { figures } = JSON.parse(
  readFileSync(new URL("../../reference/diagnostics/secondLibrary.json", import.meta.url), "utf8"),
) as { readonly figures: Readonly<Record<string, { readonly inference?: SecondLibrary }>> };

const joint = (fit: Fit, choice: ErrorsChoice, restrictions = allDriversZero(fit)) => {
  const outcome = jointTest(fit, covarianceFor(fit, choice), restrictions);
  if (outcome.kind !== "computed") throw new Error(outcome.because);
  return outcome;
};

describe("joint tests", () => {
  it.each(referenceIds)("that all drivers of %s are zero", (id) => {
    const fit = referenceFit(id);
    const known = reference(id).joint_all_slopes;
    const classical = joint(fit, { kind: "classical" });
    expect(classical.figure).toBe(classical.f);
    expectDigits(classical.f.statistic, known.classical.F, 10);
    expectDigits(classical.f.pValue, known.classical.p_F, 10);
    expectDigits(classical.chiSquare.statistic, known.classical.chisq, 10);
    const robust = joint(fit, { kind: "white", version: "HC3" });
    expect(robust.figure).toBe(robust.chiSquare);
    // 1365.4310695417943 at 50 digits; the library has seven of them.
    const expected = id === "longley" ? 1365.4310695417943 : known.HC3.chisq;
    expectDigits(robust.chiSquare.statistic, expected, 10);
    expectDigits(robust.f.statistic, expected / known.HC3.df, 10);
    if (id === "longley") return;
    if (known.HC3.p_chisq > 1e-290) expectDigits(robust.chiSquare.pValue, known.HC3.p_chisq, 9.5);
    expectDigits(robust.f.pValue, known.HC3.p_F, 9.5);
  });

  const withInference = Object.entries(figures).flatMap(([id, { inference }]) =>
    inference ? [[id, inference] as const] : [],
  );

  it.each(withInference)("of other restrictions on %s", (id, expected) => {
    const fit = referenceFit(id);
    const unit = (j: number): number[] => Array.from(fit.coefficients, (_, i) => (i === j ? 1 : 0));
    const difference = unit(1).map((weight, j) => weight - unit(2)[j]!);
    const restrictions = { weights: [difference, unit(2)], equals: [0.5, -0.25] };
    const classical = joint(fit, { kind: "classical" }, restrictions);
    expectDigits(classical.figure.statistic, expected.f.statistic, 8);
    expectDigits(classical.figure.pValue, expected.f.p, 6.5);
    const robust = joint(fit, { kind: "white", version: "HC1" }, restrictions);
    expectDigits(robust.figure.statistic, expected.chiSquareHC1.statistic, 8);
  });

  it.each(withInference)("and predictions of %s agree with the second library", (id, expected) => {
    const fit = referenceFit(id);
    const rows = expected.rows.map((row) => [1, ...row]);
    const settings = {
      reference: { law: "t", degreesOfFreedom: fit.degreesOfFreedom },
      level: 0.1,
      spread: "even",
    } as const;
    const classical = predict({ fit, covariance: covarianceFor(fit, { kind: "classical" }) }, rows, settings);
    const robust = predict({ fit, covariance: covarianceFor(fit, { kind: "white", version: "HC1" }) }, rows, settings);
    classical.rows.forEach((row, i) => {
      expectDigits(row.value, expected.value[i]!, 9);
      expectDigits(row.low, expected.meanLow[i]!, 8.5);
      expectDigits(row.high, expected.meanHigh[i]!, 8.5);
      expectDigits(row.single!.low, expected.rowLow[i]!, 8.5);
      expectDigits(row.single!.high, expected.rowHigh[i]!, 8.5);
      expectDigits(robust.rows[i]!.low, expected.meanLowHC1[i]!, 8.5);
    });
  });

  it("of one restriction is the square of its ratio, and says when two say the same", () => {
    const fit = referenceFit("investment");
    const covariance = covarianceFor(fit, { kind: "classical" });
    const one = { weights: [[0, 1, 0]], equals: [0.2] };
    const { f } = joint(fit, { kind: "classical" }, one);
    const ratio = (fit.coefficients[1]! - 0.2) / covariance.standardErrors[1]!;
    expectDigits(f.statistic, ratio ** 2, 12);
    expectDigits(f.pValue, tTwoSided(ratio, 16), 11);
    const twice = {
      weights: [
        [0, 1, 0],
        [0, 2, 0],
      ],
      equals: [0.2, 0.4],
    };
    expect(jointTest(fit, covariance, twice)).toMatchObject({ kind: "not-applicable" });
  });
});

describe("numbers made of coefficients", () => {
  const fit = referenceFit("consumption-lag");
  const covariance = covarianceFor(fit, { kind: "white", version: "HC3" });
  const settings: EstimateSettings = {
    reference: { law: "t", degreesOfFreedom: 16 },
    against: 0,
    side: "both",
    level: 0.05,
  };
  const estimation = { fit, covariance, settings };

  it("add up with their covariances", () => {
    const { value, standardError, ratio, pValue, low, high } = combinationOf(estimation, {
      offset: -3,
      weights: [0, 1, 2],
    });
    const [, b1, b2] = fit.coefficients;
    expectDigits(value, b1! + 2 * b2! - 3, 14);
    const v = (i: number, j: number): number => covariance.matrix.values[3 * i + j]!;
    expectDigits(standardError, Math.sqrt(v(1, 1) + 4 * v(2, 2) + 4 * v(1, 2)), 12);
    expectDigits(ratio, value / standardError, 14);
    expectDigits(pValue, tTwoSided(ratio, 16), 14);
    expectDigits((high - low) / 2, 2.1199052992210112 * standardError, 12);
  });

  it("divide by the delta method: a long-run effect, a turning point", () => {
    const longRun = ratioOf(estimation, { offset: 0, weights: [0, 1, 0] }, { offset: 1, weights: [0, 0, -1] });
    const f = (b: readonly number[]): number => b[1]! / (1 - b[2]!);
    const b = [...fit.coefficients];
    const gradient = b.map((value, j) => {
      const step = 1e-6 * Math.max(1, Math.abs(value));
      const at = (shift: number): number => f(b.with(j, value + shift));
      return (at(step) - at(-step)) / (2 * step);
    });
    expectDigits(longRun!.value, f(b), 14);
    expectDigits(longRun!.standardError, Math.sqrt(bilinear(gradient, covariance.matrix, gradient)), 7);
    expect(longRun!.caution).toBeNull();
    const turning = ratioOf(estimation, { offset: 0, weights: [0, -1, 0] }, { offset: 0, weights: [0, 0, 2] });
    expectDigits(turning!.value, -b[1]! / (2 * b[2]!), 14);
  });

  it("say so where they divide by what may be zero", () => {
    const within = covariance.standardErrors[2]!;
    const nearZero = { offset: -fit.coefficients[2]! + within, weights: [0, 0, 1] };
    expect(ratioOf(estimation, { offset: 0, weights: [0, 1, 0] }, nearZero)!.caution).toMatch(
      /cannot be told from zero/,
    );
    expect(ratioOf(estimation, { offset: 0, weights: [0, 1, 0] }, { offset: 0, weights: [0, 0, 0] })).toBeNull();
  });

  it("are asked on one side too", () => {
    const one = { offset: 0, weights: [0, 1, 0] };
    const both = combinationOf(estimation, one);
    const above = combinationOf({ ...estimation, settings: { ...settings, side: "above" } }, one);
    expectDigits(above.pValue, both.ratio > 0 ? both.pValue / 2 : 1 - both.pValue / 2, 12);
    expect(above.low).toBe(both.low);
  });
});

describe("predictions", () => {
  const fit = referenceFit("public-schools");
  const row = Array.from(fit.design.terms, ({ values }) => values[3]!);
  const settings = { reference: { law: "normal" }, level: 0.05, spread: "uneven" } as const;
  const model = { fit, covariance: covarianceFor(fit, { kind: "white", version: "HC3" }) };

  it("give no interval for a single row under uneven spread, and say why", () => {
    const { rows, noSingle } = predict(model, [row], settings);
    expect(rows[0]!.single).toBeNull();
    expect(noSingle).toMatch(/spread of the errors is uneven/);
    expectDigits(rows[0]!.value, fit.design.outcome.values[3]! - fit.residuals[3]!, 12);
    expect(predict(model, [row], { ...settings, spread: "not asked" }).noSingle).toMatch(/not asked/);
    expect(predict(model, [row], { ...settings, spread: "even" }).noSingle).toBeNull();
  });

  it("say when a row lies farther out than all that were used", () => {
    const far = row.map((value, j) => (j === 1 ? value * 3 : value));
    expect(predict(model, [row, far], settings).rows.map(({ beyond }) => beyond)).toEqual([false, true]);
  });
});
