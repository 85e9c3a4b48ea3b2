import { describe, expect, it } from "vitest";
import { breuschGodfrey } from "../../../src/core/diagnostics/breuschGodfrey.ts";
import { breuschPagan } from "../../../src/core/diagnostics/breuschPagan.ts";
import { arch } from "../../../src/core/diagnostics/arch.ts";
import { chow } from "../../../src/core/diagnostics/chow.ts";
import { cusum } from "../../../src/core/diagnostics/cusum.ts";
import { cusumRecursive } from "../../../src/core/diagnostics/cusumRecursive.ts";
import { durbinWatson } from "../../../src/core/diagnostics/durbinWatson.ts";
import { largestChow } from "../../../src/core/diagnostics/largestChow.ts";
import { reset } from "../../../src/core/diagnostics/reset.ts";
import { goldfeldQuandt } from "../../../src/core/diagnostics/goldfeldQuandt.ts";
import { jarqueBera } from "../../../src/core/diagnostics/jarqueBera.ts";
import { ljungBox } from "../../../src/core/diagnostics/ljungBox.ts";
import { koenker } from "../../../src/core/diagnostics/koenker.ts";
import type { Figure, TestOutcome } from "../../../src/core/diagnostics/outcome.ts";
import type { Fit } from "../../../src/core/fit/fit.ts";
import { whiteFitted, whiteTest } from "../../../src/core/diagnostics/white.ts";
import { expectDigits } from "../../support/digits.ts";
import { reference, referenceFit, referenceIds, type ReferenceTest } from "../../support/referenceFit.ts";

/** How a figure of the reference files is had from a fit, by its key there. */
const figures: Readonly<Record<string, (fit: Fit) => Figure>> = {
  breusch_pagan_koenker: (fit) => figureOf(koenker(fit)),
  breusch_pagan_lm: (fit) => figureOf(breuschPagan(fit)),
  white: (fit) => figureOf(whiteTest(fit, "squares and cross-products")),
  white_special: (fit) => figureOf(whiteFitted(fit)),
  goldfeld_quandt_by_fitted: (fit) => figureOf(goldfeldQuandt(fit)),
  jarque_bera: (fit) => figureOf(jarqueBera(fit)),
  reset_23_fitted: (fit) => figureOf(reset(fit)),
  chow_at_half: (fit) => figureOf(chow(fit, Math.floor(fit.rowCount / 2))),
  sup_F_15: (fit) => figureOf(largestChow(fit)),
  cusum_ols: (fit) => figureOf(cusum(fit)),
  cusum_recursive: (fit) => figureOf(cusumRecursive(fit)),
  ...eachOrder([1, 2, 4, 12], (order) => ({ [`ljung_box_${order}`]: (fit) => figureOf(ljungBox(fit, [order])[0]!) })),
  ...eachOrder([1, 4], (order) => ({ [`arch_lm_${order}`]: (fit) => figureOf(arch(fit, order)) })),
  ...eachOrder([1, 2, 4, 12], (order) => ({
    [`breusch_godfrey_chisq_${order}`]: (fit) => figureOf(breuschGodfrey(fit, order)),
    [`breusch_godfrey_F_${order}`]: (fit) => fFormOf(breuschGodfrey(fit, order)),
  })),
};

function eachOrder<T>(orders: readonly number[], entries: (order: number) => Record<string, T>): Record<string, T> {
  return Object.assign({}, ...orders.map(entries)) as Record<string, T>;
}

function computedOf(outcome: TestOutcome): Extract<TestOutcome, { kind: "computed" }> {
  if (outcome.kind !== "computed") throw new Error(`${outcome.test}: ${outcome.because}`);
  return outcome;
}

const figureOf = (outcome: TestOutcome): Figure => computedOf(outcome).figure;
const fFormOf = (outcome: TestOutcome): Figure => {
  const { fForm } = computedOf(outcome);
  if (fForm === null) throw new Error(`${outcome.test}: no F form`);
  return fForm;
};

function expectFigure(found: Figure, expected: ReferenceTest, name: string): void {
  expectDigits(found.statistic, expected.statistic, 10);
  if (expected.df !== undefined) expect(found.df).toEqual([expected.df].flat());
  expectDigits(found.pValue, expected.p, digitsOfTail(name, expected.p));
}

/** Figures of the files that are not to be reproduced, with the reason. */
const notAuthority: Readonly<Record<string, Readonly<Record<string, string>>>> = {
  "orange-juice-6-lags": {
    goldfeld_quandt_by_fitted:
      "348 of the 606 rows have the same fitted value and lie across the middle; the library ordered them by their last bit",
    cusum_recursive:
      "the first rows have dependent columns; the squares of the library's recursive residuals sum to 13253, not to the RSS of 13401",
  },
  longley: {
    cusum_recursive: "the library's updating keeps six digits; see highPrecision.json",
    sup_F_15: "one place only: the library compares k F, not F, with F(k, n - 2k)",
  },
  "nile-trend": { cusum_recursive: "the library's updating keeps seven digits; see highPrecision.json" },
};

/** The library's series for the exact p-value of Durbin and Watson ends at an absolute error of 1e-14. */
const digitsOfExactTail = (pValue: number): number => Math.min(10, -Math.log10(1e-14 / pValue));

/** Tails that the library takes as 1 - cdf: no digit of them is below 1e-16. */
const byComplement = new Set(["sup_F_15", "cusum_ols", "cusum_recursive"]);

function digitsOfTail(name: string, pValue: number): number {
  return byComplement.has(name) ? Math.min(10, Math.log10(pValue / 4e-16)) : 10;
}

describe.each(referenceIds)("%s", (id) => {
  const fit = referenceFit(id);
  const { tests } = reference(id);
  const known = Object.entries(tests).filter(([name]) => name in figures && !(name in (notAuthority[id] ?? {})));
  const watson = tests["durbin_watson"];
  if (watson !== undefined)
    it("durbin_watson", () => {
      const { form, figure } = computedOf(durbinWatson(fit));
      const exact = watson["p_positive_exact"] as number | undefined;
      expect(form).toBe(exact === undefined ? "normal" : "exact");
      expectDigits(figure.statistic, watson.statistic, 10);
      const expected = exact ?? (watson["p_positive_normal"] as number);
      expectDigits(figure.pValue, expected, digitsOfExactTail(expected));
    });
  it.each(known)("%s", (name, expected) => expectFigure(figures[name]!(fit), expected, name));
});
