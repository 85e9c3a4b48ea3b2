import type { Fit } from "../fit/fit.ts";
import { earlierRows, valuesAt } from "../numeric/earlierRows.ts";
import { explain } from "../numeric/explain.ts";
import { inOrder } from "../numeric/ordering.ts";
import { sumOfSquares } from "../numeric/sums.ts";
import { relativeSquares } from "./auxiliary.ts";
import { fewRows, lagrangeMultiplier } from "./lagrangeMultiplier.ts";
import { type TestOutcome, notApplicable } from "./outcome.ts";
import { noTime, timeLineOf } from "./timeLine.ts";

/**
 * Engle's LM test for runs of large errors.
 * H0: the error variance does not depend on the squared errors 1..p periods before. LM = m R^2 of the squared residuals
 * on a constant and their p predecessors, over the m rows that have them all; under H0 chi-square(p) as n grows.
 * @param order - p >= 1, in periods.
 * @returns LM >= 0 and the F form; not-applicable where rows do not run through time or too few have p predecessors.
 * @see Engle (1982), Econometrica 50, 987-1007.
 */
export function arch(fit: Fit, order: number): TestOutcome {
  const line = timeLineOf(fit.design.order);
  if (line === null) return notApplicable("arch", noTime, order);
  const earlier = Array.from({ length: order }, (_, index) => earlierRows(line, index + 1));
  const complete = Int32Array.from(fit.residuals.keys()).filter((row) => earlier.every((rows) => rows[row]! >= 0));
  if (complete.length <= order + 1) return notApplicable("arch", fewRows(complete.length, order + 1), order);
  const squares = relativeSquares(fit);
  const columns = earlier.map((rows) => inOrder(valuesAt(squares, rows), complete));
  const constant = new Float64Array(complete.length).fill(1);
  const explainedSquares = inOrder(squares, complete);
  const explained = explain([constant, ...columns], explainedSquares);
  const size = sumOfSquares(explainedSquares);
  return lagrangeMultiplier({ test: "arch", order, rowCount: complete.length, explained, size, underNull: 1 });
}
