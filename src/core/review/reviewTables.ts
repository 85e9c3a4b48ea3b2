import type { Claim } from "./claim.ts";
import type { ClaimReview } from "./claimReview.ts";
import { quantityInWords } from "./quantityWords.ts";
import { recomputedInWords } from "./shownDigits.ts";

/** A reported number beside what its cells give and, where an explanation was found, what they give under it. */
export interface ComparedRow {
  readonly name: string;
  readonly cell: string;
  readonly reported: string;
  readonly recomputed: string;
  /** Null where there is no explanation. */
  readonly explained: string | null;
  readonly agrees: boolean;
}

export const namesOfDrivers = ({ drivers }: Claim): readonly string[] => drivers.map(({ name }) => name);

/** Every reported number, in the order of the report. */
export function comparedRows({ claim, compared, explanation }: ClaimReview): readonly ComparedRow[] {
  const drivers = namesOfDrivers(claim);
  return compared.map((comparison, index) => {
    const { reported, agrees } = comparison;
    const under = explanation?.compared[index];
    return {
      name: quantityInWords(reported.quantity, drivers),
      cell: reported.cell,
      reported: reported.shown,
      recomputed: recomputedInWords(comparison),
      explained: under === undefined ? null : recomputedInWords(under),
      agrees,
    };
  });
}
