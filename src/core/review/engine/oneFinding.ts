import type { Comparison } from "../claimReview.ts";
import type { Finding, Rank } from "../finding.ts";
import { recomputedInWords } from "../shownDigits.ts";

export const mostCells = 10;

type Told = Omit<Finding, "reported" | "recomputed"> & Partial<Pick<Finding, "reported" | "recomputed">>;

export const finding = (told: Told): Finding => ({
  reported: null,
  recomputed: null,
  ...told,
  cells: [...new Set(told.cells)].slice(0, mostCells),
});

/** A finding that turns the conclusion on any driver is of the gravest rank. */
export const rankFor = (drivers: readonly string[], otherwise: Rank): Rank =>
  drivers.length > 0 ? "changes the conclusion" : otherwise;

/** The reported number that is farthest from the recomputed one in units of its last digit, coefficients first. */
export function farthest(compared: readonly Comparison[]): Pick<Finding, "reported" | "recomputed"> {
  const away = compared.filter(({ agrees, recomputed }) => !agrees && recomputed !== null);
  const coefficients = away.filter(({ reported }) => reported.quantity.kind === "coefficient");
  const distance = ({ reported, recomputed }: Comparison): number =>
    Math.abs(recomputed! - reported.value) / Math.max(reported.halfUnit, Number.MIN_VALUE);
  const [first] = (coefficients.length > 0 ? coefficients : away).toSorted((a, b) => distance(b) - distance(a));
  return first === undefined
    ? { reported: null, recomputed: null }
    : { reported: first.reported.shown, recomputed: recomputedInWords(first) };
}
