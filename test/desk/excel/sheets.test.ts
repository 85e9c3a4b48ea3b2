import { afterAll, beforeAll, describe, expect, it } from "vitest";
import type { NodeDesk } from "../../../src/desk/client/openDesk.ts";
import { bookOf, sheetOf } from "../../support/deskBook.ts";
import { codeOf, testDesk } from "../../support/desk.ts";

let desk: NodeDesk;
beforeAll(async () => {
  desk = await testDesk({ book: bookOf(sheetOf("First", [[1]]), sheetOf("Second", [[2]], { hidden: true })) });
});
afterAll(() => desk.close());

const inBatch = (work: (context: Excel.RequestContext) => unknown) => () =>
  desk.Excel.run(async (context) => {
    work(context);
    await context.sync();
  });

const names = (): readonly string[] => desk.snapshot().sheets.map(({ name }) => name);

describe("sheets", () => {
  it("are added behind the others without being shown", async () => {
    const [name, active] = await desk.Excel.run(async (context) => {
      const sheet = context.workbook.worksheets.add("Result");
      const shown = context.workbook.worksheets.getActiveWorksheet();
      sheet.load("name,position");
      shown.load("name");
      await context.sync();
      // The sheet is found again by its id in the next batch.
      sheet.getRange("A1").values = [["kept"]];
      await context.sync();
      return [sheet.name, shown.name];
    });
    expect([name, active]).toEqual(["Result", "First"]);
    expect(names()).toEqual(["First", "Second", "Result"]);
    expect(desk.value("Result!A1")).toBe("kept");
  });

  it("take Excel's next name where none is given", async () => {
    await inBatch((context) => context.workbook.worksheets.add())();
    expect(names().at(-1)).toMatch(/^Sheet\d+$/);
  });

  it.each([
    "",
    "x".repeat(32),
    "a/b",
    "a\\b",
    "a?b",
    "a*b",
    "a[b",
    "a]b",
    "a:b",
    "'quoted",
    "quoted'",
    "History",
    "history",
  ])("refuse the name %j", async (name) => {
    const code = await codeOf(inBatch((context) => context.workbook.worksheets.add(name)));
    expect(code).toBe("InvalidArgument");
  });

  it("refuse a name that is taken, without regard to case", async () => {
    expect(await codeOf(inBatch((context) => context.workbook.worksheets.add("FIRST")))).toBe("ItemAlreadyExists");
    const renaming = inBatch((context) => (context.workbook.worksheets.getItem("Result").name = "first"));
    expect(await codeOf(renaming)).toBe("ItemAlreadyExists");
  });

  it("are renamed, also to their own name in other letters, and formulas follow", async () => {
    desk.edit("First!B1", "=Result!A1");
    await inBatch((context) => (context.workbook.worksheets.getItem("Result").name = "RESULT"))();
    await desk.settle();
    expect(names()).toContain("RESULT");
    expect(desk.value("First!B1")).toBe("kept");
  });

  it("answer ItemNotFound where there is none", async () => {
    const code = await codeOf(
      inBatch((context) => context.workbook.worksheets.getItem("None").getRange("A1").load("values")),
    );
    expect(code).toBe("ItemNotFound");
  });

  it("are shown, moved, hidden and deleted", async () => {
    await inBatch((context) => {
      const sheet = context.workbook.worksheets.getItem("RESULT");
      sheet.activate();
      sheet.position = 0;
    })();
    expect(names()[0]).toBe("RESULT");
    expect(desk.snapshot().active).toBe(0);
    await inBatch((context) => (context.workbook.worksheets.getItem("Second").visibility = "Visible"))();
    await inBatch((context) => context.workbook.worksheets.getItem("RESULT").delete())();
    expect(names()).not.toContain("RESULT");
  });

  it("keep at least one of them in sight", async () => {
    const alone = await testDesk();
    const removing = (act: (sheet: Excel.Worksheet) => void) => () =>
      alone.Excel.run(async (context) => {
        act(context.workbook.worksheets.getItem("Sheet1"));
        await context.sync();
      });
    expect(await codeOf(removing((sheet) => sheet.delete()))).toBe("InvalidOperation");
    expect(await codeOf(removing((sheet) => (sheet.visibility = "Hidden")))).toBe("InvalidOperation");
    alone.close();
  });

  it("neither come nor go in a workbook whose structure is protected", async () => {
    await inBatch((context) => context.workbook.protection.protect())();
    expect(await codeOf(inBatch((context) => context.workbook.worksheets.add("New")))).toBe("AccessDenied");
    await inBatch((context) => context.workbook.protection.unprotect())();
    expect(await codeOf(inBatch((context) => context.workbook.worksheets.add("New")))).toBe("none");
  });

  it("refuse addresses that are none, and those of other sheets", async () => {
    const getting = (address: string) =>
      codeOf(inBatch((context) => context.workbook.worksheets.getItem("First").getRange(address).load("values")));
    expect(await getting("A0")).toBe("InvalidArgument");
    expect(await getting("XFE1")).toBe("InvalidArgument");
    expect(await getting("Second!A1")).toBe("InvalidArgument");
    expect(await getting("First!A1")).toBe("none");
  });

  it("find ranges by numbers, several at once, whole rows", async () => {
    const addresses = await desk.Excel.run(async (context) => {
      const sheet = context.workbook.worksheets.getItem("First");
      const block = sheet.getRangeByIndexes(1, 2, 3, 4);
      const several = sheet.getRanges("A1:B2,D4");
      const rows = sheet.getRange("2:3");
      const all = sheet.getRange();
      several.areas.load("items/address");
      for (const range of [block, rows, all]) range.load("address");
      several.load("address,areaCount,cellCount");
      await context.sync();
      return [
        block.address,
        several.address,
        several.areaCount,
        several.cellCount,
        several.areas.items.map((area) => area.address),
        rows.address,
        all.address,
      ];
    });
    expect(addresses).toEqual([
      "First!C2:F4",
      "First!A1:B2,First!D4",
      2,
      5,
      ["First!A1:B2", "First!D4"],
      "First!2:3",
      "First!1:1048576",
    ]);
  });

  it("keep panes, print settings, grid lines and marks of add-ins", async () => {
    await inBatch((context) => {
      const sheet = context.workbook.worksheets.getItem("First");
      sheet.freezePanes.freezeRows(2);
      sheet.pageLayout.setPrintArea("A1:D20");
      sheet.pageLayout.zoom = { horizontalFitToPages: 1 };
      sheet.pageLayout.orientation = "Landscape";
      sheet.pageLayout.leftMargin = 30;
      sheet.pageLayout.headersFooters.defaultForAllPages.rightFooter = "Page &P";
      sheet.horizontalPageBreaks.add("A12");
      sheet.horizontalPageBreaks.add("A5");
      sheet.customProperties.add("model", "42");
      sheet.showGridlines = false;
    })();
    expect(desk.snapshot().sheets.find(({ name }) => name === "First")).toMatchObject({
      frozenRows: 2,
      printArea: "A1:D20",
      onePageWide: true,
      landscape: true,
      pageBreaks: [4, 11],
      margins: { left: 30, right: 50.4, top: 54, bottom: 54, footer: 21.6 },
      footer: { left: "", center: "", right: "Page &P" },
      customProperties: { model: "42" },
    });
    const read = await desk.Excel.run(async (context) => {
      const sheet = context.workbook.worksheets.getItem("First");
      const mark = sheet.customProperties.getItemOrNullObject("MODEL");
      const none = sheet.customProperties.getItemOrNullObject("other");
      mark.load("value");
      sheet.load("showGridlines");
      await context.sync();
      return [mark.value, none.isNullObject, sheet.showGridlines];
    });
    expect(read).toEqual(["42", true, false]);
  });
});
