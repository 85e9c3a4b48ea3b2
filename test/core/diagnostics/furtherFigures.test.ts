import { describe, expect, it } from "vitest";
import { arch } from "../../../src/core/diagnostics/arch.ts";
import { chow } from "../../../src/core/diagnostics/chow.ts";
import { durbinWatson } from "../../../src/core/diagnostics/durbinWatson.ts";
import { influence, mostInfluential } from "../../../src/core/diagnostics/guards/influence.ts";
import { trending } from "../../../src/core/diagnostics/guards/trending.ts";
import { unitRoot, unitRootPoints } from "../../../src/core/diagnostics/guards/unitRoot.ts";
import { largestChowSurfaces } from "../../../src/core/diagnostics/hansen1997.ts";
import { jarqueBera } from "../../../src/core/diagnostics/jarqueBera.ts";
import { largestChow, largestChowPValue } from "../../../src/core/diagnostics/largestChow.ts";
import { ljungBox } from "../../../src/core/diagnostics/ljungBox.ts";
import type { TestOutcome } from "../../../src/core/diagnostics/outcome.ts";
import { reset } from "../../../src/core/diagnostics/reset.ts";
import { resetRobust } from "../../../src/core/diagnostics/resetRobust.ts";
import type { Term } from "../../../src/core/design/design.ts";
import { fitLeastSquares } from "../../../src/core/fit/fitLeastSquares.ts";
import { chiSquareTail, fTail, tTwoSided } from "../../../src/core/numeric/distributions.ts";
import { randomFrom } from "../../support/random.ts";
import { expectDigits } from "../../support/digits.ts";
import { designOf, fitOf, referenceFit, throughTime } from "../../support/referenceFit.ts";

const random = randomFrom(1975);
const draws = (n: number): number[] => Array.from({ length: n }, () => random.normal());

function computed(outcome: TestOutcome): Extract<TestOutcome, { kind: "computed" }> {
  if (outcome.kind !== "computed") throw new Error(outcome.because);
  return outcome;
}

const inTime = (n: number, columns = 1) =>
  fitOf(
    designOf(
      draws(n),
      Array.from({ length: columns }, () => draws(n)),
      { order: throughTime(n) },
    ),
  );

describe("both forms of a Wald statistic", () => {
  it("RESET with the chosen covariance: chi-square(2), and F(2, rest) of half of it", () => {
    const fit = fitOf(designOf(draws(40), [draws(40), draws(40)]));
    const { figure, fForm } = computed(resetRobust(fit, { kind: "classical" }));
    expect([figure.df, fForm!.df]).toEqual([[2], [2, 35]]);
    expectDigits(fForm!.statistic, figure.statistic / 2, 14);
    expectDigits(figure.pValue, chiSquareTail(figure.statistic, 2), 13);
    expectDigits(fForm!.pValue, fTail(figure.statistic / 2, 2, 35), 13);
    // With the classical covariance the F form is the classical test.
    expectDigits(fForm!.statistic, computed(reset(fit)).figure.statistic, 9);
  });

  it("says why where its kind of errors cannot be had with the powers", () => {
    const lags = { kind: "given", lags: 30 } as const;
    expect(resetRobust(inTime(20), { kind: "newey-west", lags, adjusted: true })).toMatchObject({
      kind: "not-applicable",
      because: "its standard errors cannot be had for the regression with the powers",
    });
  });
});

describe("what stands beside a statistic", () => {
  it("Jarque and Bera's has the moments that it is made of", () => {
    const fit = fitOf(designOf(draws(50), [draws(50)]));
    const { figure, details } = computed(jarqueBera(fit));
    const moment = (power: number): number => fit.residuals.reduce((sum, u) => sum + u ** power, 0) / 50;
    expectDigits(details["skewness"]!, moment(3) / moment(2) ** 1.5, 10);
    expectDigits(details["kurtosis"]!, moment(4) / moment(2) ** 2, 10);
    expectDigits(figure.statistic, (50 / 6) * (details["skewness"]! ** 2 + (details["kurtosis"]! - 3) ** 2 / 4), 11);
  });

  it("Chow's has the rows before the break", () => {
    expect(computed(chow(inTime(20), 8)).details).toEqual({ firstRows: 8 });
  });

  it("the normal form of Durbin and Watson's has no degrees of freedom", () => {
    expect(computed(durbinWatson(inTime(250)))).toMatchObject({ form: "normal", figure: { law: "normal", df: [] } });
  });
});

describe("as few rows as will do", () => {
  it("one degree of freedom is enough for Chow's test and for RESET", () => {
    expect(computed(chow(inTime(5), 2)).figure.df).toEqual([2, 1]);
    expect(chow(inTime(4), 2)).toMatchObject({ kind: "not-applicable" });
    expect(computed(reset(fitOf(designOf(draws(5), [draws(5)])))).figure.df).toEqual([2, 1]);
    expect(reset(fitOf(designOf(draws(4), [draws(4)])))).toMatchObject({ kind: "not-applicable" });
  });

  it("ARCH asks for one row more than columns", () => {
    expect(arch(inTime(6), 2)).toMatchObject({ kind: "computed" });
    expect(arch(inTime(5), 2)).toMatchObject({ kind: "not-applicable" });
  });

  it("single rows are measured while one degree of freedom is left without them", () => {
    expect(influence(fitOf(designOf(draws(4), [draws(4)])))).not.toBeNull();
  });
});

describe("rows that are no sequence", () => {
  it("have no lags, each order saying so", () => {
    const cases = fitOf(designOf(draws(30), [draws(30)]));
    for (const outcome of [...ljungBox(cases, [1, 3]), arch(cases, 3)]) {
      expect(outcome).toMatchObject({ kind: "not-applicable", because: expect.stringMatching(/time/) as string });
    }
    expect(ljungBox(cases, [1, 3]).map(({ order }) => order)).toEqual([1, 3]);
  });
});

describe("the largest Chow statistic", () => {
  it("between one place and the first surface its law lies straight between them", () => {
    const [first = ""] = largestChowSurfaces[2]!.split(", ");
    const [constant = 0, slope = 0, df = 0] = first.split(" ").map(Number);
    const surface = chiSquareTail(constant + slope * 9, df);
    const alone = chiSquareTail(9, 3);
    expectDigits(largestChowPValue(9, 3, 0.5), alone, 12);
    expectDigits(largestChowPValue(9, 3, 0.49), surface, 12);
    expectDigits(largestChowPValue(9, 3, 0.495), (alone + surface) / 2, 12);
  });

  it("takes as many coefficients as the tables have, and any share of rows", () => {
    expect(largestChow(inTime(140, 39))).toMatchObject({ kind: "computed" });
    expect(largestChow(inTime(140, 40))).toMatchObject({ because: "there are more than 40 coefficients" });
    expect(largestChowPValue(20, 2, 0.005)).toBeGreaterThan(largestChowPValue(20, 2, 0.15));
    expectDigits(largestChowPValue(20, 2, 0.001), largestChowPValue(20, 2, 0.01), 13);
  });
});

describe("single rows", () => {
  it("lie off by the chance that any of n normal errors lies as far", () => {
    const y = draws(30).map((value, i) => (i === 11 ? value + 6 : value));
    const fit = fitOf(designOf(y, [draws(30)]));
    const [top] = mostInfluential(fit, influence(fit)!, 1);
    expect(top!.row).toBe(11);
    expectDigits(top!.outlierPValue, 30 * tTwoSided(top!.outside, 27), 12);
    expect(top!.outlierPValue).toBeLessThan(0.01);
  });
});

describe("series that wander", () => {
  const n = 60;
  const walk = (): number[] => {
    let level = 0;
    return draws(n).map((step) => (level += step));
  };
  const [y, x] = [walk(), walk()];
  const design = designOf(y, [x], { order: throughTime(n) });
  const must = (found: ReturnType<typeof fitLeastSquares>) => {
    if (!found.ok) throw new Error(found.problem.code);
    return found.value;
  };
  const withTerm = (meaning: Term["meaning"]) => {
    const term = { name: "trend", meaning, values: Float64Array.from({ length: n }, (_, i) => i) };
    return must(fitLeastSquares({ ...design, terms: [...design.terms, term] }));
  };

  it("are held against the points for their number, with a trend where one is let in", () => {
    const plain = trending(must(fitLeastSquares(design)), durbinWatson(must(fitLeastSquares(design))))!;
    // floor(59^(1/3)) = 3 earlier changes leave 60 - 1 - 3 rows.
    expect(plain.unitRoot!.lags).toBe(3);
    expect(plain.unitRoot!.critical).toEqual(unitRootPoints(2, "constant", 56));
    for (const meaning of [
      { kind: "trend", unit: "row" },
      { kind: "date", column: "Day", unit: "day" },
    ] as const) {
      const fit = withTerm(meaning);
      expect(trending(fit, durbinWatson(fit))!.unitRoot!.critical).toEqual(unitRootPoints(2, "trend", 56));
    }
    const level = withTerm({ kind: "level", column: "Shop", level: "A", base: "B" });
    expect(trending(level, durbinWatson(level))!.unitRoot!.critical).toEqual(unitRootPoints(2, "constant", 56));
  });

  it("are suspected where R-squared is above the Durbin-Watson statistic", () => {
    const trended = y.map((value, i) => value + 3 * i);
    const fit = fitOf(designOf(trended, [x.map((value, i) => value + 3 * i)], { order: throughTime(n) }));
    const found = trending(fit, durbinWatson(fit))!;
    expect(found.durbinWatson).toBeLessThan(fit.rSquared);
    expect(found.suspected).toBe(true);
    expect(trending(referenceFit("mtcars"), durbinWatson(fit))).toBeNull();
    const unknown = { kind: "not-applicable", test: "durbin-watson", order: null, because: "" } as const;
    expect(trending(fit, unknown)).toBeNull();
    const constantAlone = fitOf(designOf(y, [], { order: throughTime(n) }));
    expect(trending(constantAlone, durbinWatson(constantAlone))?.unitRoot).toBeNull();
  });

  it("are not asked of hardly any rows or more variables than the tables have", () => {
    const settings = { variables: 2, deterministic: "constant", lags: 2 } as const;
    const residuals = Float64Array.from(draws(7));
    expect(unitRoot(residuals.subarray(0, 6), settings)).toBeNull();
    expect(unitRoot(residuals, settings)).not.toBeNull();
    expect(unitRootPoints(30, "constant", 50)).toBeNull();
    expect(unitRoot(Float64Array.from(draws(50)), { ...settings, variables: 30 })!.critical).toBeNull();
  });
});
