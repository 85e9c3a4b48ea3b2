import type { SquareMatrix } from "../numeric/matrix.ts";

export type WhiteVersion = "HC0" | "HC1" | "HC2" | "HC3" | "HC4" | "HC4m" | "HC5";
export type Kernel = "bartlett" | "parzen" | "quadratic spectral";
export type GroupedVersion = "CR0" | "CR1" | "CR2";

/** How the number of lags is found: a number, or a rule by name. */
export type LagRule =
  | { readonly kind: "given"; readonly lags: number }
  | { readonly kind: "careful" }
  | { readonly kind: "thumb" }
  | { readonly kind: "cube root" }
  | { readonly kind: "newey-west 1994"; readonly prewhiten: boolean }
  | { readonly kind: "andrews 1991"; readonly kernel: Kernel; readonly prewhiten: boolean };

/** One kind of standard errors, as asked for. */
export type ErrorsChoice =
  | { readonly kind: "classical" }
  /** With degrees of freedom by coefficient, HC2's are those of Bell and McCaffrey. */
  | { readonly kind: "white"; readonly version: WhiteVersion; readonly degrees?: "bell-mccaffrey" }
  | { readonly kind: "newey-west"; readonly lags: LagRule; readonly adjusted: boolean }
  | { readonly kind: "grouped"; readonly version: GroupedVersion };

/** The covariance of the coefficients, k by k, in the units of b b'; every factor of n is already in it. */
export interface Covariance {
  /** The choice asked for. */
  readonly choice: ErrorsChoice;
  /** What was used, where it differs or was found: lags, bandwidth, the version fallen back to. */
  readonly used: {
    readonly lags: number | null;
    readonly bandwidth: number | null;
    readonly version: string | null;
    /** A sentence where the choice could not be met as asked (a leverage of one), else null. */
    readonly fallback: string | null;
  };
  readonly matrix: SquareMatrix;
  /** For each coefficient the t law's degrees of freedom that go with it, where the kind has its own; else null. */
  readonly degreesOfFreedom: Float64Array<ArrayBuffer> | null;
  readonly standardErrors: Float64Array<ArrayBuffer>;
}
