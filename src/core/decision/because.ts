import type { RowOrder } from "../design/design.ts";
import { groupingsOf } from "../design/groupings.ts";
import type { Decision } from "./decision.ts";

type Settled = Pick<Decision, "policy" | "fourCase" | "called">;

/** Why these standard errors are called for, as a clause that can follow "because". */
export function becauseOf({ policy, fourCase, called }: Settled, order: RowOrder): string {
  if (order.kind === "groups") {
    const ways = groupingsOf(order).map(({ by }) => `of one ${by}`);
    return `rows ${ways.join(" or ")} may share what the drivers leave unexplained`;
  }
  if (policy === "always-robust") return "the policy takes robust standard errors whatever the tests say";
  switch (called.errors.kind) {
    case "newey-west":
      return fourCase.spread === "uneven" ? `${followOn(order)}, and their spread is uneven` : followOn(order);
    case "white":
      return fourCase.spread === "not asked"
        ? "whether the spread of the errors is even could not be tested"
        : "the spread of the errors is uneven";
    case "classical":
    case "grouped":
      return fourCase.followOn === "none"
        ? "the tests find neither uneven spread nor errors that follow on"
        : "the tests find no uneven spread";
  }
}

const followOn = (order: RowOrder): string =>
  `the errors follow on from ${order.kind === "time" ? `${order.period.unit} to ${order.period.unit}` : "row to row"}`;
