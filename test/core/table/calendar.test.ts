import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  calendarDay,
  dayInDigits,
  dayInWords,
  isoWeek,
  serialOf,
  weekIndexOf,
  weekIndexOfIso,
  weekdayOf,
} from "../../../src/core/table/calendar.ts";

describe("days of the 1900 system", () => {
  // Serials as a spreadsheet shows them, the days before the false 29 February 1900 included.
  it.each([
    [1, "1900-01-01"],
    [59, "1900-02-28"],
    [61, "1900-03-01"],
    [25_569, "1970-01-01"],
    [36_526, "2000-01-01"],
    [45_351, "2024-02-29"],
  ])("takes %d for %s", (serial, digits) => {
    expect(dayInDigits(serial)).toBe(digits);
    expect(serialOf(calendarDay(serial))).toBe(serial);
  });

  it("knows no day that does not exist", () => {
    expect(serialOf({ year: 2023, month: 2, day: 29 })).toBeNull();
    expect(serialOf({ year: 2023, month: 13, day: 1 })).toBeNull();
    expect(serialOf({ year: 2023, month: 4, day: 0 })).toBeNull();
  });

  it("says the time of day, carried over midnight where it rounds up", () => {
    expect(dayInDigits(45_351.604_166_67)).toBe("2024-02-29 14:30");
    expect(dayInDigits(45_350.999_999)).toBe("2024-02-29");
    expect(dayInWords(45_351)).toBe("29 February 2024");
  });

  it("counts weekdays from Monday", () => {
    const monday = serialOf({ year: 2024, month: 1, day: 1 })!;
    expect([0, 1, 5, 6, 7].map((days) => weekdayOf(monday + days))).toEqual([0, 1, 5, 6, 0]);
  });

  // ISO 8601: 2021-01-03 is the Sunday of week 53 of 2020; 2024-12-30 the Monday of week 1 of 2025.
  it.each([
    [
      { year: 2021, month: 1, day: 3 },
      { year: 2020, week: 53 },
    ],
    [
      { year: 2021, month: 1, day: 4 },
      { year: 2021, week: 1 },
    ],
    [
      { year: 2024, month: 12, day: 30 },
      { year: 2025, week: 1 },
    ],
    [
      { year: 2019, month: 2, day: 1 },
      { year: 2019, week: 5 },
    ],
  ])("knows the week of %o", (day, week) => {
    expect(isoWeek(weekIndexOf(serialOf(day)!))).toEqual(week);
  });

  it("has a week 53 in long years only", () => {
    expect(weekIndexOfIso(2020, 53)).not.toBeNull();
    expect(weekIndexOfIso(2019, 53)).toBeNull();
    expect(weekIndexOfIso(2019, 0)).toBeNull();
  });

  it("reads back every day it writes", () => {
    fc.assert(
      fc.property(fc.integer({ min: 61, max: 200_000 }), (serial) => {
        expect(serialOf(calendarDay(serial))).toBe(serial);
        const { year, week } = isoWeek(weekIndexOf(serial));
        expect(weekIndexOfIso(year, week)).toBe(weekIndexOf(serial));
      }),
      { seed: 12, numRuns: 500 },
    );
  });
});
