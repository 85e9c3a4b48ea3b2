import { type MomentModel, type MomentSolution, momentSolver } from "../../numeric/momentSolver.ts";
import { packedLength } from "../../numeric/runningMoments.ts";
import { type Moved, evidenceOf } from "./evidence.ts";
import type { Frame } from "./frame.ts";
import { madeLines } from "./madeLines.ts";
import type { ModelRecipe, Recipe } from "./recipe.ts";
import { type SieveTarget, sieveTargets, targetValue } from "./sieveTargets.ts";
import { type SummedUp, sumUp, sumUpOnce } from "./summedUp.ts";
import type { Baseline } from "./sieveTargets.ts";

/** What the sieve lets through: it may reproduce the report, and its agreement may be worth something. */
export interface Survivor {
  readonly recipe: Recipe;
  readonly chance: number;
}

export interface Sieve {
  /** For any number of looks, at columns beside the data too. */
  readonly sumUp: (recipe: Recipe) => SummedUp;
  /** For one look at the claimed columns over the claimed rows. */
  readonly sumUpOnce: (recipe: Recipe) => SummedUp;
  /** Whether the numbers agree as far as moments tell; the chance is that of the sharpest reading of the report. */
  readonly look: (summed: SummedUp, recipe: Recipe) => Survivor | null;
  readonly looked: () => number;
}

/**
 * A quick look at changes by their cross-products. It judges nothing: what passes is fitted in full. Standard errors
 * other than classical ones are beyond it, so that they are looked at only where nothing else was reported.
 */
export function sieveOf(frame: Frame, baseline: Baseline): Sieve {
  const targets = sieveTargets(baseline);
  const errorsAtBest = bestErrors(baseline);
  const solver = momentSolver(frame.lines.length + 1);
  const scratch = new Float64Array(packedLength(frame.lines.length + 1));
  const needsBreads = targets.some(({ needsBreads: needs }) => needs);
  const made = madeLines(frame);
  const modelFor = momentModels();
  let count = 0;
  return {
    sumUp: (recipe) => sumUp(frame, recipe, made),
    sumUpOnce: (recipe) => sumUpOnce(frame, recipe, made),
    looked: () => count,
    look: (summed, recipe) => {
      count++;
      const { size } = summed.moved;
      const model = modelFor(recipe.model, size);
      if (model === null || rowsDiffer(targets, summed.rows(recipe.rows), model)) return null;
      const target = scratch.subarray(0, packedLength(size));
      if (!summed.gather(target, recipe)) return null;
      const solution = solver.solve(target, summed.moved, model);
      if (solution === null) return null;
      if (needsBreads) solver.fillBreads();
      return passes(targets, recipe, solution) ? survivor(targets, { recipe, solution, errorsAtBest }) : null;
    },
  };
}

/** Models by their columns in the moments, each made once; null where one asks for a column that was not summed up. */
function momentModels(): (recipe: ModelRecipe, size: number) => MomentModel | null {
  const known = new WeakMap<ModelRecipe, MomentModel>();
  return (recipe, size) => {
    const found = known.get(recipe) ?? momentModel(recipe);
    known.set(recipe, found);
    return found.outcome < size && found.drivers.every((driver) => driver < size) ? found : null;
  };
}

const momentModel = ({ outcome, drivers, constant }: ModelRecipe): MomentModel => ({
  outcome: outcome + 1,
  drivers: drivers.map((driver) => driver + 1),
  constant,
});

/** The number of rows alone rules most changes out. */
function rowsDiffer(targets: readonly SieveTarget[], rows: number, model: MomentModel): boolean {
  const columns = model.drivers.length + (model.constant ? 1 : 0);
  for (const { quantity, least, most } of targets) {
    if (quantity.kind === "observations" && !(rows >= least && rows <= most)) return true;
    if (quantity.kind === "degrees-of-freedom" && !(rows - columns >= least && rows - columns <= most)) return true;
  }
  return false;
}

function passes(targets: readonly SieveTarget[], recipe: Recipe, solution: MomentSolution): boolean {
  for (const target of targets) {
    const found = targetValue(target.quantity, recipe.model, solution);
    if (found === null) return false;
    const loose =
      looseness * Math.abs(found) + constantLooseness * solution.constantScale * (target.ofConstant ? 1 : 0);
    if (!(found >= target.least - loose && found <= target.most + loose)) return false;
  }
  return true;
}

/** Moments lose digits that the fit keeps. */
const looseness = 1e-6;
const constantLooseness = 1e-9;

interface Passed {
  readonly recipe: Recipe;
  readonly solution: MomentSolution;
  readonly errorsAtBest: number;
}

function survivor(targets: readonly SieveTarget[], { recipe, solution, errorsAtBest }: Passed): Survivor {
  const moved = targets.map(({ reported, asClaimed, quantity }): Moved => {
    return { reported, asClaimed, found: targetValue(quantity, recipe.model, solution) ?? 0 };
  });
  return { recipe, chance: evidenceOf(moved, 1).chance * errorsAtBest };
}

/** What standard errors that the sieve does not look at could add at the very best: their own digits. */
function bestErrors({ reported }: Baseline): number {
  const terms = new Map<number | null, number>();
  for (const { quantity, halfUnit, value } of reported) {
    if (!("term" in quantity) || quantity.kind === "coefficient") continue;
    const own = Math.min(1, Math.max(halfUnit, 1e-9 * Math.abs(value)) / Math.max(Math.abs(value), halfUnit, 1e-300));
    terms.set(quantity.term, Math.min(terms.get(quantity.term) ?? 1, own));
  }
  return [...terms.values()].reduce((chance, one) => chance * one, 1);
}
