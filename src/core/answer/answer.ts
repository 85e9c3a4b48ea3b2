import type { WhiteVersion } from "../covariance/choice.ts";
import type { Decision } from "../decision/decision.ts";
import type { LeftOut, Period, TermMeaning } from "../design/design.ts";
import type { TestOutcome } from "../diagnostics/outcome.ts";
import type { InferenceTable } from "../inference/inference.ts";
import type { JointOutcome } from "../inference/joint.ts";
import type { ChoiceTable, TermFirmness } from "../robustness/firmness.ts";
import type { AskedEstimate } from "./asked.ts";
import type { Coefficients } from "./expression.ts";
import type { Guards } from "./guards.ts";
import type { Options } from "./options.ts";

/** Everything that is said of a regression, as plain values that cross to the pane, the sheet and the terminal. */
export interface Answer {
  /** "Repairs explained by Price, Advertising and Rainy days" */
  readonly title: string;
  readonly outcome: string;
  readonly observations: number;
  /** Names of the k coefficients; the constant, where there is one, comes first as "constant". */
  readonly terms: readonly string[];
  readonly coefficients: readonly number[];
  readonly standardErrors: AllStandardErrors;
  readonly fit: FitFigures;
  readonly tests: readonly TestOutcome[];
  readonly decision: Decision;
  /** Lags that Newey-West used, null where rows do not run through time. */
  readonly lags: number | null;
  readonly inference: {
    readonly classical: InferenceTable;
    readonly white: InferenceTable;
    readonly neweyWest: InferenceTable | null;
    readonly grouped: InferenceTable | null;
    readonly inForce: InferenceTable;
  };
  /** That all coefficients but the constant are zero, under each kind of standard errors. */
  readonly joint: {
    readonly classical: JointOutcome;
    readonly white: JointOutcome;
    readonly neweyWest: JointOutcome | null;
    readonly grouped: JointOutcome | null;
    /** Restrictions that were asked for; null where none were. */
    readonly asked: AskedJoint | null;
  };
  /** Numbers made of the coefficients that were asked for, under the standard errors in force. */
  readonly estimates: readonly AskedEstimate[];
  /** What more may be asked of: the names that each coefficient goes by. */
  readonly askable: Coefficients;
  /** Every choice of standard errors side by side, and what each conclusion hangs on. */
  readonly firmness: {
    readonly choices: readonly ChoiceTable[];
    readonly terms: readonly PlacedFirmness[];
  };
  readonly guards: Guards;
  /** One entry a term, in the order of `terms`. */
  readonly drivers: readonly DriverAnswer[];
  readonly verdict: readonly string[];
  readonly rows: RowsSummary;
  readonly leftOut: readonly LeftOut[];
  readonly leftOutCount: number;
  /** What was done to the data, as sentences. */
  readonly notes: readonly string[];
  readonly options: Options;
  readonly points: ResidualPoints;
  readonly shape: ResidualShape;
}

/** A test of the restrictions asked for, under each kind of standard errors. */
export interface AskedJoint {
  readonly texts: readonly string[];
  readonly classical: JointOutcome;
  readonly white: JointOutcome;
  readonly neweyWest: JointOutcome | null;
  readonly grouped: JointOutcome | null;
  readonly inForce: JointOutcome;
}

export interface AllStandardErrors {
  readonly classical: readonly number[];
  readonly white: Readonly<Partial<Record<WhiteVersion, readonly number[]>>>;
  /** Said where a White version could not be had as asked (a leverage of one), else null. */
  readonly whiteFallback: string | null;
  readonly neweyWest: {
    readonly lags: number;
    readonly adjusted: readonly number[];
    readonly unadjusted: readonly number[];
  } | null;
  readonly grouped: GroupedErrors | null;
}

export interface GroupedErrors {
  readonly groups: number;
  readonly CR0: readonly number[];
  readonly CR1: readonly number[];
  readonly CR2: readonly number[];
  /** Satterthwaite's, one a coefficient; those of the smaller number of groups with two groupings. */
  readonly CR2DegreesOfFreedom: readonly number[];
}

export interface FitFigures {
  readonly columns: number;
  readonly degreesOfFreedom: number;
  readonly sigma: number;
  readonly rSquared: number;
  readonly adjustedRSquared: number;
  readonly uncentred: boolean;
  readonly rss: number;
  readonly logLikelihood: number;
  readonly aic: number;
  readonly bic: number;
}

/** How firm the conclusion about a term is, and the cell of the outcome in the row it hangs on most. */
export type PlacedFirmness = TermFirmness & { readonly leaveOneOut: { readonly cell: string } };

/** What is said of one term. */
export interface DriverAnswer {
  readonly term: string;
  /** What sort of term it is: a column of numbers, a category, a season, ... */
  readonly kind: TermMeaning["kind"];
  readonly coefficient: number;
  readonly against: number;
  readonly standardError: number;
  readonly ratio: number;
  readonly pValue: number;
  readonly low: number;
  readonly high: number;
  /** Leaning: the choices that say otherwise, in words, and the p-value among them that is farthest from the one in force. */
  readonly firmness:
    { readonly kind: "firm" } | { readonly kind: "leaning"; readonly on: readonly string[]; readonly farthest: number };
  /** The verdict's sentence about this term; null for the constant. */
  readonly sentence: string | null;
}

export type RowsSummary =
  | { readonly kind: "cases" }
  | {
      readonly kind: "time";
      readonly period: Period;
      readonly first: string;
      readonly last: string;
      readonly gaps: number;
      readonly gapLabels: readonly string[];
    }
  | {
      readonly kind: "groups";
      readonly by: string;
      readonly groups: number;
      /** The groups that cross them, where there are any. */
      readonly second: { readonly by: string; readonly groups: number } | null;
    };

/** What the pictures of the residuals' own past and of their distribution show. */
export interface ResidualShape {
  /** r_1, r_2, ... and the bound that 95 % of them keep within if errors do not follow on; null where rows have no time. */
  readonly correlations: { readonly values: readonly number[]; readonly bound: number } | null;
  /** Residuals in ascending order, and where a normal law of the same spread would put them: at most 200 pairs. */
  readonly quantiles: { readonly residuals: readonly number[]; readonly normal: readonly number[] };
}

/** Points for the pictures: at most 2,000, evenly thinned where there are more rows. */
export interface ResidualPoints {
  readonly fitted: readonly number[];
  readonly residuals: readonly number[];
  /** Sheet row (from 1) of each point. */
  readonly rows: readonly number[];
  /** The period of each point, the first row used counting 1; null where rows do not run through time. */
  readonly periods: readonly number[] | null;
  readonly thinned: boolean;
}
