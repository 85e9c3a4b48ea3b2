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
