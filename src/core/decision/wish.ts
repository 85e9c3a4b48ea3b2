import type { ErrorsChoice, GroupedVersion, LagRule, WhiteVersion } from "../covariance/choice.ts";

export type Policy = "careful" | "textbook" | "always-robust";

/** What the user asks of the choice of standard errors. */
export interface ErrorsWish {
  readonly policy: Policy;
  /** A kind of standard errors fixed by the user, and the reason given for it. */
  readonly fixed: { readonly errors: ErrorsChoice["kind"]; readonly reason: string | null } | null;
  readonly whiteVersion: WhiteVersion;
  readonly groupedVersion: GroupedVersion;
  /** null: the policy's own rule. */
  readonly lags: LagRule | null;
  /** Whether Newey-West carries the factor n / (n - k). */
  readonly adjusted: boolean;
}
