import { describe, expect, it } from "vitest";
import { breaksGuard } from "../../../../src/core/diagnostics/guards/breaks.ts";
import type { Collinearity } from "../../../../src/core/diagnostics/guards/collinearity.ts";
import { collinearityGuard } from "../../../../src/core/diagnostics/guards/collinearityGuard.ts";
import { namesInWords } from "../../../../src/core/diagnostics/guards/guard.ts";
import type { Influence, InfluentialRow } from "../../../../src/core/diagnostics/guards/influence.ts";
import { influenceGuard } from "../../../../src/core/diagnostics/guards/influenceGuard.ts";
import { rowsGuard } from "../../../../src/core/diagnostics/guards/rows.ts";
import { type Trending, trendingGuard } from "../../../../src/core/diagnostics/guards/trending.ts";
import { type TestName, type TestOutcome, computed, notApplicable } from "../../../../src/core/diagnostics/outcome.ts";
import { designOf, fitOf, inGroups, throughTime } from "../../../support/referenceFit.ts";

const term = (name: string, inflation: number, madeOf: readonly string[] = []) => ({ term: name, inflation, madeOf });
const collinearityOf = (terms: Collinearity["terms"], conditionNumber = 50): Collinearity => ({
  terms,
  conditionNumber,
  dependencies: [],
});

describe("words about collinearity", () => {
  it("name a term from an inflation of ten on, the worst first and five at most", () => {
    const six = ["A", "B", "C", "D", "E", "F"].map((name, i) => term(name, 10 + i));
    const { sentences } = collinearityGuard(collinearityOf([...six, term("G", 9.99)]));
    expect(sentences.map((sentence) => sentence.slice(0, 1))).toEqual(["F", "E", "D", "C", "B", "1", "W"]);
    expect(sentences[5]).toBe("1 more drivers are nearly made up of the others.");
    expect(collinearityGuard(collinearityOf(six.slice(0, 5))).sentences).toHaveLength(6);
  });

  it("say of what, and how much wider", () => {
    const sentence = (inflation: number, madeOf: readonly string[]): string =>
      collinearityGuard(collinearityOf([term("Total", inflation, madeOf)])).sentences[0]!;
    expect(sentence(12.25, [])).toBe(
      "Total is nearly made up of the other drivers: its standard error is 3.5 times what it would be if they did not move together.",
    );
    expect(sentence(100, ["A", "B", "C", "D", "E", "F"])).toContain(
      "made up of A, B, C, D and E: its standard error is 10 times",
    );
    expect(sentence(99, ["A"])).toContain("is 9.9 times");
  });

  it("call it pressing where the cells' own rounding shows", () => {
    const findingAt = (condition: number) => collinearityGuard(collinearityOf([term("A", 11)], condition)).finding;
    expect([findingAt(1e7), findingAt(1.01e7)]).toEqual(["worth knowing", "look into it"]);
    expect(collinearityGuard(collinearityOf([]))).toEqual({
      guard: "collinearity",
      finding: "nothing found",
      sentences: ["No driver is nearly made up of the others."],
    });
    expect([namesInWords([]), namesInWords(["A"]), namesInWords(["A", "B", "C"])]).toEqual(["", "A", "A, B and C"]);
  });
});

describe("words about single rows", () => {
  const y = Array.from({ length: 20 }, (_, i) => ((i * 7) % 11) / 3);
  const fit = fitOf(designOf(y, [y.map((_, i) => i)], { names: ["Price"] }));
  const nothing: Influence = {
    ...{ outside: new Float64Array(20), cook: new Float64Array(20), dffits: new Float64Array(20) },
    selfFitting: [],
  };
  const row = (number: number, found: Partial<InfluentialRow> = {}): InfluentialRow => ({
    ...{ row: number, leverage: 0.1, outside: 2, cook: 0.1, dffits: 0.2, dfbetas: [0, 0], outlierPValue: 0.9 },
    ...found,
  });
  const words = (rows: readonly InfluentialRow[], measures = nothing) =>
    influenceGuard({ fit, measures, rows }, (number) => `row ${number}`);

  it("say that there are none", () => {
    expect(words([row(3, { dfbetas: [1, -1], outlierPValue: 0.05 })])).toEqual({
      guard: "influence",
      finding: "nothing found",
      sentences: ["No single row moves a coefficient by as much as its standard error."],
    });
  });

  it("name what a row moves, the most first, of five rows at most", () => {
    const moving = [1, 2, 3, 4, 5, 6].map((number) => row(number, { dfbetas: [1.25, -2.5] }));
    const { sentences, finding } = words(moving);
    expect(finding).toBe("worth knowing");
    expect(sentences).toHaveLength(5);
    expect(sentences[0]).toBe(
      "Leaving out row 1 changes the coefficient of Price by 2.5 and the constant by 1.3 standard errors.",
    );
  });

  it("name rows that lie far off, five at most, and call them pressing", () => {
    const off = [1, 2, 3, 4, 5, 6].map((number) => row(number, { outside: -4.26, outlierPValue: 0.049 }));
    const { sentences, finding } = words(off);
    expect(finding).toBe("look into it");
    expect(sentences).toEqual(
      [1, 2, 3, 4, 5].map((number) => `row ${number} lies 4.3 standard deviations off the fit of the other rows.`),
    );
  });

  it("name five rows that fit themselves and count the others", () => {
    const alone = (count: number) => words([], { ...nothing, selfFitting: Array.from({ length: count }, (_, i) => i) });
    expect(alone(5).sentences[0]).toContain("row 0, row 1, row 2, row 3 and row 4 whatever");
    expect(alone(7).sentences[0]).toContain("row 0, row 1, row 2, row 3 and row 4 and 2 more whatever");
  });
});

describe("words about time and groups", () => {
  it("count gaps beyond those that are named", () => {
    const time = throughTime(6, [0, 2, 4, 6, 8, 9]);
    if (time.kind !== "time") throw new Error(time.kind);
    const month = { ...time, period: { ...time.period, unit: "month" } };
    expect(rowsGuard({ ...month, gaps: 4, gapLabels: ["May", "June"] })!.sentences[0]).toBe(
      "4 months have no row: May and June and 2 more.",
    );
    expect(rowsGuard({ ...month, gaps: 1, gapLabels: ["May"] })!.sentences[0]).toBe("One month has no row: May.");
    expect(rowsGuard({ ...month, gaps: 0, gapLabels: [] })!.sentences).toEqual([
      `Every month from ${time.labels.first} to ${time.labels.last} has its row.`,
    ]);
  });

  it("say how many groups there are, and where they are few", () => {
    const groupsOf = (count: number) => rowsGuard(inGroups(Array.from({ length: 2 * count }, (_, i) => i >> 1)))!;
    expect(groupsOf(42).sentences).toEqual([
      expect.stringMatching(/^There are 42 groups by .*, none of them very large\.$/),
    ]);
    expect(groupsOf(41).sentences).toEqual([expect.stringMatching(/^There are only 41 groups by /)]);
    const crossed = inGroups(Array.from({ length: 200 }, (_, i) => i >> 1));
    const halves = { groups: Int32Array.from({ length: 200 }, (_, i) => i % 2), labels: ["A", "B"], by: "Half" };
    expect(rowsGuard({ ...crossed, second: halves } as typeof crossed)).toEqual({
      guard: "groups",
      finding: "look into it",
      sentences: [
        "There are only 2 groups by Half: standard errors by group are then often too small.",
        '"A" holds 50 % of the rows, so that there are fewer groups than it seems.',
      ],
    });
  });
});

describe("words about breaks", () => {
  const found = (test: TestName, pValue: number, details: Readonly<Record<string, number>> = {}): TestOutcome =>
    computed({
      test,
      form: null,
      order: null,
      figure: { statistic: 2, law: "limit", df: [], pValue },
      fForm: null,
      details,
    });

  const at = (followsOn = false) => ({ level: 0.05, followsOn });

  it("doubt the tests where errors follow on, which makes them see changes that are none", () => {
    const name = (row: number): string => `row ${row}`;
    const largest = found("largest-chow", 0.01, { firstRows: 12 });
    expect(breaksGuard([found("cusum", 0.2), largest], at(true), name)).toEqual({
      guard: "breaks",
      finding: "worth knowing",
      sentences: [
        "By the largest Chow statistic (largest between row 11 and row 12) the coefficients would change over the period. But the errors follow on, and then this test finds changes where there are none: look at the residuals through time before you believe it.",
      ],
    });
    const both = breaksGuard([found("cusum", 0.01), largest], at(true), name)!.sentences;
    expect(both).toEqual([
      expect.stringMatching(/^By the CUSUM test on the residuals and the largest Chow .* then these tests find/),
    ]);
    expect(breaksGuard([found("cusum", 0.2)], at(true), name)!.finding).toBe("nothing found");
  });

  it("go by the tests on breaks alone, and say where", () => {
    const others = [found("koenker", 0.001), notApplicable("largest-chow", "too few rows")];
    expect(breaksGuard(others, at(), String)).toBeNull();
    const calm = breaksGuard([...others, found("cusum", 0.05)], at(), String);
    expect(calm).toEqual({
      guard: "breaks",
      finding: "nothing found",
      sentences: ["No change of the coefficients over the period shows."],
    });
    const moved = [found("cusum", 0.04), found("largest-chow", 0.01, { firstRows: 12 })];
    const { sentences, finding } = breaksGuard([...others, ...moved], at(), (row) => `row ${row}`)!;
    expect(finding).toBe("look into it");
    expect(sentences).toHaveLength(2);
    expect(sentences[0]).not.toContain("largest between");
    expect(sentences[1]).toMatch(/ It is largest between row 11 and row 12\.$/);
  });
});

describe("words about series that wander", () => {
  const suspected: Trending = { suspected: true, durbinWatson: 0.4, unitRoot: null };
  const withRoot = (statistic: number) =>
    trendingGuard({ ...suspected, unitRoot: { statistic, lags: 2, critical: [-4, -3.4, -3.1] } });

  it("advise changes unless the residuals return to zero", () => {
    const advice = "Try the changes from period to period instead of the levels, or add a trend.";
    expect(withRoot(-3.41)).toMatchObject({ finding: "worth knowing" });
    expect(withRoot(-3.41).sentences).toHaveLength(2);
    expect(withRoot(-3.41).sentences[1]).toBe(
      "The residuals return to zero, though (unit-root test of the residuals -3.41, 5 % point -3.40): the series belong together.",
    );
    expect(withRoot(-3.4).finding).toBe("look into it");
    expect(withRoot(-3.4).sentences.at(-1)).toBe(advice);
    expect(trendingGuard(suspected).sentences.at(-1)).toBe(advice);
    expect(trendingGuard({ ...suspected, suspected: false }).sentences).toEqual([
      "R-squared is not above the Durbin-Watson statistic: no sign of series that merely wander side by side.",
    ]);
  });
});
