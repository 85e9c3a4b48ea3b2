import type { SquareMatrix } from "./matrix.ts";

/** Solves R x = b, R upper triangular. */
export function solveTriangle({ size, values }: SquareMatrix, right: Float64Array): Float64Array<ArrayBuffer> {
  const x = new Float64Array(size);
  for (let i = size - 1; i >= 0; i--) {
    let rest = right[i]!;
    for (let j = i + 1; j < size; j++) rest -= values[i * size + j]! * x[j]!;
    x[i] = rest / values[i * size + i]!;
  }
  return x;
}

/** Solves R' x = b, R upper triangular. */
export function solveTransposedTriangle(
  { size, values }: SquareMatrix,
  right: Float64Array,
): Float64Array<ArrayBuffer> {
  const x = new Float64Array(size);
  for (let i = 0; i < size; i++) {
    let rest = right[i]!;
    for (let j = 0; j < i; j++) rest -= values[j * size + i]! * x[j]!;
    x[i] = rest / values[i * size + i]!;
  }
  return x;
}

/** R^-1, upper triangular. */
export function invertTriangle(triangle: SquareMatrix): SquareMatrix {
  const { size } = triangle;
  const values = new Float64Array(size * size);
  for (let j = 0; j < size; j++) {
    const unit = new Float64Array(size);
    unit[j] = 1;
    solveTriangle(triangle, unit).forEach((entry, i) => (values[i * size + j] = entry));
  }
  return { size, values };
}

/** The leading rows and columns of a matrix. */
export function leading({ size, values }: SquareMatrix, count: number): SquareMatrix {
  const part = new Float64Array(count * count);
  for (let i = 0; i < count; i++) part.set(values.subarray(i * size, i * size + count), i * count);
  return { size: count, values: part };
}

/** The lengths of the columns of X, from its triangle. */
export function columnLengths({ size, values }: SquareMatrix): Float64Array<ArrayBuffer> {
  return Float64Array.from({ length: size }, (_, j) =>
    Math.hypot(...Array.from({ length: j + 1 }, (_, i) => values[i * size + j]!)),
  );
}
