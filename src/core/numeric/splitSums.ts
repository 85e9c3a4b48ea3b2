import { isPerfect } from "./perfect.ts";
import { type Regression, recursiveResiduals } from "./recursiveResiduals.ts";

/** For the split after `firstRows` rows: how much less the two parts' own regressions leave than the whole one. */
export interface Split {
  readonly firstRows: number;
  readonly ratio: number;
}

/**
 * The split of the rows with the largest (RSS - RSS_1 - RSS_2) / (RSS_1 + RSS_2), in two walks over the rows.
 * @param regression - the columns, and as outcome the residuals of the regression on all rows.
 * @param range - the first and the last number of first rows tried.
 * @returns null where at every split a part has dependent columns or both fit perfectly.
 */
export function largestSplit(regression: Regression, [from, to]: readonly [number, number]): Split | null {
  const forwards = recursiveResiduals(regression, "forwards");
  const backwards = recursiveResiduals(regression, "backwards");
  const k = regression.columns.length;
  const before = runningSquares(forwards.residuals);
  const after = runningSquares(backwards.residuals.toReversed()).toReversed();
  const whole = before.at(-1)!;
  let best: Split | null = null;
  for (let firstRows = from; firstRows <= to; firstRows++) {
    if (forwards.ranks[firstRows - 1]! < k || backwards.ranks[firstRows]! < k) continue;
    const parts = before[firstRows - 1]! + after[firstRows]!;
    if (isPerfect(parts, whole)) continue;
    const ratio = (whole - parts) / parts;
    if (best === null || ratio > best.ratio) best = { firstRows, ratio };
  }
  return best;
}

function runningSquares(values: Float64Array): Float64Array<ArrayBuffer> {
  let sum = 0;
  return Float64Array.from(values, (value) => (sum += value * value));
}
