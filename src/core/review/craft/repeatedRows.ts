import type { ClaimedLine } from "../claim.ts";
import type { Finding } from "../finding.ts";
import { type Stretch, areaOf } from "../found/claimedLines.ts";
import { addressOf } from "../../table/address.ts";
import { craftFinding } from "./craftFinding.ts";
import { found } from "./craftWords.ts";

/** Chance may repeat rows of few different numbers; blocks are told only where it would do so once in a thousand books. */
const chance = 0.001;
const fewestRows = 3;

/** Rows of data that stand twice, one block after another: pasted again, most likely. */
export function repeatedRows(lines: readonly ClaimedLine[], outcome: Stretch): Finding[] {
  const count = lines[0]?.count ?? 0;
  if (count < 2 * fewestRows) return [];
  const hashes = hashesOf(lines, count);
  const different = new Set(hashes).size;
  const rows = Math.max(fewestRows, Math.ceil(Math.log(count ** 2 / 2 / chance) / Math.log(Math.max(2, different))));
  const block = firstRepeat(hashes, rows, (a, b) => lines.every((line) => sameAt(line, a, b)));
  if (block === null) return [];
  const [first, again] = [block.first, block.again].map((from) =>
    addressOf(areaOf({ ...outcome, from: outcome.from + from, count: block.rows })),
  );
  const what = found.repeated(block.rows, first!, again!);
  return [craftFinding("repeated", { rank: "changes a number", cells: [first!, again!], what })];
}

const indexIn = (line: ClaimedLine, row: number): number => line.from - line.first + row;

const sameAt = (line: ClaimedLine, a: number, b: number): boolean =>
  line.cells.kinds[indexIn(line, a)] === line.cells.kinds[indexIn(line, b)] &&
  line.cells.numbers[indexIn(line, a)] === line.cells.numbers[indexIn(line, b)];

/** One whole number a row, the same for the same cells. */
function hashesOf(lines: readonly ClaimedLine[], count: number): Int32Array {
  const hashes = new Int32Array(count);
  const double = new Float64Array(1);
  const halves = new Int32Array(double.buffer);
  for (const line of lines) {
    for (let row = 0; row < count; row++) {
      double[0] = line.cells.numbers[indexIn(line, row)]!;
      const mixed = Math.imul(hashes[row]! ^ halves[0]!, 0x01000193) ^ halves[1]!;
      hashes[row] = Math.imul(mixed ^ (mixed >>> 15), 0x2c1b3c6d) + line.cells.kinds[indexIn(line, row)]!;
    }
  }
  return hashes;
}

interface Repeat {
  readonly first: number;
  readonly again: number;
  readonly rows: number;
}

/** The first block of at least so many rows that comes again without overlapping itself. */
function firstRepeat(hashes: Int32Array, rows: number, isSame: (a: number, b: number) => boolean): Repeat | null {
  const seen = new Map<number, number>();
  for (let row = 0; row + rows <= hashes.length; row++) {
    let key = 0;
    for (let step = 0; step < rows; step++) key = Math.imul(key, 31) + hashes[row + step]!;
    key |= 0;
    const first = seen.get(key);
    if (first === undefined) seen.set(key, row);
    else if (row - first >= rows) {
      let length = 0;
      while (first + length < row && row + length < hashes.length && isSame(first + length, row + length)) length++;
      if (length >= rows && !allAlike(first, length, isSame)) return { first, again: row, rows: length };
    }
  }
  return null;
}

/** Rows that are all the same say nothing by coming again. */
function allAlike(first: number, length: number, isSame: (a: number, b: number) => boolean): boolean {
  for (let step = 1; step < length; step++) if (!isSame(first, first + step)) return false;
  return true;
}
