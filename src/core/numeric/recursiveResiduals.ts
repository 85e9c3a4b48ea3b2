/** A pivot below this share of its column's largest value is rounding left over from the rotations, not a new direction. */
const dependent = 1e-11;

export interface Regression {
  /** k columns of n values. */
  readonly columns: readonly Float64Array[];
  readonly outcome: Float64Array;
}

export interface RecursiveResiduals {
  /**
   * w_t = (y_t - x_t' b_(t-1)) / sqrt(1 + x_t' (X'X)_(t-1)^-1 x_t), one a row; 0 where the row raised the
   * rank, since no earlier row says anything about its new direction.
   */
  readonly residuals: Float64Array<ArrayBuffer>;
  /** The rank of the rows so far, this one included. */
  readonly ranks: Int32Array<ArrayBuffer>;
}

/**
 * Recursive residuals from rotating one row after the other into the triangle. The sum of their squares up to a row is
 * the residual sum of squares of the regression on the rows so far.
 * @param walk - "forwards" from the first row, "backwards" from the last; the results stand in row order either way.
 * @see Gentleman (1974), Applied Statistics 23, 448-454; Brown, Durbin and Evans (1975), J. Royal Stat. Society B 37, 149-192.
 */
export function recursiveResiduals(regression: Regression, walk: "forwards" | "backwards"): RecursiveResiduals {
  const { columns, outcome } = regression;
  const n = outcome.length;
  const k = columns.length;
  const residuals = new Float64Array(n);
  const ranks = new Int32Array(n);
  const triangle = new Float64Array((k + 1) * (k + 1));
  const row = new Float64Array(k + 1);
  const floors = Float64Array.from(
    columns,
    (column) => dependent * column.reduce((most, x) => Math.max(most, Math.abs(x)), 0),
  );
  let rank = 0;
  for (let step = 0; step < n; step++) {
    const i = walk === "forwards" ? step : n - 1 - step;
    for (let j = 0; j < k; j++) row[j] = columns[j]![i]!;
    row[k] = outcome[i]!;
    if (rotateIn(row, triangle, floors)) rank += 1;
    else residuals[i] = row[k];
    ranks[i] = rank;
  }
  return { residuals, ranks };
}

/** Rotates a row into the triangle (row by row, outcome last). Returns whether it raised the rank; else its residual is left in the last place. */
function rotateIn(row: Float64Array, triangle: Float64Array, floors: Float64Array): boolean {
  const k = floors.length;
  const width = k + 1;
  for (let j = 0; j < k; j++) {
    const x = row[j]!;
    const start = j * width;
    const pivot = triangle[start + j]!;
    if (pivot === 0) {
      if (Math.abs(x) <= floors[j]!) continue;
      // A positive pivot keeps every cosine positive, and with them the sign of the residuals.
      for (let l = j; l < width; l++) triangle[start + l] = x < 0 ? -row[l]! : row[l]!;
      return true;
    }
    if (x === 0) continue;
    const length = Math.sqrt(pivot * pivot + x * x);
    const [c, s] = [pivot / length, x / length];
    triangle[start + j] = length;
    for (let l = j + 1; l < width; l++) {
      const above = triangle[start + l]!;
      triangle[start + l] = c * above + s * row[l]!;
      row[l] = c * row[l]! - s * above;
    }
  }
  return false;
}
