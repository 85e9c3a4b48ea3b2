import { addGram, addScore, copyRows, type GroupPart } from "../numeric/groupParts.ts";
import { inverseRootOfRest, rootRoom } from "../numeric/inverseRoot.ts";
import { times, timesRows } from "../numeric/smallProducts.ts";
import type { BasisWeights } from "./basisWeights.ts";
import type { GroupShare } from "./satterthwaite.ts";

/** What CR2 makes of one group; overwritten for the next. */
export interface AdjustedGroup extends GroupShare {
  /** Q_g'A_g e_g, k values. */
  readonly score: Float64Array;
}

/**
 * Takes groups part by part and gives what CR2 makes of each with A_g = (I - H_gg)^(-1/2), H_gg = Q_g Q_g'. A group of
 * no more than k rows is worked on in its rows; a larger one through W = Q_g'Q_g, since f(Q_g Q_g') Q_g = Q_g f(W).
 * All room is kept from group to group.
 * @param size - k.
 * @param residuals - e, n values.
 * @returns a function that takes the parts in order and gives the group with its last part, null before.
 */
export function adjustingGroups(
  size: number,
  residuals: Float64Array,
  weights: BasisWeights,
): (part: GroupPart) => AdjustedGroup | null {
  const room = roomFor(size, weights);
  let count = 0;
  return (part) => {
    const total = count + part.to - part.from;
    if (total <= size) {
      copyRows(room.rows, count, { part, size });
      room.residuals.set(residuals.subarray(part.first + part.from, part.first + part.to), count);
    }
    addScore(room.plainScore, part, residuals);
    // A small group that ends with its first part needs no k by k sums; whether it will is known only at its end.
    if (!(count === 0 && part.last && total <= size)) addGram(room.gram, part);
    count = total;
    if (!part.last) return null;
    if (total <= size) adjustInRows(room, weights, total);
    else adjustInColumns(room, weights);
    room.plainScore.fill(0);
    room.gram.fill(0);
    count = 0;
    return room.adjusted;
  };
}

type Room = ReturnType<typeof roomFor>;

function roomFor(size: number, { count }: BasisWeights) {
  const most = size * Math.max(size, count);
  return {
    ...{ size, rows: new Float64Array(size * size), residuals: new Float64Array(size) },
    ...{ plainScore: new Float64Array(size), gram: new Float64Array(size * size) },
    ...{ hat: new Float64Array(size * size), root: rootRoom(size) },
    ...{ parts: new Float64Array(most), turned: new Float64Array(most), moved: new Float64Array(size) },
    adjusted: {
      score: new Float64Array(size),
      seen: new Float64Array(count * size),
      lengths: new Float64Array(count),
    } satisfies AdjustedGroup,
  };
}

/** With the group's m rows: p = A c, t = Q'p, a = |p|^2, and the score Q'(A e). */
function adjustInRows(room: Room, { count, values }: BasisWeights, m: number): void {
  const { size, rows, hat, root, parts, turned, moved, residuals, adjusted } = room;
  timesRows(hat, [rows, m], [rows, m, size]);
  inverseRootOfRest(root, hat, m);
  timesRows(parts, [values, count], [rows, m, size]);
  timesRows(turned, [parts, count], [root.root, m, m]);
  for (let l = 0; l < count; l++) adjusted.lengths[l] = squareOf(turned, l * m, m);
  times(adjusted.seen, [turned, count], [rows, m, size]);
  timesRows(moved, [residuals, 1], [root.root, m, m]);
  times(adjusted.score, [moved, 1], [rows, m, size]);
}

/** With W = Q'Q and B = (I - W)^(-1/2): p = Q (B z), t = W B z, a = (B z)'t, and the score B s. */
function adjustInColumns(room: Room, { count, values }: BasisWeights): void {
  const { size, gram, root, turned, plainScore, adjusted } = room;
  inverseRootOfRest(root, gram, size);
  timesRows(turned, [values, count], [root.root, size, size]);
  timesRows(adjusted.seen, [turned, count], [gram, size, size]);
  for (let l = 0; l < count; l++) {
    let sum = 0;
    for (let j = l * size; j < (l + 1) * size; j++) sum += turned[j]! * adjusted.seen[j]!;
    adjusted.lengths[l] = sum;
  }
  timesRows(adjusted.score, [plainScore, 1], [root.root, size, size]);
}

function squareOf(x: Float64Array, at: number, length: number): number {
  let sum = 0;
  for (let i = at; i < at + length; i++) sum += x[i]! ** 2;
  return sum;
}
