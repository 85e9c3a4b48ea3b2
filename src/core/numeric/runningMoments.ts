/**
 * Cross-products of columns summed up row by row, so that those of any run of rows are the difference of two sums.
 * Columns are moved to mean 0 and spread 1 over some rows, which keeps the differences exact to about 1e-12 of a sum.
 */
export interface RunningMoments {
  /** Columns and the constant, which stands first. */
  readonly size: number;
  /** One value a column, the constant's 0 and 1 first: moved = (value - centre) / scale. */
  readonly centres: Float64Array;
  readonly scales: Float64Array;
  /** The columns as moved, without the constant. */
  readonly moved: readonly Float64Array[];
  /** 1 for the rows that count; the others add nothing. */
  readonly complete: Uint8Array;
  /** For each row the packed sums of all rows before it: rows + 1 times `packedLength(size)` values. */
  readonly sums: Float64Array;
}

/** The entries (i, j), j <= i, of a symmetric matrix, row by row: (i, j) stands at i (i + 1) / 2 + j. */
export const packedLength = (size: number): number => (size * (size + 1)) / 2;

/** A run of rows, the second end not included, and how often it counts. */
export interface RowRun {
  readonly from: number;
  readonly to: number;
}

/**
 * @param columns - of n values each.
 * @param complete - n bytes: 1 for rows that count.
 * @param typical - the rows whose mean and spread the columns are moved by.
 */
export function runningMoments(
  columns: readonly Float64Array[],
  complete: Uint8Array,
  typical: RowRun,
): RunningMoments {
  const size = columns.length + 1;
  const centres = new Float64Array(size);
  const scales = new Float64Array(size).fill(1);
  const moved = columns.map((column, index) => {
    const { centre, scale } = centreAndScale(column, complete, typical);
    centres[index + 1] = centre;
    scales[index + 1] = scale;
    return column.map((value) => (value - centre) / scale);
  });
  return { size, centres, scales, moved, complete, sums: summedUp(moved, complete) };
}

function centreAndScale(column: Float64Array, complete: Uint8Array, { from, to }: RowRun) {
  let count = 0;
  let sum = 0;
  for (let row = from; row < to; row++) if (complete[row] === 1) [count, sum] = [count + 1, sum + column[row]!];
  const centre = count === 0 ? 0 : sum / count;
  let squares = 0;
  for (let row = from; row < to; row++) if (complete[row] === 1) squares += (column[row]! - centre) ** 2;
  const spread = count === 0 ? 0 : Math.sqrt(squares / count);
  return { centre, scale: spread > 0 && Number.isFinite(spread) ? spread : 1 };
}

function summedUp(moved: readonly Float64Array[], complete: Uint8Array): Float64Array {
  const length = packedLength(moved.length + 1);
  const sums = new Float64Array((complete.length + 1) * length);
  const row = new Float64Array(moved.length + 1);
  for (let i = 0; i < complete.length; i++) {
    const at = (i + 1) * length;
    sums.copyWithin(at, i * length, at);
    if (complete[i] === 0) continue;
    readRow(moved, i, row);
    addProducts(sums, at, { row, times: 1 });
  }
  return sums;
}

function readRow(moved: readonly Float64Array[], index: number, row: Float64Array): void {
  row[0] = 1;
  for (let j = 0; j < moved.length; j++) row[j + 1] = moved[j]![index]!;
}

interface Weighted {
  /** The constant's 1 first, then one value a column as moved. */
  readonly row: Float64Array;
  readonly times: number;
}

function addProducts(sums: Float64Array, at: number, { row, times }: Weighted): void {
  let entry = at;
  for (let i = 0; i < row.length; i++) {
    const weight = row[i]! * times;
    for (let j = 0; j <= i; j++) sums[entry++]! += weight * row[j]!;
  }
}

/** target += times * (the packed moments of a run of rows). */
export function addRun(target: Float64Array, { sums, size }: RunningMoments, run: RowRun & { times: number }): void {
  const length = packedLength(size);
  const [from, to] = [run.from * length, run.to * length];
  for (let entry = 0; entry < length; entry++) target[entry]! += run.times * (sums[to + entry]! - sums[from + entry]!);
}

/** target += times * (the products of one row that is not among the columns), its values not moved yet. */
export function addRow(
  target: Float64Array,
  { centres, scales, size }: RunningMoments,
  { values, times }: { readonly values: ArrayLike<number>; readonly times: number },
): void {
  const row = new Float64Array(size).fill(1);
  for (let j = 1; j < size; j++) row[j] = (values[j - 1]! - centres[j]!) / scales[j]!;
  addProducts(target, 0, { row, times });
}
