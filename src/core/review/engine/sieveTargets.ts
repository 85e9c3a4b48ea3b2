import { roundedTwice } from "./agreement.ts";
import type { MomentSolution } from "../../numeric/momentSolver.ts";
import type { Quantity, ReportedNumber } from "../claim.ts";
import { isErrorQuantity, plainQuantity, wholeValue } from "./quantities.ts";
import type { ModelRecipe } from "./recipe.ts";

/** A reported number as the sieve looks at it: the range that is shown so. */
export interface SieveTarget {
  readonly reported: ReportedNumber;
  readonly quantity: Quantity;
  readonly asClaimed: number | null;
  readonly least: number;
  readonly most: number;
  readonly ofConstant: boolean;
  readonly needsBreads: boolean;
}

/** What is told soonest first. Standard errors and ratios are looked at, as classical ones, only where nothing else is. */
export function sieveTargets({ reported, asClaimed }: Baseline): SieveTarget[] {
  const all = reported.map((number, index) => targetOf(number, asClaimed[index] ?? null));
  const plain = all.filter(({ quantity }) => plainQuantity(quantity) !== null);
  if (plain.length > 0) return plain.toSorted((one, other) => rankOf(one) - rankOf(other));
  return all.filter(({ quantity }) => quantity.kind === "standard-error" || quantity.kind === "ratio");
}

const order: readonly Quantity["kind"][] = ["observations", "degrees-of-freedom", "coefficient", "r-squared", "sigma"];

function rankOf({ quantity: { kind } }: SieveTarget): number {
  const rank = order.indexOf(kind);
  return rank < 0 ? order.length : rank;
}

const targetOf = (reported: ReportedNumber, asClaimed: number | null): SieveTarget => ({
  reported,
  quantity: reported.quantity,
  asClaimed,
  least: reported.value - reported.halfUnit * roundedTwice,
  most: reported.value + reported.halfUnit * roundedTwice,
  ofConstant:
    reported.quantity.kind === "prediction" || ("term" in reported.quantity && reported.quantity.term === null),
  needsBreads: isErrorQuantity(reported.quantity),
});

/** What moments give for a quantity; null where the regression has no such quantity. */
export function targetValue(quantity: Quantity, model: ModelRecipe, solution: MomentSolution): number | null {
  const factor = model.factors[model.outcome] ?? 1;
  if (isErrorQuantity(quantity)) return classicalValue(quantity, model, solution);
  switch (quantity.kind) {
    case "coefficient":
      return coefficient(quantity.term, model, solution);
    case "prediction":
      return predicted(quantity.at, model, solution);
    case "standard-error":
    case "ratio":
    case "p-value":
    case "low":
    case "high":
      return null;
    default:
      return wholeValue(quantity.kind, {
        rows: solution.rows,
        columns: model.drivers.length + (model.constant ? 1 : 0),
        constant: model.constant,
        rss: solution.rss * factor ** 2,
        tss: solution.tss * factor ** 2,
        slope: solution.slopes[0]!,
      });
  }
}

function coefficient(term: number | null, model: ModelRecipe, solution: MomentSolution): number | null {
  const factor = model.factors[model.outcome] ?? 1;
  if (term === null) return solution.constant * factor;
  const place = model.reportedAs[term] ?? null;
  return place === null ? null : (solution.slopes[place]! * factor) / (model.factors[model.drivers[place]!] ?? 1);
}

function predicted(at: readonly number[], model: ModelRecipe, solution: MomentSolution): number | null {
  let sum = coefficient(null, model, solution) ?? 0;
  for (let term = 0; term < model.reportedAs.length; term++) {
    const slope = coefficient(term, model, solution);
    const value = at[term];
    if (slope === null || value === undefined) return null;
    sum += slope * value;
  }
  return sum;
}

/** The constant's error is not to be had from the drivers' breads; it is left to the fit. */
function classicalValue(
  { kind, term }: { readonly kind: Quantity["kind"]; readonly term: number | null },
  model: ModelRecipe,
  solution: MomentSolution,
): number | null {
  const place = term === null ? null : (model.reportedAs[term] ?? null);
  if (place === null) return null;
  const degrees = solution.rows - model.drivers.length - (model.constant ? 1 : 0);
  const error = Math.sqrt((solution.rss / degrees) * solution.breads[place]!);
  if (kind === "ratio") return solution.slopes[place]! / error;
  const factor = (model.factors[model.outcome] ?? 1) / (model.factors[model.drivers[place]!] ?? 1);
  return error * factor;
}

/** Reported numbers beside what the cells give for them as claimed. */
export interface Baseline {
  readonly reported: readonly ReportedNumber[];
  readonly asClaimed: readonly (number | null)[];
}
