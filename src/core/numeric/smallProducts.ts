/**
 * Products of small matrices in room that is kept, for work that is done for each of many groups. Every matrix stands
 * row by row in an array that may be longer than it. Two rows are taken at a time, so that half as much is fetched.
 */

/** out = A B': rows_a by rows_b, both with `inner` columns. */
export function timesRows(
  out: Float64Array,
  [a, rowsA]: readonly [Float64Array, number],
  [b, rowsB, inner]: readonly [Float64Array, number, number],
): void {
  const odd = rowsB % 2;
  for (let i = 0; i < rowsA; i++) {
    const left = i * inner;
    const to = i * rowsB;
    if (odd === 1) out[to] = rowProduct(a, left, [b, inner]);
    for (let j = odd; j < rowsB; j += 2) {
      const one = j * inner;
      const two = one + inner;
      let first = 0;
      let second = 0;
      for (let m = 0; m < inner; m++) {
        const weight = a[left + m]!;
        first += weight * b[one + m]!;
        second += weight * b[two + m]!;
      }
      out[to + j] = first;
      out[to + j + 1] = second;
    }
  }
}

/** The row of A that begins at `from` times the first row of B. */
function rowProduct(a: Float64Array, from: number, [b, inner]: readonly [Float64Array, number]): number {
  let sum = 0;
  for (let m = 0; m < inner; m++) sum += a[from + m]! * b[m]!;
  return sum;
}

/** out = A B: rows_a by columns, A with `inner` columns. */
export function times(
  out: Float64Array,
  [a, rowsA]: readonly [Float64Array, number],
  [b, inner, columns]: readonly [Float64Array, number, number],
): void {
  const odd = inner % 2;
  for (let i = 0; i < rowsA; i++) {
    const left = i * inner;
    const to = i * columns;
    const alone = odd === 1 ? a[left]! : 0;
    for (let j = 0; j < columns; j++) out[to + j] = alone * b[j]!;
    for (let m = odd; m < inner; m += 2) {
      const weight = a[left + m]!;
      const next = a[left + m + 1]!;
      const one = m * columns;
      const two = one + columns;
      for (let j = 0; j < columns; j++) out[to + j]! += weight * b[one + j]! + next * b[two + j]!;
    }
  }
}
