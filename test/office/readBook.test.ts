import { afterAll, beforeAll, describe, expect, it } from "vitest";
import type { Book, BookSheet } from "../../src/core/review/book.ts";
import { cellKind } from "../../src/core/table/cells.ts";
import type { BookCell, BookData } from "../../src/desk/book/bookData.ts";
import { bookOf, sheetOf } from "../support/deskBook.ts";
import { type DeskHost, errand, openDeskHost } from "../support/deskHost.ts";

const shown = (value: number, numberFormat: string): BookCell => ({ value, style: { numberFormat } });

const sales = sheetOf(
  "Sales",
  [
    [null, "Week", "Cups", "Rain", "Doubled"],
    [null, shown(45292, "yyyy-mm-dd"), 12.5, 3, { value: 6, formula: "=2*D2" }],
    [null, shown(45299, "yyyy-mm-dd"), 11, "n/a", { value: 8, formula: "=2*D3" }],
    [null, shown(45306, "yyyy-mm-dd"), 9.25, 5, 10],
    [null, "'=A1", 8, 7, { value: 14, formula: "=2*D5" }],
    [null, "Total", { value: 40.75, formula: "=SUM(C2:C5)" }],
  ],
  { hiddenRows: [3], hiddenColumns: [3], tables: [{ name: "Weekly", address: "B1:E5" }] },
);

const results = sheetOf("Results", [
  [
    {
      value: -1.25,
      formula: "=LINEST(Sales!C2:C5,Sales!E2:E5,TRUE,TRUE)",
      spill: "A1:B5",
      style: { numberFormat: "0.00" },
    },
    20.5,
  ],
  [0.1, 0.2],
  [0.9, 0.3],
  [18, 2],
  [7, 0.5],
  [{ value: 0.05, formula: "=INDEX(Fit,1,2)" }],
  ["=SLOPE(C2:C5,D2:D5)"],
  [{ value: { error: "#N/A" }, formula: "=SLOPE(Sales!C2:C5,Sales!D2:D5)" }],
]);

const book: BookData = {
  ...bookOf(sales, sheetOf("Empty", []), results, sheetOf("Attic", [[1]], { hidden: true })),
  names: [
    { name: "Fit", refersTo: "LINEST(Sales!$C$2:$C$5,Sales!$E$2:$E$5)" },
    { name: "Cups", refersTo: "Sales!$C$2:$C$5" },
  ],
  manualCalculation: true,
};

describe("a workbook as a review reads it", () => {
  let at: DeskHost;
  let read: Book;
  beforeAll(async () => {
    at = await openDeskHost(book);
    const result = await at.host.readBook(errand());
    if (!result.ok) throw new Error(result.problem.code);
    read = result.value;
  });
  afterAll(() => at.desk.close());

  const sheet = (name: string): BookSheet => read.sheets.find((one) => one.sheet === name)!;

  it("has every sheet in use, hidden ones too, with names, tables and how it is calculated", () => {
    expect(read.sheets.map(({ sheet, visible }) => [sheet, visible])).toEqual([
      ["Sales", true],
      ["Results", true],
      ["Attic", false],
    ]);
    expect(read.names).toEqual([
      { name: "Fit", refersTo: "LINEST(Sales!$C$2:$C$5,Sales!$E$2:$E$5)", sheet: null },
      { name: "Cups", refersTo: "Sales!$C$2:$C$5", sheet: null },
    ]);
    expect(read.calculation).toBe("manual");
    expect(sheet("Sales").tables).toEqual([
      {
        name: "Weekly",
        area: { sheet: "Sales", row: 0, column: 1, rows: 5, columns: 4 },
        headings: true,
        totals: false,
      },
    ]);
  });

  it("keeps the cells, what is hidden, and where formulas stand", () => {
    const { firstColumn, rowCount, columns, hiddenRows, hiddenColumns, calculated } = sheet("Sales");
    expect([firstColumn, rowCount, columns.length]).toEqual([1, 6, 4]);
    expect([...columns[0]!.kinds]).toEqual([
      cellKind.text,
      cellKind.date,
      cellKind.date,
      cellKind.date,
      cellKind.text,
      cellKind.text,
    ]);
    expect([hiddenRows, hiddenColumns]).toEqual([[3], [3]]);
    expect(calculated.map((rows) => rows && [...rows])).toEqual([null, [0, 0, 0, 0, 0, 1], null, [0, 1, 1, 0, 1, 0]]);
  });

  it("keeps the formulas that bear on a regression, and how far they reach", () => {
    expect(sheet("Sales").formulas.map(({ formula }) => formula)).toEqual(["=SUM(C2:C5)"]);
    expect(sheet("Results").formulas.map(({ row, formula, rows, columns }) => [row, formula, rows, columns])).toEqual([
      [0, "=LINEST(Sales!C2:C5,Sales!E2:E5,TRUE,TRUE)", 5, 2],
      [5, "=INDEX(Fit,1,2)", 1, 1],
      [7, "=SLOPE(Sales!C2:C5,Sales!D2:D5)", 1, 1],
    ]);
    const [window] = sheet("Results").formats;
    expect(window!.formats[window!.indices[0]!]).toBe("0.00");
    expect(window!.formats[window!.indices[1]!]).toBe("General");
  });

  it("leaves away the sheets that Footing wrote", async () => {
    const marked = { ...results, customProperties: { Footing: "result sheet" } };
    const { desk, host } = await openDeskHost(bookOf(sales, marked));
    const result = await host.readBook(errand());
    expect(result.ok && result.value.sheets.map(({ sheet }) => sheet)).toEqual(["Sales"]);
    desk.close();
  });
});

describe("a large workbook", () => {
  it("is read in chunks, with formats at both ends alone, and can be stopped", async () => {
    const rows = Array.from({ length: 45_000 }, (_, row): BookCell[] => [
      shown(40_000 + row, "yyyy-mm-dd"),
      row / 8,
      -row,
    ]);
    const { desk, host } = await openDeskHost(bookOf(sheetOf("Data", rows)), { profile: "web" });
    const shares: number[] = [];
    const result = await host.readBook(errand(undefined, (share) => void shares.push(share!)));
    if (!result.ok) throw new Error(result.problem.code);
    const [data] = result.value.sheets;
    expect(data!.formats.map(({ firstRow, rowCount }) => [firstRow, rowCount])).toEqual([
      [0, 500],
      [44_500, 500],
    ]);
    for (const row of [0, 499, 500, 30_000, 44_999]) {
      expect(data!.columns[0]!.kinds[row]).toBe(cellKind.date);
      expect(data!.columns[1]!.numbers[row]).toBe(row / 8);
    }
    expect(shares.length).toBeGreaterThan(3);
    expect(shares.at(-1)).toBe(1);
    const controller = new AbortController();
    const stopped = await host.readBook(errand(controller.signal, (share) => share! > 0 && controller.abort()));
    expect(stopped).toEqual({ ok: false, problem: { code: "cancelled" } });
    desk.close();
  });
});
