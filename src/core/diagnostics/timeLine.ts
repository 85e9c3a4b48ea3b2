import type { RowOrder } from "../design/design.ts";
import type { TimeLine } from "../numeric/earlierRows.ts";

/** Where the rows stand in time; null where what rows are to each other gives them no place there. */
export function timeLineOf(order: RowOrder): TimeLine | null {
  switch (order.kind) {
    case "cases":
      return null;
    case "time":
      return { positions: order.positions, groups: null };
    case "groups":
      return order.positions === null ? null : { positions: order.positions, groups: order.groups };
  }
}

/** Why a test that looks along time is not made. */
export const noTime = "rows are not said to run through time, so their order means nothing";
