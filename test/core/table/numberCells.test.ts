import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { Cell } from "../../../src/core/table/cells.ts";
import { readNumberCells } from "../../../src/core/table/numberCells.ts";
import { columnOf, faultOf, must } from "../../support/sheet.ts";

const read = (cells: readonly Cell[], decimal: "." | "," | null = null) =>
  readNumberCells(columnOf("Price", cells, 2), decimal);

describe("a column read as numbers", () => {
  it("leaves blanks and marks out, and nothing else", () => {
    const { values, present, notes } = must(read([5, null, "NA", { error: "#N/A" }, "-", -2.5]));
    expect([...present]).toEqual([1, 0, 0, 0, 0, 1]);
    expect([...values]).toEqual([5, 0, 0, 0, 0, -2.5]);
    expect(notes).toEqual([]);
  });

  it("reads TRUE and FALSE alone as 1 and 0, and says so", () => {
    const { values, notes } = must(read([true, false, null, true]));
    expect([...values]).toEqual([1, 0, 0, 1]);
    expect(notes).toEqual(["Price: TRUE was read as 1 and FALSE as 0."]);
  });

  it("reads text numbers with leave only, under the agreed decimal mark", () => {
    expect(faultOf(read([5, "1.234,50", "12 %"]))).toEqual({
      code: "text-numbers",
      column: "Price",
      cells: ["Months!C3", "Months!C4"],
      values: ["1.234,50", "12 %"],
      count: 2,
    });
    const { values, notes } = must(read([5, "1.234,50", "12 %"], ","));
    expect([...values]).toEqual([5, 1234.5, 0.12]);
    expect(notes).toEqual(['Price: 2 texts were read as numbers, such as "1.234,50".']);
  });

  it("faults text that the agreed decimal mark does not read", () => {
    expect(faultOf(read([5, "1.234,50", "1,234"], "."))).toMatchObject({
      code: "text-in-number-column",
      cells: ["Months!C3"],
      count: 1,
    });
  });

  it.each<[string, Cell[], object]>([
    ["only blanks", [null, " "], { code: "empty-column", column: "Price", where: "Months!C2:C3" }],
    ["only marks", [null, "NA"], { code: "no-numbers", column: "Price", where: "Months!C2:C3" }],
    ["only words", ["north", "south"], { code: "no-numbers", column: "Price", where: "Months!C2:C3" }],
    ["a word", [5, "n.k."], { code: "text-in-number-column", cells: ["Months!C3"], values: ["n.k."], count: 1 }],
    ["TRUE among numbers", [5, true], { code: "text-in-number-column", cells: ["Months!C3"], values: ["TRUE"] }],
    ["an error", [{ error: "#DIV/0!" }, 5], { code: "error-cells", cells: ["Months!C2"], values: ["#DIV/0!"] }],
    ["a date", [5, { date: 45_351 }], { code: "dates-in-number-column", cells: ["Months!C3"], values: ["2024-02-29"] }],
    ["dates as text", ["2024-02-29", "2024-03-01"], { code: "dates-as-text", count: 2 }],
    ["slashed dates", [5, "3/4/2024"], { code: "dates-as-text", cells: ["Months!C3"], values: ["3/4/2024"] }],
  ])("faults %s with its cell", (_, cells, fault) => {
    expect(faultOf(read(cells))).toMatchObject(fault);
  });

  it("lists ten cells and counts them all", () => {
    const fault = faultOf(read([1, ...Array.from({ length: 25 }, () => "x")]));
    expect(fault).toMatchObject({ code: "text-in-number-column", count: 25 });
    expect("cells" in fault ? fault.cells : []).toHaveLength(10);
  });

  it("marks exactly the cells with a number as present", () => {
    const cell = fc.oneof(fc.double({ noNaN: true, noDefaultInfinity: true }), fc.constantFrom(null, "NA", "?", ""));
    fc.assert(
      fc.property(fc.array(cell, { minLength: 1 }), (cells) => {
        fc.pre(cells.some((one) => typeof one === "number"));
        const { present, values } = must(read(cells));
        expect([...present]).toEqual(cells.map((one) => (typeof one === "number" ? 1 : 0)));
        expect([...values]).toEqual(cells.map((one) => (typeof one === "number" ? one : 0)));
      }),
      { seed: 14, numRuns: 200 },
    );
  });
});
