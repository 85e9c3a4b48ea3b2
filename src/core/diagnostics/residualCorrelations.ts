import type { Fit } from "../fit/fit.ts";
import { earlierRows, valuesAt } from "../numeric/earlierRows.ts";
import { innerProduct } from "../numeric/sums.ts";
import { timeLineOf } from "./timeLine.ts";

/**
 * Correlations of the residuals with their own past, r_l = sum of e_t e_(t-l) over sum of e_t^2. A period without a row
 * counts as zero.
 * @param most - lags 1..most, in periods, below n.
 * @returns r_1, ..., r_most, each in [-1, 1]; null where rows do not run through time.
 * @see Box and Jenkins (1970), Time Series Analysis, section 2.1.6.
 */
export function residualCorrelations(
  { design, residuals, residualSumOfSquares }: Fit,
  most: number,
): readonly number[] | null {
  const line = timeLineOf(design.order);
  if (line === null) return null;
  return Array.from(
    { length: most },
    (_, index) => innerProduct(residuals, valuesAt(residuals, earlierRows(line, index + 1))) / residualSumOfSquares,
  );
}
