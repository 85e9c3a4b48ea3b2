/** What a spreadsheet's own regression reports. */
export interface OrdinaryFit {
  /** The constant first. */
  readonly coefficients: readonly number[];
  /** Right only for errors with an even spread that do not follow on. */
  readonly standardErrors: readonly number[];
  readonly rSquared: number;
  readonly rows: number;
}

/** Least squares by the normal equations, as one would work it out in cells: enough for well-behaved figures of a demo. */
export function ordinaryFit(outcome: readonly number[], drivers: readonly (readonly number[])[]): OrdinaryFit {
  const columns = [outcome.map(() => 1), ...drivers];
  const products = columns.map((first) => columns.map((second) => dot(first, second)));
  const inverse = inverted(products);
  const totals = columns.map((column) => dot(column, outcome));
  const coefficients = inverse.map((row) => dot(row, totals));
  const residuals = outcome.map(
    (value, i) =>
      value -
      dot(
        coefficients,
        columns.map((column) => column[i]!),
      ),
  );
  const mean = dot(outcome, columns[0]!) / outcome.length;
  const squares = dot(residuals, residuals);
  const variance = squares / (outcome.length - columns.length);
  return {
    coefficients,
    standardErrors: inverse.map((row, j) => Math.sqrt(variance * row[j]!)),
    rSquared: 1 - squares / outcome.reduce((sum, value) => sum + (value - mean) ** 2, 0),
    rows: outcome.length,
  };
}

const dot = (first: readonly number[], second: readonly number[]): number =>
  first.reduce((sum, value, i) => sum + value * second[i]!, 0);

/** Gauss and Jordan's elimination, of a matrix of products, whose pivots are never zero while no column depends on others. */
function inverted(matrix: readonly (readonly number[])[]): readonly (readonly number[])[] {
  const size = matrix.length;
  let rows = matrix.map((row, i) => [...row, ...row.map((_, j) => (i === j ? 1 : 0))]);
  for (let pivot = 0; pivot < size; pivot++) {
    const scaled = rows[pivot]!.map((value) => value / rows[pivot]![pivot]!);
    rows = rows.map((row, i) => (i === pivot ? scaled : row.map((value, j) => value - row[pivot]! * scaled[j]!)));
  }
  return rows.map((row) => row.slice(size));
}
