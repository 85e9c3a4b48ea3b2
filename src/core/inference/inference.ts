import type { Reference } from "./reference.ts";

/** Ratios, p-values and intervals of k coefficients under one kind of standard errors. */
export interface InferenceTable {
  readonly reference: Reference;
  /** Where each coefficient has t degrees of freedom of its own (Satterthwaite's): one value a coefficient. */
  readonly degreesOfFreedom?: readonly number[];
  readonly standardErrors: readonly number[];
  /** (b - b0) / se. */
  readonly ratio: readonly number[];
  /** Two-sided, under `reference`. */
  readonly pValue: readonly number[];
  /** Two-sided, t with n - k degrees of freedom. */
  readonly pValueT: readonly number[];
  /** Two-sided, standard normal. */
  readonly pValueNormal: readonly number[];
  /** Interval at 1 - level under `reference`. */
  readonly low: readonly number[];
  readonly high: readonly number[];
}
