import { describe, expect, it } from "vitest";
import { periodsInWords } from "../../../src/core/table/periodNames.ts";
import { readTimeCells } from "../../../src/core/table/timeCells.ts";
import { type TimesFound, gapsIn, timesIn } from "../../../src/core/table/timesFound.ts";
import type { Cell } from "../../../src/core/table/cells.ts";
import { columnOf, day } from "../../support/sheet.ts";

const found = (cells: readonly Cell[], name = "When"): TimesFound => timesIn(readTimeCells(columnOf(name, cells)))!;
const days = (first: { date: number }, steps: readonly number[]): Cell[] =>
  steps.map((step) => ({ date: first.date + step }));
const range = (count: number): number[] => Array.from({ length: count }, (_, i) => i);
const positions = ({ distinct, positionOf }: TimesFound): number[] => Array.from(distinct, positionOf);

const monday = day(2024, 1, 1);
/** Monday to Friday over so many weeks. */
const workdays = (weeks: number): number[] => range(weeks * 5).map((i) => Math.floor(i / 5) * 7 + (i % 5));

describe("the period of a time column", () => {
  it.each<[string, Cell[], readonly [name: string, unit: string, season: number]]>([
    ["years", [2019, 2020, 2021], ["yearly", "year", 1]],
    ["quarter labels", ["2019Q1", "2019Q2", "2019Q3"], ["quarterly", "quarter", 4]],
    ["month labels", ["Jan 2019", "Feb 2019"], ["monthly", "month", 12]],
    ["month labels a quarter apart", ["Mar 2019", "Jun 2019", "Sep 2019"], ["quarterly", "quarter", 4]],
    ["every other month", ["2019-01", "2019-03", "2019-07"], ["every 2 months", "2 months", 6]],
    ["week labels", ["2019-W51", "2019-W52", "2020-W01"], ["weekly", "week", 52]],
    ["first days of months", [day(2024, 1, 1), day(2024, 2, 1), day(2024, 4, 1)], ["monthly", "month", 12]],
    ["last days of months", [day(2024, 1, 31), day(2024, 2, 29), day(2024, 3, 31)], ["monthly", "month", 12]],
    [
      "last working days",
      [day(2024, 3, 28), day(2024, 4, 30), day(2024, 5, 31), day(2024, 6, 28)],
      ["monthly", "month", 12],
    ],
    ["ends of quarters", [day(2023, 12, 31), day(2024, 3, 31), day(2024, 6, 30)], ["quarterly", "quarter", 4]],
    ["ends of years", [day(2021, 12, 31), day(2022, 12, 31), day(2023, 12, 31)], ["yearly", "year", 1]],
    [
      "days a week apart",
      days(
        monday,
        range(8).map((i) => i * 7),
      ),
      ["weekly", "week", 52],
    ],
    [
      "days two weeks apart",
      days(
        monday,
        range(8).map((i) => i * 14),
      ),
      ["every 2 weeks", "2 weeks", 26],
    ],
    ["Fridays, one of them early", days(monday, [4, 11, 17, 25, 32, 39]), ["weekly", "week", 52]],
    ["days", days(monday, range(10)), ["daily", "day", 7]],
    ["working days", days(monday, workdays(3)), ["business-daily", "business day", 5]],
    [
      "every day but Sunday",
      days(
        monday,
        range(24).filter((i) => i % 7 !== 6),
      ),
      ["daily", "day", 7],
    ],
    [
      "every third day",
      days(
        monday,
        range(12).map((i) => i * 3),
      ),
      ["every 3 days", "3 days", 1],
    ],
    [
      "hours",
      days(
        monday,
        range(30).map((i) => i / 24),
      ),
      ["hourly", "hour", 24],
    ],
    [
      "quarters of an hour",
      days(
        monday,
        range(30).map((i) => i / 96),
      ),
      ["every 15 minutes", "15 minutes", 96],
    ],
    [
      "months at noon",
      [day(2024, 1, 1), day(2024, 2, 1), day(2024, 3, 1)].map(({ date }) => ({ date: date + 0.5 })),
      ["monthly", "month", 12],
    ],
    ["running numbers", [1, 2, 3, 5], ["by running number", "step", 1]],
    ["irregular dates", days(monday, [0, 1, 40, 41, 200, 203]), ["row by row", "row", 1]],
    ["irregular numbers", [1.5, 2.7, 9], ["row by row", "row", 1]],
  ])("finds %s", (_, cells, [name, unit, season]) => {
    expect(found(cells).period).toEqual({ name, unit, season });
  });

  it("takes running numbers under a heading that says what they count for that", () => {
    expect(
      found(
        range(20).map((i) => i + 1),
        "Week",
      ).period,
    ).toEqual({ name: "weekly", unit: "week", season: 52 });
    expect(found([3, 4], "Week").labelOf(1)).toBe("week 4");
    expect(positions(found([3, 4, 90], "Week"))).toEqual([0, 1, 87]);
  });

  it("keeps the place of periods that are missing", () => {
    expect(positions(found(["2019-01", "2019-02", "2019-05"]))).toEqual([0, 1, 4]);
    expect(
      positions(
        found(
          days(
            monday,
            workdays(2).filter((step) => step !== 3),
          ),
        ),
      ),
    ).toEqual([0, 1, 2, 4, 5, 6, 7, 8, 9]);
    expect(positions(found([day(2024, 1, 31), day(2024, 2, 29), day(2024, 5, 31)]))).toEqual([0, 1, 4]);
    expect(positions(found(days(monday, [4, 11, 17, 32])))).toEqual([0, 1, 2, 4]);
  });

  it("counts rows without a period one after the other", () => {
    const { distinct, positionOf, regular, labelOf } = found(days(monday, [0, 1, 40, 41, 200, 203]));
    expect(Array.from(distinct, positionOf)).toEqual([0, 1, 2, 3, 4, 5]);
    expect(regular).toBe(false);
    expect(labelOf(2)).toBe("10 February 2024");
  });

  it("names positions in words", () => {
    expect(found(["2019Q1", "2019Q2"]).labelOf(3)).toBe("Q4 2019");
    expect(found(["2019-11", "2019-12"]).labelOf(2)).toBe("January 2020");
    expect(found(["2019-W52", "2020-W01"]).labelOf(1)).toBe("week 1 of 2020");
    expect(found(days(monday, workdays(2))).labelOf(5)).toBe("8 January 2024");
    expect(
      found(
        days(
          monday,
          range(30).map((i) => i / 24),
        ),
      ).labelOf(25),
    ).toBe("2024-01-02 01:00");
    expect(found([2019, 2020]).labelOf(1)).toBe("2020");
  });

  it("counts gaps and names the first five", () => {
    const { distinct, positionOf, labelOf } = found(["2019-01", "2019-03", "2019-10"]);
    expect(gapsIn(Int32Array.from(distinct, positionOf), labelOf)).toEqual({
      gaps: 7,
      gapLabels: ["February 2019", "April 2019", "May 2019", "June 2019", "July 2019"],
    });
  });

  it("says periods in words, several of a kind multiplied out", () => {
    expect(periodsInWords({ name: "monthly", unit: "month", season: 12 }, 1)).toBe("1 month");
    expect(periodsInWords({ name: "monthly", unit: "month", season: 12 }, 3)).toBe("3 months");
    expect(periodsInWords({ name: "every 2 weeks", unit: "2 weeks", season: 26 }, 2)).toBe("4 weeks");
  });
});
