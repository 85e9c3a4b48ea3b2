import type { BasisBlock } from "./basis.ts";
import { basisBlockRows } from "./basis.ts";
import { type RowSource, visitRows } from "./rowSource.ts";

/** What one group of rows adds up to; both arrays are overwritten for the next group. */
export interface GroupMoments {
  readonly group: number;
  /** sum of e_i q_i, k values. */
  readonly score: Float64Array;
  /** sum of q_i q_i', k by k, row by row; the upper half alone is filled. */
  readonly gram: Float64Array;
}

/** The factor of each row and the group that it belongs to; rows of one group stand together. */
export interface Runs {
  readonly factors: Float64Array;
  readonly groups: Int32Array;
}

/**
 * Calls `visit` with the moments of each run of rows that carry the same group number.
 * @param source - n rows q_i.
 * @param runs - e_i and the group numbers, n values each.
 */
export function visitGroups(
  source: RowSource,
  { factors, groups }: Runs,
  visit: (moments: GroupMoments) => void,
): void {
  const score = new Float64Array(source.size);
  const gram = new Float64Array(source.size ** 2);
  visitRows(source, (block) => {
    let from = 0;
    while (from < block.rows) {
      const group = groups[block.first + from]!;
      let to = from + 1;
      while (to < block.rows && groups[block.first + to] === group) to++;
      addRun({ block, from, to }, factors, { group, score, gram });
      if (groups[block.first + to] !== group) {
        visit({ group, score, gram });
        score.fill(0);
        gram.fill(0);
      }
      from = to;
    }
  });
}

interface Run {
  readonly block: BasisBlock;
  readonly from: number;
  readonly to: number;
}

function addRun(
  { block: { values, first }, from, to }: Run,
  factors: Float64Array,
  { score, gram }: GroupMoments,
): void {
  const size = score.length;
  for (let a = 0; a < size; a++) {
    const left = a * basisBlockRows;
    for (let i = from; i < to; i++) score[a]! += values[left + i]! * factors[first + i]!;
    for (let b = a; b < size; b++) {
      const right = b * basisBlockRows;
      let sum = 0;
      for (let i = from; i < to; i++) sum += values[left + i]! * values[right + i]!;
      gram[a * size + b]! += sum;
    }
  }
}
