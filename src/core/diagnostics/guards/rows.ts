import type { RowOrder } from "../../design/design.ts";
import { type Grouped, fewestGroups, groupingsOf } from "../../design/groupings.ts";
import { type Guard, namesInWords } from "./guard.ts";

/** With fewer groups the figures for groups are too optimistic (Cameron and Miller 2015, J. Human Resources 50, 317-372). */
const fewGroups = 42;
/** A group with more than this share of the rows counts for more than one of many. */
const largeShare = 0.25;

/** What the rows' places in time or in groups mean for the figures; null where rows are separate cases. */
export function rowsGuard(order: RowOrder): Guard | null {
  switch (order.kind) {
    case "cases":
      return null;
    case "time":
      return gapsGuard(order);
    case "groups":
      return groupsGuard(order);
  }
}

/** Rows that are their own time, since no column tells it, can only be left out. */
function gapsGuard({ gaps, gapLabels, period, labels }: Extract<RowOrder, { kind: "time" }>): Guard | null {
  const isRowByRow = period.unit === "row";
  if (gaps === 0 && isRowByRow) return null;
  if (gaps === 0) {
    const sentences = [`Every ${period.unit} from ${labels.first} to ${labels.last} has its row.`];
    return { guard: "time", finding: "nothing found", sentences };
  }
  const shown = namesInWords(gapLabels);
  const more = gaps > gapLabels.length ? ` and ${gaps - gapLabels.length} more` : "";
  const lacks = isRowByRow ? ["is not used", "are not used"] : ["has no row", "have no row"];
  const missing = gaps === 1 ? `One ${period.unit} ${lacks[0]}` : `${gaps} ${period.unit}s ${lacks[1]}`;
  return {
    guard: "time",
    finding: "worth knowing",
    sentences: [
      `${missing}: ${shown}${more}.`,
      "Each keeps its place: rows on either side of it are not taken for neighbours.",
    ],
  };
}

function groupsGuard(order: Extract<RowOrder, { kind: "groups" }>): Guard {
  const sentences = groupingsOf(order).flatMap(groupFaults);
  const few = fewestGroups(order) < fewGroups;
  if (sentences.length > 0) return { guard: "groups", finding: few ? "look into it" : "worth knowing", sentences };
  return {
    guard: "groups",
    finding: "nothing found",
    sentences: groupingsOf(order).map(
      ({ labels, by }) => `There are ${labels.length} groups by ${by}, none of them very large.`,
    ),
  };
}

function groupFaults({ groups, labels, by }: Grouped): string[] {
  const sizes = new Float64Array(labels.length);
  for (const group of groups) sizes[group]! += 1;
  const largest = sizes.indexOf(Math.max(...sizes));
  const share = sizes[largest]! / groups.length;
  const few = `There are only ${labels.length} groups by ${by}: standard errors by group are then often too small.`;
  const large = `"${labels[largest]}" holds ${Math.round(100 * share)} % of the rows, so that there are fewer groups than it seems.`;
  return [...(labels.length < fewGroups ? [few] : []), ...(share > largeShare ? [large] : [])];
}
