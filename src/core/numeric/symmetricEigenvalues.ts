import type { SquareMatrix } from "./matrix.ts";

/**
 * The eigenvalues of a symmetric matrix without its vectors, in ascending order: Householder's reflections to a
 * tridiagonal matrix, then implicit QL. The error of each is a small multiple of the rounding of the largest.
 * @param a - symmetric; only its lower triangle is read. Squares of its entries are to be in the range of doubles.
 * @see Martin, Reinsch and Wilkinson (1968), Numer. Math. 11, 181-195; Dubrulle, Martin and Wilkinson (1968), Numer.
 *   Math. 12, 377-383.
 */
export function symmetricEigenvalues(a: SquareMatrix): Float64Array<ArrayBuffer> {
  const tridiagonal = tridiagonalOf(a);
  const tolerance = Number.EPSILON * largestSize(tridiagonal);
  const { diagonal } = tridiagonal;
  for (let first = 0; first < diagonal.length; first++) {
    for (;;) {
      const last = endOfBlock(tridiagonal, first, tolerance);
      if (last === first) break;
      stepOfQL(tridiagonal, first, last);
    }
  }
  return diagonal.sort();
}

interface Tridiagonal {
  readonly diagonal: Float64Array<ArrayBuffer>;
  /** Entry i stands between rows i and i + 1; the last is 0. */
  readonly beside: Float64Array<ArrayBuffer>;
}

/** Row by row from the last: a reflection of the rows above it leaves the row one entry beside the diagonal. */
function tridiagonalOf({ size, values }: SquareMatrix): Tridiagonal {
  const lower = Float64Array.from(values);
  const diagonal = new Float64Array(size);
  const beside = new Float64Array(size);
  const image = new Float64Array(size);
  for (let row = size - 1; row > 0; row--) {
    const normal = lower.subarray(row * size, row * size + row);
    diagonal[row] = lower[row * size + row]!;
    beside[row - 1] = turnIntoNormal(normal);
    if (beside[row - 1] !== 0) reflect({ lower, size, normal, image });
  }
  if (size > 0) diagonal[0] = lower[0]!;
  return { diagonal, beside };
}

/**
 * Makes x the normal v of the reflection that takes it to a multiple of its last unit vector, v scaled to v'v = 2.
 * @returns the multiple.
 */
function turnIntoNormal(x: Float64Array): number {
  let square = 0;
  for (const value of x) square += value * value;
  if (square === 0) return 0;
  const end = x.length - 1;
  const last = x[end]!;
  const multiple = last > 0 ? -Math.sqrt(square) : Math.sqrt(square);
  x[end] = last - multiple;
  const scale = 1 / Math.sqrt(square + Math.abs(last * multiple));
  for (let i = 0; i <= end; i++) x[i]! *= scale;
  return multiple;
}

interface Reflection {
  readonly lower: Float64Array;
  readonly size: number;
  readonly normal: Float64Array;
  /** Room for A v, at least as long as v. */
  readonly image: Float64Array;
}

/** A - v w' - w v' in place of A, with w = A v - (v'A v / 2) v: the leading rows, reflected from both sides. */
function reflect(reflection: Reflection): void {
  const { lower, size, normal: v, image: w } = reflection;
  const count = v.length;
  fillImage(reflection);
  let half = 0;
  for (let i = 0; i < count; i++) half += (v[i]! * w[i]!) / 2;
  for (let i = 0; i < count; i++) w[i]! -= half * v[i]!;
  if (count % 2 === 1) lower[0]! -= 2 * v[0]! * w[0]!;
  for (let i = count % 2; i < count; i += 2) {
    const upper = i * size;
    const under = upper + size;
    const v0 = v[i]!;
    const w0 = w[i]!;
    const v1 = v[i + 1]!;
    const w1 = w[i + 1]!;
    for (let j = 0; j <= i; j++) {
      lower[upper + j]! -= v0 * w[j]! + w0 * v[j]!;
      lower[under + j]! -= v1 * w[j]! + w1 * v[j]!;
    }
    lower[under + i + 1]! -= 2 * v1 * w1;
  }
}

/** A v from the lower triangle, two rows at a time: each entry serves its row and its column. */
function fillImage({ lower, size, normal: v, image }: Reflection): void {
  const count = v.length;
  if (count % 2 === 1) image[0] = lower[0]! * v[0]!;
  for (let i = count % 2; i < count; i += 2) {
    const upper = i * size;
    const under = upper + size;
    const v0 = v[i]!;
    const v1 = v[i + 1]!;
    let sum0 = 0;
    let sum1 = 0;
    for (let j = 0; j < i; j++) {
      const entry0 = lower[upper + j]!;
      const entry1 = lower[under + j]!;
      sum0 += entry0 * v[j]!;
      sum1 += entry1 * v[j]!;
      image[j]! += entry0 * v0 + entry1 * v1;
    }
    const between = lower[under + i]!;
    image[i] = sum0 + lower[upper + i]! * v0 + between * v1;
    image[i + 1] = sum1 + between * v0 + lower[under + i + 1]! * v1;
  }
}

function largestSize({ diagonal, beside }: Tridiagonal): number {
  return diagonal.reduce((most, value, i) => Math.max(most, Math.abs(value) + Math.abs(beside[i]!)), 0);
}

/** The last row of the block that begins at `first`: no entry beside the diagonal within it is negligible. */
function endOfBlock({ beside }: Tridiagonal, first: number, tolerance: number): number {
  let last = first;
  while (last < beside.length - 1 && Math.abs(beside[last]!) > tolerance) last += 1;
  return last;
}

/** One implicit step on the rows first..last, with Wilkinson's shift: the entry beside the first row falls to zero. */
function stepOfQL({ diagonal, beside }: Tridiagonal, first: number, last: number): void {
  let g = diagonal[last]! - shiftOf(diagonal[first]!, diagonal[first + 1]!, beside[first]!);
  let sine = 1;
  let cosine = 1;
  let taken = 0;
  for (let i = last - 1; i >= first; i--) {
    const f = sine * beside[i]!;
    const b = cosine * beside[i]!;
    const length = Math.sqrt(f * f + g * g);
    beside[i + 1] = length;
    sine = length === 0 ? 0 : f / length;
    cosine = length === 0 ? 1 : g / length;
    g = diagonal[i + 1]! - taken;
    const r = (diagonal[i]! - g) * sine + 2 * cosine * b;
    taken = sine * r;
    diagonal[i + 1] = g + taken;
    g = cosine * r - b;
  }
  diagonal[first]! -= taken;
  beside[first] = g;
  beside[last] = 0;
}

/** The eigenvalue of [[a, e], [e, b]] that is nearer to a. */
function shiftOf(a: number, b: number, e: number): number {
  const half = (b - a) / (2 * e);
  const root = Math.sqrt(half * half + 1);
  return a - e / (half + (half < 0 ? -root : root));
}
