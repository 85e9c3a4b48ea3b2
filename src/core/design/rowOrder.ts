import { type Result, failure, success } from "../problem/result.ts";
import { gapsIn } from "../table/timesFound.ts";
import type { RowOrder } from "./design.ts";
import type { Grouping, RowFrame } from "./rowFrame.ts";
import type { Timeline } from "./timeline.ts";

/**
 * What the rows used are to each other.
 * @param rows - the source rows used, in design order.
 * @returns Problem "one-group" where all of them belong to the same.
 */
export function rowOrderOf({ groups, second, timeline }: RowFrame, rows: Int32Array<ArrayBuffer>): Result<RowOrder> {
  if (groups !== null) return groupOrder({ groups, second, timeline }, rows);
  return success(timeline === null ? { kind: "cases" } : timeOrder(timeline, rows));
}

function timeOrder({ positions, period, labelOf }: Timeline, rows: Int32Array<ArrayBuffer>): RowOrder {
  const first = positions[rows[0]!]!;
  const used = rows.map((row) => positions[row]! - first);
  const label = (position: number): string => labelOf(position + first);
  return {
    kind: "time",
    positions: used,
    period,
    labels: { first: label(0), last: label(used.at(-1)!) },
    ...gapsIn(used, label),
  };
}

type GroupFrame = Pick<RowFrame, "second" | "timeline"> & { readonly groups: Grouping };

function groupOrder({ groups, second, timeline }: GroupFrame, rows: Int32Array<ArrayBuffer>): Result<RowOrder> {
  const by = regrouped(groups, rows);
  const across = second === null ? null : regrouped(second, rows);
  for (const [grouping, { labels }] of [
    [groups, by],
    [second, across ?? by],
  ] as const) {
    if (grouping !== null && labels.length === 1) {
      return failure({ code: "one-group", column: grouping.column.name, value: labels[0]! });
    }
  }
  return success({
    kind: "groups",
    ...by,
    second: across === null || second === null ? null : { ...across, by: second.column.name },
    positions: timeline === null ? null : fromZero(timeline.positions, rows),
    by: groups.column.name,
  });
}

function fromZero(positions: Int32Array, rows: Int32Array<ArrayBuffer>): Int32Array<ArrayBuffer> {
  const first = rows.reduce((least, row) => Math.min(least, positions[row]!), Infinity);
  return rows.map((row) => positions[row]! - first);
}

/** Groups numbered anew, without those that lost all their rows. */
function regrouped({ cells: { codes, levels } }: Grouping, rows: Int32Array<ArrayBuffer>) {
  const occurs = new Uint8Array(levels.length);
  for (const row of rows) occurs[codes[row]!] = 1;
  const numbers = new Int32Array(levels.length);
  const labels = levels.filter((_, code) => occurs[code] === 1);
  let next = 0;
  for (let code = 0; code < levels.length; code++) if (occurs[code] === 1) numbers[code] = next++;
  return { groups: rows.map((row) => numbers[codes[row]!]!), labels };
}
