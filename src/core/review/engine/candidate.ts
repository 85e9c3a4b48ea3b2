import type { Change } from "./change.ts";
import { mostByChance } from "./evidence.ts";
import type { Recipe } from "./recipe.ts";
import type { Sieve, Survivor } from "./sieve.ts";
import type { SummedUp } from "./summedUp.ts";

/** The changes that are tried, by how many there are of them. */
export interface Changes {
  readonly few: readonly Change[];
  /** At least one a row, to be tried alone. */
  readonly many: Iterable<Change>;
  /** Those to be tried with another change, for what that made of the recipe and the rows that are complete then. */
  readonly manyMore: (recipe: Recipe, complete: Uint8Array) => readonly Change[];
}

/** A change or two that passed the sieve. */
export interface Candidate {
  readonly changes: readonly Change[];
  readonly survivor: Survivor;
}

/** What a stage let through. */
export interface Kept {
  readonly candidates: readonly Candidate[];
  /** How many fit the numbers shown, but so would too many others by chance. */
  readonly untelling: number;
}

export interface Keeping {
  readonly look: (summed: SummedUp, recipe: Recipe) => Survivor | null;
  readonly keep: (changes: readonly Change[], survivor: Survivor) => void;
  readonly kept: () => Kept;
}

/** Where so many changes fit, the report cannot tell one from another; the first of them are enough to see that. */
const mostKept = 5000;

/** Looks through a sieve and keeps what may be worth believing after so many looks. */
export function keeping(sieve: Sieve): Keeping {
  const candidates: Candidate[] = [];
  let untelling = 0;
  return {
    look: sieve.look,
    keep: (changes, survivor) => {
      const mayTell = survivor.chance * sieve.looked() < mostByChance;
      if (mayTell && candidates.length < mostKept) candidates.push({ changes, survivor });
      else untelling++;
    },
    kept: () => ({ candidates, untelling }),
  };
}
