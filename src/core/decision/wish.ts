import type { ErrorsChoice, GroupedVersion, LagRule, WhiteVersion } from "../covariance/choice.ts";

/** A White version, or HC2 with t degrees of freedom by coefficient: for skewed drivers or high leverage. */
export type WhiteWish = WhiteVersion | "HC2 bell-mccaffrey";

export const whiteWishes = [
  "HC0",
  "HC1",
  "HC2",
  "HC2 bell-mccaffrey",
  "HC3",
  "HC4",
  "HC4m",
  "HC5",
] as const satisfies readonly WhiteWish[];

export const whiteErrors = (wish: WhiteWish): Extract<ErrorsChoice, { kind: "white" }> =>
  wish === "HC2 bell-mccaffrey"
    ? { kind: "white", version: "HC2", degrees: "bell-mccaffrey" }
    : { kind: "white", version: wish };

export type Policy = "careful" | "textbook" | "always-robust";

/** What the user asks of the choice of standard errors. */
export interface ErrorsWish {
  readonly policy: Policy;
  /** A kind of standard errors fixed by the user, and the reason given for it. */
  readonly fixed: { readonly errors: ErrorsChoice["kind"]; readonly reason: string | null } | null;
  readonly whiteVersion: WhiteWish;
  readonly groupedVersion: GroupedVersion;
  /** null: the policy's own rule. */
  readonly lags: LagRule | null;
  /** Whether Newey-West carries the factor n / (n - k). */
  readonly adjusted: boolean;
}
