import { type Result, failure, success } from "../problem/result.ts";
import type { NumberCells } from "../table/numberCells.ts";
import type { TimeUnit } from "../table/periodLabels.ts";
import type { Column } from "../table/source.ts";
import { spotsOf } from "../table/spots.ts";
import { readTimeCells, timeState } from "../table/timeCells.ts";
import { type TimesFound, timesIn } from "../table/timesFound.ts";
import { nothingRead, unreadableTime } from "./timeline.ts";

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
  const found = timesIn(times);
  if (found === null) return failure(nothingRead(column, times));
  const spots = spotsOf(column, (row) => states[row] === timeState.unreadable);
  if (spots.count > 0) return failure(unreadableTime(column, spots));
  const { unit, count } = countingOf(found, times.unit);
  return success({
    numbers: {
      values: values.map((value, row) => (states[row] === timeState.read ? count(value) : 0)),
      present: states.map((state) => (state === timeState.read ? 1 : 0)),
      notes: [...times.notes, `${column.name} counts ${unit}s since ${found.labelOf(0)}.`],
    },
    unit,
  });
}

interface Counting {
  readonly unit: string;
  readonly count: (time: number) => number;
}

function countingOf({ distinct, regular, period, positionOf }: TimesFound, unit: TimeUnit): Counting {
  if (regular) return { unit: period.unit, count: positionOf };
  const first = distinct[0]!;
  const long = unit === "day" && distinct.at(-1)! - first > daysTold;
  if (long) return { unit: "year", count: (time) => (time - first) / daysAYear };
  return { unit: unit === "number" ? "step" : unit, count: (time) => time - first };
}
