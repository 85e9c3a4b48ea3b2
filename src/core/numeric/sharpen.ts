import { addInnerProduct, settle, wide, type Wide } from "./doubleDouble.ts";
import type { SquareMatrix } from "./matrix.ts";
import { solveTransposedTriangle } from "./triangle.ts";

const blockRows = 512;

/**
 * Corrects the triangle R of X = QR for the rounding of its computation, which for nearly dependent columns would show
 * in the standard errors. With E = R^-T (X'X - R'R) R^-1, the difference in double-double, the better triangle is
 * (I + U) R, where U is E's upper half with half the diagonal, because (I + U)'(I + U) = I + E + O(E^2).
 */
export function sharpen(columns: readonly Float64Array[], triangle: SquareMatrix): SquareMatrix {
  const { size, values } = triangle;
  const error = symmetricSolve(triangle, crossProductError(columns, triangle));
  const sharper = new Float64Array(size * size);
  for (let i = 0; i < size; i++) {
    for (let j = i; j < size; j++) {
      let correction = (error[i * size + i]! / 2) * values[i * size + j]!;
      for (let m = i + 1; m <= j; m++) correction += error[i * size + m]! * values[m * size + j]!;
      sharper[i * size + j] = values[i * size + j]! + correction;
    }
  }
  return { size, values: sharper };
}

/** X'X - R'R, each to 32 digits before they are subtracted. */
function crossProductError(columns: readonly Float64Array[], { size, values }: SquareMatrix): Float64Array {
  const sums = wide(size * size);
  addCrossProducts(sums, columns);
  const rowsOfTriangle = Array.from({ length: size }, (_, j) =>
    Float64Array.from({ length: size }, (_, i) => values[i * size + j]!),
  );
  const ofTriangle = wide(size * size);
  addCrossProducts(ofTriangle, rowsOfTriangle);
  return sums.high.map((high, index) => high - ofTriangle.high[index]! + (sums.low[index]! - ofTriangle.low[index]!));
}

function addCrossProducts(sums: Wide, columns: readonly Float64Array[]): void {
  const rowCount = columns[0]!.length;
  const size = columns.length;
  const r = wide(blockRows);
  for (let first = 0; first < rowCount; first += blockRows) {
    const last = Math.min(first + blockRows, rowCount);
    columns.forEach((column, j) => {
      r.high.set(column.subarray(first, last));
      for (let i = 0; i <= j; i++) addInnerProduct(sums, i * size + j, { x: columns[i]!.subarray(first, last), r });
    });
  }
  settle(sums, size * size);
  for (let i = 0; i < size; i++) {
    for (let j = 0; j < i; j++) {
      sums.high[i * size + j] = sums.high[j * size + i]!;
      sums.low[i * size + j] = sums.low[j * size + i]!;
    }
  }
}

/** R^-T M R^-1 for a symmetric M. */
function symmetricSolve(triangle: SquareMatrix, matrix: Float64Array): Float64Array {
  const { size } = triangle;
  const half = new Float64Array(size * size);
  for (let j = 0; j < size; j++) {
    const row = solveTransposedTriangle(triangle, matrix.subarray(j * size, (j + 1) * size));
    half.set(row, j * size);
  }
  const whole = new Float64Array(size * size);
  for (let j = 0; j < size; j++) {
    const column = Float64Array.from({ length: size }, (_, i) => half[i * size + j]!);
    whole.set(solveTransposedTriangle(triangle, column), j * size);
  }
  return whole;
}
