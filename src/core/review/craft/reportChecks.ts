import { type CellPlace, addressAt, isCalculatedAt, isSpilledAt } from "../cellsOfBook.ts";
import type { Finding } from "../finding.ts";
import type { ReportBlock } from "../typed/reportBlock.ts";
import type { Gathered } from "../found/gatherClaims.ts";
import { craftFinding } from "./craftFinding.ts";
import { found } from "./craftWords.ts";
import { addressOf } from "../../table/address.ts";

const isMade = (place: CellPlace): boolean => isCalculatedAt(place) || isSpilledAt(place);

/** Numbers of a report that no formula supports: all of them, or some among formulas. */
export function typedResults(block: ReportBlock, group: Gathered | null): Finding[] {
  const filled = new Set(group?.cells.map(({ place }) => addressAt(place)) ?? []);
  const places = [
    ...block.terms.flatMap(({ numbers, inBrackets }) =>
      [...numbers, ...(inBrackets === null ? [] : [inBrackets])].map(({ place }) => place),
    ),
    ...block.summaries.map(({ place }) => place),
  ];
  const typed = places.filter((place) => !isMade(place) && !filled.has(addressAt(place)));
  if (typed.length === 0) return [];
  if (typed.length === places.length) {
    const cells = [addressOf(block.area)];
    return [craftFinding("typedResults", { rank: "worth knowing", cells, what: found.typedResults(typed.length) })];
  }
  const what = found.typedAmongFormulas(typed.length, places.length - typed.length);
  return [craftFinding("typedAmongFormulas", { rank: "changes a number", cells: typed.map(addressAt), what })];
}
