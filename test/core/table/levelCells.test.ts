import { describe, expect, it } from "vitest";
import { readLevelCells } from "../../../src/core/table/levelCells.ts";
import { columnOf, day, faultOf, must } from "../../support/sheet.ts";

describe("a column read as categories", () => {
  it("trims text, counts numbers inside it, and leaves marks out", () => {
    const { codes, levels } = must(readLevelCells(columnOf("Shop", ["Shop 10", " Shop 2", "NA", null, "Shop 10 "])));
    expect(levels).toEqual(["Shop 2", "Shop 10"]);
    expect([...codes]).toEqual([1, 0, -1, -1, 1]);
  });

  it("orders numbers by size", () => {
    const { codes, levels } = must(readLevelCells(columnOf("Lot", [10, 1.5, -3, 1.25, "10"])));
    expect(levels).toEqual(["-3", "1.25", "1.5", "10"]);
    expect([...codes]).toEqual([3, 2, 0, 1, 3]);
  });

  it("writes dates and booleans out", () => {
    expect(must(readLevelCells(columnOf("When", [day(2024, 5, 3), true, false]))).levels).toEqual([
      "2024-05-03",
      "FALSE",
      "TRUE",
    ]);
  });

  it("keeps levels that differ in capitals apart", () => {
    expect(must(readLevelCells(columnOf("Region", ["north", "North"]))).levels).toHaveLength(2);
  });

  it("faults errors and empty columns", () => {
    expect(faultOf(readLevelCells(columnOf("Shop", ["a", { error: "#REF!" }])))).toMatchObject({
      code: "error-cells",
      cells: ["Months!A3"],
    });
    expect(faultOf(readLevelCells(columnOf("Shop", [null, "NA"])))).toEqual({
      code: "empty-column",
      column: "Shop",
      where: "Months!A2:A3",
    });
  });
});
