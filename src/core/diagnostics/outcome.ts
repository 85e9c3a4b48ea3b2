export type TestName =
  | "breusch-pagan"
  | "koenker"
  | "white"
  | "white-fitted"
  | "goldfeld-quandt"
  | "breusch-godfrey"
  | "durbin-watson"
  | "ljung-box"
  | "arch"
  | "reset"
  | "reset-robust"
  | "jarque-bera"
  | "chow"
  | "largest-chow"
  | "cusum"
  | "cusum-recursive";

/** The law a statistic follows under its null hypothesis. */
export type Law = "chi-square" | "F" | "normal" | "exact" | "limit";

export interface Figure {
  readonly statistic: number;
  readonly law: Law;
  /** Degrees of freedom: one for chi-square, two for F, none otherwise. */
  readonly df: readonly number[];
  readonly pValue: number;
}

/**
 * What a test can say. `figure` is the form that the trade quotes first; `fForm` the F form of an LM test
 * where it has one. A test that cannot be computed is never a number.
 */
export type TestOutcome =
  | {
      readonly kind: "computed";
      readonly test: TestName;
      /** "squares and cross-products", "squares", "fitted values"; "exact", "normal"; null where there is one form only. */
      readonly form: string | null;
      /** The order of autocorrelation looked for; null where orders do not exist. */
      readonly order: number | null;
      readonly figure: Figure;
      readonly fForm: Figure | null;
      /** Further figures by name, such as skewness or the row of the largest break. */
      readonly details: Readonly<Record<string, number>>;
    }
  | {
      readonly kind: "not-applicable";
      readonly test: TestName;
      readonly order: number | null;
      readonly because: string;
    };

type Computed = Extract<TestOutcome, { kind: "computed" }>;

/** The one maker of computed outcomes: a statistic that is not a number is our bug, not a result. */
export function computed(outcome: Omit<Computed, "kind">): Computed {
  const figures = outcome.fForm === null ? [outcome.figure] : [outcome.figure, outcome.fForm];
  for (const { statistic, pValue } of figures) {
    if (!Number.isFinite(statistic) || !(pValue >= 0 && pValue <= 1)) {
      throw new Error(`${outcome.test}: statistic ${statistic}, p-value ${pValue}`);
    }
  }
  return { kind: "computed", ...outcome };
}

export const notApplicable = (test: TestName, because: string, order: number | null = null): TestOutcome => ({
  kind: "not-applicable",
  test,
  order,
  because,
});
