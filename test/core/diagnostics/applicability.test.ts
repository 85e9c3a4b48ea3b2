import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { arch } from "../../../src/core/diagnostics/arch.ts";
import { breuschGodfreyOrders } from "../../../src/core/diagnostics/breuschGodfrey.ts";
import { breuschPagan } from "../../../src/core/diagnostics/breuschPagan.ts";
import { chow } from "../../../src/core/diagnostics/chow.ts";
import { cusum } from "../../../src/core/diagnostics/cusum.ts";
import { cusumRecursive } from "../../../src/core/diagnostics/cusumRecursive.ts";
import { durbinWatson } from "../../../src/core/diagnostics/durbinWatson.ts";
import { goldfeldQuandt } from "../../../src/core/diagnostics/goldfeldQuandt.ts";
import { jarqueBera } from "../../../src/core/diagnostics/jarqueBera.ts";
import { koenker } from "../../../src/core/diagnostics/koenker.ts";
import { largestChow } from "../../../src/core/diagnostics/largestChow.ts";
import { ljungBox } from "../../../src/core/diagnostics/ljungBox.ts";
import type { TestOutcome } from "../../../src/core/diagnostics/outcome.ts";
import { reset } from "../../../src/core/diagnostics/reset.ts";
import { resetRobust } from "../../../src/core/diagnostics/resetRobust.ts";
import { testWords } from "../../../src/core/diagnostics/words.ts";
import { whiteFitted, whiteTest } from "../../../src/core/diagnostics/white.ts";
import type { Fit } from "../../../src/core/fit/fit.ts";
import { fitLeastSquares } from "../../../src/core/fit/fitLeastSquares.ts";
import { randomFrom } from "../../support/random.ts";
import { expectDigits } from "../../support/digits.ts";
import { designOf, fitOf, referenceFit, throughTime } from "../../support/referenceFit.ts";

const everyTest = (fit: Fit): TestOutcome[] => [
  koenker(fit),
  breuschPagan(fit),
  whiteTest(fit),
  whiteFitted(fit),
  goldfeldQuandt(fit),
  ...breuschGodfreyOrders(fit, [1, 2, 4]),
  durbinWatson(fit),
  ...ljungBox(fit, [1, 2, 4]),
  arch(fit, 1),
  arch(fit, 4),
  reset(fit),
  resetRobust(fit, { kind: "white", version: "HC3" }),
  jarqueBera(fit),
  chow(fit, Math.floor(fit.rowCount / 2)),
  largestChow(fit),
  cusum(fit),
  cusumRecursive(fit),
];

/** Columns as a sheet may hold them: numbers, indicators, a trend, whole numbers with many repeats. */
const shapes = [
  (random: () => number) => 40 + 5 * random(),
  (random: () => number) => (random() > 0.3 ? 1 : 0),
  (_: () => number, i: number) => i,
  (random: () => number) => Math.round(random()),
] as const;

describe("every test", () => {
  it("is a number in its range or a reason, on any design that can be fitted", () => {
    const draws = fc.record({
      seed: fc.nat(99999),
      n: fc.integer({ min: 2, max: 14 }),
      columns: fc.array(fc.constantFrom(...shapes), { maxLength: 3 }),
      wholeNumbers: fc.boolean(),
      constant: fc.boolean(),
      step: fc.constantFrom(1, 2),
    });
    let fitted = 0;
    fc.assert(
      fc.property(draws, ({ seed, n, columns, wholeNumbers, constant, step }) => {
        const random = randomFrom(seed);
        const X = columns.map((shape) => Array.from({ length: n }, (_, i) => shape(random.normal, i)));
        const y = Array.from({ length: n }, () => (wholeNumbers ? Math.round(2 * random.normal()) : random.normal()));
        const order = throughTime(
          n,
          Array.from({ length: n }, (_, i) => (i < n / 2 ? i : i + step - 1)),
        );
        const fit = fitLeastSquares(designOf(y, X, { order, constant }));
        if (!fit.ok || fit.value.columnCount === 0) return;
        fitted += 1;
        for (const outcome of everyTest(fit.value)) {
          if (outcome.kind === "not-applicable") {
            expect(outcome.because.length).toBeGreaterThan(10);
            continue;
          }
          for (const figure of [outcome.figure, outcome.fForm ?? outcome.figure]) {
            expect(figure.statistic, outcome.test).toBeGreaterThanOrEqual(outcome.test === "largest-chow" ? -1e-9 : 0);
            expect(figure.pValue >= 0 && figure.pValue <= 1, outcome.test).toBe(true);
            for (const df of figure.df) expect(df).toBeGreaterThanOrEqual(1);
          }
        }
      }),
      { seed: 20010911, numRuns: 1500 },
    );
    expect(fitted).toBeGreaterThan(500);
  });

  it("has its words", () => {
    const titles = new Set<string>();
    for (const words of Object.values(testWords)) {
      expect(words.question).toMatch(/\?$/);
      expect(words.rejected).toMatch(/[.)]$/);
      expect(words.notRejected).toMatch(/[.)]$/);
      expect(words.source).toMatch(/\d{4}/);
      expect(`${words.rejected} ${words.notRejected}`).not.toMatch(/\b(prove|accept|cause)/);
      titles.add(words.title);
    }
    expect(titles.size).toBe(Object.keys(testWords).length);
  });
});

describe("a test does not apply", () => {
  const random = randomFrom(17);
  const draw = (n: number): number[] => Array.from({ length: n }, () => random.normal());
  const inTime = (n: number, q: number): Fit =>
    fitOf(
      designOf(
        draw(n),
        Array.from({ length: q }, () => draw(n)),
        { order: throughTime(n) },
      ),
    );

  // Residuals of one size, their signs unrelated to the driver.
  const signs = [1, -1, -1, 1, 1, -1, -1, 1];
  const equalSizes = fitOf(
    designOf(
      signs.map((sign) => 10 + sign / 3),
      [[1.1, 1.1, -1.1, -1.1, 0, 0, 0.3, 0.3]],
      { order: throughTime(8) },
    ),
  );

  it.each([
    // Three columns and the halves of seven rows: three rows fit themselves.
    ["goldfeld-quandt", () => goldfeldQuandt(inTime(7, 2)), /too few/],
    ["goldfeld-quandt", () => goldfeldQuandt(inTime(6, 2)), /too few/],
    // Four rows: the constant, two drivers and a lag leave none over.
    ["breusch-godfrey", () => breuschGodfreyOrders(inTime(4, 2), [1])[0]!, /4 rows are too few for the 4 columns/],
    ["koenker", () => koenker(fitOf(designOf(draw(5), []))), /nothing that could show it varies/],
    ["koenker", () => koenker(equalSizes), /all equal/],
    ["white", () => whiteTest(equalSizes), /all equal/],
    ["arch", () => arch(equalSizes, 1), /all equal/],
    ["arch", () => arch(inTime(6, 1), 3), /3 rows are too few for the 4 columns/],
    ["ljung-box", () => ljungBox(inTime(6, 1), [6])[0]!, /6 rows are too few for 6 lags/],
    ["reset", () => reset(fitOf(designOf(draw(9), [[0, 1, 0, 1, 1, 0, 0, 1, 0]]))), /combinations of the drivers/],
    ["reset", () => reset(inTime(5, 2)), /too few/],
    ["reset-robust", () => resetRobust(inTime(5, 2), { kind: "white", version: "HC1" }), /too few/],
    [
      "reset-robust",
      () => resetRobust(fitOf(designOf(draw(9), [[0, 1, 0, 1, 1, 0, 0, 1, 0]])), { kind: "classical" }),
      /combinations/,
    ],
    ["cusum-recursive", () => cusumRecursive(inTime(4, 2)), /too few/],
    ["largest-chow", () => largestChow(inTime(130, 40)), /more than 40 coefficients/],
  ] as const)("%s %#", (test, outcomeOf, because) => {
    const outcome = outcomeOf();
    expect(outcome).toMatchObject({ kind: "not-applicable", test });
    expect(outcome.kind === "not-applicable" && outcome.because).toMatch(because);
  });

  it("but with one row more it does", () => {
    expect(goldfeldQuandt(inTime(8, 2)).kind).toBe("computed");
    expect(breuschGodfreyOrders(inTime(5, 2), [1])[0]!.kind).toBe("computed");
    expect(arch(inTime(8, 1), 3).kind).toBe("computed");
    expect(ljungBox(inTime(7, 1), [6])[0]!.kind).toBe("computed");
    expect(cusumRecursive(inTime(5, 2)).kind).toBe("computed");
  });
});

describe("RESET", () => {
  it("takes one power where the other is made up of the rest", () => {
    const random = randomFrom(5);
    const x = Array.from({ length: 30 }, (_, i) => (i % 3) - 1);
    const y = x.map((value) => 2 * value + random.normal());
    const fit = fitOf(designOf(y, [x]));
    const [plain, robust] = [reset(fit), resetRobust(fit, { kind: "classical" })];
    expect(plain.kind === "computed" && plain.figure.df).toEqual([1, 27]);
    if (plain.kind !== "computed" || robust.kind !== "computed") throw new Error("not computed");
    expectDigits(robust.fForm!.statistic, plain.figure.statistic, 10);
    expectDigits(robust.fForm!.pValue, plain.figure.pValue, 10);
  });

  it("with the classical covariance is the plain one", () => {
    for (const id of ["mtcars", "wages", "school-scores-3", "longley"]) {
      const fit = referenceFit(id);
      const [plain, robust] = [reset(fit), resetRobust(fit, { kind: "classical" })];
      if (plain.kind !== "computed" || robust.kind !== "computed") throw new Error(id);
      expectDigits(robust.fForm!.statistic, plain.figure.statistic, 8);
    }
  });
});
