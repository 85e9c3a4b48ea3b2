import type { SquareMatrix } from "./matrix.ts";

/** Rows worked on at a time. */
const blockRows = 256;

/**
 * x_t - A x_(t-1) in place of x_t, from the last row to the second, so that each row still finds the one before it as it
 * was. The first row stays. No second copy of the columns is made.
 * @param columns - k columns of equal height, which are overwritten.
 * @param transition - A, k by k: row j says how the j-th number follows from all numbers one row before.
 */
export function takeLessEarlier(columns: readonly Float64Array[], transition: SquareMatrix): void {
  const rowCount = columns[0]?.length ?? 0;
  const before = columns.map(() => new Float64Array(blockRows));
  for (let end = rowCount; end > 1; end -= blockRows) {
    const first = Math.max(1, end - blockRows);
    columns.forEach((column, j) => {
      before[j]!.set(column.subarray(first - 1, end - 1));
    });
    columns.forEach((column, j) => {
      lessCombination(column.subarray(first, end), before, transition.values.subarray(j * columns.length));
    });
  }
}

function lessCombination(target: Float64Array, columns: readonly Float64Array[], weights: Float64Array): void {
  columns.forEach((column, m) => {
    const weight = weights[m]!;
    for (let i = 0; i < target.length; i++) target[i]! -= weight * column[i]!;
  });
}

/** The rows given, moved together at the head of each column. @param rows - ascending; no two alike. */
export function keepRows(columns: readonly Float64Array<ArrayBuffer>[], rows: Int32Array): Float64Array<ArrayBuffer>[] {
  return columns.map((column) => {
    for (let i = 0; i < rows.length; i++) column[i] = column[rows[i]!]!;
    return column.subarray(0, rows.length);
  });
}
