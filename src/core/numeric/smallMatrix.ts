import { CholeskyDecomposition, EigenvalueDecomposition, Matrix, SingularValueDecomposition, inverse } from "ml-matrix";
import type { SquareMatrix } from "./matrix.ts";

/** Work on k by k matrices. Nothing here is meant for matrices with a row for each observation. */

export const identity = (size: number): SquareMatrix => fromMatrix(Matrix.eye(size));

export const matrixOf = (rows: readonly (readonly number[])[]): SquareMatrix => ({
  size: rows.length,
  values: Float64Array.from(rows.flat()),
});

export const diagonal = ({ size, values }: SquareMatrix): Float64Array<ArrayBuffer> =>
  Float64Array.from({ length: size }, (_, i) => values[i * size + i]!);

/** A B A'. */
export function sandwich(a: SquareMatrix, b: SquareMatrix): SquareMatrix {
  const left = toMatrix(a);
  const product = left.mmul(toMatrix(b)).mmul(left.transpose());
  return symmetrised(fromMatrix(product));
}

/** A A'. */
export const timesTransposed = (a: SquareMatrix): SquareMatrix => sandwich(a, identity(a.size));

export const scaled = ({ size, values }: SquareMatrix, factor: number): SquareMatrix => ({
  size,
  values: values.map((value) => value * factor),
});

export const plus = (a: SquareMatrix, b: SquareMatrix): SquareMatrix => ({
  size: a.size,
  values: a.values.map((value, index) => value + b.values[index]!),
});

/** A x. */
export function timesVector({ size, values }: SquareMatrix, x: ArrayLike<number>): Float64Array<ArrayBuffer> {
  return Float64Array.from({ length: size }, (_, i) => {
    let sum = 0;
    for (let j = 0; j < size; j++) sum += values[i * size + j]! * x[j]!;
    return sum;
  });
}

/** sums += x x'. */
export function addOuterProduct(sums: Float64Array, x: Float64Array): void {
  const size = x.length;
  for (let i = 0; i < size; i++) for (let j = 0; j < size; j++) sums[i * size + j]! += x[i]! * x[j]!;
}

/** x' A y. */
export function bilinear(x: ArrayLike<number>, a: SquareMatrix, y: ArrayLike<number>): number {
  return timesVector(a, y).reduce((sum, value, i) => sum + value * x[i]!, 0);
}

/** A^-1, by the LU decomposition; A must not be singular. */
export const invert = (a: SquareMatrix): SquareMatrix => fromMatrix(inverse(toMatrix(a)));

/** The lower triangle L with A = L L', or null where A is not positive definite. */
export function choleskyFactor(a: SquareMatrix): SquareMatrix | null {
  const decomposition = new CholeskyDecomposition(toMatrix(a));
  return decomposition.isPositiveDefinite() ? fromMatrix(decomposition.lowerTriangularMatrix) : null;
}

/** Eigenvalues of a symmetric matrix in ascending order, and their vectors as the columns of a matrix. */
interface Eigen {
  readonly values: Float64Array<ArrayBuffer>;
  readonly vectors: SquareMatrix;
}

function symmetricEigen(a: SquareMatrix): Eigen {
  const decomposition = new EigenvalueDecomposition(toMatrix(a), { assumeSymmetric: true });
  return {
    values: Float64Array.from(decomposition.realEigenvalues),
    vectors: fromMatrix(decomposition.eigenvectorMatrix),
  };
}

/** V f(L) V' for a symmetric matrix V L V': its square root, or the inverse of that, and the like. */
export function symmetricFunction(a: SquareMatrix, f: (eigenvalue: number) => number): SquareMatrix {
  const { values, vectors } = symmetricEigen(a);
  const { size } = a;
  const result = new Float64Array(size * size);
  values.forEach((value, m) => {
    const weight = f(value);
    for (let i = 0; i < size; i++) {
      const left = weight * vectors.values[i * size + m]!;
      for (let j = 0; j < size; j++) result[i * size + j]! += left * vectors.values[j * size + m]!;
    }
  });
  return { size, values: result };
}

/** The largest size among the eigenvalues of any square matrix. */
export function spectralRadius(a: SquareMatrix): number {
  const { realEigenvalues, imaginaryEigenvalues } = new EigenvalueDecomposition(toMatrix(a));
  return Math.max(...realEigenvalues.map((real, i) => Math.hypot(real, imaginaryEigenvalues[i]!)));
}

/** Singular values in descending order, and the right singular vectors as the columns of a matrix. */
export interface SingularValues {
  readonly values: Float64Array<ArrayBuffer>;
  readonly right: SquareMatrix;
}

export function singularValues(a: SquareMatrix): SingularValues {
  const { diagonal: values, rightSingularVectors } = new SingularValueDecomposition(toMatrix(a));
  return { values: Float64Array.from(values), right: fromMatrix(rightSingularVectors) };
}

function toMatrix({ size, values }: SquareMatrix): Matrix {
  return Matrix.from1DArray(size, size, values);
}

function fromMatrix(matrix: Matrix): SquareMatrix {
  return { size: matrix.rows, values: Float64Array.from(matrix.to1DArray()) };
}

/** Rounding leaves the two halves of a symmetric product a digit apart. */
function symmetrised({ size, values }: SquareMatrix): SquareMatrix {
  return {
    size,
    values: values.map((value, index) => (value + values[(index % size) * size + Math.floor(index / size)]!) / 2),
  };
}
