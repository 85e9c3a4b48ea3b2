import { describe, expect, it } from "vitest";
import { breakPlacesOf } from "../../src/app/breakPlace.ts";
import { takeInHand } from "../../src/app/dataInHand.ts";
import { proposeSetup } from "../../src/app/proposal.ts";
import { changeColumn } from "../../src/app/setup.ts";
import { repairMonths } from "../support/repairs.ts";
import { must } from "../support/sheet.ts";
import { toCellColumn } from "../support/cellColumns.ts";

const rows = repairMonths(24);
rows[6]![3] = null;

const dataOf = async (cells: typeof rows) =>
  must(
    await takeInHand({
      sheet: "Months",
      firstRow: 2,
      firstColumn: 0,
      rowCount: cells.length,
      columns: cells[0]!.map((_, column) => toCellColumn(cells.map((row) => row[column]!))),
      address: "Months!A3:E27",
      table: null,
    }),
  );

const data = await dataOf(rows);
const setup = proposeSetup(data.columns);

describe("where a break may stand", () => {
  it("counts the rows that are used before a row of the sheet, and the other way round", () => {
    const places = breakPlacesOf(data.source, setup)!;
    expect(places.count).toBe(23);
    // Headings stand in row 3, the month left out in row 9.
    expect([places.before(4), places.before(8), places.before(10)]).toEqual([0, 4, 5]);
    expect([places.before(9), places.before(99)]).toEqual([null, null]);
    expect([places.after(0), places.after(5), places.after(23)]).toEqual([4, 10, null]);
  });

  it("goes by time where the rows stand in another order", async () => {
    const [headings, ...body] = rows;
    const turned = await dataOf([headings!, ...body.toReversed()]);
    const places = breakPlacesOf(turned.source, proposeSetup(turned.columns))!;
    expect([places.before(27), places.after(0)]).toEqual([0, 27]);
  });

  it("is not told of rows that are not in time, nor where the set-up has a fault", () => {
    expect(breakPlacesOf(data.source, { ...setup, rows: "cases" })).toBeNull();
    const fault = changeColumn(setup, "Price index", { also: { kind: "none" }, as: "category" });
    expect(breakPlacesOf(data.source, { ...fault, columns: [] })).toBeNull();
  });
});
