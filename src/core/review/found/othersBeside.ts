import { cellKind } from "../../table/cells.ts";
import { kindAt } from "../cellsOfBook.ts";
import type { ClaimedLine } from "../claim.ts";
import type { Aligned } from "./alignedLines.ts";
import { type Stretch, claimedLine, placeAlong } from "./claimedLines.ts";

/** A line beside the data is looked at in so many places to tell whether it is filled. */
const looks = 200;

/** So many lines on either side; wider sheets are rare, and their far ends say nothing of the rows. */
const farthest = 40;

/** The other lines of the table that the outcome stands in: as far as lines are filled beside one another. */
export function othersBeside([outcome, ...drivers]: Aligned): readonly ClaimedLine[] {
  const { sheet, runs } = outcome;
  const own = [outcome, ...drivers].filter((line) => line.sheet === sheet && line.runs === runs);
  const used = new Set(own.map(({ track }) => track));
  const found: Stretch[] = [];
  for (const step of [-1, 1]) {
    const start = step < 0 ? Math.min(...used) : Math.max(...used);
    for (let track = start + step; Math.abs(track - start) <= farthest; track += step) {
      const line = { ...outcome, track };
      if (!isFilled(line)) break;
      found.push(line);
    }
  }
  for (let track = Math.min(...used) + 1; track < Math.max(...used); track++) {
    if (!used.has(track) && isFilled({ ...outcome, track })) found.push({ ...outcome, track });
  }
  return found.sort((one, other) => one.track - other.track).map((line) => claimedLine(line, "as it is"));
}

function isFilled(line: Stretch): boolean {
  const step = Math.max(1, Math.floor(line.count / looks));
  let seen = 0;
  let filled = 0;
  for (let index = 0; index < line.count; index += step) {
    seen++;
    if (kindAt(placeAlong(line, line.from + index)) !== cellKind.blank) filled++;
  }
  return 2 * filled >= seen;
}
