import { describe, expect, it } from "vitest";
import type { Term } from "../../../src/core/design/design.ts";
import { fitLeastSquares } from "../../../src/core/fit/fitLeastSquares.ts";
import { randomFrom } from "../../support/random.ts";
import type { Problem } from "../../../src/core/problem/problem.ts";
import { expectDigits } from "../../support/digits.ts";
import { designOf, fitOf, reference, referenceFit } from "../../support/referenceFit.ts";

function problemOf(...design: Parameters<typeof designOf>): Problem {
  const fitted = fitLeastSquares(designOf(...design));
  if (fitted.ok) throw new Error("fitted");
  return fitted.problem;
}

describe("what cannot be fitted", () => {
  it("fewer rows than terms and one", () => {
    expect(
      problemOf(
        [3, 1, 4],
        [
          [2, 7, 1],
          [8, 2, 8],
        ],
      ),
    ).toEqual({ code: "too-few-rows", rows: 3, needed: 4, leftOut: 0 });
    expect(
      fitOf(
        designOf(
          [3, 1, 4, 9],
          [
            [2, 7, 1, 5],
            [8, 2, 6, 4],
          ],
        ),
      ).degreesOfFreedom,
    ).toBe(1);
  });

  it("an outcome that never varies", () => {
    expect(problemOf([5, 5, 5, 5], [[2, 7, 1, 8]])).toEqual({ code: "constant-outcome", column: "y" });
  });

  it("a constant beside the constant, but not instead of it", () => {
    const columns = [
      [2, 7, 1, 8, 3],
      [4, 4, 4, 4, 4],
    ];
    expect(problemOf([3, 1, 4, 1, 6], columns, { names: ["Price", "Shops"] })).toEqual({
      code: "constant-column",
      column: "Shops",
    });
    expect(fitOf(designOf([3, 1, 4, 1, 6], columns, { constant: false })).uncentred).toBe(true);
  });

  it("dependent columns, with what they are made of", () => {
    const [a, b] = [
      [2, 7, 1, 8, 2, 8],
      [3, 1, 4, 1, 5, 9],
    ];
    const names = ["East", "West", "Idle", "Both"];
    const idle = [1, 6, 1, 8, 0, 3];
    expect(problemOf([1, 4, 2, 8, 5, 7], [a, b, idle, a.map((value, i) => value + b[i]!)], { names })).toEqual({
      code: "dependent-columns",
      column: "Both",
      madeOf: ["East", "West"],
    });
  });

  it("a perfect fit, also where only the rounding of the cells is left", () => {
    const x = Array.from({ length: 20 }, (_, i) => 1.1 * i);
    expect(
      problemOf(
        x.map((value) => 0.1 + 0.7 * value),
        [x],
      ),
    ).toEqual({ code: "perfect-fit", column: "y" });
    expect(
      problemOf(
        x.map((value) => 1e9 + 0.3 * value),
        [x],
      ),
    ).toEqual({ code: "perfect-fit", column: "y" });
  });

  it("a perfect fit by large terms that all but cancel", () => {
    const random = randomFrom(6);
    const a = Array.from({ length: 20 }, () => 1e9 * (1 + random.uniform()));
    const b = a.map((value) => value - random.normal());
    const y = a.map((value, i) => 3000 * value - 3000 * b[i]!);
    expect(problemOf(y, [a, b])).toEqual({ code: "perfect-fit", column: "y" });
  });

  it("a column of zeros where there is no constant", () => {
    const problem = problemOf(
      [3, 1, 4, 1, 5],
      [
        [2, 7, 1, 8, 2],
        [0, 0, 0, 0, 0],
      ],
      { constant: false },
    );
    expect(problem).toEqual({ code: "dependent-columns", column: "x2", madeOf: [] });
  });

  it("but errors in the twelfth digit are errors", () => {
    const random = randomFrom(5);
    const x = Array.from({ length: 20 }, (_, i) => i);
    const fit = fitOf(
      designOf(
        x.map((value) => (3 + 2 * value) * (1 + 1e-12 * random.normal())),
        [x],
      ),
    );
    expect(fit.sigma).toBeGreaterThan(1e-12);
    expect(fit.sigma).toBeLessThan(1e-10);
  });

  it("columns of nothing but tiny numbers", () => {
    const problem = problemOf([3, 1, 4, 1], [[0, 2e-150, 7e-151, 1e-150]], { names: ["Share"] });
    expect(problem).toEqual({ code: "numbers-too-large", column: "Share", cell: "row 2 of the data", value: 2e-150 });
  });
});

describe("figures of the fit", () => {
  const [y, x] = [
    [3.1, 4.9, 7.2, 8.7, 11.4],
    [1, 2, 3, 4, 5],
  ];

  it("about zero without a constant", () => {
    const fit = fitOf(designOf(y, [x], { constant: false }));
    const slope = x.reduce((sum, value, i) => sum + value * y[i]!, 0) / 55;
    const rss = y.reduce((sum, value, i) => sum + (value - slope * x[i]!) ** 2, 0);
    const total = y.reduce((sum, value) => sum + value ** 2, 0);
    expectDigits(fit.coefficients[0]!, slope, 14);
    expectDigits(fit.residualSumOfSquares, rss, 12);
    expectDigits(fit.rSquared, 1 - rss / total, 14);
    expectDigits(fit.adjustedRSquared, 1 - rss / 4 / (total / 5), 14);
    expect(fit.uncentred).toBe(true);
  });

  it("likelihood and criteria as written out", () => {
    const fit = fitOf(designOf(y, [x]));
    const variance = fit.residualSumOfSquares / 5;
    const logLikelihood = fit.residuals.reduce(
      (sum, u) => sum - Math.log(2 * Math.PI * variance) / 2 - u ** 2 / (2 * variance),
      0,
    );
    expectDigits(fit.logLikelihood, logLikelihood, 13);
    expectDigits(fit.aic, -2 * logLikelihood + 2 * 3, 13);
    expectDigits(fit.bic, -2 * logLikelihood + Math.log(5) * 3, 13);
  });

  it("leverages add up to the number of terms, and one row's dummy has one of 1", () => {
    const alone = [0, 0, 1, 0, 0];
    const fit = fitOf(designOf(y, [x, alone]));
    expect(fit.leverages.reduce((sum, h) => sum + h, 0)).toBeCloseTo(3, 13);
    expect(fit.leverages[2]).toBeCloseTo(1, 14);
    expect(Math.max(...fit.leverages)).toBeLessThanOrEqual(1);
  });

  it("leverages of the data files agree with R's", () => {
    const { influence_top5_by_cook: expected } = reference("stackloss");
    const fit = referenceFit("stackloss");
    expected.row.forEach((row, index) => expectDigits(fit.leverages[row - 1]!, expected.leverage[index]!, 11));
  });

  it("bread times X'X is one", () => {
    const { bread, design } = fitOf(designOf(y, [x]));
    const product = design.terms.map((left: Term) =>
      design.terms.map((right) => left.values.reduce((sum, value, i) => sum + value * right.values[i]!, 0)),
    );
    const [a, b, , d] = bread.values;
    expect(a! * product[0]![0]! + b! * product[1]![0]!).toBeCloseTo(1, 13);
    expect(a! * product[0]![1]! + b! * product[1]![1]!).toBeCloseTo(0, 12);
    expect(b! * product[0]![1]! + d! * product[1]![1]!).toBeCloseTo(1, 13);
  });
});
