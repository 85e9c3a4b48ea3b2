import type { Fit } from "../fit/fit.ts";
import { type Extent, extentOf } from "../numeric/timeGrid.ts";

/** When each row was, for everything that looks back in time. */
export interface Timeline extends Extent {
  /** Whole period numbers, ascending within each group. */
  readonly positions: Int32Array;
  /** Group numbers where rows are in groups: no lag crosses from one to the next. */
  readonly groups: Int32Array | null;
}

/** Rows without an order in time follow one another as they stand. `rows` and `span` are those of the longest group. */
export function timelineOf({ design: { order }, rowCount }: Fit): Timeline {
  const groups = order.kind === "groups" ? order.groups : null;
  const given = order.kind === "cases" ? null : order.positions;
  const positions = given ?? Int32Array.from({ length: rowCount }, (_, i) => i);
  return { positions, groups, ...extentOf(positions, groups) };
}
