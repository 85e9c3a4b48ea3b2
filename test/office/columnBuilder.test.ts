import { describe, expect, it } from "vitest";
import type { Cell } from "../../src/core/table/cells.ts";
import { columnBuilder } from "../../src/office/columnBuilder.ts";
import { toCellColumn } from "../support/cellColumns.ts";

/** A cell as Excel's API tells it, and what it is. */
const told: readonly (readonly [value: unknown, type: string, format: string, cell: Cell])[] = [
  [12.5, "Double", "General", 12.5],
  [0, "Double", "0.00", 0],
  ["", "Empty", "General", null],
  ["", "String", "General", null],
  ["0", "String", "@", "0"],
  ["n/a", "String", "General", "n/a"],
  ["#N/A", "Error", "General", { error: "#N/A" }],
  ["#N/A", "String", "@", "#N/A"],
  [true, "Boolean", "General", true],
  [false, "Boolean", "yyyy", false],
  [45292, "Double", "yyyy-mm-dd", { date: 45292 }],
  [45292, "Double", "General", 45292],
  [0.5, "Double", "[h]:mm", 0.5],
  ["", "Empty", "yyyy-mm-dd", null],
  ["n/a", "String", "yyyy-mm-dd", "n/a"],
  [-7, "Integer", "General", -7],
];

describe("cells as Excel tells them", () => {
  it("become a column, whatever the chunks they came in", () => {
    const expected = toCellColumn(told.map(([, , , cell]) => cell));
    for (const height of [1, 3, told.length]) {
      const builder = columnBuilder(told.length);
      for (let row = 0; row < told.length; row += height) {
        const chunk = told.slice(row, row + height);
        const beside = (values: readonly unknown[]) => values.map((value) => ["beside", value]);
        builder.put(
          {
            values: beside(chunk.map(([value]) => value)),
            valueTypes: beside(chunk.map(([, type]) => type)) as string[][],
            numberFormat: beside(chunk.map(([, , format]) => format)) as string[][],
          },
          1,
          row,
        );
      }
      expect(builder.column()).toEqual(expected);
    }
  });
});
