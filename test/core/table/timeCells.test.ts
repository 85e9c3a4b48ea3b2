import { describe, expect, it } from "vitest";
import type { Cell } from "../../../src/core/table/cells.ts";
import { readTimeCells, timeState } from "../../../src/core/table/timeCells.ts";
import { columnOf, day } from "../../support/sheet.ts";

const read = (cells: readonly Cell[], name = "Month") => readTimeCells(columnOf(name, cells));
const { missing, unreadable } = timeState;

describe("a column read as times", () => {
  it("reads dates as days", () => {
    const { unit, values, notes } = read([day(2024, 1, 1), day(2024, 2, 1)]);
    expect([unit, values[1]! - values[0]!, notes]).toEqual(["day", 31, []]);
  });

  it("reads labels in their own unit", () => {
    expect(read(["2019Q1", "Q2 2019", "3Q19"])).toMatchObject({ unit: "quarter" });
    expect([...read(["Jan 2019", "2019-02", "Mar-19"]).values].map((index) => index % 12)).toEqual([0, 1, 2]);
  });

  it("turns labels of several units into days", () => {
    const { unit, values } = read([day(2019, 12, 1), "Jan 2020", "2020Q2"]);
    expect(unit).toBe("day");
    expect([...values]).toEqual([day(2019, 12, 1).date, day(2020, 1, 1).date, day(2020, 4, 1).date]);
  });

  it("takes numbers for the years, months or days that they look like", () => {
    expect(read([2019, 2020])).toMatchObject({ unit: "year", notes: [] });
    expect(read([201_911, 201_912, 202_001])).toMatchObject({ unit: "month" });
    expect([...read([201_912, 202_001]).values]).toEqual([2019 * 12 + 11, 2020 * 12]);
    expect(read([20_190_228, 20_190_301])).toMatchObject({
      unit: "day",
      notes: ["Month: numbers were read as year, month and day."],
    });
    expect(read([2019, 2019.25, 2019.5])).toMatchObject({ unit: "quarter" });
    expect(read([2019, 2019.083, 2019.17])).toMatchObject({ unit: "month" });
  });

  it("takes bare serial numbers for dates, as worksheet functions receive them", () => {
    const { unit, values, notes } = read([45_292, 45_323]);
    expect([unit, [...values]]).toEqual(["day", [45_292, 45_323]]);
    expect(notes).toEqual(["Month: numbers were read as the serial numbers of dates."]);
  });

  it("takes other numbers for running numbers, and hears from the heading what they count", () => {
    expect(read([1, 2, 3], "Week")).toMatchObject({ unit: "number", counts: "week" });
    expect(read([1, 2, 3], "t")).toMatchObject({ unit: "number", counts: null });
    expect(read(["Week 1", "Week 2"], "Period")).toMatchObject({ unit: "number" });
  });

  it("reads dates such as 3/4/2024 by the whole column, and not where both readings suit", () => {
    const { values, notes } = read(["3/4/2024", "17/4/2024"]);
    expect([...values]).toEqual([day(2024, 4, 3).date, day(2024, 4, 17).date]);
    expect(notes).toEqual(["Month: dates kept as text were read as day/month/year."]);
    expect([...read(["4/3/2024", "4/17/2024"]).values]).toEqual([...values]);
    expect([...read(["3/4/2024", "5/6/2024"]).states]).toEqual([unreadable, unreadable]);
  });

  it("does not read such dates beside true dates, which may have been turned round already", () => {
    expect([...read(["17/4/2024", day(2024, 3, 5)]).states]).toEqual([unreadable, timeState.read]);
  });

  it("reads business years by the whole column", () => {
    expect([...read(["2010-11", "2011-12", "2012-13"]).values]).toEqual([2010, 2011, 2012]);
    expect(read(["2010-11", "2010-12"])).toMatchObject({ unit: "month" });
  });

  it("tells missing from unreadable", () => {
    const { states } = read(["2019-01", null, "NA", "Total", { error: "#REF!" }, true]);
    expect([...states]).toEqual([timeState.read, missing, missing, unreadable, unreadable, unreadable]);
  });

  it("does not mix running numbers with the calendar", () => {
    expect([...read(["2019-01", "2019-02", 7]).states]).toEqual([timeState.read, timeState.read, unreadable]);
    expect([...read([1, 2, 3, "2019-01"]).states]).toEqual([...Array<number>(3).fill(timeState.read), unreadable]);
  });
});
