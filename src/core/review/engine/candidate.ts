import type { Change } from "./change.ts";
import { mostByChance } from "./evidence.ts";
import type { Recipe } from "./recipe.ts";
import type { Sieve, SummedUp, Survivor } from "./sieve.ts";

/** The changes that are tried, by how many there are of them. */
export interface Changes {
  readonly few: readonly Change[];
  /** At least one a row. */
  readonly many: readonly Change[];
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
  readonly look: (changes: readonly Change[], summed: SummedUp, recipe: Recipe) => void;
  readonly kept: () => Kept;
}

/** Looks through a sieve and keeps what may be worth believing after so many looks. */
export function keeping(sieve: Sieve): Keeping {
  const candidates: Candidate[] = [];
  let untelling = 0;
  return {
    look: (changes, summed, recipe) => {
      const survivor = sieve.look(summed, recipe);
      if (survivor === null) return;
      if (survivor.chance * sieve.looked() < mostByChance) candidates.push({ changes, survivor });
      else untelling++;
    },
    kept: () => ({ candidates, untelling }),
  };
}
