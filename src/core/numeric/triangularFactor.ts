import type { SquareMatrix } from "./matrix.ts";
import { extremes } from "./sums.ts";
import { columnLengths } from "./triangle.ts";
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
  const plain = factorOf(columns, new Float64Array(columns.length).fill(1));
  const sound = columnLengths(plain).every((length, j) =>
    length === 0 ? columns[j]!.every((value) => value === 0) : length > 1 / moderate && length < moderate,
  );
  if (sound) return plain;
  return factorOf(columns, Float64Array.from(columns, scaleOf));
}

/** Columns of a length within these bounds can be squared and summed without leaving the range of doubles. */
const moderate = 2 ** 400;

function factorOf(columns: readonly Float64Array[], scales: Float64Array): SquareMatrix {
  const size = columns.length;
  const rowCount = columns[0]?.length ?? 0;
  const block = even(size * size);
  const values = arena.numbers(block + size * blockRows);
  values.fill(0, 0, block);
  for (let first = 0; first < rowCount; first += blockRows) {
    const rows = Math.min(blockRows, rowCount - first);
    columns.forEach((column, j) => {
      const part = column.subarray(first, first + rows);
      place(scales[j] === 1 ? part : part.map((value) => value * scales[j]!), values, block + j * blockRows);
    });
    arena.kernels.reflectRows({ triangle: 0, block, size, rows, stride: blockRows });
  }
  return { size, values: values.slice(0, size * size).map((value, index) => value / scales[index % size]!) };
}

/** Columns in the arena begin at even places. */
const even = (length: number): number => length + (length % 2);

/** The power of two that brings the largest entry to between 1 and 2; 1 for a column of zeros. */
function scaleOf(column: Float64Array): number {
  const { least, greatest } = extremes(column);
  const largest = Math.max(-least, greatest);
  return largest === 0 ? 1 : Math.pow(2, -Math.floor(Math.log2(largest)));
}
