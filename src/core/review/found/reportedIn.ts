import type { CellPlace } from "../cellsOfBook.ts";
import { addressAt } from "../cellsOfBook.ts";
import type { Quantity, ReportedNumber } from "../claim.ts";
import type { Regression } from "../formula/foundRegression.ts";
import type { Measure, Step } from "../formula/values.ts";
import { shownNumberAt } from "./shownNumber.ts";

/**
 * The number that a cell reports of a regression, led back through what the formula did to it, and out of the factors
 * by which its lines were multiplied: in the units of the cells that went in.
 * @returns null where the cell shows no number, or one that cannot be led back.
 */
export function reportedIn(place: CellPlace, measure: Measure): ReportedNumber | null {
  const shown = shownNumberAt(place, true);
  if (shown === null) return null;
  const { quantity, steps } = inUnitsOfCells(measure);
  const found = ledBack(shown, steps);
  return found === null ? null : { quantity, ...found, cell: addressAt(place), shown: shown.shown };
}

type Amount = Pick<ReportedNumber, "value" | "halfUnit">;

/** The last step is undone first. */
function ledBack({ value, halfUnit }: Amount, steps: readonly Step[]): Amount | null {
  let amount: Amount = { value, halfUnit };
  for (const step of [...steps].reverse()) {
    if (step.kind === "rounded") amount = { ...amount, halfUnit: Math.max(amount.halfUnit, step.half) };
    else {
      const middle = step.from(amount.value);
      const ends = [step.from(amount.value - amount.halfUnit), step.from(amount.value + amount.halfUnit)];
      const widths = ends.filter(Number.isFinite).map((end) => Math.abs(end - middle));
      if (!Number.isFinite(middle) || widths.length === 0) return null;
      amount = { value: middle, halfUnit: Math.max(...widths) };
    }
  }
  return amount;
}

function inUnitsOfCells({ regression, quantity, steps }: Measure): Pick<Measure, "quantity" | "steps"> {
  const inside = quantityInUnits(regression, quantity);
  const factor = factorOf(regression, quantity);
  return factor === 1
    ? { quantity: inside, steps }
    : { quantity: inside, steps: [{ kind: "back", from: (shown) => shown / factor }, ...steps] };
}

/** A prediction's drivers, out of the factors by which they enter. */
function quantityInUnits({ drivers }: Regression, quantity: Quantity): Quantity {
  if (quantity.kind !== "prediction") return quantity;
  return { kind: "prediction", at: quantity.at.map((value, term) => value / drivers[term]!.factor) };
}

/** How many times as large a quantity comes out as it would from the cells as they are. */
function factorOf({ outcome, drivers }: Regression, quantity: Quantity): number {
  const term = "term" in quantity ? quantity.term : 0;
  const driver = term === null ? 1 : (drivers[term]?.factor ?? 1);
  return factors[quantity.kind]?.(outcome.factor, driver) ?? 1;
}

const perDriver = (outcome: number, driver: number): number => outcome / driver;

const factors: Partial<Record<Quantity["kind"], (outcome: number, driver: number) => number>> = {
  coefficient: perDriver,
  low: perDriver,
  high: perDriver,
  "standard-error": (outcome, driver) => Math.abs(outcome / driver),
  ratio: (outcome, driver) => Math.sign(outcome * driver),
  correlation: (outcome, driver) => Math.sign(outcome * driver),
  sigma: Math.abs,
  prediction: (outcome) => outcome,
  "explained-sum-of-squares": (outcome) => outcome ** 2,
  "residual-sum-of-squares": (outcome) => outcome ** 2,
};
