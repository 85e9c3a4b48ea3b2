import type { Fit } from "../../fit/fit.ts";
import type { Claim } from "../claim.ts";
import type { Comparison } from "../claimReview.ts";
import { agrees } from "./agreement.ts";
import { type ErrorKind, groupedKinds, lagKinds, plainKinds, ruleKinds } from "./errorKinds.ts";
import {
  type ErrorReport,
  type ErrorsUsed,
  type ReportedError,
  errorValue,
  levelsOf,
  matchesOf,
} from "./errorMatch.ts";
import type { Frame } from "./frame.ts";
import type { Ordering } from "./orderings.ts";
import { isErrorQuantity, plainQuantity, plainValue } from "./quantities.ts";
import type { Recipe } from "./recipe.ts";
import { refit } from "./refit.ts";

/** What stays the same while a claim is reviewed. */
export interface Bench {
  readonly claim: Claim;
  readonly frame: Frame;
  /** The regression exactly as claimed. */
  readonly claimed: Recipe;
  /** Lines beside the data that may be the time or the groups of the rows. */
  readonly orderings: Ordering;
}

/** A recipe fitted in full and held against every reported number. */
export interface Trial {
  readonly recipe: Recipe;
  readonly fit: Fit;
  readonly compared: readonly Comparison[];
  /** How the figures that rest on standard errors came out; classical where no kind fits; null where none is reported. */
  readonly used: ErrorsUsed | null;
  /** How many kinds were looked at until one fitted. */
  readonly errorsTried: number;
  readonly plainAgree: boolean;
  readonly errorsAgree: boolean;
}

export const agreesThroughout = ({ plainAgree, errorsAgree }: Trial): boolean => plainAgree && errorsAgree;

export const reportedErrors = (claim: Claim): ErrorReport => ({
  reported: claim.reported.filter((number): number is ReportedError => isErrorQuantity(number.quantity)),
  levels: levelsOf(claim),
});

/**
 * Fits a recipe and holds it against the report.
 * @param kinds - the standard errors that are looked at where all other numbers agree.
 * @returns null where the recipe cannot be fitted at all.
 */
export function trial(bench: Bench, recipe: Recipe, kinds: Kinds = allKinds): Trial | null {
  const fitted = refit(bench.frame, recipe, { kind: "cases" });
  return fitted?.ok === true ? trialOf(bench, { recipe, fit: fitted.value }, kinds) : null;
}

export interface Made {
  readonly recipe: Recipe;
  readonly fit: Fit;
}

/** Kinds of standard errors for a fit, simplest first. */
export type Kinds = (bench: Bench, made: Made) => Generator<ErrorKind>;

function trialOf(bench: Bench, { recipe, fit }: Made, kinds: Kinds): Trial {
  const errors = reportedErrors(bench.claim);
  const plainAgree = bench.claim.reported.every((number) => {
    const quantity = plainQuantity(number.quantity);
    if (quantity === null) return true;
    const found = plainValue(quantity, fit, recipe.model);
    return found !== null && agrees(number, found);
  });
  const tried = plainAgree ? kinds(bench, { recipe, fit }) : plainKinds(fit);
  const isNone = errors.reported.length === 0;
  const match = isNone ? null : firstMatch(errors, { recipe, fit }, tried);
  const used = match?.used ?? null;
  return {
    recipe,
    fit,
    compared: comparisons(bench.claim, { recipe, fit, used }),
    used,
    errorsTried: match?.tried ?? 0,
    plainAgree,
    errorsAgree: isNone || match?.fits === true,
  };
}

/** The first kind that gives all reported figures; the classical one where none does. */
function firstMatch(errors: ErrorReport, { recipe, fit }: Made, kinds: Generator<ErrorKind>) {
  const fitted = { coefficients: fit.coefficients, model: recipe.model };
  let tried = 0;
  let classical: ErrorKind | null = null;
  for (const kind of kinds) {
    tried++;
    classical ??= kind;
    const used = matchesOf(kind, errors, fitted)[0];
    if (used !== undefined) return { used, tried, fits: true };
  }
  if (classical === null) return null;
  return { used: { kind: classical, law: classical.laws[0]!, level: errors.levels[0]! }, tried, fits: false };
}

/** Every kind of standard errors that the sheet allows to be tried. */
export function* allKinds(bench: Bench, made: Made): Generator<ErrorKind> {
  yield* quickKinds(bench, made);
  yield* ruleKinds(made.fit, "");
  for (const { fit, suffix } of ordered(bench, made)) yield* ruleKinds(fit, suffix);
}

/** Those that cost little: for the many regressions that a search fits. */
export function* quickKinds(bench: Bench, made: Made): Generator<ErrorKind> {
  yield* plainKinds(made.fit);
  yield* lagKinds(made.fit, "");
  for (const { fit, suffix } of ordered(bench, made)) yield* lagKinds(fit, suffix);
  for (const line of bench.orderings.groups) {
    const grouped = refit(bench.frame, made.recipe, { kind: "groups", by: line });
    if (grouped?.ok === true) yield* groupedKinds(grouped.value, line.name);
  }
}

/** The same regression with its rows by each line that may be the time, where that is another order. */
function* ordered(
  { frame, orderings }: Bench,
  { recipe }: Made,
): Generator<{ readonly fit: Fit; readonly suffix: string }> {
  for (const line of orderings.times) {
    const inTime = refit(frame, recipe, { kind: "time", by: line });
    if (inTime?.ok === true && !runsOn(inTime.value)) yield { fit: inTime.value, suffix: `, rows by ${line.name}` };
  }
}

/** Whether the rows by time are the rows as they stand, one period each. */
function runsOn({ design: { order, sourceRows } }: Fit): boolean {
  const consecutive = (rows: Int32Array): boolean => rows.every((row, at) => at === 0 || row === rows[at - 1]! + 1);
  return order.kind === "time" && consecutive(order.positions) && consecutive(sourceRows);
}

interface Compared {
  readonly recipe: Recipe;
  readonly fit: Fit;
  readonly used: ErrorsUsed | null;
}

/** Every reported number beside what a fit gives for it. */
export function comparisons({ reported }: Claim, { recipe: { model }, fit, used }: Compared): Comparison[] {
  return reported.map((number) => {
    const plain = plainQuantity(number.quantity);
    const error = isErrorQuantity(number.quantity) ? number.quantity : null;
    const byErrors = (): number | null =>
      error === null || used === null ? null : errorValue(error, { coefficients: fit.coefficients, model }, used);
    const recomputed = plain === null ? byErrors() : plainValue(plain, fit, model);
    const finite = recomputed !== null && Number.isFinite(recomputed) ? recomputed : null;
    return { reported: number, recomputed: finite, agrees: finite !== null && agrees(number, finite) };
  });
}
