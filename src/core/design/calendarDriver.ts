import { type Result, failure, success } from "../problem/result.ts";
import { monthNames } from "../table/calendar.ts";
import type { Term } from "./design.ts";
import type { Ingredient, Lack } from "./ingredient.ts";
import type { CalendarDriver } from "./model.ts";
import { presentIn, valuesAt } from "./rows.ts";
import type { Timeline } from "./timeline.ts";

/**
 * A driver made from the time column alone: the trend counts periods from the first row used; month and quarter
 * indicators compare each month or quarter with the first one that occurs.
 * @param timeline - null where rows have no order in time.
 * @returns Problem "calendar-needs-dates"; its terms "one-category" where all rows fall into one month or quarter.
 */
export function calendarDriver(driver: CalendarDriver, timeline: Timeline | null): Result<Ingredient> {
  if (timeline === null) return failure({ code: "calendar-needs-dates", driver, column: null });
  const { positions, monthOf, quarterOf, period } = timeline;
  if (driver === "trend") return success(ingredient(timeline, (rows) => trendTerm(rows, positions, period.unit)));
  const read = driver === "month indicators" ? monthOf : quarterOf;
  if (read === null) return failure({ code: "calendar-needs-dates", driver, column: timeline.column?.name ?? null });
  const names = driver === "month indicators" ? monthNames : ["Q1", "Q2", "Q3", "Q4"];
  return success(ingredient(timeline, (rows) => seasonTerms(driver, rows, { read, names })));
}

const ingredient = ({ positions }: Timeline, terms: Ingredient["terms"]): Ingredient => ({
  present: presentIn(positions),
  lackOf: noTime,
  terms,
  notes: [],
});

/** Rows without a time are refused or left out before a calendar driver is asked. */
function noTime(row: number): Lack {
  throw new Error(`row ${row} has no time and should have been left out before`);
}

function trendTerm(rows: Int32Array, positions: Int32Array, unit: string): Result<readonly Term[]> {
  const first = rows.reduce((least, row) => Math.min(least, positions[row]!), Infinity);
  const values = valuesAt(rows, (row) => positions[row]! - first);
  return success([{ name: "trend", meaning: { kind: "trend", unit }, values }]);
}

interface Season {
  /** Number of the month or quarter of a row, from 1. */
  readonly read: (row: number) => number;
  readonly names: readonly string[];
}

function seasonTerms(driver: CalendarDriver, rows: Int32Array, { read, names }: Season): Result<readonly Term[]> {
  const seasons = valuesAt(rows, read);
  const used = names.flatMap((_, index) => (seasons.includes(index + 1) ? [index + 1] : []));
  const base = names[used[0]! - 1]!;
  if (used.length === 1) return failure({ code: "one-category", column: driver, value: base });
  return success(
    used.slice(1).map((season) => ({
      name: names[season - 1]!,
      meaning: { kind: "season", level: names[season - 1]!, base },
      values: seasons.map((one) => (one === season ? 1 : 0)),
    })),
  );
}
