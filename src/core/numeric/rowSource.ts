import { type Basis, type BasisBlock, basisBlockRows, fillBasis } from "./basis.ts";

/** Rows of k numbers met block by block, such as the scores of a fit. */
export interface RowSource {
  /** k. */
  readonly size: number;
  readonly rowCount: number;
  /** Writes the rows that the block names into its values, column by column. */
  readonly fill: (block: BasisBlock) => void;
  /** The rows as columns where they stand ready. */
  readonly stored?: readonly Float64Array<ArrayBuffer>[];
}

/** q_i: the rows of the basis, formed when they are asked for. */
export const basisRows = (basis: Basis): RowSource => ({
  size: basis.columns.length,
  rowCount: basis.columns[0]?.length ?? 0,
  fill: (block) => {
    fillBasis(basis, block);
  },
});

/** e_i q_i: the rows of the basis, each times its factor; formed when they are asked for. */
export const weightedRows = (basis: Basis, factors: Float64Array): RowSource => ({
  size: basis.columns.length,
  rowCount: factors.length,
  fill: (block) => {
    fillBasis(basis, block);
    multiplyRows(block, basis.columns.length, factors);
  },
});

/** Rows that stand ready in columns. */
export const storedRows = (columns: readonly Float64Array<ArrayBuffer>[]): RowSource => ({
  stored: columns,
  size: columns.length,
  rowCount: columns[0]?.length ?? 0,
  fill: ({ values, first, rows }) => {
    columns.forEach((column, j) => values.set(column.subarray(first, first + rows), j * basisBlockRows));
  },
});

/** The whole of a source as k columns, for work that needs all rows at once; not to be written where they are stored. */
export function columnsOf(source: RowSource): readonly Float64Array<ArrayBuffer>[] {
  if (source.stored !== undefined) return source.stored;
  const columns = Array.from({ length: source.size }, () => new Float64Array(source.rowCount));
  visitRows(source, ({ values, first, rows }) => {
    columns.forEach((column, j) => {
      column.set(values.subarray(j * basisBlockRows, j * basisBlockRows + rows), first);
    });
  });
  return columns;
}

/** The sum of the numbers of each row, each times its weight. */
export function combinedRows(source: RowSource, weights: Float64Array): Float64Array<ArrayBuffer> {
  const sums = new Float64Array(source.rowCount);
  visitRows(source, ({ values, first, rows }) => {
    weights.forEach((weight, j) => {
      const start = j * basisBlockRows;
      for (let i = 0; i < rows; i++) sums[first + i]! += weight * values[start + i]!;
    });
  });
  return sums;
}

/** Calls `visit` on each block in order; the block's values are overwritten after each call. */
export function visitRows({ size, rowCount, fill }: RowSource, visit: (block: BasisBlock) => void): void {
  const values = new Float64Array(size * basisBlockRows);
  for (let first = 0; first < rowCount; first += basisBlockRows) {
    const block = { values, first, rows: Math.min(basisBlockRows, rowCount - first) };
    fill(block);
    visit(block);
  }
}

function multiplyRows({ values, first, rows }: BasisBlock, size: number, factors: Float64Array): void {
  for (let j = 0; j < size; j++) {
    const start = j * basisBlockRows;
    for (let i = 0; i < rows; i++) values[start + i]! *= factors[first + i]!;
  }
}
