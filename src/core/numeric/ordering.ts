/**
 * The row numbers in ascending order of the keys; equal keys stay in the order of their rows.
 * @param keys - one finite number a row.
 */
export function ascendingRows(keys: Float64Array | Int32Array): Int32Array<ArrayBuffer> {
  return Int32Array.from(keys.keys()).sort((a, b) => keys[a]! - keys[b]! || a - b);
}

/** The entries of a column in the order of the given row numbers. */
export function inOrder(values: Float64Array, rows: Int32Array): Float64Array<ArrayBuffer> {
  const ordered = new Float64Array(rows.length);
  for (let i = 0; i < rows.length; i++) ordered[i] = values[rows[i]!]!;
  return ordered;
}

/** The same for ascending rows that may be read but not written: where they stand together, the column's own memory. */
export function rowsOf(values: Float64Array, rows: Int32Array): Float64Array {
  const [first = 0, last = -1] = [rows[0], rows.at(-1)];
  return last - first + 1 === rows.length ? values.subarray(first, last + 1) : inOrder(values, rows);
}

/** The numbers of the rows whose entry is above a bound, ascending. */
export function rowsAbove(values: Float64Array, bound: number): number[] {
  const rows: number[] = [];
  for (let i = 0; i < values.length; i++) if (values[i]! > bound) rows.push(i);
  return rows;
}

/** Whether no entry is below the one before it. */
export function isAscending(keys: Int32Array): boolean {
  for (let i = 1; i < keys.length; i++) if (keys[i]! < keys[i - 1]!) return false;
  return true;
}

/** One number for each pair that occurs, counted from 0 in the order of first appearance. */
export function pairNumbers(first: Int32Array, second: Int32Array): Int32Array<ArrayBuffer> {
  const width = second.reduce((most, number) => Math.max(most, number), 0) + 1;
  const known = new Map<number, number>();
  return Int32Array.from(first, (number, row) => {
    const key = number * width + second[row]!;
    const pair = known.get(key) ?? known.size;
    known.set(key, pair);
    return pair;
  });
}

/**
 * The rows with the `count` smallest keys, and the others; both in the order of their rows. Of equal keys at the border
 * the earlier rows count as smaller.
 */
export function smallestRows(
  keys: Float64Array,
  count: number,
): readonly [Int32Array<ArrayBuffer>, Int32Array<ArrayBuffer>] {
  const border = keys.toSorted()[count]!;
  let atBorder = count - keys.reduce((below, key) => (key < border ? below + 1 : below), 0);
  const smaller = new Int32Array(count);
  const others = new Int32Array(keys.length - count);
  let found = 0;
  for (let row = 0; row < keys.length; row++) {
    const key = keys[row]!;
    if (key < border || (key === border && atBorder-- > 0)) smaller[found++] = row;
    else others[row - found] = row;
  }
  return [smaller, others];
}
