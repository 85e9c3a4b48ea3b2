import { describe, expect, it } from "vitest";
import type { PlacedBlock } from "../../src/app/host.ts";
import { columnsOfTable, readPlaced } from "../../src/app/tableInHand.ts";
import type { Cell } from "../../src/core/table/cells.ts";
import { toCellColumn } from "../support/cellColumns.ts";

/** A block of three columns, its headings in row 5 of the sheet and column C the first. */
const blockOf = (rows: readonly (readonly Cell[])[], table: string | null = "Sales"): PlacedBlock => ({
  sheet: "Data",
  firstRow: 4,
  firstColumn: 2,
  rowCount: rows.length,
  columns: [0, 1, 2].map((column) => toCellColumn(rows.map((row) => row[column] ?? null))),
  address: "Data!C5",
  table,
});

const headings = ["Month\nby name", "Price [net]", "Driver's #1"];
const body: Cell[][] = Array.from({ length: 6 }, (_, row) => [100 + row, row * row, 7 - row]);

const tableIn = (rows: readonly (readonly Cell[])[], table?: string | null) => {
  const found = readPlaced(blockOf(rows, table));
  return found.ok ? found.value.table : found.problem;
};

describe("a table in hand", () => {
  it("keeps its headings as they stand in the cells", () => {
    expect(tableIn([headings, ...body])).toEqual({ name: "Sales", firstColumn: 2, headings });
    expect(tableIn([headings, ...body, [], []])).toMatchObject({ name: "Sales" });
  });

  it("is none where the block is none, or where its last rows were not read", () => {
    expect(tableIn([headings, ...body], null)).toBeNull();
    expect(tableIn([headings, ...body, ["Total", 55, 27]])).toBeNull();
  });

  it("is spoken of column by column, signs that mean something else escaped", () => {
    const table = { name: "Sales", firstColumn: 2, headings };
    expect(columnsOfTable(table, 2, 2)).toBe("Sales[[#Headers],[#Data],[Month\nby name]]");
    expect(columnsOfTable(table, 3, 4)).toBe("Sales[[#Headers],[#Data],[Price '[net']]:[Driver''s '#1]]");
  });
});
