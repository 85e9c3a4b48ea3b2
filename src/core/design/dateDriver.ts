import { type Result, failure, success } from "../problem/result.ts";
import type { NumberCells } from "../table/numberCells.ts";
import type { Column } from "../table/source.ts";
import { spotsOf } from "../table/spots.ts";
import { type TimeCells, readTimeCells, timeState } from "../table/timeCells.ts";
import { findGrid } from "./period.ts";
import { timeInWords } from "./periodNames.ts";
import { distinctTimes, nothingRead, unreadableTime } from "./timeline.ts";

/** A column of dates or periods as a number: how many units have passed since its first time. */
export interface DateNumbers {
  readonly numbers: NumberCells;
  readonly unit: string;
}

/** Beyond two years of irregular dates, effects are told by the year. */
const daysTold = 731;

/** Mean length of a year of the Gregorian calendar. */
const daysAYear = 365.2425;

/**
 * Counts dates in the periods they follow; dates without a period in days, or in years where they span more than two.
 * @returns Problem "empty-column", "unreadable-time" or "dates-as-text".
 */
export function dateNumbers(column: Column): Result<DateNumbers> {
  const times = readTimeCells(column);
  const { values, states } = times;
  const distinct = distinctTimes(times);
  if (distinct.length === 0) return failure(nothingRead(column, times));
  const spots = spotsOf(column, (row) => states[row] === timeState.unreadable);
  if (spots.count > 0) return failure(unreadableTime(column, spots));
  const { unit, count, since } = countingOf(distinct, times);
  return success({
    numbers: {
      values: values.map((value, row) => (states[row] === timeState.read ? count(value) : 0)),
      present: states.map((state) => (state === timeState.read ? 1 : 0)),
      notes: [...times.notes, `${column.name} counts ${unit}s since ${since}.`],
    },
    unit,
  });
}

interface Counting {
  readonly unit: string;
  readonly count: (time: number) => number;
  readonly since: string;
}

function countingOf(distinct: Float64Array, { unit, counts }: TimeCells): Counting {
  const grid = findGrid({ values: distinct, unit, counts });
  if (grid !== null) return { unit: grid.period.unit, count: grid.positionOf, since: grid.labelOf(0) };
  const first = distinct[0]!;
  const step = unit === "number" ? "step" : unit;
  const long = unit === "day" && distinct.at(-1)! - first > daysTold;
  const scale = long ? daysAYear : 1;
  return { unit: long ? "year" : step, count: (time) => (time - first) / scale, since: timeInWords(step, first) };
}
