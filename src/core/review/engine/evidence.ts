import type { Quantity, ReportedNumber } from "../claim.ts";

/** A reported number under a change, and what the cells give for it as claimed. */
export interface Moved {
  readonly reported: ReportedNumber;
  readonly found: number;
  /** Null where the cells as claimed give nothing. */
  readonly asClaimed: number | null;
}

export interface Evidence {
  /** How probable it is that a change which says nothing of the report agrees with every number of it. */
  readonly chance: number;
  /** How many numbers speak for it: facts of their own that the change moved well beyond their digits. */
  readonly telling: number;
}

/** A fact speaks for a change if an idle one would meet it in one of ten cases at most. */
const tellingBelow = 0.1;

/** So many chance agreements are expected, at the most, among all the changes tried, before one is believed. */
export const mostByChance = 1e-3;
/** One number alone can always be met. */
export const fewestTelling = 2;

/**
 * How much the agreement of a change with every reported number is worth. A change that moves a number by d from what
 * the cells give as claimed could have moved it anywhere within d either way: that it lies within half a unit h of the
 * reported one is a chance of h / d. A number that it does not move says nothing for it. Numbers that follow from one
 * another (R-squared, sigma and F; a standard error and its ratio) are one fact, the sharpest of them counting; what
 * the facts have to do with each other beyond that is neglected.
 * @param errorsTried - how many kinds of standard errors were looked at until one agreed: each was a chance more.
 */
export function evidenceOf(moved: readonly Moved[], errorsTried: number): Evidence {
  const facts = new Map<string, number>();
  for (const one of moved) {
    const fact = factOf(one.reported.quantity);
    if (fact === null) continue;
    facts.set(fact, Math.min(facts.get(fact) ?? 1, chanceOf(one)));
  }
  const plain = product([...facts].filter(([fact]) => !fact.startsWith(errorsFact)));
  const errors = product([...facts].filter(([fact]) => fact.startsWith(errorsFact)));
  return {
    chance: plain * Math.min(1, errors * Math.max(1, errorsTried)),
    telling: [...facts.values()].filter((chance) => chance <= tellingBelow).length,
  };
}

const product = (facts: readonly (readonly [string, number])[]): number =>
  facts.reduce((chance, [, one]) => chance * one, 1);

/** Numbers given in full still agree by rounding alone to this share of themselves. */
const sharpest = 1e-9;

export function chanceOf({ reported, found, asClaimed }: Moved): number {
  const half = Math.max(reported.halfUnit, sharpest * Math.abs(found));
  const distance = Math.abs(found - (asClaimed ?? 0));
  return distance <= half ? 1 : half / distance;
}

const errorsFact = "errors of ";

/** Null for the number of rows, by which the changes that are looked at are chosen. */
function factOf(quantity: Quantity): string | null {
  switch (quantity.kind) {
    case "coefficient":
      return `coefficient of ${quantity.term ?? "constant"}`;
    case "standard-error":
    case "ratio":
    case "p-value":
    case "low":
    case "high":
      return `${errorsFact}${quantity.term ?? "constant"}`;
    case "prediction":
      return `prediction at ${quantity.at.join()}`;
    case "observations":
    case "degrees-of-freedom":
      return null;
    default:
      return "fit";
  }
}
