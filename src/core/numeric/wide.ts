/** Numbers of about 32 digits: each the sum of a high and a low word. */
export interface Wide {
  readonly high: Float64Array;
  readonly low: Float64Array;
}

export const wide = (length: number): Wide => ({ high: new Float64Array(length), low: new Float64Array(length) });

/** Folds the low words into the high ones; what a high word cannot hold stays in the low one. */
export function settle({ high, low }: Wide): void {
  for (let i = 0; i < high.length; i++) {
    const sum = high[i]! + low[i]!;
    low[i] = low[i]! - (sum - high[i]!);
    high[i] = sum;
  }
}
