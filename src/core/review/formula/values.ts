import type { Quantity } from "../claim.ts";
import type { Regression } from "./foundRegression.ts";

/** What a formula, or a part of it, comes to: a number, or something that a regression gives. */
export type Value =
  | { readonly kind: "known"; readonly value: number }
  | Measure
  | Combination
  | { readonly kind: "block"; readonly rows: readonly (readonly Value[])[] }
  /** A standard error times an unknown number, as it is added to a coefficient for a bound. */
  | { readonly kind: "margin"; readonly of: Measure }
  /** The size of a quantity, its sign taken off. */
  | { readonly kind: "size"; readonly of: Measure }
  /** What T.INV.2T gives. */
  | { readonly kind: "quantile" }
  | { readonly kind: "unknown"; readonly why: string };

/** A quantity of a regression, and what has been done to it since. */
export interface Measure {
  readonly kind: "measure";
  readonly regression: Regression;
  readonly quantity: Quantity;
  /** From the inside out. */
  readonly steps: readonly Step[];
}

/** Back from what is shown to what it was made of; a rounding loses digits that no step back restores. */
export type Step =
  | { readonly kind: "back"; readonly from: (shown: number) => number }
  | { readonly kind: "rounded"; readonly half: number };

/** Coefficients of one regression, each times a number, and a number beside; null stands for the constant. */
export interface Combination {
  readonly kind: "combination";
  readonly regression: Regression;
  readonly weights: ReadonlyMap<number | null, number>;
  readonly offset: number;
}

export const known = (value: number): Value => ({ kind: "known", value });

export const unknown = (why: string): Value => ({ kind: "unknown", why });

export const measured = (regression: Regression, quantity: Quantity): Measure => ({
  kind: "measure",
  regression,
  quantity,
  steps: [],
});

export const coefficient = (regression: Regression, term: number | null): Combination => ({
  kind: "combination",
  regression,
  weights: new Map([[term, 1]]),
  offset: 0,
});

/** The same with one more step taken. */
export const after = (measure: Measure, step: Step): Measure => ({ ...measure, steps: [...measure.steps, step] });

/** The term whose coefficient a value is, once and with nothing beside; undefined for anything else. */
export function termIn(value: Value): number | null | undefined {
  if (value.kind !== "combination" || value.offset !== 0 || value.weights.size !== 1) return undefined;
  const [[term, weight]] = [...value.weights] as [[number | null, number]];
  return weight === 1 ? term : undefined;
}

/**
 * A combination as one quantity: a coefficient times a number, or, where every driver and the constant take part, the
 * prediction at the drivers' values. Null for any other.
 */
export function asMeasure({ regression, weights, offset }: Combination): Measure | null {
  const [first] = weights;
  if (first !== undefined && weights.size === 1) {
    const [term, weight] = first;
    if (weight === 0) return null;
    const coefficient = measured(regression, { kind: "coefficient", term });
    if (weight === 1 && offset === 0) return coefficient;
    return after(coefficient, { kind: "back", from: (shown) => (shown - offset) / weight });
  }
  const at = regression.drivers.map((_, term) => weights.get(term));
  const whole = at.every((weight) => weight !== undefined);
  if (!whole || (weights.get(null) ?? 0) !== (regression.constant ? 1 : 0)) return null;
  const prediction = measured(regression, { kind: "prediction", at });
  return offset === 0 ? prediction : after(prediction, { kind: "back", from: (shown) => shown - offset });
}

/** One value in the place of a block or of a single value: as a formula shows it that fills one cell. */
export const cornerOf = (value: Value): Value => (value.kind === "block" ? (value.rows[0]?.[0] ?? unknown("")) : value);

/** Does to each value of a block what is done to one. */
export const each = (value: Value, change: (one: Value) => Value): Value =>
  value.kind === "block" ? { kind: "block", rows: value.rows.map((row) => row.map(change)) } : change(value);
