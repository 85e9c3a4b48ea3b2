import { serialOf } from "./calendar.ts";
import { type Moment, type TimeUnit, isYear } from "./periodLabels.ts";

/**
 * How the plain numbers of a time column are to be read. Worksheet functions receive dates as bare serials, so
 * numbers in their range are days; 2024, 202401 and 20240131 are what they look like; the rest are running numbers.
 */
export interface NumberReading {
  readonly unit: TimeUnit;
  readonly read: (value: number) => number;
  /** How this is said to the user, null where it goes without saying. */
  readonly words: string | null;
}

/** The first reading that suits every number. */
export function readingOf(values: Float64Array): NumberReading {
  return readings.find(({ suits }) => values.every(suits)) ?? runningNumber;
}

const runningNumber: NumberReading = { unit: "number", read: (value) => value, words: null };

/** 3 October 1954 to 10 January 2119: serials outside are more likely running numbers. */
const firstLikelySerial = 20_000;
const lastLikelySerial = 80_000;

/** Twelfths of a year are typed with two decimals or more. */
const monthTolerance = 0.07;

const compactDay = (value: number): number | null =>
  serialOf({ year: Math.floor(value / 10_000), month: Math.floor(value / 100) % 100, day: value % 100 });

const near = (value: number, tolerance: number): boolean => Math.abs(value - Math.round(value)) <= tolerance;

const inYears = (value: number): boolean => isYear(Math.floor(value));

const readings: readonly (NumberReading & { readonly suits: (value: number) => boolean })[] = [
  { unit: "year", suits: isYear, read: (value) => value, words: null },
  {
    unit: "month",
    suits: (value) => Number.isInteger(value) && inYears(value / 100) && value % 100 >= 1 && value % 100 <= 12,
    read: (value) => Math.floor(value / 100) * 12 + (value % 100) - 1,
    words: "as year and month",
  },
  {
    unit: "day",
    suits: (value) => Number.isInteger(value) && inYears(value / 10_000) && compactDay(value) !== null,
    read: (value) => compactDay(value) ?? 0,
    words: "as year, month and day",
  },
  {
    unit: "day",
    suits: (value) => value >= firstLikelySerial && value <= lastLikelySerial,
    read: (value) => value,
    words: "as the serial numbers of dates",
  },
  {
    unit: "quarter",
    suits: (value) => inYears(value) && Number.isInteger(value * 4),
    read: (value) => value * 4,
    words: "as quarters of a year",
  },
  {
    unit: "month",
    suits: (value) => inYears(value) && near(value * 12, monthTolerance),
    read: (value) => Math.round(value * 12),
    words: "as twelfths of a year",
  },
];

/** A moment of any calendar unit as the serial of the day it begins with. */
export function firstDayOf({ unit, index }: Moment): number {
  switch (unit) {
    case "year":
      return serialOf({ year: index, month: 1, day: 1 })!;
    case "quarter":
      return serialOf({ year: Math.floor(index / 4), month: (index % 4) * 3 + 1, day: 1 })!;
    case "month":
      return serialOf({ year: Math.floor(index / 12), month: (index % 12) + 1, day: 1 })!;
    case "week":
      return index * 7 + 2;
    case "day":
    case "number":
      return index;
  }
}
