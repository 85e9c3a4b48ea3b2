import { basisBlockRows } from "./basis.ts";
import { addCrossProducts } from "./crossProducts.ts";
import type { SquareMatrix } from "./matrix.ts";
import type { RowSource } from "./rowSource.ts";

/**
 * sum over t of w_t w_t', where w_t adds up the rows whose positions lie in the L + 1 periods that end at t, and t runs
 * over every period in which the window holds a row. Divided by L + 1 this is the Bartlett-weighted sum
 * G_0 + sum (1 - l/(L+1)) (G_l + G_l'), at a cost that does not depend on L, and never indefinite.
 * Between two moments at which a row enters or leaves, the window stays the same and is counted once with its length.
 * @param source - n rows of k numbers.
 * @param positions - n whole numbers, strictly ascending.
 * @param lags - L >= 0.
 * @returns k by k.
 */
export function movingWindowProducts(source: RowSource, positions: Float64Array, lags: number): SquareMatrix {
  const { size } = source;
  const sums = new Float64Array(size * size);
  const ring = ringFor(source, lags);
  const windows: Windows = { values: new Float64Array(size * basisBlockRows), running: new Float64Array(2 * size) };
  const clock: Clock = { head: 0, tail: 0 };
  const moments = momentBuffer();
  while (clock.tail < positions.length) {
    const count = nextMoments({ positions, lags, slots: ring.slots }, clock, moments);
    fillRing(source, ring, clock.head);
    for (let j = 0; j < size; j++) runColumn({ ring, windows, moments }, j, count);
    addCrossProducts(sums, { values: windows.values, rows: count, size });
  }
  return { size, values: sums };
}

/** Rows that have entered, kept until they have left: row i stands in slot i modulo `slots`; slot `slots` holds zeros. */
interface Ring {
  readonly slots: number;
  readonly values: Float64Array;
  filled: number;
}

function ringFor({ size, rowCount }: RowSource, lags: number): Ring {
  const needed = Math.min(lags + 1, rowCount) + 2 * basisBlockRows;
  const slots = 2 ** Math.ceil(Math.log2(needed));
  return { slots, values: new Float64Array(size * (slots + 1)), filled: 0 };
}

/** Blocks start at multiples of their height, which divides the number of slots: none wraps around. */
function fillRing(source: RowSource, ring: Ring, until: number): void {
  const values = new Float64Array(source.size * basisBlockRows);
  while (ring.filled < until) {
    const rows = Math.min(basisBlockRows, source.rowCount - ring.filled);
    source.fill({ values, first: ring.filled, rows });
    const slot = ring.filled % ring.slots;
    for (let j = 0; j < source.size; j++) {
      const start = j * basisBlockRows;
      ring.values.set(values.subarray(start, start + rows), j * (ring.slots + 1) + slot);
    }
    ring.filled += rows;
  }
}

/** The next row to enter and the next to leave. */
interface Clock {
  head: number;
  tail: number;
}

/** What enters and leaves at each moment, as slots of the ring, and the root of how long the window then stays. */
interface Moments {
  readonly enter: Int32Array;
  readonly leave: Int32Array;
  readonly root: Float64Array;
}

const momentBuffer = (): Moments => ({
  enter: new Int32Array(basisBlockRows),
  leave: new Int32Array(basisBlockRows),
  root: new Float64Array(basisBlockRows),
});

interface Timing {
  readonly positions: Float64Array;
  readonly lags: number;
  readonly slots: number;
}

function nextMoments({ positions, lags, slots }: Timing, clock: Clock, moments: Moments): number {
  const n = positions.length;
  let count = 0;
  for (; count < basisBlockRows && clock.tail < n; count++) {
    const leaving = positions[clock.tail]! + lags + 1;
    const now = clock.head < n ? Math.min(positions[clock.head]!, leaving) : leaving;
    moments.enter[count] = clock.head < n && positions[clock.head] === now ? clock.head++ % slots : slots;
    moments.leave[count] = leaving === now ? clock.tail++ % slots : slots;
    const nextLeaving = clock.tail < n ? positions[clock.tail]! + lags + 1 : now;
    const next = clock.head < n ? Math.min(positions[clock.head]!, nextLeaving) : nextLeaving;
    moments.root[count] = clock.head === clock.tail ? 0 : Math.sqrt(next - now);
  }
  return count;
}

interface Windows {
  readonly values: Float64Array;
  /** For each column the sum of the window, and what rounding took from it. */
  readonly running: Float64Array;
}

/** One column of the windows; TwoSum keeps every lost digit, so that a million steps do not drift. */
function runColumn(
  { ring, windows, moments }: { ring: Ring; windows: Windows; moments: Moments },
  j: number,
  count: number,
): void {
  const column = ring.values.subarray(j * (ring.slots + 1), (j + 1) * (ring.slots + 1));
  const { enter, leave, root } = moments;
  const start = j * basisBlockRows;
  let total = windows.running[2 * j]!;
  let lost = windows.running[2 * j + 1]!;
  for (let i = 0; i < count; i++) {
    const added = column[enter[i]!]!;
    const more = total + added;
    const part = more - total;
    lost += total - (more - part) + (added - part);
    const removed = -column[leave[i]!]!;
    total = more + removed;
    const rest = total - more;
    lost += more - (total - rest) + (removed - rest);
    windows.values[start + i] = (total + lost) * root[i]!;
  }
  windows.running[2 * j] = total;
  windows.running[2 * j + 1] = lost;
}
