import { EigenvalueDecomposition, Matrix } from "ml-matrix";
import type { SquareMatrix } from "../../src/core/numeric/matrix.ts";

const toMatrix = ({ size, values }: SquareMatrix): Matrix => Matrix.from1DArray(size, size, values);

/** A B. */
export const product = (a: SquareMatrix, b: SquareMatrix): SquareMatrix => ({
  size: a.size,
  values: Float64Array.from(toMatrix(a).mmul(toMatrix(b)).to1DArray()),
});

/** In ascending order, by the matrix library: another method than core's own. */
export const eigenvaluesOf = (symmetric: SquareMatrix): readonly number[] =>
  new EigenvalueDecomposition(toMatrix(symmetric), { assumeSymmetric: true }).realEigenvalues;
