import { describe, expect, it } from "vitest";
import { breuschGodfrey } from "../../../src/core/diagnostics/breuschGodfrey.ts";
import { breuschPagan } from "../../../src/core/diagnostics/breuschPagan.ts";
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

function expectFigure(found: Figure, expected: ReferenceTest): void {
  expectDigits(found.statistic, expected.statistic, 10);
  if (expected.df !== undefined) expect(found.df).toEqual([expected.df].flat());
  expectDigits(found.pValue, expected.p, 10);
}

describe.each(referenceIds)("%s", (id) => {
  const fit = referenceFit(id);
  const { tests } = reference(id);
  const known = Object.entries(tests).filter(([name]) => name in figures);
  it.each(known)("%s", (name, expected) => expectFigure(figures[name]!(fit), expected));
});
