import { describe, expect, it } from "vitest";
import { buildDesign } from "../../../src/core/design/buildDesign.ts";
import type { Design, RowOrder } from "../../../src/core/design/design.ts";
import type { RowsAre } from "../../../src/core/design/model.ts";
import type { Cell } from "../../../src/core/table/cells.ts";
import { modelWith } from "../../support/models.ts";
import { faultOf, must, sourceOf } from "../../support/sheet.ts";

const grouped = (parts: Partial<Extract<RowsAre, { kind: "groups" }>> = {}) =>
  modelWith({ rows: { kind: "groups", by: "Shop", second: null, order: null, ...parts } });
const groupsOf = ({ order }: Design): Extract<RowOrder, { kind: "groups" }> => {
  if (order.kind !== "groups") throw new Error(order.kind);
  return order;
};

const columns: Record<string, Cell[]> = {
  Shop: ["South", "North", "South", "North", "East", "South"],
  Year: [2021, 2020, 2019, 2019, 2020, 2020],
  Repairs: [1, 2, 3, 4, 5, 7],
  Price: [10, 12, 15, 12, 18, 9],
};

describe("a design of rows in groups", () => {
  it("brings the rows of a group together, groups by name, rows as they stand", () => {
    const design = must(buildDesign(sourceOf(columns), grouped()));
    expect([...design.sourceRows]).toEqual([4, 1, 3, 0, 2, 5]);
    expect(groupsOf(design)).toEqual({
      kind: "groups",
      by: "Shop",
      groups: Int32Array.from([0, 1, 1, 2, 2, 2]),
      labels: ["East", "North", "South"],
      second: null,
      positions: null,
    });
  });

  it("orders the rows of each group by time and keeps their places", () => {
    const source = sourceOf({ ...columns, Repairs: [1, 2, 3, 4, 5, null] });
    const design = must(buildDesign(source, grouped({ order: "Year" })));
    expect([...design.sourceRows]).toEqual([4, 3, 1, 2, 0]);
    expect([...groupsOf(design).positions!]).toEqual([1, 0, 1, 0, 2]);
  });

  it("allows the same time in several groups, but not twice in one", () => {
    const twice = sourceOf({ ...columns, Year: [2021, 2020, 2021, 2019, 2020, 2020] });
    expect(faultOf(buildDesign(twice, grouped({ order: "Year" })))).toMatchObject({
      code: "repeated-time",
      cells: ["Months!B2", "Months!B4"],
      count: 2,
    });
  });

  it("leaves out rows without a group and numbers the groups that are left", () => {
    const source = sourceOf({
      ...columns,
      Shop: ["South", "North", null, "North", "East", "NA"],
      Price: [10, 12, 15, 12, null, 9],
    });
    const design = must(buildDesign(source, grouped()));
    expect(groupsOf(design).labels).toEqual(["North", "South"]);
    expect([...groupsOf(design).groups]).toEqual([0, 0, 1]);
    expect(design.leftOut).toEqual([
      { row: 4, cell: "Months!A4", because: '"Shop" is blank' },
      { row: 6, cell: "Months!D6", because: '"Price" is blank' },
      { row: 7, cell: "Months!A7", because: '"Shop" holds "NA"' },
    ]);
  });

  it("groups in two ways", () => {
    const design = must(buildDesign(sourceOf(columns), grouped({ second: "Year" })));
    const { second } = groupsOf(design);
    expect(second!.labels).toEqual(["2019", "2020", "2021"]);
    expect([...second!.groups]).toEqual([1, 1, 0, 2, 0, 1]);
  });

  it("faults one group only, in the column or among the rows used", () => {
    const same = sourceOf({ ...columns, Shop: ["South", "South", "South", "South", "South", "South"] });
    expect(faultOf(buildDesign(same, grouped()))).toEqual({ code: "one-group", column: "Shop", value: "South" });
    const left = sourceOf({ ...columns, Price: [10, null, 15, null, null, 9] });
    expect(faultOf(buildDesign(left, grouped()))).toEqual({ code: "one-group", column: "Shop", value: "South" });
    const years = sourceOf({ ...columns, Year: [2020, 2020, 2019, 2020, 2020, 2020], Price: [1, 2, null, 4, 5, 6] });
    expect(faultOf(buildDesign(years, grouped({ second: "Year" })))).toEqual({
      code: "one-group",
      column: "Year",
      value: "2020",
    });
  });
});
