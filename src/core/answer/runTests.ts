import { breuschGodfrey } from "../diagnostics/breuschGodfrey.ts";
import { koenker } from "../diagnostics/koenker.ts";
import type { TestOutcome } from "../diagnostics/outcome.ts";
import { whiteTest } from "../diagnostics/white.ts";
import type { Fit } from "../fit/fit.ts";
import type { Report } from "./question.ts";

const usualOrder = 4;

/** Every order up to four, and the one that decides. */
const ordersUpTo = (testOrder: number): number[] => [
  ...new Set([...Array.from({ length: usualOrder }, (_, index) => index + 1), testOrder]),
];

/** Every test that is shown, in the order of the evidence: spread, then follow-on where rows run through time. */
export function runTests(fit: Fit, testOrder: number, report: Report): TestOutcome[] {
  report("Testing whether the spread is even", 0.05);
  const spread = [koenker(fit), whiteTest(fit)];
  report("Testing whether errors follow on", 0.4);
  const followOn =
    fit.design.order.kind === "time" ? ordersUpTo(testOrder).map((order) => breuschGodfrey(fit, order)) : [];
  return [...spread, ...followOn];
}
