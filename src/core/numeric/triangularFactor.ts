import type { SquareMatrix } from "./matrix.ts";
import { extremes } from "./sums.ts";
import { arena } from "./vector/arena.ts";
import { place } from "./vector/place.ts";

/** Rows taken at a time: a block of some twenty columns stays in the cache. */
const blockRows = 512;

/**
 * The upper triangle R of the QR decomposition of the matrix whose columns are given, by Householder reflections.
 * Rows are taken in blocks beneath the triangle found so far, so that reflection j touches row j of the triangle and
 * the block alone; Q is not kept. Columns of extreme size are scaled by a power of two on the way, which changes no digit.
 * A column that those before it make up leaves a diagonal entry near zero.
 * @param columns - p columns of equal height n; n may be less than p.
 * @returns R, p by p; the signs of its rows as they come.
 * @see Golub and Van Loan (2013), Matrix Computations, 5.2; Demmel, Grigori, Hoemmen and Langou (2012), SIAM J. Sci.
 *   Comput. 34, A206-A239.
 */
export function triangularFactor(columns: readonly Float64Array[]): SquareMatrix {
  const size = columns.length;
  const rowCount = columns[0]?.length ?? 0;
  const scales = Float64Array.from(columns, scaleOf);
  const triangle = new Float64Array(size * size);
  const block = even(size * size);
  const values = arena.numbers(block + size * blockRows);
  values.fill(0, 0, triangle.length);
  for (let first = 0; first < rowCount; first += blockRows) {
    const rows = Math.min(blockRows, rowCount - first);
    columns.forEach((column, j) => {
      placeScaled(column.subarray(first, first + rows), scales[j]!, { values, at: block + j * blockRows });
    });
    arena.kernels.reflectRows({ triangle: 0, block, size, rows, stride: blockRows });
  }
  triangle.set(values.subarray(0, triangle.length));
  return { size, values: triangle.map((value, index) => value / scales[index % size]!) };
}

/** Places in the arena are even. */
const even = (length: number): number => length + (length % 2);

/** Numbers of a size within these bounds can be squared and summed over any sheet. */
const moderate = 2 ** 300;

/** 1, or the power of two that brings the largest entry of a column of extreme size to between 1 and 2. */
function scaleOf(column: Float64Array): number {
  const { least, greatest } = extremes(column);
  const largest = Math.max(-least, greatest);
  const extreme = largest > moderate || (largest > 0 && largest < 1 / moderate);
  return extreme ? Math.pow(2, -Math.floor(Math.log2(largest))) : 1;
}

function placeScaled(column: Float64Array, scale: number, { values, at }: { values: Float64Array; at: number }): void {
  place(scale === 1 ? column : column.map((value) => value * scale), values, at);
}
