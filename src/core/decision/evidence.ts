import type { RowOrder } from "../design/design.ts";
import type { TestOutcome } from "../diagnostics/outcome.ts";
import type { Sizes } from "./policies.ts";

/** What the decision looks at. `lags` are the lags that Newey-West would use, found by the policy's rule or given. */
export interface Evidence {
  readonly tests: readonly TestOutcome[];
  readonly order: RowOrder;
  readonly sizes: Sizes;
  /** The order of the Breusch-Godfrey test that decides. */
  readonly testOrder: number;
}
