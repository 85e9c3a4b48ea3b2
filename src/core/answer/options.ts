import type { ErrorsChoice, LagRule, WhiteVersion } from "../covariance/choice.ts";
import type { Policy } from "../decision/decision.ts";

/** How the answer is to be made, beside the model. */
export interface Options {
  readonly policy: Policy;
  /** A kind of standard errors fixed by the user, and the reason given for it. */
  readonly fixed: { readonly errors: ErrorsChoice["kind"]; readonly reason: string | null } | null;
  readonly whiteVersion: WhiteVersion;
  /** null: the policy's own rule. */
  readonly lags: LagRule | null;
  /** Whether Newey-West carries the factor n / (n - k). */
  readonly adjusted: boolean;
  /** Two-sided level, 0.05 for 95 % intervals. */
  readonly level: number;
  /** The value each driver is tested against, by term name; 0 where none is given. */
  readonly against: Readonly<Record<string, number>>;
  /** Units in words by column, "orders a month". */
  readonly units: Readonly<Record<string, string>>;
}

export const defaultOptions: Options = {
  policy: "careful",
  fixed: null,
  whiteVersion: "HC3",
  lags: null,
  adjusted: true,
  level: 0.05,
  against: {},
  units: {},
};
