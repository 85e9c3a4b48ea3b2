import { calendarDay, dayCount, minutesADay, weekIndexOf, weekdayOf } from "./calendar.ts";
import type { TimeUnit } from "./periodLabels.ts";
import { type GridUnit, type Period, businessDay, periodOf, timeInWords } from "./periodNames.ts";

/** Times that fall on whole periods of equal length. */
export interface Grid {
  readonly period: Period;
  /** Whole periods since the first time. */
  readonly positionOf: (time: number) => number;
  readonly labelOf: (position: number) => string;
}

/** A time column's distinct times, ascending, in its unit (see Moment). */
export interface Times {
  readonly values: Float64Array;
  readonly unit: TimeUnit;
  /** What running numbers count, null where that is not known. */
  readonly counts: Exclude<TimeUnit, "number"> | null;
}

/**
 * Finds the period of a time column. Labels keep their own unit; dates are taken for months where no month has two
 * and all stand at the same end of it, else for weeks, business days or days. The step is the greatest that suits all.
 * @returns null where times follow no period: fewer than half of the periods between first and last would be there.
 */
export function findGrid({ values, unit, counts }: Times): Grid | null {
  switch (unit) {
    case "year":
    case "quarter":
    case "month":
    case "week":
      return stepped(values, { unit, read: itself, word: null });
    case "number":
      return values.every(Number.isInteger) ? numberGrid(values, counts) : null;
    case "day":
      return atOneHour(values) ? dayGrid(values) : clockGrid(values);
  }
}

/** How a time becomes a whole number of a unit. `word` goes before running numbers, "week 5". */
interface Scale {
  readonly unit: GridUnit;
  readonly read: (time: number) => number;
  readonly word: string | null;
}

const itself = (time: number): number => time;

function stepped(values: Float64Array, { unit, read, word }: Scale): Grid {
  const first = read(values[0]!);
  let step = 0;
  for (const value of values) step = greatestCommonDivisor(read(value) - first, step);
  const size = Math.max(step, 1);
  return {
    period: periodOf(unit, size),
    positionOf: (time) => Math.round((read(time) - first) / size),
    labelOf: (position) => {
      const time = first + position * size;
      return word === null ? timeInWords(unit, time) : `${word} ${time}`;
    },
  };
}

function greatestCommonDivisor(a: number, b: number): number {
  while (b !== 0) [a, b] = [b, a % b];
  return a;
}

/** Fewer rows than one for two periods say that the period is not there. */
const leastFilled = 0.5;

function filled(grid: Grid, values: Float64Array): Grid | null {
  const periods = grid.positionOf(values.at(-1)!) + 1;
  return values.length >= leastFilled * periods ? grid : null;
}

/** Numbers that are said to count weeks or months keep their gaps, however many; bare ones may be no count at all. */
const numberGrid = (values: Float64Array, counts: Times["counts"]): Grid | null =>
  counts === null
    ? filled(stepped(values, { unit: "step", read: itself, word: null }), values)
    : stepped(values, { unit: counts, read: itself, word: counts });

function dayGrid(values: Float64Array): Grid | null {
  if (areMonthly(values)) return stepped(values, { unit: "month", read: monthOf, word: null });
  const byDay = stepped(values, { unit: "day", read: dayCount, word: null });
  if (byDay.period.unit.includes("week")) return byDay;
  if (areWeekly(values)) return filled(stepped(values, { unit: "week", read: weekIndexOf, word: null }), values);
  if (skipWeekends(values)) {
    const read = (time: number): number => businessDay(weekIndexOf(time), weekdayOf(time));
    return filled(stepped(values, { unit: "business day", read, word: null }), values);
  }
  return filled(byDay, values);
}

/** Whole days, or all at the same time of day to the second. */
function atOneHour(values: Float64Array): boolean {
  const hour = values[0]! - Math.floor(values[0]!);
  return values.every((value) => Math.abs(value - Math.floor(value) - hour) < 1 / secondsADay);
}

const secondsADay = 86_400;

const clockGrid = (values: Float64Array): Grid | null =>
  filled(stepped(values, { unit: "minute", read: (time) => Math.round(time * minutesADay), word: null }), values);

function monthOf(serial: number): number {
  const { year, month } = calendarDay(serial);
  return year * 12 + month - 1;
}

/** A first or last working day moves by weekends and holidays so much within its month. */
const monthEndDays = 6;

function areMonthly(values: Float64Array): boolean {
  if (values.length < 2 || values.length > monthOf(values.at(-1)!) - monthOf(values[0]!) + 1) return false;
  const days = Array.from(values, (value) => calendarDay(value));
  const distinct = days.every(
    (day, i) => i === 0 || day.month !== days[i - 1]!.month || day.year !== days[i - 1]!.year,
  );
  if (!distinct) return false;
  const fromStart = days.map(({ day }) => day);
  const fromEnd = days.map(({ year, month, day }) => new Date(Date.UTC(year, month, 0)).getUTCDate() - day);
  return spread(fromStart) <= monthEndDays || spread(fromEnd) <= monthEndDays;
}

/** A week's report may come a day or two early or late. */
const weekDays = 2;

function areWeekly(values: Float64Array): boolean {
  if (values.length > weekIndexOf(values.at(-1)!) - weekIndexOf(values[0]!) + 1) return false;
  const weeks = Array.from(values, weekIndexOf);
  const distinct = weeks.every((week, i) => i === 0 || week !== weeks[i - 1]!);
  return values.length > 2 && distinct && spread(Array.from(values, weekdayOf)) <= weekDays;
}

function skipWeekends(values: Float64Array): boolean {
  const spansWeek = values.at(-1)! - values[0]! >= 7;
  return spansWeek && values.every((value) => weekdayOf(value) < 5);
}

function spread(numbers: readonly number[]): number {
  let [least, most] = [Infinity, -Infinity];
  for (const number of numbers) [least, most] = [Math.min(least, number), Math.max(most, number)];
  return most - least;
}
