import type { Fit } from "../fit/fit.ts";
import type { Basis } from "../numeric/basis.ts";
import { explain, type Explained } from "../numeric/explain.ts";
import { explainFromMoments } from "../numeric/explainFromMoments.ts";
import { dependenceTolerance } from "../numeric/leastSquares.ts";
import { productColumns, productCount, productMoments } from "../numeric/productMoments.ts";
import { mean, sumOfSquares } from "../numeric/sums.ts";
import { columnLengths } from "../numeric/triangle.ts";
import { triangularFactor } from "../numeric/triangularFactor.ts";
import { constantAndDrivers, relativeSquares } from "./auxiliary.ts";

/** Up to so many multiplications the columns are factored themselves; beyond, their moments are, which is faster. */
const mostByColumns = 1e9;
/** Beyond so many multiplications (a full sheet of some thirty drivers) the test would take a minute. */
const mostByMoments = 5e10;
/** A matrix of so many columns squared is the most that is held. */
const mostProducts = 2500;

/**
 * The regression of the squared residuals on all squares and cross-products of the drivers.
 * @returns null where there are more of them than can be worked with.
 */
export function explainByProducts(fit: Fit): Explained | null {
  const basis = basisWithConstant(fit);
  const products = productCount(basis.columns.length);
  const squares = relativeSquares(fit);
  if (fit.rowCount * products ** 2 <= mostByColumns) return explain(productColumns(basis), squares);
  const distinctMoments = products ** 2 / 6;
  if (products > mostProducts || fit.rowCount * distinctMoments > mostByMoments) return null;
  return explainFromMoments(productMoments(basis, squares), sumOfSquares(squares, mean(squares)));
}

/** An orthonormal basis of the constant and the terms, the constant first. */
function basisWithConstant(fit: Fit): Basis {
  const columns = constantAndDrivers(fit);
  if (fit.design.terms[0]?.meaning.kind === "constant") return { columns, triangle: fit.triangle };
  const factor = triangularFactor(columns);
  const lengths = columnLengths(factor);
  const independent = columns.filter(
    (_, j) => Math.abs(factor.values[j * factor.size + j]!) > dependenceTolerance * lengths[j]!,
  );
  return { columns: independent, triangle: triangularFactor(independent) };
}
