import { type Result, failure, success } from "../problem/result.ts";
import { type LevelCells, readLevelCells } from "../table/levelCells.ts";
import type { Column, Source } from "../table/source.ts";
import { findColumn } from "./columns.ts";
import { type Ingredient, missingCell } from "./ingredient.ts";
import type { RowsAre } from "./model.ts";
import { presentIn } from "./rows.ts";
import { type Sequence, earlierRows, sequenceOf } from "./sequence.ts";
import { type Timeline, columnTimeline, rowTimeline } from "./timeline.ts";
import type { LookBack } from "./transforms.ts";

/** A column that says which group each row belongs to. */
export interface Grouping {
  readonly column: Column;
  readonly cells: LevelCells;
}

/** What the rows of a source are to each other, before any is left out. */
export interface RowFrame {
  readonly kind: RowsAre["kind"];
  readonly groups: Grouping | null;
  readonly second: Grouping | null;
  /** null where rows have no order in time. */
  readonly timeline: Timeline | null;
  readonly sequence: Sequence | null;
  readonly lookBack: LookBack | null;
}

/**
 * Reads the columns that say what rows are to each other.
 * @returns Problems of finding and reading those columns, and "repeated-time".
 */
export function readRowFrame(source: Source, rows: RowsAre): Result<RowFrame> {
  if (rows.kind === "cases") return success(unordered("cases"));
  const grouped = readGroups(source, rows);
  if (!grouped.ok) return grouped;
  const found = { ...unordered(rows.kind), ...grouped.value };
  if (rows.kind === "groups" && rows.order === null) return success(found);
  const timeline = readTimeline(source, rows.order);
  if (!timeline.ok) return timeline;
  const sequence = sequenceOf(timeline.value, found.groups?.cells ?? null);
  if (!sequence.ok) return sequence;
  return success({ ...found, ...ordered(timeline.value, sequence.value, found.groups) });
}

function readGroups(source: Source, rows: RowsAre): Result<Pick<RowFrame, "groups" | "second">> {
  if (rows.kind !== "groups") return success({ groups: null, second: null });
  const groups = readGrouping(source, rows.by);
  if (!groups.ok) return groups;
  const second = rows.second === null ? success(null) : readGrouping(source, rows.second);
  return second.ok ? success({ groups: groups.value, second: second.value }) : second;
}

const unordered = (kind: RowsAre["kind"]): RowFrame => ({
  kind,
  groups: null,
  second: null,
  timeline: null,
  sequence: null,
  lookBack: null,
});

function ordered(
  timeline: Timeline,
  sequence: Sequence,
  groups: Grouping | null,
): Pick<RowFrame, "timeline" | "sequence" | "lookBack"> {
  const order = { positions: timeline.positions, codes: groups?.cells.codes ?? null };
  const earlier = (periods: number): Int32Array => earlierRows(sequence, periods, order);
  return { timeline, sequence, lookBack: { earlier, period: timeline.period } };
}

function readTimeline(source: Source, order: string | null): Result<Timeline> {
  if (order === null) return success(rowTimeline(source));
  const column = findColumn(source, order);
  return column.ok ? columnTimeline(column.value) : column;
}

function readGrouping(source: Source, heading: string): Result<Grouping> {
  const column = findColumn(source, heading);
  if (!column.ok) return column;
  const cells = readLevelCells(column.value);
  if (!cells.ok) return cells;
  const [only, ...others] = cells.value.levels;
  if (only !== undefined && others.length === 0) {
    return failure({ code: "one-group", column: column.value.name, value: only });
  }
  return success({ column: column.value, cells: cells.value });
}

/** Rows whose group is missing cannot be used; groups make no terms. */
export const groupIngredients = ({ groups, second }: RowFrame): Ingredient[] =>
  [groups, second]
    .filter((grouping) => grouping !== null)
    .map(({ column, cells }) => ({
      present: presentIn(cells.codes),
      lackOf: (row) => missingCell(column, row),
      terms: () => success([]),
      notes: [],
    }));
