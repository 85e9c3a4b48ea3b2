import { addressOf } from "../../table/address.ts";
import { wordsAt } from "../cellsOfBook.ts";
import type { Finding } from "../finding.ts";
import { type Stretch, areaOf, isNumberAlong, placeAlong } from "../found/claimedLines.ts";
import type { Gathered } from "../found/gatherClaims.ts";
import { addressesAlong, craftFinding } from "./craftFinding.ts";
import { found } from "./craftWords.ts";

export interface NamedStretch {
  readonly name: string;
  readonly stretch: Stretch;
}

/** Ranges of one table that do not begin in the same place: each row is set against another one. */
export function shiftedRanges(outcome: NamedStretch, drivers: readonly NamedStretch[]): Finding[] {
  return drivers.flatMap(({ name, stretch }) => {
    const sameTable = stretch.sheet === outcome.stretch.sheet && stretch.runs === outcome.stretch.runs;
    const by = stretch.from - outcome.stretch.from;
    if (!sameTable || by === 0 || !overlap(outcome.stretch, stretch)) return [];
    const cells = [outcome.stretch, stretch].map((line) => addressOf(areaOf(line)));
    return [craftFinding("shifted", { rank: "changes a number", cells, what: found.shifted(outcome.name, name, by) })];
  });
}

/** Ranges far apart are different tables, one below the other. */
const overlap = (one: Stretch, other: Stretch): boolean => Math.abs(one.from - other.from) < one.count;

/** A heading within the range of a function that passes over text. Whole columns have one and mean nothing by it. */
export function headingsInside({ regression, aligned }: Gathered): Finding[] {
  if (!regression.passesOver) return [];
  const areas = [regression.outcome, ...regression.drivers].map(({ area }) => area);
  return aligned.flatMap((line, index) => {
    const area = areas[index]!;
    const named = line.runs === "down" ? area.row : area.column;
    if (named === 0 && Math.max(area.rows, area.columns) > longestMeant) return [];
    if (named >= line.from || isNumberAlong(line, named)) return [];
    const heading = wordsAt(placeAlong(line, named));
    if (heading === "") return [];
    const what = found.headingInside(heading, heading);
    return [craftFinding("headingInside", { rank: "worth knowing", cells: addressesAlong(line, [named]), what })];
  });
}

/** Ranges beyond this length reach to the end of the sheet. */
const longestMeant = 16_383;
