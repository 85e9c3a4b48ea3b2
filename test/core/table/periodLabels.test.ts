import { describe, expect, it } from "vitest";
import { serialOf, weekIndexOfIso } from "../../../src/core/table/calendar.ts";
import { numberedThing, readLabel } from "../../../src/core/table/periodLabels.ts";

const month = (year: number, number: number) => ({ unit: "month", index: year * 12 + number - 1 });
const quarter = (year: number, number: number) => ({ unit: "quarter", index: year * 4 + number - 1 });
const day = (year: number, number: number, dayOfMonth: number) => ({
  unit: "day",
  index: serialOf({ year, month: number, day: dayOfMonth })!,
});

describe("readLabel", () => {
  it.each([
    ["2019", { unit: "year", index: 2019 }],
    ["FY2019", { unit: "year", index: 2019 }],
    ["2019Q1", quarter(2019, 1)],
    ["2019-Q3", quarter(2019, 3)],
    ["Q1 2019", quarter(2019, 1)],
    ["Q4/19", quarter(2019, 4)],
    ["2Q19", quarter(2019, 2)],
    ["2019-01", month(2019, 1)],
    ["2019M01", month(2019, 1)],
    ["2019/11", month(2019, 11)],
    ["201912", month(2019, 12)],
    ["01/2019", month(2019, 1)],
    ["Jan 2019", month(2019, 1)],
    ["Jan-19", month(2019, 1)],
    ["Jan-87", month(1987, 1)],
    ["september 2019", month(2019, 9)],
    ["Sept. 2019", month(2019, 9)],
    ["2019 May", month(2019, 5)],
    ["2019-W05", { unit: "week", index: weekIndexOfIso(2019, 5) }],
    ["2019 week 5", { unit: "week", index: weekIndexOfIso(2019, 5) }],
    ["W05/2019", { unit: "week", index: weekIndexOfIso(2019, 5) }],
    ["Week 5", { unit: "number", index: 5 }],
    ["W12", { unit: "number", index: 12 }],
    ["2019-02-28", day(2019, 2, 28)],
    ["2019-02-28T06:00:00Z", { unit: "day", index: day(2019, 2, 28).index + 0.25 }],
    ["2019/2/28", day(2019, 2, 28)],
    ["28.2.2019", day(2019, 2, 28)],
    ["20190228", day(2019, 2, 28)],
    ["28 Feb 2019", day(2019, 2, 28)],
    ["28-Feb-19", day(2019, 2, 28)],
    ["Feb 28, 2019", day(2019, 2, 28)],
  ])("reads %s", (text, moment) => {
    expect(readLabel(text)).toEqual(moment);
  });

  it.each([
    "",
    "Total",
    "2019-13",
    "2019-00",
    "2019Q5",
    "2019-W53",
    "2019-02-29",
    "2019-02-28T25:00",
    "3/4/2019",
    "12",
  ])("leaves %s alone", (text) => {
    expect(readLabel(text)).toBeNull();
  });

  it("hears from a heading what running numbers count", () => {
    expect(["Week", "Month no.", "Weeks since start", "Price", "Weekend"].map(numberedThing)).toEqual([
      "week",
      "month",
      "week",
      null,
      null,
    ]);
  });
});
