/**
 * The innermost loops over rows. They work on one array, the arena: callers copy a block of rows in, call a kernel and
 * copy out what they need. Where the machine has vectors of two doubles, WebAssembly runs them three times as fast as
 * JavaScript; elsewhere their twins in scalar.ts do the same, up to the order in which sums are rounded.
 * Places are indices into the arena; columns lie `stride` apart. Where `rows` is odd, every column has a
 * zero after its last row.
 */
export interface Kernels {
  /** Householder reflections that carry a block into the triangle above it (size by size, row by row). */
  readonly reflectRows: (at: TriangleAndBlock) => void;
  /** Forward substitution: each row x' of the block becomes x' R^-1. */
  readonly substitute: (at: TriangleAndBlock) => void;
  /** sums_l += left_l'right and nextSums_l += left_l'next for columns l = 0..count - 1; next may be right itself. */
  readonly addProducts: (at: LeftAndRight) => void;
  /** product_i = x_i y_i. */
  readonly multiply: (at: Factors) => void;
  /** sums_i += sum of x_ij^2 over the columns of the block, row by row. */
  readonly addSquares: (at: RowSums) => void;
  /**
   * Rotates rows of `size` numbers and an outcome, which lie row by row, into the triangle above them, one after the
   * other. raised_i is 1 where row i raised the rank; else what is left of its outcome is its recursive residual. A
   * number that does not exceed its floor in size is no new direction.
   */
  readonly rotateRows: (at: Rotation) => void;
  /** high + low -= x (factor + factorLow), exact but for the low word's rounding. */
  readonly subtractMultiple: (at: Multiple) => void;
  /** The two words at `sum` += x'(high + low), in double-double. */
  readonly addInnerProduct: (at: InnerProduct) => void;
}

export interface TriangleAndBlock {
  readonly triangle: number;
  readonly block: number;
  readonly size: number;
  readonly rows: number;
  readonly stride: number;
}

export interface LeftAndRight {
  readonly left: number;
  readonly count: number;
  readonly right: number;
  readonly next: number;
  readonly rows: number;
  readonly stride: number;
  readonly sums: number;
  readonly nextSums: number;
}

export interface Factors {
  readonly x: number;
  readonly y: number;
  readonly product: number;
  readonly rows: number;
}

export interface RowSums {
  readonly block: number;
  readonly size: number;
  readonly rows: number;
  readonly stride: number;
  readonly sums: number;
}

export interface Rotation {
  /** size rows of size + 1 numbers. */
  readonly triangle: number;
  readonly floors: number;
  readonly block: number;
  readonly size: number;
  readonly rows: number;
  readonly raised: number;
}

/** A column x and a column of two words. */
interface WideColumn {
  readonly x: number;
  readonly high: number;
  readonly low: number;
  readonly rows: number;
}

export interface Multiple extends WideColumn {
  readonly factor: number;
  readonly factorLow: number;
}

export interface InnerProduct extends WideColumn {
  readonly sum: number;
}

/** Kernels and the array that they work on. */
export interface Arena {
  readonly kernels: Kernels;
  /** At least so many numbers; what stood there stays only until the next call with more. */
  readonly numbers: (length: number) => Float64Array;
}
