import { describe, expect, it } from "vitest";
import type { Cell } from "../../../src/core/table/cells.ts";
import { describeColumn } from "../../../src/core/table/describe.ts";
import { proposeRoles } from "../../../src/core/table/roles.ts";
import { day, sourceOf } from "../../support/sheet.ts";

const proposed = (columns: Readonly<Record<string, readonly Cell[]>>) =>
  proposeRoles(sourceOf(columns).columns.map(describeColumn));

const dates = [day(2024, 1, 1), day(2024, 2, 1), day(2024, 3, 1), day(2024, 4, 1)];
const repairs = [210, 198, 240, 205];
const price = [31, 33, 29, 32];

describe("proposed roles", () => {
  it("takes dates for time, the first numbers for the outcome and the rest for drivers", () => {
    expect(proposed({ Repairs: repairs, Month: dates, Price: price, Rain: [9, 12, 4, 7] })).toEqual({
      outcome: "Repairs",
      drivers: ["Price", "Rain"],
      time: "Month",
      groups: null,
      rowsAre: "time",
    });
  });

  it("takes rows for separate cases where nothing tells time", () => {
    expect(proposed({ Shop: ["a", "b", "c", "d"], Takings: repairs, Staff: price })).toMatchObject({
      outcome: "Takings",
      drivers: ["Staff"],
      time: null,
      rowsAre: "cases",
    });
  });

  it("names no drivers where there are more of them than the rows could tell apart, or than anyone would mean", () => {
    const numbered = (count: number, rows: number) =>
      Object.fromEntries(
        Array.from({ length: count }, (_, j) => [
          `C${j}`,
          Array.from({ length: rows }, (_, i) => (i * i + j * 7) % 11),
        ]),
      );
    expect(proposed(numbered(4, 5)).drivers).toEqual(["C1", "C2", "C3"]);
    expect(proposed(numbered(5, 5))).toMatchObject({ outcome: "C0", drivers: [] });
    expect(proposed(numbered(31, 40)).drivers).toHaveLength(30);
    expect(proposed(numbered(32, 40))).toMatchObject({ outcome: "C0", drivers: [] });
  });

  it("leaves constants and row counters aside", () => {
    expect(proposed({ No: [1, 2, 3, 4], Country: [7, 7, 7, 7], Takings: repairs, Staff: price })).toMatchObject({
      outcome: "Takings",
      drivers: ["Staff"],
    });
  });

  it("takes a counter of weeks for time", () => {
    expect(proposed({ Week: [1, 2, 3, 4], Cost: repairs, Parcels: price })).toMatchObject({
      time: "Week",
      outcome: "Cost",
      rowsAre: "time",
    });
  });

  it("takes repeated times with a column of names for groups", () => {
    const panel = {
      Shop: ["North", "North", "South", "South"],
      Year: [2019, 2020, 2019, 2020],
      Takings: repairs,
      Staff: price,
    };
    expect(proposed(panel)).toEqual({
      outcome: "Takings",
      drivers: ["Staff"],
      time: "Year",
      groups: "Shop",
      rowsAre: "groups",
    });
  });

  it("takes repeated times without names for separate cases", () => {
    const columns = { Bought: [dates[0]!, dates[0]!, dates[1]!, dates[1]!], Cost: repairs, Size: price };
    expect(proposed(columns)).toMatchObject({ time: null, groups: null, rowsAre: "cases" });
  });

  it("proposes nothing where there are no numbers", () => {
    expect(proposed({ Town: ["Hull", "York", "Leeds"] })).toMatchObject({ outcome: null, drivers: [] });
  });
});
