import type { SquareMatrix } from "./matrix.ts";
import { choleskyFactor } from "./smallMatrix.ts";

/**
 * The t ratio of e_(t-1) in the regression of the change e_t - e_(t-1) on it and on the `lags` changes before, without a
 * constant. All cross-products come from the first row of them, because one period later they differ by the products
 * at the two ends alone: the cost is n times the lags, not their square.
 * @param series - n values, one a period.
 * @param lags - at least 0, and fewer than n / 2 - 1.
 * @returns null where the columns are dependent or the fit is perfect.
 */
export function levelRatio(series: Float64Array, lags: number): number | null {
  const factor = choleskyFactor(changeMoments(series, lags));
  if (factor === null) return null;
  const { size, values } = factor;
  const [level, change] = [size - 2, size - 1];
  // The last two columns of the factor hold what the lagged changes leave of the level and of the change.
  const part = values[change * size + level]!;
  const rest = values[change * size + change]!;
  const rows = series.length - 1 - lags;
  return rest === 0 ? null : (part * Math.sqrt(rows - lags - 1)) / rest;
}

/** Cross-products of the columns [changes 1..lags periods before | level before | change], over the rows that have all. */
function changeMoments(series: Float64Array, lags: number): SquareMatrix {
  const changes = new Float64Array(series.length - 1);
  for (let t = 0; t < changes.length; t++) changes[t] = series[t + 1]! - series[t]!;
  const between = lagProducts(changes, lags);
  const size = lags + 2;
  const values = new Float64Array(size * size);
  const place = (lag: number): number => (lag === 0 ? size - 1 : lag - 1);
  for (let i = 0; i <= lags; i++) {
    for (let j = 0; j <= lags; j++) values[place(i) * size + place(j)] = between[i * (lags + 1) + j]!;
    const withLevel = shiftedProduct(series, changes, { from: lags, back: i });
    values[place(i) * size + lags] = withLevel;
    values[lags * size + place(i)] = withLevel;
  }
  values[lags * size + lags] = shiftedProduct(series.subarray(0, changes.length), series, { from: lags, back: 0 });
  return { size, values };
}

/** sum of d_(t-i) d_(t-j) for i, j = 0..lags, t from `lags` on. */
function lagProducts(d: Float64Array, lags: number): Float64Array {
  const width = lags + 1;
  const sums = new Float64Array(width * width);
  const last = d.length - 1;
  for (let j = 0; j <= lags; j++) {
    let sum = shiftedProduct(d, d, { from: lags, back: j });
    for (let i = 0; i + j <= lags; i++) {
      sums[i * width + i + j] = sum;
      sums[(i + j) * width + i] = sum;
      if (i + j < lags) sum += d[lags - 1 - i]! * d[lags - 1 - i - j]! - d[last - i]! * d[last - i - j]!;
    }
  }
  return sums;
}

/** sum of x_t y_(t-back) for t from `from` to the end of the shorter. */
function shiftedProduct(x: Float64Array, y: Float64Array, { from, back }: { from: number; back: number }): number {
  const until = Math.min(x.length, y.length);
  let sum = 0;
  for (let t = from; t < until; t++) sum += x[t]! * y[t - back]!;
  return sum;
}
