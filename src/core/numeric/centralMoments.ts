export interface CentralMoments {
  readonly mean: number;
  /** Means of the second, third and fourth powers about the mean. */
  readonly second: number;
  readonly third: number;
  readonly fourth: number;
}

/** Mean and central moments, all divided by n, in two passes. */
export function centralMoments(values: Float64Array): CentralMoments {
  const n = values.length;
  let sum = 0;
  for (const x of values) sum += x;
  const mean = sum / n;
  let [second, third, fourth] = [0, 0, 0];
  for (const x of values) {
    const d = x - mean;
    const square = d * d;
    second += square;
    third += square * d;
    fourth += square * square;
  }
  return { mean, second: second / n, third: third / n, fourth: fourth / n };
}
