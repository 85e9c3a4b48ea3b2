/**
 * Sums and products carried to about 32 digits as a high and a low word, block by block: TwoSum (Knuth 1969) and
 * TwoProduct with the split of Veltkamp and Dekker (Dekker 1971, Numer. Math. 18, 224-242), written out because
 * JavaScript has no fused multiply-add. Arguments must stay below 1e290 in size.
 */
export interface Wide {
  readonly high: Float64Array;
  readonly low: Float64Array;
}

export const wide = (length: number): Wide => ({ high: new Float64Array(length), low: new Float64Array(length) });

/** 2^27 + 1 splits a double into two halves of 26 bits. */
const split = 134217729;

/** target_i -= x_i (high + low), for i = 0..x.length - 1; the low words gather and are folded in by `settle`. */
export function subtractMultiple(target: Wide, x: Float64Array, { high, low }: { high: number; low: number }): void {
  const scaled = split * high;
  const top = scaled - (scaled - high);
  const bottom = high - top;
  for (let i = 0; i < x.length; i++) {
    const value = x[i]!;
    const product = value * high;
    const c = split * value;
    const head = c - (c - value);
    const tail = value - head;
    const lost = head * top - product + head * bottom + tail * top + tail * bottom;
    const before = target.high[i]!;
    const after = before - product;
    const back = after - before;
    target.low[i]! += before - (after - back) - (product + back) - lost - value * low;
    target.high[i] = after;
  }
}

/** Folds the low words of the first `rows` entries into the high ones; what remains stays in the low word. */
export function settle({ high, low }: Wide, rows: number): void {
  for (let i = 0; i < rows; i++) {
    const sum = high[i]! + low[i]!;
    low[i] = low[i]! - (sum - high[i]!);
    high[i] = sum;
  }
}

/** sums[at] += x'r, over the x.length first entries of a settled r. */
export function addInnerProduct(sums: Wide, at: number, { x, r }: { x: Float64Array; r: Wide }): void {
  let sum = sums.high[at]!;
  let rest = sums.low[at]!;
  for (let i = 0; i < x.length; i++) {
    const a = x[i]!;
    const b = r.high[i]!;
    const product = a * b;
    const c = split * a;
    const aHead = c - (c - a);
    const aTail = a - aHead;
    const d = split * b;
    const bHead = d - (d - b);
    const bTail = b - bHead;
    const lost = aHead * bHead - product + aHead * bTail + aTail * bHead + aTail * bTail;
    const after = sum + product;
    const back = after - sum;
    rest += sum - (after - back) + (product - back) + lost + a * r.low[i]!;
    sum = after;
  }
  sums.high[at] = sum;
  sums.low[at] = rest;
}
