import type { SquareMatrix } from "./matrix.ts";

/** Rows taken at a time: a block of some twenty columns stays in the cache. */
const blockRows = 512;

/**
 * The upper triangle R of the QR decomposition of the matrix whose columns are given, by Householder reflections.
 * Rows are taken in blocks beneath the triangle found so far, so that reflection j touches row j of the triangle and
 * the block alone; Q is not kept. Columns are scaled by powers of two on the way, which changes no digit.
 * A column that those before it make up leaves a diagonal entry near zero.
 * @param columns - p columns of equal height n; n may be less than p.
 * @returns R, p by p; the signs of its rows as they come.
 * @see Golub and Van Loan (2013), Matrix Computations, 5.2; Demmel, Grigori, Hoemmen and Langou (2012), SIAM J. Sci. Comput. 34, A206-A239.
 */
export function triangularFactor(columns: readonly Float64Array[]): SquareMatrix {
  const size = columns.length;
  const rowCount = columns[0]?.length ?? 0;
  const scales = Float64Array.from(columns, scaleOf);
  const work: Work = {
    size,
    rows: 0,
    triangle: new Float64Array(size * size),
    block: new Float64Array(size * blockRows),
  };
  for (let first = 0; first < rowCount; first += blockRows) {
    work.rows = Math.min(blockRows, rowCount - first);
    columns.forEach((column, j) => {
      copyScaled(column.subarray(first, first + work.rows), scales[j]!, work.block.subarray(j * blockRows));
    });
    for (let j = 0; j < size; j++) reflect(work, j);
  }
  return { size, values: work.triangle.map((value, index) => value / scales[index % size]!) };
}

/** The running triangle, row by row, and the block of rows beneath it, column by column. */
interface Work {
  readonly size: number;
  rows: number;
  readonly triangle: Float64Array;
  readonly block: Float64Array;
}

/** The power of two that brings the largest entry to between 1 and 2; 1 for a column of zeros. */
function scaleOf(column: Float64Array): number {
  let largest = 0;
  for (let i = 0; i < column.length; i++) {
    const size = Math.abs(column[i]!);
    if (size > largest) largest = size;
  }
  return largest === 0 ? 1 : Math.pow(2, -Math.floor(Math.log2(largest)));
}

function copyScaled(from: Float64Array, scale: number, to: Float64Array): void {
  for (let i = 0; i < from.length; i++) to[i] = from[i]! * scale;
}

/** Reflection j clears column j of the block into the triangle's diagonal and carries the later columns along. */
function reflect({ size, rows, triangle, block }: Work, j: number): void {
  const start = j * blockRows;
  let square = 0;
  for (let i = start; i < start + rows; i++) square += block[i]! * block[i]!;
  if (square === 0) return;
  const diagonal = triangle[j * size + j]!;
  const norm = Math.sqrt(square + diagonal * diagonal);
  const image = diagonal > 0 ? -norm : norm;
  // The reflection's vector is (head, the block's column); head has no cancellation by the choice of sign.
  const head = diagonal - image;
  const work: Reflection = { size, rows, triangle, block, j, head, factor: 1 / (image * head) };
  triangle[j * size + j] = image;
  let c = j + 1;
  for (; c + 3 < size; c += 4) applyToFour(work, c);
  for (; c < size; c++) applyToOne(work, c);
}

interface Reflection extends Readonly<Work> {
  readonly j: number;
  readonly head: number;
  readonly factor: number;
}

function applyToOne({ size, rows, triangle, block, j, head, factor }: Reflection, c: number): void {
  const v = j * blockRows;
  const x = c * blockRows;
  let dot = head * triangle[j * size + c]!;
  for (let i = 0; i < rows; i++) dot += block[v + i]! * block[x + i]!;
  dot *= factor;
  triangle[j * size + c]! += dot * head;
  for (let i = 0; i < rows; i++) block[x + i]! += dot * block[v + i]!;
}

/** Four columns at once, so that the reflection's vector is read once for all of them. */
function applyToFour({ size, rows, triangle, block, j, head, factor }: Reflection, c: number): void {
  const v = j * blockRows;
  const x0 = c * blockRows;
  const x1 = x0 + blockRows;
  const x2 = x1 + blockRows;
  const x3 = x2 + blockRows;
  const top = j * size + c;
  let dot0 = head * triangle[top]!;
  let dot1 = head * triangle[top + 1]!;
  let dot2 = head * triangle[top + 2]!;
  let dot3 = head * triangle[top + 3]!;
  for (let i = 0; i < rows; i++) {
    const value = block[v + i]!;
    dot0 += value * block[x0 + i]!;
    dot1 += value * block[x1 + i]!;
    dot2 += value * block[x2 + i]!;
    dot3 += value * block[x3 + i]!;
  }
  dot0 *= factor;
  dot1 *= factor;
  dot2 *= factor;
  dot3 *= factor;
  triangle[top]! += dot0 * head;
  triangle[top + 1]! += dot1 * head;
  triangle[top + 2]! += dot2 * head;
  triangle[top + 3]! += dot3 * head;
  for (let i = 0; i < rows; i++) {
    const value = block[v + i]!;
    block[x0 + i]! += dot0 * value;
    block[x1 + i]! += dot1 * value;
    block[x2 + i]! += dot2 * value;
    block[x3 + i]! += dot3 * value;
  }
}
