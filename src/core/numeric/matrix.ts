/** A small square matrix, row by row: the entry in row i and column j is values[i * size + j]. */
export interface SquareMatrix {
  readonly size: number;
  readonly values: Float64Array;
}
