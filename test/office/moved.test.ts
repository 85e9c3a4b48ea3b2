import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { mostColumns, mostRows } from "../../src/core/table/address.ts";
import { type Rectangle } from "../../src/office/areas.ts";
import { changedArea, moved } from "../../src/office/moved.ts";

const area: Rectangle = { row: 4, column: 1, rows: 10, columns: 3 };
const wholeRows = (row: number, rows: number): Rectangle => ({ row, column: 0, rows, columns: mostColumns });
const wholeColumns = (column: number, columns: number): Rectangle => ({ row: 0, column, rows: mostRows, columns });

describe("the cells an event speaks of", () => {
  it("are cells, whole columns or whole rows", () => {
    expect(changedArea("B2:C4")).toMatchObject({ row: 1, column: 1, rows: 3, columns: 2 });
    expect(changedArea("B:C")).toMatchObject(wholeColumns(1, 2));
    expect(changedArea("5:7")).toEqual(wholeRows(4, 3));
    expect(changedArea("B2,D4")).toEqual(wholeRows(0, mostRows));
  });
});

describe("an area under changes of its sheet", () => {
  it("is touched by edits that meet it and by no others", () => {
    const edit = (row: number, column: number) =>
      moved(area, { kind: "RangeEdited", area: { row, column, rows: 1, columns: 1 } });
    expect(edit(4, 1)).toEqual({ area, touched: true });
    expect(edit(13, 3).touched).toBe(true);
    expect(edit(14, 3).touched).toBe(false);
    expect(edit(3, 1).touched).toBe(false);
    expect(edit(5, 4).touched).toBe(false);
  });

  it("moves with rows and columns before it, untouched", () => {
    expect(moved(area, { kind: "RowInserted", area: wholeRows(4, 2) })).toEqual({
      area: { ...area, row: 6 },
      touched: false,
    });
    expect(moved(area, { kind: "ColumnDeleted", area: wholeColumns(0, 1) })).toEqual({
      area: { ...area, column: 0 },
      touched: false,
    });
    expect(moved(area, { kind: "RowInserted", area: wholeRows(14, 5) })).toEqual({ area, touched: false });
  });

  it("grows and shrinks with rows and columns inside it, touched", () => {
    expect(moved(area, { kind: "RowInserted", area: wholeRows(8, 2) })).toEqual({
      area: { ...area, rows: 12 },
      touched: true,
    });
    expect(moved(area, { kind: "RowDeleted", area: wholeRows(2, 4) })).toEqual({
      area: { ...area, row: 2, rows: 8 },
      touched: true,
    });
    expect(moved(area, { kind: "ColumnInserted", area: wholeColumns(2, 1) })).toEqual({
      area: { ...area, columns: 4 },
      touched: true,
    });
    expect(moved(area, { kind: "RowDeleted", area: wholeRows(0, 30) })).toEqual({ area: null, touched: true });
  });

  it("agrees with moving the cells one by one", () => {
    const spot = fc.integer({ min: 0, max: 30 });
    const count = fc.integer({ min: 1, max: 12 });
    fc.assert(
      fc.property(spot, count, fc.constantFrom("RowInserted", "RowDeleted"), (at, rows, kind) => {
        const before = Array.from({ length: 60 }, (_, row) => row);
        const after = [...before];
        if (kind === "RowInserted") after.splice(at, 0, ...Array.from({ length: rows }, () => -1));
        else after.splice(at, rows);
        const mine = (row: number) => row >= area.row && row < area.row + area.rows;
        const places = after.flatMap((row, index) => (mine(row) ? [index] : []));
        const { area: now } = moved(area, { kind, area: wholeRows(at, rows) });
        const ends = now === null ? [] : [now.row, now.row + now.rows - 1];
        expect(ends).toEqual(places.length === 0 ? [] : [places[0], places.at(-1)]);
      }),
      { seed: 20261202, numRuns: 500 },
    );
  });
});
