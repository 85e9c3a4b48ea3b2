import type { Problem } from "../problem/problem.ts";
import { type Result, failure, success } from "../problem/result.ts";
import { calendarDay, mondayOf } from "../table/calendar.ts";
import type { TimeUnit } from "../table/periodLabels.ts";
import { type Period, rowByRow } from "../table/periodNames.ts";
import { rangeOf, rowNumberOf } from "../table/place.ts";
import type { Column, Source } from "../table/source.ts";
import { spotsOf } from "../table/spots.ts";
import { isSlashedDate } from "../table/timeTexts.ts";
import { type TimeCells, readTimeCells, timeState } from "../table/timeCells.ts";
import { timesIn } from "../table/timesFound.ts";
import { everyRow } from "./rows.ts";

/** Where each row of a source stands in time. */
export interface Timeline {
  /** The time column; null where rows are taken as they stand. */
  readonly column: Column | null;
  readonly period: Period;
  /** Whole periods since the first time; -1 for rows without a time. */
  readonly positions: Int32Array<ArrayBuffer>;
  readonly labelOf: (position: number) => string;
  /** Month from 1 to 12, or quarter from 1 to 4, of a row; null where the times do not tell. */
  readonly monthOf: ((row: number) => number) | null;
  readonly quarterOf: ((row: number) => number) | null;
  /** Rows whose time stands but cannot be read. */
  readonly isUnreadable: (row: number) => boolean;
  readonly notes: readonly string[];
}

/** Rows as they stand, each one step after the one above. */
export const rowTimeline = ({ rowCount, columns }: Source): Timeline => ({
  column: null,
  period: rowByRow,
  positions: everyRow(rowCount),
  labelOf: (position) => `row ${columns[0] === undefined ? position + 1 : rowNumberOf(columns[0].place, position)}`,
  monthOf: null,
  quarterOf: null,
  isUnreadable: () => false,
  notes: [],
});

/**
 * Reads a time column and finds its period.
 * @returns Problem "empty-column" where no cell holds anything, "unreadable-time" or "dates-as-text" where none is readable.
 */
export function columnTimeline(column: Column): Result<Timeline> {
  const times = readTimeCells(column);
  const found = timesIn(times);
  if (found === null) return failure(nothingRead(column, times));
  const { regular, period, positionOf, labelOf } = found;
  const positions = new Int32Array(times.values.length).fill(-1);
  for (let row = 0; row < positions.length; row++) {
    if (times.states[row] === timeState.read) positions[row] = positionOf(times.values[row]!);
  }
  const irregular = `${column.name} follows no regular period, so each row counts as one step after the one before.`;
  return success({
    column,
    period,
    positions,
    labelOf,
    ...calendarOf(times),
    isUnreadable: (row) => times.states[row] === timeState.unreadable,
    notes: regular ? times.notes : [...times.notes, irregular],
  });
}

export function nothingRead(column: Column, { states }: Pick<TimeCells, "states">): Problem {
  const spots = spotsOf(column, (row) => states[row] === timeState.unreadable);
  if (spots.count === 0)
    return { code: "empty-column", column: column.name, where: rangeOf(column.place, states.length) };
  return unreadableTime(column, spots);
}

/** A date whose day and month cannot be told apart is named as such. */
export const unreadableTime = (column: Column, spots: ReturnType<typeof spotsOf>): Problem => ({
  code: spots.values.every(isSlashedDate) ? "dates-as-text" : "unreadable-time",
  ...spots,
});

function calendarOf({ unit, values }: TimeCells): Pick<Timeline, "monthOf" | "quarterOf"> {
  const month = monthReaders[unit];
  if (unit === "quarter") return { monthOf: null, quarterOf: (row) => (values[row]! % 4) + 1 };
  if (month === undefined) return { monthOf: null, quarterOf: null };
  return { monthOf: (row) => month(values[row]!), quarterOf: (row) => Math.ceil(month(values[row]!) / 3) };
}

/** The month of a time; a week belongs to the month of its Thursday. */
const monthReaders: Partial<Record<TimeUnit, (time: number) => number>> = {
  month: (time) => (time % 12) + 1,
  week: (time) => calendarDay(mondayOf(time) + 3).month,
  day: (time) => calendarDay(time).month,
};
