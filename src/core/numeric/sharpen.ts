import type { SquareMatrix } from "./matrix.ts";
import { solveTransposedTriangle } from "./triangle.ts";
import { arena } from "./vector/arena.ts";
import { place } from "./vector/place.ts";
import { settle, type Wide, wide } from "./wide.ts";

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
  const ofColumns = wideCrossProducts(columns);
  const rowsOfTriangle = Array.from({ length: size }, (_, j) =>
    Float64Array.from({ length: size }, (_, i) => values[i * size + j]!),
  );
  const ofTriangle = wideCrossProducts(rowsOfTriangle);
  return ofColumns.high.map(
    (high, index) => high - ofTriangle.high[index]! + (ofColumns.low[index]! - ofTriangle.low[index]!),
  );
}

/** X'X, p by p, in two words. */
function wideCrossProducts(columns: readonly Float64Array[]): Wide {
  const size = columns.length;
  const rowCount = columns[0]!.length;
  const [low, sums] = [0, blockRows];
  const block = sums + 2 * size * size;
  const space = arena.numbers(block + size * blockRows);
  space.fill(0, low, block);
  for (let first = 0; first < rowCount; first += blockRows) {
    const rows = Math.min(blockRows, rowCount - first);
    columns.forEach((column, j) => {
      const high = block + j * blockRows;
      place(column.subarray(first, first + rows), space, high);
      for (let i = 0; i <= j; i++) {
        const x = block + i * blockRows;
        arena.kernels.addInnerProduct({ sum: sums + 2 * (i * size + j), x, high, low, rows });
      }
    });
  }
  return bothHalves(space.subarray(sums, block), size);
}

function bothHalves(sums: Float64Array, size: number): Wide {
  const whole = wide(size * size);
  for (let i = 0; i < size; i++) {
    for (let j = 0; j < size; j++) {
      const from = 2 * (Math.min(i, j) * size + Math.max(i, j));
      whole.high[i * size + j] = sums[from]!;
      whole.low[i * size + j] = sums[from + 1]!;
    }
  }
  settle(whole);
  return whole;
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
