import { describe, expect, it } from "vitest";
import type { Cell } from "../../../src/core/table/cells.ts";
import { describeColumn } from "../../../src/core/table/describe.ts";
import { columnOf, day } from "../../support/sheet.ts";

const described = (cells: readonly Cell[], name = "Price") => describeColumn(columnOf(name, cells));
const months = (count: number): Cell[] =>
  Array.from({ length: count }, (_, i) => day(2020 + Math.floor(i / 12), (i % 12) + 1, 1));

describe("what a column holds", () => {
  it.each<[string, Cell[], readonly [name: string, holds: string]]>([
    ["numbers", [5, 7.5, 5, null, "n.k.", 9, 9, 9], ["Price", "numbers"]],
    ["numbers kept as text", ["1,5", "2,5", 3], ["Price", "numbers"]],
    ["dates", months(5), ["When", "dates"]],
    ["quarters", ["2019Q1", "2019Q2", "NA", "2019Q3"], ["When", "periods"]],
    ["years under a heading that says so", [2019, 2019, 2020], ["Year", "periods"]],
    ["years in turn", [2015, 2016, 2017, 2018, 2019], ["FY", "periods"]],
    ["numbers that could be years", [1999, 2400, 1801, 1650, 1999], ["Takings", "numbers"]],
    ["years and months run together", [201_911, 201_912, 202_001], ["P", "periods"]],
    ["numbers that could be serials", [45_000, 44_000, 46_500], ["Takings", "numbers"]],
    ["few words, often", ["N", "S", "N", "S", "E", "E"], ["Region", "categories"]],
    ["booleans", [true, false, true, true], ["Open", "categories"]],
    ["words that hardly repeat", ["Hull", "York", "Leeds", "Hull"], ["Town", "text"]],
    ["a mixture", [1, 2, "a", "b"], ["Code", "mixed"]],
    ["nothing", [null, "NA", " "], ["Empty", "nothing"]],
  ])("%s", (_, cells, [name, holds]) => {
    expect(described(cells, name).holds).toBe(holds);
  });

  it("counts every cell once", () => {
    const cells: Cell[] = [5, 6, day(2024, 1, 1), true, "a", "1,5", { error: "#REF!" }, null, "NA"];
    expect(described(cells).counts).toEqual({
      rows: 9,
      numbers: 2,
      dates: 1,
      booleans: 1,
      texts: 1,
      textNumbers: 1,
      errors: 1,
      blanks: 1,
      marks: 1,
    });
  });

  it("lists the unusable cells with what they hold", () => {
    const cells: Cell[] = [5, 6, 7, 8, 9, 11, 12, null, "NA", "n.k."];
    expect(described(cells).unusable).toEqual({
      column: "Price",
      cells: ["Months!A9", "Months!A10", "Months!A11"],
      values: ["", "NA", "n.k."],
      count: 3,
    });
    expect(described(["2019-01", "2019-02", "2019-03", "Total"]).unusable).toMatchObject({ cells: ["Months!A5"] });
    expect(described(["a", "b", "a", "b", null]).unusable.count).toBe(1);
  });

  it("offers text that is plainly numbers, with count, example and decimal mark", () => {
    expect(described([5, "1.234,50", "7,25"]).textNumbers).toEqual({
      count: 2,
      example: "1.234,50",
      decimal: ",",
      certain: true,
    });
    expect(described([5, 6]).textNumbers).toBeNull();
  });

  it("draws a sample of at most forty numbers in row order", () => {
    const values = Array.from({ length: 1000 }, (_, i) => i * 2);
    const { sample, min, max, distinct } = described(values);
    expect(sample).toHaveLength(40);
    expect([sample[0], sample.at(-1), min, max, distinct]).toEqual([0, 1998, 0, 1998, 1000]);
    expect(sample.every((one, i) => i === 0 || one > sample[i - 1]!)).toBe(true);
    expect(described([7, 3, 5]).sample).toEqual([7, 3, 5]);
  });

  it("knows constants and counters", () => {
    expect(described([4, 4, null, 4])).toMatchObject({ constant: true, counter: false, distinct: 1 });
    expect(described([7, 8, 9])).toMatchObject({ constant: false, counter: true });
    expect(described([7, 9, 10])).toMatchObject({ counter: false });
  });

  it("lists categories, the most frequent first", () => {
    expect(described(["S", "N", "N", "NA", " N", "N", "N"]).levels).toEqual([
      { level: "N", count: 5 },
      { level: "S", count: 1 },
    ]);
  });

  it("summarises the time: period, ends, gaps, repeats, order", () => {
    const cells = months(6).filter((_, i) => i !== 3);
    expect(described(cells, "Month").time).toEqual({
      unit: "day",
      period: { name: "monthly", unit: "month", season: 12 },
      first: "January 2020",
      last: "June 2020",
      gaps: 1,
      gapLabels: ["April 2020"],
      distinct: 5,
      repeats: false,
      ascending: true,
    });
    expect(described([...months(3), ...months(3)]).time).toMatchObject({
      repeats: true,
      ascending: false,
      distinct: 3,
    });
    expect(described([5, 6]).time).toBeNull();
  });
});
