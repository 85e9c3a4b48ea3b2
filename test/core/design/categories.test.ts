import { describe, expect, it } from "vitest";
import { buildDesign } from "../../../src/core/design/buildDesign.ts";
import type { Cell } from "../../../src/core/table/cells.ts";
import { driver, modelWith } from "../../support/models.ts";
import { faultOf, must, sourceOf } from "../../support/sheet.ts";

const repairs = [210, 198, 240, 205, 222, 231];
const region: Cell[] = ["South", "North", "East", "North ", "South", "North"];

const built = (cells: readonly Cell[], base: string | null = null, outcome: readonly Cell[] = repairs) =>
  buildDesign(
    sourceOf({ Repairs: outcome, Region: cells }),
    modelWith({ drivers: [driver("Region", { as: "category", base })] }),
  );

describe("category drivers", () => {
  it("compares every level with the most frequent one, and says so", () => {
    const { terms, notes } = must(built(region));
    expect(terms.slice(1).map(({ name, values }) => [name, [...values]])).toEqual([
      ["Region: East", [0, 0, 1, 0, 0, 0]],
      ["Region: South", [1, 0, 0, 0, 1, 0]],
    ]);
    expect(terms[1]!.meaning).toEqual({ kind: "level", column: "Region", level: "East", base: "North" });
    expect(notes).toEqual(["Region: the other categories are compared with North."]);
  });

  it("takes the base that is asked for, free of case", () => {
    const { terms } = must(built(region, "south"));
    expect(terms.slice(1).map(({ name }) => name)).toEqual(["Region: East", "Region: North"]);
  });

  it("takes the first of equally frequent levels, whatever the order of rows", () => {
    const base = (cells: readonly Cell[]) => must(built(cells)).terms[1]!.meaning;
    expect(base(["b", "a", "b", "a", "c", "c"])).toMatchObject({ base: "a" });
    expect(base(["c", "c", "a", "b", "a", "b"])).toMatchObject({ base: "a" });
  });

  it("knows the levels of the rows used only", () => {
    const outcome = [210, 198, null, 205, 222, 231];
    expect(must(built(region, null, outcome)).terms.map(({ name }) => name)).toEqual(["constant", "Region: South"]);
    expect(faultOf(built(region, "East", outcome))).toEqual({
      code: "unknown-base",
      column: "Region",
      base: "East",
      nearest: null,
    });
  });

  it("offers the nearest level for an unknown base", () => {
    expect(faultOf(built(region, "Nrth"))).toMatchObject({ code: "unknown-base", nearest: "North" });
  });

  it("reads numbers and booleans as categories", () => {
    expect(must(built([1, 2, 2, 1, 1, 2], "1")).terms[1]!.name).toBe("Region: 2");
    expect(must(built([true, false, true, true, false, true])).terms[1]!.name).toBe("Region: FALSE");
  });

  it("faults one category, too many of them, and error cells", () => {
    expect(faultOf(built(["N", "N", "N", "N", "N", null]))).toEqual({
      code: "one-category",
      column: "Region",
      value: "N",
    });
    const many = Array.from({ length: 90 }, (_, i) => `customer ${i % 60}`);
    expect(
      faultOf(
        built(
          many,
          null,
          many.map((_, i) => i),
        ),
      ),
    ).toEqual({
      code: "too-many-categories",
      column: "Region",
      categories: 60,
      rows: 90,
    });
    expect(faultOf(built(["N", "S", { error: "#REF!" }, "S", "N", "S"]))).toMatchObject({
      code: "error-cells",
      cells: ["Months!B4"],
    });
  });

  it("notes levels that differ in capitals alone", () => {
    expect(must(built(["north", "North", "South", "South", "North", "South"])).notes).toContain(
      'Region: "north" and "North" count as different categories.',
    );
  });
});
