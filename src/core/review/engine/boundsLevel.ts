import { levelsOf } from "./errorMatch.ts";
import { type Bench, type Trial, trial } from "./trial.ts";

/** Fewer bounds than these may come out at some level, under some kind of standard errors, by chance. */
const fewestBounds = 4;

/**
 * The level at which the bounds of a report come out where they do not at the one that it says.
 * @param claimed - the cells as claimed; all else must come out of them.
 * @returns null where they come out, or at no level that people take, or where too few are reported to tell.
 */
export function levelInstead(bench: Bench, claimed: Trial | null): number | null {
  const { level, reported } = bench.claim;
  const bounds = reported.filter(({ quantity: { kind } }) => kind === "low" || kind === "high").length;
  const isDoubtful = claimed !== null && claimed.plainAgree && !claimed.errorsAgree;
  if (level === undefined || bounds < fewestBounds || !isDoubtful) return null;
  const others = levelsOf({}).filter((one) => one !== level);
  const comesOut = (one: number): boolean =>
    trial({ ...bench, claim: { ...bench.claim, level: one } }, bench.claimed)?.errorsAgree === true;
  return others.find(comesOut) ?? null;
}
