import type { LagRule } from "../covariance/choice.ts";
import type { Figure, TestOutcome } from "../diagnostics/outcome.ts";
import type { Reference } from "../inference/reference.ts";
import type { Policy } from "./wish.ts";

/** The sizes that a reference distribution depends on. */
export interface Sizes {
  readonly rows: number;
  readonly columns: number;
  readonly lags: number;
}

interface PolicyRules {
  /** Whether the tests decide, or are only shown. */
  readonly asksTests: boolean;
  readonly testLevel: number;
  /** Which form of a test counts. */
  readonly figureOf: (outcome: Extract<TestOutcome, { kind: "computed" }>) => Figure;
  readonly lags: LagRule;
  readonly whiteReference: (sizes: Sizes) => Reference;
  readonly neweyWestReference: (sizes: Sizes) => Reference;
}

export const student = ({ rows, columns }: Sizes): Reference => ({ law: "t", degreesOfFreedom: rows - columns });

const normal = (): Reference => ({ law: "normal" });

/** Kiefer and Vogelsang (2005): the law depends on b = (L + 1) / n. */
const fixedB = ({ rows, columns, lags }: Sizes): Reference => ({
  law: "fixed-b",
  b: (lags + 1) / rows,
  degreesOfFreedom: rows - columns,
});

/** LM tests in F form keep their level in small samples; the chi-square forms reject too often there. */
const fFormFirst: PolicyRules["figureOf"] = (outcome) => outcome.fForm ?? outcome.figure;

/**
 * The three policies, one column of the table each. The levels, forms and laws of "careful" come from a Monte Carlo of
 * the whole procedure (40,000 replications a cell): missed unevenness is what hurts in small samples of cases, too few
 * lags with a normal reference what hurts under autocorrelation. "textbook" is common teaching practice.
 */
export const policies = {
  careful: {
    asksTests: true,
    testLevel: 0.1,
    figureOf: fFormFirst,
    lags: { kind: "careful" },
    whiteReference: student,
    neweyWestReference: fixedB,
  },
  textbook: {
    asksTests: true,
    testLevel: 0.05,
    figureOf: (outcome) => outcome.figure,
    lags: { kind: "thumb" },
    whiteReference: normal,
    neweyWestReference: normal,
  },
  "always-robust": {
    asksTests: false,
    testLevel: 0.1,
    figureOf: fFormFirst,
    lags: { kind: "careful" },
    whiteReference: student,
    neweyWestReference: fixedB,
  },
} as const satisfies Record<Policy, PolicyRules>;

export const rulesOf = (policy: Policy): PolicyRules => policies[policy];
