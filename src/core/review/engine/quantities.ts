import type { Fit } from "../../fit/fit.ts";
import { fTail } from "../../numeric/distributions.ts";
import type { Quantity } from "../claim.ts";
import type { ModelRecipe } from "./recipe.ts";

type TermQuantity = Extract<Quantity, { readonly term: number | null }>;

/** A quantity that rests on the choice of standard errors. */
export interface ErrorQuantity {
  readonly kind: Exclude<TermQuantity["kind"], "coefficient">;
  readonly term: number | null;
}

export type PlainQuantity =
  { readonly kind: "coefficient"; readonly term: number | null } | Exclude<Quantity, TermQuantity>;

export const isErrorQuantity = (quantity: Quantity): quantity is ErrorQuantity =>
  "term" in quantity && quantity.kind !== "coefficient";

/** @returns null for a quantity that rests on standard errors. */
export const plainQuantity = (quantity: Quantity): PlainQuantity | null =>
  isErrorQuantity(quantity) ? null : (quantity as PlainQuantity);

/** The place among a fit's coefficients of a claimed term (null the constant); null where it has none. */
export function placeOf(term: number | null, { constant, reportedAs }: ModelRecipe): number | null {
  if (term === null) return constant ? 0 : null;
  const place = reportedAs[term] ?? null;
  return place === null ? null : place + (constant ? 1 : 0);
}

/** What a fit gives for a quantity that does not rest on standard errors; null where it has no such quantity. */
export function plainValue(quantity: PlainQuantity, fit: Fit, model: ModelRecipe): number | null {
  switch (quantity.kind) {
    case "coefficient": {
      const place = placeOf(quantity.term, model);
      // A regression through the origin has the constant 0, and spreadsheets print it so.
      if (place === null) return quantity.term === null ? 0 : null;
      return fit.coefficients[place]!;
    }
    case "prediction":
      return predicted(quantity.at, fit, model);
    default:
      return wholeValue(quantity.kind, sumsOf(fit));
  }
}

function predicted(at: readonly number[], { coefficients }: Fit, model: ModelRecipe): number | null {
  let sum = model.constant ? coefficients[0]! : 0;
  for (let term = 0; term < model.reportedAs.length; term++) {
    const place = placeOf(term, model);
    const value = at[term];
    if (place === null || value === undefined) return null;
    sum += coefficients[place]! * value;
  }
  return sum;
}

/** What the figures of a regression as a whole are made from. */
export interface Sums {
  readonly rows: number;
  /** The constant counted. */
  readonly columns: number;
  readonly constant: boolean;
  readonly rss: number;
  readonly tss: number;
  /** Of the first driver, for a correlation's sign. */
  readonly slope: number;
}

const sumsOf = ({ design, ...fit }: Fit): Sums => ({
  rows: fit.rowCount,
  columns: fit.columnCount,
  constant: design.hasConstant,
  rss: fit.residualSumOfSquares,
  tss: fit.totalSumOfSquares,
  slope: fit.coefficients[design.hasConstant ? 1 : 0] ?? 0,
});

export type WholeKind = Exclude<PlainQuantity["kind"], "coefficient" | "prediction">;

/** A figure of the regression as a whole. */
export const wholeValue = (kind: WholeKind, sums: Sums): number => wholes[kind](sums);

const degrees = ({ rows, columns }: Sums): number => rows - columns;
const drivers = ({ columns, constant }: Sums): number => columns - (constant ? 1 : 0);
const rSquared = ({ rss, tss }: Sums): number => 1 - rss / tss;
const f = (sums: Sums): number => (sums.tss - sums.rss) / drivers(sums) / (sums.rss / degrees(sums));

const wholes: Readonly<Record<WholeKind, (sums: Sums) => number>> = {
  "r-squared": rSquared,
  "adjusted-r-squared": (sums) => 1 - ((1 - rSquared(sums)) * (sums.rows - (sums.constant ? 1 : 0))) / degrees(sums),
  correlation: (sums) => (drivers(sums) === 1 && sums.slope < 0 ? -1 : 1) * Math.sqrt(Math.max(0, rSquared(sums))),
  sigma: (sums) => Math.sqrt(sums.rss / degrees(sums)),
  f,
  "f-p-value": (sums) => fTail(Math.max(0, f(sums)), drivers(sums), degrees(sums)),
  "degrees-of-freedom": degrees,
  observations: ({ rows }) => rows,
  "explained-sum-of-squares": ({ rss, tss }) => tss - rss,
  "residual-sum-of-squares": ({ rss }) => rss,
};
