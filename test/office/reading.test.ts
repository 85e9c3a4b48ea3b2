import { afterAll, beforeAll, describe, expect, it } from "vitest";
import type { PlacedBlock, WhereToRead } from "../../src/app/host.ts";
import type { Cell } from "../../src/core/table/cells.ts";
import type { BookCell, BookData, SheetData } from "../../src/desk/book/bookData.ts";
import { bookOf, sheetOf } from "../support/deskBook.ts";
import { type DeskHost, errand, openDeskHost } from "../support/deskHost.ts";
import { toCellColumn } from "../support/cellColumns.ts";

const month = (serial: number): BookCell => ({ value: serial, style: { numberFormat: "mmm yyyy" } });

const chart: SheetData["charts"][number] = {
  name: "Chart 1",
  title: "Repairs",
  kind: "scatter",
  place: { row: 12, column: 0, rows: 10, columns: 4 },
  xTitle: "Price",
  yTitle: "Repairs",
  series: [{ name: "Repairs", x: "Months!$C$4:$C$9", y: "Months!$B$4:$B$9", line: false, markers: true }],
};

/** A title, an empty row, headings, six months; a table beside; a lonely cell far away. */
const months = sheetOf(
  "Months",
  [
    ["Repairs in 2024"],
    [],
    ["Month", "Repairs", "Price", "Note"],
    [month(45292), 120.5, 10, "as usual"],
    [month(45323), null, 11, "="],
    [month(45352), 0, "n/a", null],
    [month(45383), 118, { error: "#N/A" }, "12"],
    [month(45413), true, 12, "#REF!"],
    [month(45444), 131, 12.75, "last"],
  ],
  { charts: [chart] },
);

const tables = sheetOf(
  "It's data",
  [
    [null, "Lot", "Cost"],
    [null, 1, 20.5],
    [null, 2, 30.25],
    [null, 3, 40.125],
  ],
  { tables: [{ name: "Parts", address: "B1:C4" }] },
);

const book: BookData = {
  ...bookOf(months, tables, sheetOf("Empty", []), sheetOf("Secret", [[1]], { hidden: true })),
  names: [
    { name: "Prices", refersTo: "Months!$C$3:$C$9" },
    { name: "Rate", refersTo: "=0.07" },
  ],
};

describe("reading a workbook", () => {
  let at: DeskHost;
  beforeAll(async () => {
    at = await openDeskHost(book);
  });
  afterAll(() => at.desk.close());

  const read = (where: WhereToRead) => at.host.read(where, errand());
  const readOk = async (where: WhereToRead): Promise<PlacedBlock> => {
    const result = await read(where);
    if (!result.ok) throw new Error(JSON.stringify(result.problem));
    return result.value;
  };
  const address = (text: string): WhereToRead => ({ kind: "address", address: text });
  const problem = async (where: WhereToRead) => {
    const result = await read(where);
    return result.ok ? null : result.problem;
  };

  it("tells every kind of cell apart", async () => {
    const block = await readOk(address("Months!A4:D9"));
    const columns: readonly Cell[][] = [
      [45292, 45323, 45352, 45383, 45413, 45444].map((date) => ({ date })),
      [120.5, null, 0, 118, true, 131],
      [10, 11, "n/a", { error: "#N/A" }, 12, 12.75],
      ["as usual", "=", null, "12", "#REF!", "last"],
    ];
    expect(block.columns).toEqual(columns.map(toCellColumn));
    expect(block).toMatchObject({
      sheet: "Months",
      firstRow: 3,
      firstColumn: 0,
      rowCount: 6,
      address: "Months!A4:D9",
      table: null,
      hiddenRows: [],
    });
  });

  it("takes a title for its sheet: one column has nothing to explain it by", async () => {
    at.desk.select("Months!A1");
    expect((await readOk({ kind: "selection" })).address).toBe("Months!A1:D9");
  });

  it("widens one selected cell to the data around it, and no further", async () => {
    at.desk.select("Months!B5");
    expect((await readOk({ kind: "selection" })).address).toBe("Months!A3:D9");
    at.desk.select("Months!B4:C6");
    expect((await readOk({ kind: "selection" })).address).toBe("Months!B4:C6");
  });

  it("widens one typed cell in the same way", async () => {
    expect((await readOk(address("Months!B5"))).address).toBe("Months!A3:D9");
    expect((await readOk(address("Months!A1"))).address).toBe("Months!A1:D9");
  });

  it("stops whole columns at the last cell in use", async () => {
    at.desk.select("Months!A:D");
    expect(await readOk({ kind: "selection" })).toMatchObject({ address: "Months!A1:D9", rowCount: 9 });
    expect((await readOk(address("Months!B:C"))).address).toBe("Months!B1:C9");
  });

  it("knows a table, whichever part of it is meant", async () => {
    const whole = { address: "'It''s data'!B1:C4", table: "Parts", firstColumn: 1 };
    at.desk.select("'It''s data'!C3");
    expect(await readOk({ kind: "selection" })).toMatchObject(whole);
    expect(await readOk(address("'It''s data'!B2:C4"))).toMatchObject(whole);
    expect(await readOk(address("'It''s data'!B:C"))).toMatchObject(whole);
    expect(await readOk(address("parts"))).toMatchObject(whole);
    expect(await readOk(address("'It''s data'!B1:B4"))).toMatchObject({ table: null });
  });

  it("reads names, and addresses without a sheet on the sheet in front", async () => {
    expect((await readOk(address("prices"))).address).toBe("Months!C3:C9");
    at.desk.select("'It''s data'!A1");
    expect((await readOk(address("B1:C2"))).address).toBe("'It''s data'!B1:C2");
  });

  it("lists places that hold data, hidden sheets and constants left out", async () => {
    expect(await at.host.listPlaces()).toEqual({
      ok: true,
      value: [
        { kind: "table", name: "Parts", address: "'It''s data'!B1:C4" },
        { kind: "name", name: "Prices", address: "Months!C3:C9" },
        { kind: "sheet", name: "Months", address: "Months!A1:D9" },
        { kind: "sheet", name: "It's data", address: "'It''s data'!B1:C4" },
      ],
    });
    const place = { kind: "sheet", name: "Months", address: "out of date" } as const;
    expect((await readOk({ kind: "place", place })).address).toBe("Months!A1:D9");
  });

  it("says what is wrong with a place", async () => {
    expect(await problem(address("Month!A1:B2"))).toEqual({ code: "unknown-place", place: "Month", nearest: "Months" });
    expect(await problem(address("Partz"))).toEqual({ code: "unknown-place", place: "Partz", nearest: "Parts" });
    expect(await problem(address("A1:"))).toEqual({ code: "bad-address", address: "A1:" });
    expect(await problem(address("Empty!A1:C9"))).toEqual({ code: "no-data", where: "Empty!A1:C9" });
    expect(await problem({ kind: "place", place: { kind: "table", name: "Gone", address: "X!A1" } })).toMatchObject({
      code: "unknown-place",
      place: "Gone",
    });
  });

  it("says what is selected instead of cells", async () => {
    at.desk.select("Months!A3:B9", "Months!D3:D9");
    expect(await problem({ kind: "selection" })).toEqual({ code: "several-areas-selected", areas: 2 });
    at.desk.select("Months!A3:B9");
    at.desk.switches.chartSelected = true;
    expect(await problem({ kind: "selection" })).toEqual({ code: "chart-selected" });
    at.desk.switches.chartSelected = false;
    at.desk.switches.otherWorkbook = true;
    expect(await problem({ kind: "selection" })).toEqual({ code: "other-workbook" });
    at.desk.switches.otherWorkbook = false;
  });

  it("does not go on after its errand is over", async () => {
    const result = await at.host.read(address("Months!A1:D9"), errand(AbortSignal.abort()));
    expect(result).toEqual({ ok: false, problem: { code: "cancelled" } });
  });
});

describe("reading rows that are hidden", () => {
  it("reads them all and says which are hidden", async () => {
    const rows = Array.from({ length: 10 }, (_, row): BookCell[] => [row === 0 ? "x" : row * 1.5]);
    const { desk, host } = await openDeskHost(bookOf(sheetOf("Rows", rows, { hiddenRows: [2, 3, 7] })));
    const result = await host.read({ kind: "address", address: "Rows!A1:A10" }, errand());
    expect(result).toMatchObject({ ok: true, value: { rowCount: 10, hiddenRows: [2, 3, 7] } });
    const part = await host.read({ kind: "address", address: "Rows!A3:A4" }, errand());
    expect(part).toMatchObject({ ok: true, value: { rowCount: 2, hiddenRows: [2, 3] } });
    desk.close();
  });
});
