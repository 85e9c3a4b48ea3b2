import type { Design } from "../design/design.ts";
import type { RowsSummary } from "./answer.ts";

/** What the rows of a design are to each other, as plain values. */
export function rowsSummary({ order }: Design): RowsSummary {
  switch (order.kind) {
    case "cases":
      return { kind: "cases" };
    case "time": {
      const { period, labels, gaps, gapLabels } = order;
      return { kind: "time", period, first: labels.first, last: labels.last, gaps, gapLabels };
    }
    case "groups":
      return {
        kind: "groups",
        by: order.by,
        groups: order.labels.length,
        second: order.second === null ? null : { by: order.second.by, groups: order.second.labels.length },
      };
  }
}
