import { type MomentModel, type MomentSolution, momentSolver } from "../../numeric/momentSolver.ts";
import { type RunningMoments, addRow, addRun, packedLength, runningMoments } from "../../numeric/runningMoments.ts";
import type { ReportedNumber } from "../claim.ts";
import { type Moved, evidenceOf } from "./evidence.ts";
import type { Frame } from "./frame.ts";
import { lineValues } from "./lineValues.ts";
import type { ModelRecipe, Recipe } from "./recipe.ts";
import { completeRows, extraRows, runsOf } from "./rowList.ts";
import { type SieveTarget, sieveTargets, targetValue } from "./sieveTargets.ts";

/** The lines of a recipe summed up, so that any choice of rows and any model of them costs no pass over the rows. */
export interface SummedUp {
  readonly lines: Recipe["lines"];
  readonly moments: RunningMoments;
}

/** What the sieve lets through: it may reproduce the report, and its agreement may be worth something. */
export interface Survivor {
  readonly recipe: Recipe;
  readonly chance: number;
}

export interface Sieve {
  /** @param helpers - whether columns beside the data are summed up too. */
  readonly sumUp: (recipe: Recipe, helpers: boolean) => SummedUp;
  /** Whether the numbers agree as far as moments tell; the chance is that of the sharpest reading of the report. */
  readonly look: (summed: SummedUp, recipe: Recipe) => Survivor | null;
  readonly looked: () => number;
}

/** Reported numbers beside what the cells give for them as claimed. */
export interface Baseline {
  readonly reported: readonly ReportedNumber[];
  readonly asClaimed: readonly (number | null)[];
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
  let count = 0;
  return {
    sumUp: (recipe, helpers) => sumUp(frame, recipe, helpers),
    looked: () => count,
    look: (summed, recipe) => {
      count++;
      const { moments } = summed;
      const target = scratch.subarray(0, packedLength(moments.size));
      if (!gather(target, { frame, summed, recipe })) return null;
      const model = momentModel(recipe.model, moments.size);
      if (model === null || rowsDiffer(targets, target[0]!, model)) return null;
      const solution = solver.solve(target, moments, model);
      if (solution === null) return null;
      if (needsBreads) solver.fillBreads();
      return passes(targets, recipe, solution) ? survivor(targets, { recipe, solution, errorsAtBest }) : null;
    },
  };
}

function sumUp(frame: Frame, recipe: Recipe, helpers: boolean): SummedUp {
  const claimed = frame.driverCount + 1;
  const lines = frame.lines.slice(0, helpers ? undefined : claimed);
  const values = lines.map((line, index) => lineValues(line, recipe.lines[index]!, frame));
  const complete = completeRows(values.slice(0, claimed));
  const typical = { from: frame.first, to: frame.first + frame.count };
  const columns = values.map((line) => line.values);
  return { lines: recipe.lines, moments: runningMoments(columns, complete, typical) };
}

interface Gathering {
  readonly frame: Frame;
  readonly summed: SummedUp;
  readonly recipe: Recipe;
}

/** The moments of the rows that count; false where a row counted in has no value. */
function gather(target: Float64Array, { frame, summed: { moments }, recipe }: Gathering): boolean {
  const { span, without, again, zeros, summary } = recipe.rows;
  target.fill(0);
  addRun(target, moments, { ...span, times: 1 });
  for (const gap of without) {
    const [from, to] = [Math.max(gap.from, span.from), Math.min(gap.to, span.to)];
    if (from < to) addRun(target, moments, { from, to, times: -1 });
  }
  for (const run of again) addRun(target, moments, { ...run, times: 1 });
  if (zeros === 0 && summary === "none") return true;
  const rows = summary === "none" ? [] : countedRows(recipe, moments.complete);
  const extra = extraRows(frame, recipe, rows);
  for (const values of extra ?? []) addRow(target, moments, { values, times: 1 });
  return extra !== null;
}

function countedRows(recipe: Recipe, complete: Uint8Array): number[] {
  const rows: number[] = [];
  for (const { from, to } of runsOf(recipe.rows)) {
    for (let row = from; row < to; row++) if (complete[row] === 1) rows.push(row);
  }
  return rows;
}

/** Null where the model asks for a column that was not summed up. */
function momentModel({ outcome, drivers, constant }: ModelRecipe, size: number): MomentModel | null {
  if (outcome + 1 >= size || drivers.some((driver) => driver + 1 >= size)) return null;
  return { outcome: outcome + 1, drivers: drivers.map((driver) => driver + 1), constant };
}

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
