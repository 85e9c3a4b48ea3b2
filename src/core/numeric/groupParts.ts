import { basisBlockRows } from "./basis.ts";
import { type RowSource, visitRows } from "./rowSource.ts";

/** Rows of one group that stand in one block; a group that crosses blocks comes in several parts, one after another. */
export interface GroupPart {
  /** Entry (i, j) is values[j * basisBlockRows + i]; overwritten for the next block. */
  readonly values: Float64Array;
  /** The part's rows within the block: from..to - 1. */
  readonly from: number;
  readonly to: number;
  /** The row of the source at place 0 of the block. */
  readonly first: number;
  /** Whether the group ends with this part. */
  readonly last: boolean;
}

/**
 * Calls `visit` with the parts of each run of rows that carry the same group number.
 * @param source - n rows.
 * @param groups - n numbers; rows of one group stand together.
 */
export function visitGroups(source: RowSource, groups: Int32Array, visit: (part: GroupPart) => void): void {
  visitRows(source, ({ values, first, rows }) => {
    let from = 0;
    while (from < rows) {
      const group = groups[first + from]!;
      let to = from + 1;
      while (to < rows && groups[first + to] === group) to++;
      visit({ values, from, to, first, last: groups[first + to] !== group });
      from = to;
    }
  });
}

/** score += sum of e_i q_i over the part's rows. */
export function addScore(score: Float64Array, { values, from, to, first }: GroupPart, factors: Float64Array): void {
  for (let j = 0; j < score.length; j++) {
    const column = j * basisBlockRows;
    for (let i = from; i < to; i++) score[j]! += values[column + i]! * factors[first + i]!;
  }
}

/** gram += sum of q_i q_i' over the part's rows, k by k; both halves are filled. */
export function addGram(gram: Float64Array, { values, from, to }: GroupPart): void {
  const size = Math.sqrt(gram.length);
  for (let a = 0; a < size; a++) {
    const left = a * basisBlockRows;
    for (let b = 0; b <= a; b++) {
      const right = b * basisBlockRows;
      let sum = 0;
      for (let i = from; i < to; i++) sum += values[left + i]! * values[right + i]!;
      gram[a * size + b]! += sum;
      if (a !== b) gram[b * size + a]! += sum;
    }
  }
}

/** The group's rows one after another, k numbers each; @returns the row after the last one written. */
export function copyRows(rows: Float64Array, at: number, { part, size }: { part: GroupPart; size: number }): number {
  const { values, from, to } = part;
  for (let i = from; i < to; i++) {
    const row = (at + i - from) * size;
    for (let j = 0; j < size; j++) rows[row + j] = values[j * basisBlockRows + i]!;
  }
  return at + to - from;
}
