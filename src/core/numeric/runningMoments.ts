/** Columns moved to mean 0 and spread 1 over some rows. */
export interface Moved {
  /** Columns and the constant, which stands first. */
  readonly size: number;
  /** One value a column, the constant's 0 and 1 first: moved = (value - centre) / scale. */
  readonly centres: Float64Array;
  readonly scales: Float64Array;
  /** The columns as moved, without the constant. */
  readonly moved: readonly Float64Array[];
}

/**
 * Cross-products of columns summed up row by row, so that those of any run of rows are the difference of two sums.
 * Columns are moved to mean 0 and spread 1 over some rows, which keeps the differences exact to about 1e-12 of a sum.
 */
export interface RunningMoments extends Moved {
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
 * @param columns - of n values each, moved.
 * @param complete - n bytes: 1 for rows that count.
 */
export function runningMoments(columns: readonly MovedColumn[], complete: Uint8Array): RunningMoments {
  const moved = sideBySide(columns);
  return { ...moved, complete, sums: summedUp(moved.moved, complete) };
}

/** How many of the rows of a run count. */
export const rowsInRun = ({ sums, size }: RunningMoments, { from, to }: RowRun): number =>
  sums[to * packedLength(size)]! - sums[from * packedLength(size)]!;

/** A column moved to mean 0 and spread 1 over some rows; rows that do not count hold 0. */
export interface MovedColumn {
  readonly centre: number;
  readonly scale: number;
  readonly values: Float64Array;
}

/** @param complete - 1 for the rows that count. @param typical - the rows whose mean and spread are taken. */
export function movedColumn(column: Float64Array, complete: Uint8Array, typical: RowRun): MovedColumn {
  const { centre, scale } = centreAndScale(column, complete, typical);
  const values = new Float64Array(column.length);
  for (let row = 0; row < values.length; row++) values[row] = complete[row] === 1 ? (column[row]! - centre) / scale : 0;
  return { centre, scale, values };
}

/** sum of x_i y_i, without the compensation of `sums`: a sieve needs fewer digits and many sums. */
export function roughProduct(x: Float64Array, y: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < x.length; i++) sum += x[i]! * y[i]!;
  return sum;
}

/** Columns moved each for itself, set side by side. */
export const sideBySide = (columns: readonly MovedColumn[]): Moved => ({
  size: columns.length + 1,
  centres: Float64Array.from([0, ...columns.map(({ centre }) => centre)]),
  scales: Float64Array.from([1, ...columns.map(({ scale }) => scale)]),
  moved: columns.map(({ values }) => values),
});

function centreAndScale(column: Float64Array, complete: Uint8Array, { from, to }: RowRun) {
  let count = 0;
  let sum = 0;
  for (let row = from; row < to; row++) {
    if (complete[row] === 0) continue;
    count++;
    sum += column[row]!;
  }
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

/** target -= the products of one of the rows of the columns. */
export function takeRow(target: Float64Array, { moved, size }: Moved, index: number): void {
  const row = new Float64Array(size);
  readRow(moved, index, row);
  addProducts(target, 0, { row, times: -1 });
}

function addProducts(sums: Float64Array, at: number, { row, times }: Weighted): void {
  let entry = at;
  for (let i = 0; i < row.length; i++) {
    const weight = row[i]! * times;
    for (let j = 0; j <= i; j++) sums[entry++]! += weight * row[j]!;
  }
}

/** target += the packed moments of a run of rows. */
export function addRun(target: Float64Array, { sums, size }: RunningMoments, run: RowRun): void {
  const length = packedLength(size);
  const [from, to] = [run.from * length, run.to * length];
  for (let entry = 0; entry < length; entry++) target[entry]! += sums[to + entry]! - sums[from + entry]!;
}

/** target -= the packed moments of a run of rows. */
export const takeRun = (target: Float64Array, moments: RunningMoments, { from, to }: RowRun): void =>
  addRun(target, moments, { from: to, to: from });

/** target += times * (the products of one row that is not among the columns), its values not moved yet. */
export function addRow(
  target: Float64Array,
  { centres, scales, size }: Moved,
  { values, times }: { readonly values: ArrayLike<number>; readonly times: number },
): void {
  const row = new Float64Array(size).fill(1);
  for (let j = 1; j < size; j++) row[j] = (values[j - 1]! - centres[j]!) / scales[j]!;
  addProducts(target, 0, { row, times });
}
