import type { Claim, ClaimedLine } from "../../core/review/claim.ts";
import { standsInCells } from "../../core/review/forms.ts";
import type { Column } from "../../core/table/source.ts";
import type { ReviewFacts } from "../../sheet/review/madeSections.ts";
import { fingerprint } from "../fingerprint.ts";
import type { Edition } from "../work.ts";

/** What a review sheet says of its making. */
export async function reviewFactsOf(claims: readonly Claim[], { today, version }: Edition): Promise<ReviewFacts> {
  return { date: today(), version, fingerprints: await Promise.all(claims.map(fingerprintOfClaim)) };
}

/** The fingerprint of the cells as the regression took them: the same as that of an answer about the same cells. */
export const fingerprintOfClaim = ({ outcome, drivers }: Claim): Promise<string> =>
  fingerprint([outcome, ...drivers.filter(standsInCells)].map(columnOf));

function columnOf({ name, sheet, track, first, from, count, cells }: ClaimedLine): Column {
  const [start, end] = [from - first, from - first + count];
  const { kinds, numbers, texts } = cells;
  return {
    name,
    place: { kind: "sheet", sheet, column: track, firstRow: from },
    cells: { kinds: kinds.slice(start, end), numbers: numbers.slice(start, end), texts },
  };
}
