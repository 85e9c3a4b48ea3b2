import type { SquareMatrix } from "../numeric/matrix.ts";
import type { Design } from "../design/design.ts";

/** A least squares fit of n rows on k columns. */
export interface Fit {
  readonly design: Design;
  readonly rowCount: number;
  readonly columnCount: number;
  /** n - k. */
  readonly degreesOfFreedom: number;
  /** b, k values in the order of the design's terms. */
  readonly coefficients: Float64Array<ArrayBuffer>;
  /** e = y - X b, n values in design order. */
  readonly residuals: Float64Array<ArrayBuffer>;
  /** h_i = x_i' (X'X)^-1 x_i, n values in [0, 1]. */
  readonly leverages: Float64Array<ArrayBuffer>;
  /** R of X = QR, upper triangular, k by k, signs as computed. */
  readonly triangle: SquareMatrix;
  /** R^-1, upper triangular: rows of X times this are rows of the orthonormal basis Q. */
  readonly inverseTriangle: SquareMatrix;
  /** (X'X)^-1, not scaled by n or sigma. */
  readonly bread: SquareMatrix;
  /** s = sqrt(RSS / (n - k)), in units of the outcome. */
  readonly sigma: number;
  readonly residualSumOfSquares: number;
  /** About the mean with a constant, about zero without. */
  readonly totalSumOfSquares: number;
  readonly rSquared: number;
  readonly adjustedRSquared: number;
  /** True where there is no constant: R^2 is then about zero. */
  readonly uncentred: boolean;
  readonly logLikelihood: number;
  readonly aic: number;
  readonly bic: number;
}
