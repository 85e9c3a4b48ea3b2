/** Copies a column's part into an arena, with the zero that an odd number of rows asks for after it. */
export function place(column: Float64Array, values: Float64Array, at: number): void {
  values.set(column, at);
  if (column.length % 2 === 1) values[at + column.length] = 0;
}
