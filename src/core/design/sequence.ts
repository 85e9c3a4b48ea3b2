import { type Result, failure, success } from "../problem/result.ts";
import type { LevelCells } from "../table/levelCells.ts";
import { spotsOf } from "../table/spots.ts";
import { everyRow, keptRows, presentIn } from "./rows.ts";
import type { Timeline } from "./timeline.ts";

/** All rows that have a time (and a group), by group and by time within it. */
export interface Sequence {
  /** Source rows in that order. */
  readonly rows: Int32Array<ArrayBuffer>;
  /** Whether the source stands in that order already. */
  readonly asTheyStand: boolean;
}

/**
 * Puts rows in order of time, within groups where there are any; rows of the same time keep their order.
 * @returns Problem "repeated-time" where a time stands in more than one row (of a group).
 */
export function sequenceOf(timeline: Timeline, groups: LevelCells | null): Result<Sequence> {
  const { positions, column } = timeline;
  const codes = groups?.codes ?? null;
  const rows = rowsWithTime(positions, codes);
  const after = (a: number, b: number): number =>
    (codes === null ? 0 : codes[a]! - codes[b]!) || positions[a]! - positions[b]! || a - b;
  const asTheyStand = rows.every((row, i) => i === 0 || after(rows[i - 1]!, row) < 0);
  if (!asTheyStand) rows.sort(after);
  const repeated = new Uint8Array(positions.length);
  for (let i = 1; i < rows.length; i++) {
    const [before, row] = [rows[i - 1]!, rows[i]!];
    if (positions[before] !== positions[row] || (codes !== null && codes[before] !== codes[row])) continue;
    repeated[before] = 1;
    repeated[row] = 1;
  }
  if (column !== null && repeated.includes(1)) {
    return failure({ code: "repeated-time", ...spotsOf(column, (row) => repeated[row] === 1) });
  }
  return success({ rows, asTheyStand });
}

function rowsWithTime(positions: Int32Array, codes: Int32Array | null): Int32Array<ArrayBuffer> {
  const usable = presentIn(positions);
  for (let row = 0; codes !== null && row < usable.length; row++) if (codes[row]! < 0) usable[row] = 0;
  return keptRows(everyRow(positions.length), usable);
}

/**
 * For each source row the row that stands so many periods earlier (in its group), -1 where there is none.
 * A period without a row is not stepped over: what counts is time, not the number of rows.
 */
export function earlierRows(
  { rows }: Sequence,
  periods: number,
  { positions, codes }: Ordered,
): Int32Array<ArrayBuffer> {
  const earlier = new Int32Array(positions.length).fill(-1);
  let behind = 0;
  for (const row of rows) {
    const wanted = positions[row]! - periods;
    const isBefore = (other: number): boolean =>
      (codes !== null && codes[other]! < codes[row]!) || (sameGroup(codes, other, row) && positions[other]! < wanted);
    while (isBefore(rows[behind]!)) behind++;
    const candidate = rows[behind]!;
    if (sameGroup(codes, candidate, row) && positions[candidate] === wanted) earlier[row] = candidate;
  }
  return earlier;
}

export interface Ordered {
  readonly positions: Int32Array;
  readonly codes: Int32Array | null;
}

const sameGroup = (codes: Int32Array | null, a: number, b: number): boolean => codes === null || codes[a] === codes[b];
