import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { arch } from "../../../src/core/diagnostics/arch.ts";
import { breuschGodfrey, breuschGodfreyOrders } from "../../../src/core/diagnostics/breuschGodfrey.ts";
import { goldfeldQuandt } from "../../../src/core/diagnostics/goldfeldQuandt.ts";
import { koenker } from "../../../src/core/diagnostics/koenker.ts";
import { ljungBox } from "../../../src/core/diagnostics/ljungBox.ts";
import type { TestOutcome } from "../../../src/core/diagnostics/outcome.ts";
import { whiteTest } from "../../../src/core/diagnostics/white.ts";
import { chiSquareTail, fTail } from "../../../src/core/numeric/distributions.ts";
import { explain } from "../../../src/core/numeric/explain.ts";
import { randomFrom } from "../../support/random.ts";
import { expectDigits } from "../../support/digits.ts";
import { designOf, fitOf, inGroups, reference, referenceFit, throughTime } from "../../support/referenceFit.ts";

type Computed = Extract<TestOutcome, { kind: "computed" }>;

function computedOf(outcome: TestOutcome): Computed {
  if (outcome.kind !== "computed") throw new Error(outcome.because);
  return outcome;
}

/** n rows, q drivers of which the last spreads the errors. */
function drawn(seed: number, n: number, q: number) {
  const random = randomFrom(seed);
  const X = Array.from({ length: q }, (_, j) => Array.from({ length: n }, () => j + random.normal()));
  const y = Array.from({ length: n }, (_, i) => 2 + X[0]![i]! + random.normal() * (0.4 + Math.abs(X[q - 1]![i]!)));
  return { X, y };
}

const sizes = fc.record({
  seed: fc.nat(99999),
  n: fc.integer({ min: 14, max: 90 }),
  q: fc.integer({ min: 1, max: 3 }),
});
const runs = { seed: 19800517, numRuns: 60 };

describe("White's form", () => {
  it.each([
    ["investment", "squares and cross-products", 5],
    ["mtcars", "squares and cross-products", 9],
    ["credit-card", "squares and cross-products", 12],
    ["orange-juice-6-lags", "squares and cross-products", 25],
    ["stackloss", "squares", 6],
    ["wages", "squares", 6],
    ["longley", "fitted values", 2],
  ])("of %s is %s, with %i degrees of freedom", (id, form, df) => {
    const outcome = computedOf(whiteTest(referenceFit(id)));
    expect(outcome.form).toBe(form);
    expect(outcome.figure.df).toEqual([df]);
  });

  it("turns at three rows a column, and at two", () => {
    const formAt = (n: number, q: number): string | null => {
      const { X, y } = drawn(5, n, q);
      return computedOf(whiteTest(fitOf(designOf(y, X)))).form;
    };
    // Two drivers: five terms and the constant; four drivers: 14 and the constant, eight squares and levels and the constant.
    expect([formAt(18, 2), formAt(17, 2)]).toEqual(["squares and cross-products", "squares"]);
    expect([formAt(45, 4), formAt(44, 4)]).toEqual(["squares and cross-products", "squares"]);
    expect([formAt(18, 4), formAt(17, 4)]).toEqual(["squares", "fitted values"]);
  });

  it("squares an indicator once", () => {
    const { X, y } = drawn(8, 60, 1);
    const indicator = y.map((_, i) => (i % 4 === 0 ? 1 : 0));
    const outcome = computedOf(whiteTest(fitOf(designOf(y, [...X, indicator]))));
    expect(outcome.figure.df).toEqual([4]);
  });

  it("without a constant has one in its auxiliary regression, also where indicators make it up", () => {
    const { X, y } = drawn(9, 60, 1);
    const [first, second] = [y.map((_, i) => (i % 2 === 0 ? 1 : 0)), y.map((_, i) => (i % 2 === 0 ? 0 : 1))];
    const bare = computedOf(whiteTest(fitOf(designOf(y, [X[0]!], { constant: false }))));
    expect(bare.figure.df).toEqual([2]);
    const [withBoth, withOne] = [
      computedOf(whiteTest(fitOf(designOf(y, [first, second, X[0]!], { constant: false })))),
      computedOf(whiteTest(fitOf(designOf(y, [second, X[0]!])))),
    ];
    expect(withBoth.figure.df).toEqual(withOne.figure.df);
    expectDigits(withBoth.figure.statistic, withOne.figure.statistic, 10);
    expectDigits(
      computedOf(koenker(fitOf(designOf(y, [first, second, X[0]!], { constant: false })))).figure.statistic,
      computedOf(koenker(fitOf(designOf(y, [second, X[0]!])))).figure.statistic,
      11,
    );
  });
});

describe("the deciding tests", () => {
  it("do not change with the units of the outcome or of a driver, nor with a multiple of a driver added to the outcome", () => {
    fc.assert(
      fc.property(sizes, ({ seed, n, q }) => {
        const { X, y } = drawn(seed, n, q);
        const order = throughTime(n);
        const one = fitOf(designOf(y, X, { order }));
        const other = fitOf(
          designOf(
            y.map((value, i) => 1e6 * (value + 3 * X[0]![i]! - 7)),
            X.map((column, j) => (j === 0 ? column.map((x) => 20 - x / 512) : column)),
            { order },
          ),
        );
        for (const test of [koenker, whiteTest, (fit: typeof one) => breuschGodfrey(fit, 2)]) {
          const [a, b] = [computedOf(test(one)), computedOf(test(other))];
          expect(a.form).toBe(b.form);
          expectDigits(a.figure.statistic, b.figure.statistic, 7);
          expectDigits(a.figure.pValue, b.figure.pValue, 7);
        }
      }),
      runs,
    );
  });

  it("do not change with the order of the rows, where rows are cases", () => {
    fc.assert(
      fc.property(sizes, ({ seed, n, q }) => {
        const { X, y } = drawn(seed, n, q);
        const one = fitOf(designOf(y, X));
        const other = fitOf(
          designOf(
            y.toReversed(),
            X.map((column) => column.toReversed()),
          ),
        );
        for (const test of [koenker, whiteTest]) {
          expectDigits(computedOf(test(one)).figure.statistic, computedOf(test(other)).figure.statistic, 9);
        }
      }),
      runs,
    );
  });

  it("give the F form of the same columns", () => {
    const { figure, fForm } = computedOf(koenker(referenceFit("public-schools")));
    const n = 50;
    const share = figure.statistic / n;
    const f = share / 2 / ((1 - share) / (n - 3));
    expectDigits(fForm!.statistic, f, 12);
    expect(fForm!.df).toEqual([2, 47]);
    expectDigits(fForm!.pValue, fTail(f, 2, 47), 12);
    expectDigits(figure.pValue, chiSquareTail(figure.statistic, 2), 14);
  });

  it("say why they do not apply", () => {
    const y = [3.1, 4.7, 5.2, 7.9, 6.4, 9.3];
    const constantOnly = fitOf(designOf(y, []));
    expect(koenker(constantOnly)).toMatchObject({ kind: "not-applicable", test: "koenker" });
    expect(whiteTest(constantOnly)).toMatchObject({ kind: "not-applicable", test: "white" });
    const few = fitOf(
      designOf(y.slice(0, 4), [
        [1, 2, 4, 3],
        [5, 1, 2, 2],
      ]),
    );
    expect(whiteTest(few)).toMatchObject({ kind: "computed", form: "fitted values" });
    expect(breuschGodfrey(few, 1)).toMatchObject({
      kind: "not-applicable",
      order: 1,
      because: expect.stringContaining("run through time") as string,
    });
  });
});

describe("the Breusch-Godfrey test", () => {
  const { X, y } = drawn(77, 40, 2);

  it("looks at the same for several orders at once as for each alone", () => {
    const fit = fitOf(designOf(y, X, { order: throughTime(40) }));
    const together = breuschGodfreyOrders(fit, [1, 2, 3, 6]);
    [1, 2, 3, 6].forEach((order, index) => {
      const alone = computedOf(breuschGodfrey(fit, order));
      expect(computedOf(together[index]!).order).toBe(order);
      expectDigits(computedOf(together[index]!).figure.statistic, alone.figure.statistic, 11);
    });
  });

  it("keeps the place of a missing period: its residual counts as zero", () => {
    const positions = Array.from({ length: 40 }, (_, i) => (i < 15 ? i : i < 30 ? i + 1 : i + 4));
    const fit = fitOf(designOf(y, X, { order: throughTime(40, positions) }));
    const grid = new Float64Array(44);
    positions.forEach((position, i) => (grid[position] = fit.residuals[i]!));
    const lagged = [1, 2].map((lag) => Float64Array.from(positions, (position) => grid[position - lag] ?? 0));
    const terms = fit.design.terms.map(({ values }) => values);
    const { explained, total } = explain([...terms, ...lagged], fit.residuals, "zero");
    const { figure } = computedOf(breuschGodfrey(fit, 2));
    expectDigits(figure.statistic, (40 * explained) / total, 11);
    const closed = computedOf(breuschGodfrey(fitOf(designOf(y, X, { order: throughTime(40) })), 2));
    expect(Math.abs(figure.statistic / closed.figure.statistic - 1)).toBeGreaterThan(0.01);
  });

  it("never looks from one group into the next", () => {
    const groups = Array.from({ length: 40 }, (_, i) => (i < 22 ? 0 : 1));
    const positions = Array.from({ length: 40 }, (_, i) => (i < 22 ? i : i - 22));
    const grouped = fitOf(designOf(y, X, { order: inGroups(groups, positions) }));
    // The same with so many periods between the two groups that no lag bridges them.
    const apart = fitOf(
      designOf(y, X, {
        order: throughTime(
          40,
          positions.map((p, i) => (i < 22 ? p : p + 100)),
        ),
      }),
    );
    const [one, other] = [computedOf(breuschGodfrey(grouped, 3)), computedOf(breuschGodfrey(apart, 3))];
    expectDigits(one.figure.statistic, other.figure.statistic, 13);
    const joined = computedOf(breuschGodfrey(fitOf(designOf(y, X, { order: throughTime(40) })), 3));
    expect(Math.abs(one.figure.statistic / joined.figure.statistic - 1)).toBeGreaterThan(0.001);
    expect(breuschGodfrey(fitOf(designOf(y, X, { order: inGroups(groups) })), 1).kind).toBe("not-applicable");
  });

  it("drops a lag that no row has", () => {
    const everyThird = Array.from({ length: 40 }, (_, i) => 3 * i);
    const fit = fitOf(designOf(y, X, { order: throughTime(40, everyThird) }));
    expect(computedOf(breuschGodfrey(fit, 4)).figure.df).toEqual([1]);
    expect(breuschGodfrey(fit, 2).kind).toBe("not-applicable");
  });
});

describe("tests that look along time", () => {
  const { X, y } = drawn(31, 40, 1);
  const positions = Array.from({ length: 40 }, (_, i) => (i < 18 ? i : i + 2));
  const fit = fitOf(designOf(y, X, { order: throughTime(40, positions) }));
  const grid = new Float64Array(42);
  positions.forEach((position, i) => (grid[position] = fit.residuals[i]!));

  it("count a missing period as zero among the correlations", () => {
    const parts = [1, 2, 3].map((lag) => {
      const product = Array.from(grid).reduce((sum, u, t) => sum + u * (grid[t - lag] ?? 0), 0);
      return (product / fit.residualSumOfSquares) ** 2 / (40 - lag);
    });
    const { figure } = computedOf(ljungBox(fit, [3])[0]!);
    expectDigits(figure.statistic, 40 * 42 * parts.reduce((sum, part) => sum + part, 0), 11);
    expectDigits(figure.pValue, chiSquareTail(figure.statistic, 3), 14);
  });

  it("leave out of the ARCH test the rows whose predecessors are missing", () => {
    const complete = positions.flatMap((position, i) =>
      [1, 2].every((lag) => positions.includes(position - lag)) ? [i] : [],
    );
    const square = (i: number): number => fit.residuals[i]! ** 2;
    const columns = [
      Float64Array.from(complete, () => 1),
      ...[1, 2].map((lag) => Float64Array.from(complete, (i) => square(i - lag))),
    ];
    const { explained, total } = explain(columns, Float64Array.from(complete, square));
    const { figure } = computedOf(arch(fit, 2));
    expect(complete).toHaveLength(36);
    expectDigits(figure.statistic, (36 * explained) / total, 10);
  });
});

describe("the Goldfeld-Quandt test", () => {
  it("compares the regressions of the two halves", () => {
    const fit = referenceFit("mtcars");
    const { y, X } = reference("mtcars");
    const order = y
      .map((value, i) => ({ i, fitted: value - fit.residuals[i]! }))
      .sort((one, other) => one.fitted - other.fitted)
      .map(({ i }) => i);
    const half = (rows: readonly number[]) =>
      fitOf(
        designOf(
          rows.map((i) => y[i]!),
          X.map((column) => rows.map((i) => column[i]!)),
        ),
      );
    const [smaller, larger] = [half(order.slice(0, 16)), half(order.slice(16))];
    const { figure } = computedOf(goldfeldQuandt(fit));
    expectDigits(figure.statistic, (larger.sigma / smaller.sigma) ** 2, 10);
    expectDigits(figure.pValue, fTail(figure.statistic, 12, 12), 13);
  });
});
