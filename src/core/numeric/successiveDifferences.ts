import { type Basis, basisBlockRows, visitBasis } from "./basis.ts";
import { addCrossProducts, mirrored } from "./crossProducts.ts";
import type { SquareMatrix } from "./matrix.ts";

/**
 * Moments of the form sum of (v_i - v_(i-1))^2 over the linked rows, v' A v, on an orthonormal basis Q.
 */
export interface DifferenceMoments {
  /** Q'AQ. */
  readonly cross: SquareMatrix;
  /** tr Q'A^2 Q. */
  readonly crossOfSquare: number;
  /** tr A and tr A^2. */
  readonly trace: number;
  readonly traceOfSquare: number;
}

/**
 * @param linked - one a row: 1 where the row before is its predecessor, else 0; linked[0] is 0.
 */
export function differenceMoments(basis: Basis, linked: Uint8Array): DifferenceMoments {
  const size = basis.columns.length;
  const cross = new Float64Array(size * size);
  const differences = new Float64Array(size * basisBlockRows);
  const last = { value: new Float64Array(size), difference: new Float64Array(size) };
  let crossOfSquare = 0;
  visitBasis(basis, ({ values, first, rows }) => {
    for (let j = 0; j < size; j++) {
      const start = j * basisBlockRows;
      for (let i = 0; i < rows; i++) {
        const value = values[start + i]!;
        const difference = linked[first + i]! * (value - last.value[j]!);
        crossOfSquare += (difference - last.difference[j]!) ** 2;
        differences[start + i] = difference;
        last.value[j] = value;
        last.difference[j] = difference;
      }
    }
    addCrossProducts(cross, { values: differences, rows, size });
  });
  for (const difference of last.difference) crossOfSquare += difference ** 2;
  return { cross: mirrored(cross, size), crossOfSquare, ...traces(linked) };
}

/** A has the number of a row's links on its diagonal and -1 for each link off it. */
function traces(linked: Uint8Array): { trace: number; traceOfSquare: number } {
  let [links, squares] = [0, 0];
  for (let i = 0; i < linked.length; i++) {
    links += linked[i]!;
    squares += (linked[i]! + (linked[i + 1] ?? 0)) ** 2;
  }
  return { trace: 2 * links, traceOfSquare: squares + 2 * links };
}

/**
 * D M D', where D takes the differences of linked rows and M = I - QQ': its eigenvalues that are not zero are those of
 * M A M. One row and column a link; meant for few rows.
 * @param columns - Q as columns.
 */
export function residualDifferences(columns: readonly Float64Array[], linked: Uint8Array): SquareMatrix {
  const rows = [...linked.keys()].filter((row) => linked[row] === 1);
  const size = rows.length;
  const values = new Float64Array(size * size);
  rows.forEach((row, i) => {
    values[i * size + i] = 2;
    if (rows[i + 1] === row + 1) values[i * size + i + 1] = -1;
  });
  for (const q of columns) {
    subtractSquare(
      values,
      Float64Array.from(rows, (row) => q[row]! - q[row - 1]!),
    );
  }
  return mirrored(values, size);
}

/** v v' off the upper half. */
function subtractSquare(values: Float64Array, v: Float64Array): void {
  const size = v.length;
  for (let i = 0; i < size; i++) {
    const factor = v[i]!;
    for (let j = i; j < size; j++) values[i * size + j]! -= factor * v[j]!;
  }
}
