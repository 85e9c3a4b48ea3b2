import type { Fit } from "../fit/fit.ts";
import type { SquareMatrix } from "../numeric/matrix.ts";
import { diagonal, sandwich } from "../numeric/smallMatrix.ts";
import type { Covariance, ErrorsChoice } from "./choice.ts";

/** What was used to meet a choice; whatever is not said is null. */
type Used = Partial<Covariance["used"]>;

/** The covariance R^-1 M R^-T whose meat M stands in the basis Q. */
export function fromMeat(
  fit: Fit,
  meat: SquareMatrix,
  { choice, used }: { choice: ErrorsChoice; used?: Used },
): Covariance {
  return fromMatrix(sandwich(fit.inverseTriangle, meat), { choice, ...(used && { used }) });
}

/** A covariance and its standard errors, the roots of its diagonal. */
export function fromMatrix(matrix: SquareMatrix, { choice, used }: { choice: ErrorsChoice; used?: Used }): Covariance {
  return {
    choice,
    used: { lags: null, bandwidth: null, version: null, fallback: null, ...used },
    matrix,
    degreesOfFreedom: null,
    // A variance of zero can come out below it by rounding.
    standardErrors: diagonal(matrix).map((variance) => Math.sqrt(Math.max(variance, 0))),
  };
}
