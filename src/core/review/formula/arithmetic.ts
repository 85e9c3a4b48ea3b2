import { type Regression, sameRegression } from "./foundRegression.ts";
import {
  type Combination,
  type Measure,
  type Value,
  after,
  asMeasure,
  each,
  known,
  measured,
  termIn,
  unknown,
} from "./values.ts";
import { whyUnread } from "./whyUnread.ts";

const lost = unknown(whyUnread.goesIntoArithmetic);

/** What two values come to; a block takes part with each of its cells. */
export function combined(sign: string, left: Value, right: Value): Value {
  if (sign === "&") return unknown(whyUnread.goesIntoText);
  if (left.kind === "block") return right.kind === "block" ? lost : each(left, (one) => combined(sign, one, right));
  if (right.kind === "block") return each(right, (one) => combined(sign, left, one));
  if (left.kind === "unknown" && right.kind !== "measure") return left;
  if (left.kind === "known" && right.kind === "known") return calculated(sign, left.value, right.value);
  return withRegressions[sign]?.(left, right) ?? lost;
}

const withRegressions: Readonly<Record<string, (left: Value, right: Value) => Value>> = {
  "+": sum,
  "-": difference,
  "*": product,
  "/": quotient,
  "^": power,
};

const operations: Readonly<Record<string, (left: number, right: number) => number>> = {
  "+": (left, right) => left + right,
  "-": (left, right) => left - right,
  "*": (left, right) => left * right,
  "/": (left, right) => left / right,
  "^": (left, right) => left ** right,
};

function calculated(sign: string, left: number, right: number): Value {
  const value = operations[sign]?.(left, right) ?? NaN;
  return Number.isFinite(value) ? known(value) : lost;
}

function sum(left: Value, right: Value): Value {
  if (left.kind === "combination" && right.kind === "combination") return together(left, right);
  if (right.kind === "known") return shifted(left, right.value);
  if (left.kind === "known") return shifted(right, left.value);
  return bound(left, right, "high") ?? bound(right, left, "high") ?? lost;
}

function difference(left: Value, right: Value): Value {
  if (right.kind === "known") return shifted(left, -right.value);
  return bound(left, right, "low") ?? sum(left, scaled(right, -1));
}

function together(left: Combination, right: Combination): Value {
  if (!sameRegression(left.regression, right.regression)) return unknown(whyUnread.severalAtOnce);
  const weights = new Map(left.weights);
  for (const [term, weight] of right.weights) weights.set(term, (weights.get(term) ?? 0) + weight);
  return { ...left, weights, offset: left.offset + right.offset };
}

function shifted(value: Value, by: number): Value {
  if (value.kind === "combination") return { ...value, offset: value.offset + by };
  return value.kind === "measure" ? after(value, { kind: "back", from: (shown) => shown - by }) : lost;
}

export function scaled(value: Value, by: number): Value {
  if (value.kind === "known") return known(value.value * by);
  if (by === 0) return lost;
  if (value.kind === "measure") return after(value, { kind: "back", from: (shown) => shown / by });
  if (value.kind !== "combination") return lost;
  const weights = new Map([...value.weights].map(([term, weight]) => [term, weight * by]));
  return { ...value, weights, offset: value.offset * by };
}

/** A coefficient with a multiple of its own standard error added or taken away is a bound of its interval. */
function bound(value: Value, margin: Value, side: "low" | "high"): Value | null {
  const term = termIn(value);
  const of = margin.kind === "margin" ? margin.of : margin;
  if (term === undefined || value.kind !== "combination" || !isErrorOf(of, value.regression, term)) return null;
  return measured(value.regression, { kind: side, term });
}

const isErrorOf = (value: Value, regression: Regression, term: number | null): value is Measure =>
  value.kind === "measure" &&
  value.quantity.kind === "standard-error" &&
  value.quantity.term === term &&
  sameRegression(value.regression, regression);

function product(left: Value, right: Value): Value {
  if (right.kind === "known") return scaled(left, right.value);
  if (left.kind === "known") return scaled(right, left.value);
  return marginOf(left, right) ?? marginOf(right, left) ?? lost;
}

/** A quantile of the t law times a standard error. */
function marginOf(quantile: Value, error: Value): Value | null {
  const isError = error.kind === "measure" && error.quantity.kind === "standard-error" && error.steps.length === 0;
  return quantile.kind === "quantile" && isError ? { kind: "margin", of: error } : null;
}

function quotient(left: Value, right: Value): Value {
  if (right.kind === "known") return right.value === 0 ? lost : scaled(left, 1 / right.value);
  const term = termIn(left);
  const isRatio =
    term !== undefined &&
    left.kind === "combination" &&
    isErrorOf(right, left.regression, term) &&
    right.steps.length === 0;
  return isRatio ? measured(left.regression, { kind: "ratio", term }) : lost;
}

function power(left: Value, right: Value): Value {
  const squared = right.kind === "known" && right.value === 2;
  const isCorrelation = left.kind === "measure" && left.quantity.kind === "correlation" && left.steps.length === 0;
  return squared && isCorrelation ? measured(left.regression, { kind: "r-squared" }) : lost;
}

/** A value as one quantity, where it is one. */
export function quantityIn(value: Value): Measure | null {
  if (value.kind === "measure") return value;
  return value.kind === "combination" ? asMeasure(value) : null;
}
