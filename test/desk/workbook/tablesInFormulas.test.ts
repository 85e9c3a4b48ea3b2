import { afterEach, describe, expect, it } from "vitest";
import type { BookData } from "../../../src/desk/book/bookData.ts";
import { openDesk, type NodeDesk } from "../../../src/desk/client/openDesk.ts";
import { openXlsx } from "../../../src/desk/files/openXlsx.ts";
import { saveXlsx } from "../../../src/desk/files/saveXlsx.ts";
import { bookOf, sheetOf } from "../../support/deskBook.ts";

const awkward = "Driver's [x] #1, @home";
const inBrackets = "[Driver''s '[x'] '#1, '@home]";
const formulas = [
  "=SUM(Sales[Price])",
  `=SUM(Sales[[#Headers],[#Data],[Price]:${inBrackets}])`,
  "=SUM(Sales)",
  '=COUNTA(Sales[[#All],[Price]])&" Sales[Price]"',
  "=SUM(ENTIRELY.GONE[x])",
];

const book = (): BookData =>
  bookOf(
    sheetOf("My data", [["A note above"], [null, "Price", awkward], [null, 1, 10], [null, 2, 20]], {
      tables: [{ name: "Sales", address: "B2:C4" }],
    }),
    sheetOf("Work", []),
  );

let desk: NodeDesk | null = null;
afterEach(() => desk?.close());

async function open(data: BookData): Promise<NodeDesk> {
  desk = await openDesk({ book: data });
  await desk.Office.onReady();
  return desk;
}

async function enter(sheet: NodeDesk): Promise<void> {
  for (const [row, formula] of formulas.entries()) sheet.edit(`Work!A${row + 1}`, formula);
  await sheet.settle();
}

const results = (sheet: NodeDesk) => sheet.values("Work!A1:A4").map(([value]) => value);

describe("formulas that speak of a table", () => {
  it("compute over its cells and keep their words", async () => {
    const sheet = await open(book());
    await enter(sheet);
    expect(results(sheet)).toEqual([3, 33, 33, "3 Sales[Price]"]);
    expect(formulas.map((_, row) => sheet.formula(`Work!A${row + 1}`))).toEqual(formulas);
    const read = await sheet.Excel.run(async (context) => {
      const range = context.workbook.worksheets.getItem("Work").getRange("A1:A5").load("formulas");
      await context.sync();
      return range.formulas.flat() as unknown[];
    });
    expect(read).toEqual(formulas);
    expect(sheet.error("Work!A5")).not.toBeNull();
  });

  it("follow it when a row is entered below, and when cells of that row change later", async () => {
    const sheet = await open(book());
    await enter(sheet);
    sheet.edit("'My data'!B5", 4);
    await sheet.settle();
    expect(results(sheet)).toEqual([7, 37, 37, "4 Sales[Price]"]);
    sheet.edit("'My data'!C5", 40);
    await sheet.settle();
    expect(results(sheet)).toEqual([7, 77, 77, "4 Sales[Price]"]);
    sheet.edit("'My data'!B5", 5);
    await sheet.settle();
    expect(results(sheet)).toEqual([8, 78, 78, "4 Sales[Price]"]);
    expect(sheet.snapshot().sheets[0]?.tables).toEqual([{ name: "Sales", address: "B2:C5" }]);
  });

  it("leave alone what stands apart from it, beside it or further below", async () => {
    const sheet = await open(book());
    await enter(sheet);
    for (const cell of ["B7", "A5", "D5", "D3"]) sheet.edit(`'My data'!${cell}`, 9);
    await sheet.settle();
    expect(results(sheet)).toEqual([3, 33, 33, "3 Sales[Price]"]);
  });

  it("follow it when rows come above it or within it, and its sheet takes another name", async () => {
    const sheet = await open(book());
    await enter(sheet);
    const data = sheet.book.grid.api.getActiveWorkbook()?.getActiveSheet();
    data?.insertRows(0, 1);
    data?.insertRows(4, 1);
    await sheet.Excel.run(async (context) => {
      context.workbook.worksheets.getItem("My data").name = "Moved, and renamed";
      await context.sync();
    });
    await sheet.settle();
    sheet.edit("'Moved, and renamed'!B5", 100);
    await sheet.settle();
    expect(results(sheet)).toEqual([103, 133, 133, "4 Sales[Price]"]);
    expect(formulas.map((_, row) => sheet.formula(`Work!A${row + 1}`))).toEqual(formulas);
  });

  it("speak of a column by its new heading, and of the table by its new name", async () => {
    const sheet = await open(book());
    await enter(sheet);
    sheet.edit("'My data'!B2", "Price [net], #2");
    await sheet.settle();
    await sheet.Excel.run(async (context) => {
      context.workbook.tables.getItem("Sales").name = "Turnover";
      await context.sync();
    });
    sheet.edit("'My data'!B3", 101);
    await sheet.settle();
    expect(results(sheet)).toEqual([103, 133, 133, "3 Sales[Price]"]);
    expect(formulas.slice(0, 4).map((_, row) => sheet.formula(`Work!A${row + 1}`))).toEqual([
      "=SUM(Turnover[Price '[net'], '#2])",
      `=SUM(Turnover[[#Headers],[#Data],[Price '[net'], '#2]:${inBrackets}])`,
      "=SUM(Turnover)",
      "=COUNTA(Turnover[[#All],[Price '[net'], '#2]])&\" Sales[Price]\"",
    ]);
  });

  it("stand in a saved workbook as they were written, and compute when it is opened again", async () => {
    const sheet = await open(book());
    await enter(sheet);
    const reading = await openXlsx(await saveXlsx(sheet.snapshot()));
    sheet.close();
    if (!reading.ok) throw new Error(reading.because);
    const again = await open(reading.value);
    expect(formulas.map((_, row) => again.formula(`Work!A${row + 1}`))).toEqual(formulas);
    expect(results(again)).toEqual([3, 33, 33, "3 Sales[Price]"]);
    again.edit("'My data'!B5", 4);
    await again.settle();
    expect(results(again)).toEqual([7, 37, 37, "4 Sales[Price]"]);
  });
});
