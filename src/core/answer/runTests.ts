import type { ErrorsChoice } from "../covariance/choice.ts";
import { arch } from "../diagnostics/arch.ts";
import { breuschGodfreyOrders } from "../diagnostics/breuschGodfrey.ts";
import { breuschPagan } from "../diagnostics/breuschPagan.ts";
import { chow } from "../diagnostics/chow.ts";
import { cusum } from "../diagnostics/cusum.ts";
import { cusumRecursive } from "../diagnostics/cusumRecursive.ts";
import { durbinWatson } from "../diagnostics/durbinWatson.ts";
import { goldfeldQuandt } from "../diagnostics/goldfeldQuandt.ts";
import { jarqueBera } from "../diagnostics/jarqueBera.ts";
import { koenker } from "../diagnostics/koenker.ts";
import { largestChow } from "../diagnostics/largestChow.ts";
import { ljungBox } from "../diagnostics/ljungBox.ts";
import { type TestOutcome, notApplicable } from "../diagnostics/outcome.ts";
import { reset } from "../diagnostics/reset.ts";
import { resetRobust } from "../diagnostics/resetRobust.ts";
import { noTime } from "../diagnostics/timeLine.ts";
import { whiteFitted, whiteTest } from "../diagnostics/white.ts";
import type { Fit } from "../fit/fit.ts";
import type { Report } from "./question.ts";

const usualOrder = 4;

/** Every order up to four, and the one that decides. */
const ordersUpTo = (testOrder: number): number[] => [
  ...new Set([...Array.from({ length: usualOrder }, (_, index) => index + 1), testOrder]),
];

/** The tests that decide between the four cases: spread, then follow-on at each order where rows run through time. */
export function decidingTests(fit: Fit, testOrder: number, report: Report): TestOutcome[] {
  report("Testing whether the spread is even", 0.05);
  const spread = [koenker(fit), whiteTest(fit)];
  report("Testing whether errors follow on", 0.35);
  const followOn =
    fit.design.order.kind === "time"
      ? breuschGodfreyOrders(fit, ordersUpTo(testOrder))
      : [notApplicable("breusch-godfrey", noTime)];
  return [...spread, ...followOn];
}

/** The tests that are shown beside those: on spread, follow-on, curve, shape and breaks. */
export function furtherTests(fit: Fit, inForce: ErrorsChoice, asked: Asked): TestOutcome[] {
  const spread = [breuschPagan(fit), whiteFitted(fit), goldfeldQuandt(fit)];
  const shape = [reset(fit), resetRobust(fit, inForce), jarqueBera(fit)];
  return [...spread, ...throughTime(fit, asked), ...shape];
}

interface Asked {
  readonly testOrder: number;
  /** After how many rows a break is looked for; null for half of them. */
  readonly breakAfter: number | null;
}

/** Tests that need rows in time; where they are not, each says so once. */
function throughTime(fit: Fit, { testOrder, breakAfter }: Asked): TestOutcome[] {
  if (fit.design.order.kind !== "time") {
    const names = ["durbin-watson", "ljung-box", "arch", "chow", "largest-chow", "cusum", "cusum-recursive"] as const;
    return names.map((name) => notApplicable(name, noTime));
  }
  const orders = ordersUpTo(testOrder);
  return [
    durbinWatson(fit),
    ...ljungBox(fit, orders),
    ...orders.map((order) => arch(fit, order)),
    chow(fit, breakAfter ?? Math.floor(fit.rowCount / 2)),
    largestChow(fit),
    cusum(fit),
    cusumRecursive(fit),
  ];
}
