import { describe, expect, it } from "vitest";
import { buildDesign } from "../../../src/core/design/buildDesign.ts";
import { withoutHidden } from "../../../src/core/table/hiddenRows.ts";
import { readBlock } from "../../../src/core/table/locate.ts";
import { driver, modelWith } from "../../support/models.ts";
import { blockOf, faultOf, must } from "../../support/sheet.ts";

const rows = [
  ["Repairs", "Price"],
  [210, 31],
  [198, 33],
  [240, 29],
  [205, 32],
  [222, 30.5],
  [231, 28],
];
/** Sheet rows from 0: the block begins in row 10, so that its second row of data is row 12. */
const block = (hiddenRows: readonly number[], cells: typeof rows = rows) =>
  blockOf(cells, { firstRow: 10, hiddenRows });
const sourceWith = (hiddenRows: readonly number[], cells?: typeof rows) =>
  must(readBlock(block(hiddenRows, cells))).source;

describe("rows that the sheet does not show", () => {
  it("are counted among the data, those above and below them not", () => {
    expect(sourceWith([10, 12, 15, 40]).hidden).toEqual({ rows: [1, 4], leftOut: false });
    expect(sourceWith([10, 40]).hidden).toBeUndefined();
  });

  it("are used by default, and the answer says so", () => {
    const design = must(buildDesign(sourceWith([12, 15]), modelWith()));
    expect([...design.sourceRows]).toEqual([0, 1, 2, 3, 4, 5]);
    expect(design.notes).toEqual(["2 rows of the data are hidden or filtered away, but counted like the others."]);
  });

  it("are left out where that was chosen, with the reason", () => {
    const design = must(buildDesign(withoutHidden(sourceWith([12, 15])), modelWith()));
    expect([...design.sourceRows]).toEqual([0, 2, 3, 5]);
    expect(design.leftOut).toEqual([
      { row: 13, cell: "Months!A13", because: "the row is hidden" },
      { row: 16, cell: "Months!A16", because: "the row is hidden" },
    ]);
    expect(design.notes).toEqual([
      "2 rows of the data are hidden or filtered away, and left out as if they were not there.",
    ]);
  });

  it("cannot stop the answer once they are left out", () => {
    const broken = rows.map((cells, row) => (row === 2 ? ["about 200", 33] : cells)) as typeof rows;
    expect(faultOf(buildDesign(sourceWith([12], broken), modelWith())).code).toBe("text-in-number-column");
    expect(must(buildDesign(withoutHidden(sourceWith([12], broken)), modelWith())).rowCount).toBe(5);
  });

  it("give no earlier value to a lag", () => {
    const lagged = modelWith({
      drivers: [{ ...driver("Price"), transform: { kind: "lag", periods: 1 } }],
      rows: { kind: "time", order: null },
    });
    expect(must(buildDesign(sourceWith([12]), lagged)).rowCount).toBe(5);
    const design = must(buildDesign(withoutHidden(sourceWith([12])), lagged));
    expect([...design.sourceRows]).toEqual([3, 4, 5]);
  });

  it("leave the cells of the source untouched", () => {
    const source = sourceWith([12]);
    withoutHidden(source);
    expect([...source.columns[0]!.cells.numbers]).toEqual([210, 198, 240, 205, 222, 231]);
  });
});
