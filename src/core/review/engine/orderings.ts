import { describeColumn } from "../../table/describe.ts";
import { proposeRoles } from "../../table/roles.ts";
import { rowsOf } from "../../table/locate.ts";
import type { Column } from "../../table/source.ts";
import type { Claim, ClaimedLine } from "../claim.ts";
import { standsInCells } from "../forms.ts";

/** The lines by what they may be to the rows; a driver can be the time as well. */
export interface Ordering {
  readonly times: readonly ClaimedLine[];
  readonly groups: readonly ClaimedLine[];
  /** What the rows are taken for, as the pane would propose it. */
  readonly proposed:
    | { readonly kind: "cases" }
    | { readonly kind: "time"; readonly by: ClaimedLine }
    | { readonly kind: "groups"; readonly by: ClaimedLine; readonly order: ClaimedLine };
}

/** More columns than these are not tried as groups. */
const mostGroupings = 4;

export function orderingsOf({ others, outcome, drivers }: Claim): Ordering {
  const beside = [...others, ...drivers].filter(({ runs, cells }) => runs === outcome.runs && cells.kinds.length > 0);
  const described = beside.map((line, index) => ({ line, found: describeColumn(columnOf(line, `beside ${index}`)) }));
  const times = described.filter(
    ({ found }) => found.holds === "dates" || found.holds === "periods" || isRunning(found),
  );
  const groups = described.filter(({ line, found }) => {
    const present = found.counts.rows - found.counts.blanks - found.counts.marks;
    return !drivers.includes(line) && found.distinct > 1 && found.distinct * 2 <= present;
  });
  const roles = proposeRoles(described.map(({ line, found }) => ({ ...found, name: keyOf(line) })));
  const named = (key: string | null): ClaimedLine | null => beside.find((line) => keyOf(line) === key) ?? null;
  return {
    times: times.map(({ line }) => line),
    groups: groups.slice(0, mostGroupings).map(({ line }) => line),
    proposed: inPositionOrder(proposedFrom(roles.rowsAre, named(roles.time), named(roles.groups)), drivers),
  };
}

function proposedFrom(
  rowsAre: "cases" | "time" | "groups",
  time: ClaimedLine | null,
  groups: ClaimedLine | null,
): Ordering["proposed"] {
  if (rowsAre === "time" && time !== null) return { kind: "time", by: time };
  if (rowsAre === "groups" && groups !== null && time !== null) return { kind: "groups", by: groups, order: time };
  return { kind: "cases" };
}

/** Whoever regresses on positions takes the rows for a course of time, whatever else stands beside them. */
function inPositionOrder(proposed: Ordering["proposed"], drivers: readonly ClaimedLine[]): Ordering["proposed"] {
  const position = drivers.find((line) => !standsInCells(line));
  return proposed.kind === "cases" && position !== undefined ? { kind: "time", by: position } : proposed;
}

/** Names may repeat; a heading's own words tell whether it counts weeks or months. */
const keyOf = ({ name, sheet, track }: ClaimedLine): string => `${name} ${sheet} ${track}`;

const isRunning = ({ counter }: ReturnType<typeof describeColumn>): boolean => counter;

/** The claimed cells of a line as a column. */
function columnOf(line: ClaimedLine, name: string): Column {
  const from = Math.max(0, line.from - line.first);
  return {
    name: line.name === "" ? name : line.name,
    place: { kind: "argument", argument: name, column: 0, firstRow: 0 },
    cells: rowsOf(line.cells, from, from + line.count),
  };
}
