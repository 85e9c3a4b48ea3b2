/**
 * Loops over lists of row numbers, written out: a typed array's own `filter` and `from` collect their results in
 * ordinary memory first, which costs seconds on a full sheet.
 */

/** 0, 1, 2 and so on: every row of a source. */
export function everyRow(rowCount: number): Int32Array<ArrayBuffer> {
  const rows = new Int32Array(rowCount);
  for (let row = 0; row < rowCount; row++) rows[row] = row;
  return rows;
}

/** The rows for which the byte is 1, in the order given. */
export function keptRows(rows: Int32Array, bytes: Uint8Array): Int32Array<ArrayBuffer> {
  const kept = new Int32Array(rows.length);
  let count = 0;
  for (let i = 0; i < rows.length; i++) if (bytes[rows[i]!] === 1) kept[count++] = rows[i]!;
  return kept.slice(0, count);
}

/** A value for each of the rows. */
export function valuesAt(rows: Int32Array, valueOf: (row: number) => number): Float64Array<ArrayBuffer> {
  const values = new Float64Array(rows.length);
  for (let i = 0; i < rows.length; i++) values[i] = valueOf(rows[i]!);
  return values;
}

/** 1 for each number that counts something, 0 for those that stand for nothing by being negative. */
export function presentIn(numbers: Int32Array): Uint8Array<ArrayBuffer> {
  const present = new Uint8Array(numbers.length);
  for (let row = 0; row < numbers.length; row++) present[row] = numbers[row]! < 0 ? 0 : 1;
  return present;
}
