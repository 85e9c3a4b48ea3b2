import type { Candidate, Changes, Kept } from "./candidate.ts";
import type { Change, Hypothesis } from "./change.ts";
import { type Evidence, evidenceOf, fewestTelling, mostByChance } from "./evidence.ts";
import { lineChanges } from "./lineChanges.ts";
import { manyInPairs, manyRowChanges } from "./manyRowChanges.ts";
import { modelChanges } from "./modelChanges.ts";
import { looksAlone, looksInPairs } from "./looks.ts";
import type { Recipe, Run } from "./recipe.ts";
import { fewRowChanges } from "./rowChanges.ts";
import { underSameErrors } from "./sameErrors.ts";
import { type Sieve, sieveOf } from "./sieve.ts";
import { type Bench, type Trial, agreesThroughout, quickKinds, trial } from "./trial.ts";
import { completeRows, runsOf } from "./rowList.ts";
import { lineValues } from "./lineValues.ts";

/** Changes under which every reported number comes out, and which are worth believing. */
export interface Found {
  readonly changes: readonly Change[];
  readonly trial: Trial;
  readonly evidence: Evidence;
}

/** What a search came to. */
export interface Searched {
  /** Cheapest first; empty where nothing that was tried explains the report. */
  readonly found: readonly Found[];
  /** How many changes were looked at, alone and in pairs. */
  readonly looked: number;
  /** How many fit the numbers shown, but would by chance as well. */
  readonly untelling: number;
  /** The sorts of changes that were tried. */
  readonly tried: ReadonlySet<Hypothesis>;
  readonly inPairs: boolean;
}

/** How far the search has come, from 0 to 1. */
export interface SearchStep {
  readonly step: string;
  readonly share: number;
}

/**
 * Looks for a small change of data or model that reproduces every reported number: each alone, then each with each,
 * few before many; stops after the first stage in which one is found, so that others of the same cost are told too.
 * Where nothing differs but the standard errors there is nothing for two changes to explain, and pairs are not tried.
 * A generator, so that whoever runs it can show how far it is and stop it between steps.
 * @param claimed - the trial of the regression as claimed; null where it cannot be fitted.
 */
export function* search(bench: Bench, claimed: Trial | null): Generator<SearchStep, Searched> {
  const changes = changesOf(bench);
  const { reported } = bench.claim;
  const asClaimed = reported.map((_, index) => claimed?.compared[index]?.recomputed ?? null);
  const sieve = sieveOf(bench.frame, { reported, asClaimed });
  const alone = looksAlone(bench, changes, sieve);
  const stages = claimed?.plainAgree === true ? alone : [...alone, ...looksInPairs(bench, changes, sieve)];
  let untelling = 0;
  for (const [index, { step, inPairs, looks }] of stages.entries()) {
    const kept = yield* keptOf(looks, { step, from: index / stages.length, width: 1 / stages.length });
    const judged = yield* stepping(judge(kept, { bench, claimed, sieve }), {
      step: "Fitting what may explain it",
      share: (index + 1) / stages.length,
    });
    untelling += judged.untelling;
    if (judged.found.length > 0 || index === stages.length - 1) {
      const tried = new Set([...changes.few.map(({ facts }) => facts.hypothesis), ...byTheRow]);
      return { found: judged.found, looked: sieve.looked(), untelling, tried, inPairs };
    }
  }
  return { found: [], looked: 0, untelling, tried: new Set(), inPairs: false };
}

const byTheRow: readonly Hypothesis[] = ["row-left-out", "rows-left-out", "block-repeated"];

function changesOf({ frame, claim, claimed }: Bench): Changes {
  const lines = frame.lines.slice(0, frame.driverCount + 1);
  const complete = completeRows(lines.map((line, index) => lineValues(line, claimed.lines[index]!, frame)));
  const few = [...fewRowChanges({ frame, complete }), ...modelChanges(frame, claim), ...lineChanges(frame)];
  const listed = manyInPairs(frame);
  return {
    few,
    many: manyRowChanges({ frame, complete, missing: missingRows(claim, claimed, complete) }),
    manyMore: (recipe, rows) => listed(rows, missingRows(claim, recipe, rows)),
  };
}

/** How many rows the report says it used, less those that a recipe has. */
function missingRows({ reported }: Bench["claim"], { rows, model }: Recipe, complete: Uint8Array): number | null {
  const number = reported.find(({ quantity: { kind } }) => kind === "observations" || kind === "degrees-of-freedom");
  if (number === undefined) return null;
  const columns = model.drivers.length + (model.constant ? 1 : 0);
  const used = Math.round(number.value) + (number.quantity.kind === "observations" ? 0 : columns);
  const extra = rows.zeros + (rows.summary === "none" ? 0 : 1);
  const counted = (run: Run): number => complete.subarray(run.from, run.to).reduce((sum, byte) => sum + byte, 0);
  return used - runsOf(rows).reduce((sum, run) => sum + counted(run), extra);
}

/** A step wherever the work pauses. */
function* stepping<T>(work: Generator<null, T>, step: SearchStep): Generator<SearchStep, T> {
  for (;;) {
    const next = work.next();
    if (next.done === true) return next.value;
    yield step;
  }
}

/** The looks of a stage one after another; the generator pauses wherever they do. */
function* keptOf(
  looks: Generator<number, Kept>,
  { step, from, width }: { readonly step: string; readonly from: number; readonly width: number },
): Generator<SearchStep, Kept> {
  for (;;) {
    const next = looks.next();
    if (next.done === true) return next.value;
    yield { step, share: from + width * next.value };
  }
}

interface Judging {
  readonly bench: Bench;
  readonly claimed: Trial | null;
  readonly sieve: Sieve;
}

/** Fits what may be worth believing, with a pause after each, and keeps what reproduces everything and is. */
function* judge(
  kept: Kept,
  { bench, claimed, sieve }: Judging,
): Generator<null, Pick<Searched, "found" | "untelling">> {
  const looked = sieve.looked();
  const worthIt = ({ survivor }: Candidate): boolean => survivor.chance * looked < mostByChance;
  const hopeful = kept.candidates.filter(worthIt);
  const bestFirst = hopeful.toSorted((a, b) => a.survivor.chance - b.survivor.chance);
  const fitted = new Set(bestFirst.slice(0, mostFitted(bench.frame.count)));
  const found: Found[] = [];
  let untelling = kept.untelling + kept.candidates.length - hopeful.length;
  for (const { changes, survivor } of hopeful.filter((one) => fitted.has(one))) {
    yield null;
    const tried = trial(bench, survivor.recipe, quickKinds);
    if (tried === null || !agreesThroughout(tried)) continue;
    const evidence = evidenceFor(tried, bench, claimed);
    if (evidence.telling >= fewestTelling && evidence.chance * looked < mostByChance) {
      found.push({ changes, trial: tried, evidence });
    } else untelling++;
  }
  return { found, untelling };
}

/** How many regressions one stage may fit in full: about so many rows in all, within reason. */
const mostFitted = (rows: number): number => Math.max(12, Math.min(60, Math.floor(100_000 / rows)));

function evidenceFor({ compared, errorsTried, used }: Trial, bench: Bench, claimed: Trial | null): Evidence {
  const base = claimed === null ? null : underSameErrors(bench, claimed, used);
  const moved = compared.map(({ reported, recomputed }, index) => ({
    reported,
    found: recomputed ?? 0,
    asClaimed: base?.[index] ?? null,
  }));
  return evidenceOf(moved, errorsTried);
}
