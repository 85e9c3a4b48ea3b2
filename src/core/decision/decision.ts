import type { ErrorsChoice } from "../covariance/choice.ts";
import type { TestOutcome } from "../diagnostics/outcome.ts";
import type { Reference } from "../inference/reference.ts";
import type { Policy } from "./wish.ts";

/** What the tests say of the two questions that make the four cases. */
export interface FourCase {
  readonly spread: "even" | "uneven" | "not asked";
  readonly followOn: "none" | "some" | "not asked";
}

/** Which standard errors, with which reference distribution, and why. */
export interface Decision {
  readonly policy: Policy;
  readonly fourCase: FourCase;
  /** What the evidence calls for under the policy. */
  readonly called: { readonly errors: ErrorsChoice; readonly reference: Reference };
  /** What is in force: the same, unless the user fixed a kind. */
  readonly inForce: { readonly errors: ErrorsChoice; readonly reference: Reference };
  readonly because: string;
  /** The user's reason for a fixed kind, "none given", or null where nothing was fixed. */
  readonly override: string | null;
  /** The level of the tests that decide: 0.10 under careful, 0.05 under textbook. */
  readonly testLevel: number;
  /** The tests looked at, with the p-value that counted. */
  readonly restsOn: readonly { readonly outcome: TestOutcome; readonly pValue: number; readonly rejected: boolean }[];
  /** Cautions about small samples and the like, as sentences. */
  readonly cautions: readonly string[];
}
