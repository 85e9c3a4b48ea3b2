import type { Finding, Rank } from "../finding.ts";
import { type Stretch, areaOf } from "../found/claimedLines.ts";
import { addressOf } from "../../table/address.ts";
import { advice } from "./craftWords.ts";

interface Told {
  readonly rank: Rank;
  readonly cells: readonly string[];
  readonly what: string;
}

const mostCells = 10;

/** A finding about how a sheet is made; its short name says which. */
export const craftFinding = (code: keyof typeof advice, { rank, cells, what }: Told): Finding => ({
  rank,
  code: codeOf(code),
  cells: [...new Set(cells)].slice(0, mostCells),
  reported: null,
  recomputed: null,
  what,
  toDo: advice[code],
});

/** "textInRange" -> "text-in-range" */
const codeOf = (name: string): string => name.replaceAll(/[A-Z]/g, (letter) => `-${letter.toLowerCase()}`);

/** Positions along a line as addresses, those side by side as one range. */
export function addressesAlong(line: Stretch, positions: readonly number[]): string[] {
  const found: string[] = [];
  for (let index = 0; index < positions.length && found.length < mostCells;) {
    let end = index + 1;
    while (end < positions.length && positions[end] === positions[end - 1]! + 1) end++;
    found.push(addressOf(areaOf({ ...line, from: positions[index]!, count: end - index })));
    index = end;
  }
  return found;
}
