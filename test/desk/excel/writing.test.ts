import { afterAll, beforeAll, describe, expect, it } from "vitest";
import type { NodeDesk } from "../../../src/desk/client/openDesk.ts";
import { bookOf, sheetOf } from "../../support/deskBook.ts";
import { codeOf, load, set, testDesk } from "../../support/desk.ts";

const names = ["Typed", "Shapes", "Formulas", "Looks", "Large", "Locked", "Order", "Spill"];

let desk: NodeDesk;
beforeAll(async () => {
  desk = await testDesk({
    book: bookOf(...names.map((name) => sheetOf(name, [], name === "Locked" ? { protected: true } : {}))),
  });
});
afterAll(() => desk.close());

describe("values written through the API", () => {
  it.each([
    ["1e3", 1000, "Double"],
    ["005", 5, "Double"],
    ["2024-01-02", 45293, "Double"],
    ["12%", 0.12, "Double"],
    ["TRUE", true, "Boolean"],
    ["true", true, "Boolean"],
    ["#N/A", "#N/A", "Error"],
    ["2019Q1", "2019Q1", "String"],
    ["'005", "005", "String"],
    ["'=1+1", "=1+1", "String"],
    ["'#N/A", "#N/A", "String"],
    ["", "", "Empty"],
    [12.5, 12.5, "Double"],
    [false, false, "Boolean"],
  ])("reads %j as if it were typed: %j, %s", async (written, value, kind) => {
    await set(desk, "Typed!A1", { values: [[written]] });
    expect(await load(desk, "Typed!A1", "values")).toEqual([[value]]);
    expect(await load(desk, "Typed!A1", "valueTypes")).toEqual([[kind]]);
    await set(desk, "Typed!A1", { values: [[""]], numberFormat: [["General"]] });
  });

  it("gives a cell the format that its text brings along", async () => {
    await set(desk, "Typed!B1:B2", { values: [["2024-01-02"], ["12%"]] });
    expect(await load(desk, "Typed!B1:B2", "text")).toEqual([["2024-01-02"], ["12%"]]);
  });

  it("keeps everything as text in cells of text format, also when the format comes in the same batch", async () => {
    await desk.Excel.run(async (context) => {
      const range = context.workbook.worksheets.getItem("Typed").getRange("C1:C4");
      range.numberFormat = [["@"], ["@"], ["@"], ["@"]];
      range.values = [["005"], ["=1+1"], [7], ["1e3"]];
      await context.sync();
    });
    expect(await load(desk, "Typed!C1:C4", "values")).toEqual([["005"], ["=1+1"], ["7"], ["1e3"]]);
    expect(await load(desk, "Typed!C1:C4", "valueTypes")).toEqual([["String"], ["String"], ["String"], ["String"]]);
  });

  it("leaves a cell as it is for null, and takes its content for an empty text", async () => {
    await set(desk, "Typed!D1:E1", { values: [[3, 4]] });
    await set(desk, "Typed!D1:E1", { values: [[null, ""]] });
    expect(await load(desk, "Typed!D1:E1", "valueTypes")).toEqual([["Double", "Empty"]]);
  });
});

describe("shapes", () => {
  it("spreads one value over the range", async () => {
    await desk.Excel.run(async (context) => {
      const range = context.workbook.worksheets.getItem("Shapes").getRange("A1:B2");
      range.values = 5 as unknown as number[][];
      await context.sync();
    });
    expect(await load(desk, "Shapes!A1:B2", "values")).toEqual([
      [5, 5],
      [5, 5],
    ]);
  });

  it.each([[[[1, 2]]], [[[1], [2]]], [[[1, 2], [3]]]])("refuses %j for a block of two by two", async (values) => {
    expect(await codeOf(() => set(desk, "Shapes!C1:D2", { values }))).toBe("InvalidArgument");
    expect(await load(desk, "Shapes!C1:D2", "valueTypes")).toEqual([
      ["Empty", "Empty"],
      ["Empty", "Empty"],
    ]);
  });

  it("refuses to write whole columns", async () => {
    expect(await codeOf(() => set(desk, "Shapes!F:F", { values: 1 as unknown as number[][] }))).toBe("InvalidArgument");
  });
});

describe("formulas", () => {
  it("are calculated before the next read of the same batch", async () => {
    const value = await desk.Excel.run(async (context) => {
      const range = context.workbook.worksheets.getItem("Formulas").getRange("A1:A3");
      range.formulas = [["2"], ["=A1*10"], ["=A2+1"]];
      range.load("values");
      await context.sync();
      return range.values;
    });
    expect(value).toEqual([[2], [20], [21]]);
  });

  it("are not lost when their looks change together with another cell's content", async () => {
    await set(desk, "Formulas!D1:D2", { formulas: [["=E1*2"], ["=SUM(E1:E2)"]] });
    await desk.Excel.run(async (context) => {
      const sheet = context.workbook.worksheets.getItem("Formulas");
      sheet.getRange("D1:D2").format.font.bold = true;
      sheet.getRange("F1").values = [["beside"]];
      await context.sync();
    });
    await set(desk, "Formulas!E1:E2", { values: [[3], [4]] });
    await desk.settle();
    expect(desk.values("Formulas!D1:D2")).toEqual([[6], [7]]);
  });

  it("answer #NAME? for a function nobody knows", async () => {
    await set(desk, "Formulas!B1", { formulas: [["=FOOTING.NOTHING(A1)"]] });
    expect(await load(desk, "Formulas!B1", "values")).toEqual([["#NAME?"]]);
    expect(await load(desk, "Formulas!B1", "valueTypes")).toEqual([["Error"]]);
  });

  it("spill, tell where to, and say so when something stands in the way", async () => {
    await set(desk, "Spill!A1", { formulas: [["=SEQUENCE(3)"]] });
    const spill = await desk.Excel.run(async (context) => {
      const cell = context.workbook.worksheets.getItem("Spill").getRange("A1");
      const area = cell.getSpillingToRange();
      const none = context.workbook.worksheets.getItem("Spill").getRange("B1").getSpillingToRangeOrNullObject();
      area.load("address,values,hasSpill");
      await context.sync();
      return [area.address, area.values, area.hasSpill, none.isNullObject];
    });
    expect(spill).toEqual(["Spill!A1:A3", [[1], [2], [3]], true, true]);
    await set(desk, "Spill!A2", { values: [["in the way"]] });
    expect(await load(desk, "Spill!A1:A3", "values")).toEqual([["#SPILL!"], ["in the way"], [""]]);
    await set(desk, "Spill!A2", { values: [[""]] });
    expect(await load(desk, "Spill!A1:A3", "values")).toEqual([[1], [2], [3]]);
  });
});

describe("looks", () => {
  it("are set and told", async () => {
    const told = await desk.Excel.run(async (context) => {
      const range = context.workbook.worksheets.getItem("Looks").getRange("A1:B2");
      range.format.font.bold = true;
      range.format.font.color = "#1F2937";
      range.format.fill.color = "yellow";
      range.format.horizontalAlignment = "Right";
      range.format.wrapText = true;
      range.format.columnWidth = 90;
      range.format.rowHeight = 30;
      range.format.borders.getItem("EdgeBottom").style = "Continuous";
      await context.sync();
      const { format } = range;
      format.load("horizontalAlignment,wrapText,columnWidth,rowHeight");
      format.font.load("bold,color");
      format.fill.load("color");
      await context.sync();
      const { font, fill } = format;
      return [
        font.bold,
        font.color,
        fill.color,
        format.horizontalAlignment,
        format.wrapText,
        format.columnWidth,
        format.rowHeight,
      ];
    });
    expect(told).toEqual([true, "#1F2937", "#FFFF00", "Right", true, 90, 30]);
    const [sheet] = desk.snapshot().sheets.filter(({ name }) => name === "Looks");
    expect(sheet?.rows[1]?.[0]).toMatchObject({ style: { bold: true, fill: "#ffff00", lineBelow: "#000000" } });
    expect(sheet?.rows[0]?.[0]).not.toHaveProperty("style.lineBelow");
  });

  it("merge cells and take the merge away with all else", async () => {
    const merges = () => desk.snapshot().sheets.find(({ name }) => name === "Looks")?.merges;
    await desk.Excel.run(async (context) => {
      context.workbook.worksheets.getItem("Looks").getRange("D1:F2").merge(true);
      await context.sync();
    });
    expect(merges()).toEqual(["D1:F1", "D2:F2"]);
    await desk.Excel.run(async (context) => {
      context.workbook.worksheets.getItem("Looks").getRange("D1:F2").clear();
      await context.sync();
    });
    expect(merges()).toEqual([]);
  });

  it("fit columns to their texts", async () => {
    const width = await desk.Excel.run(async (context) => {
      const range = context.workbook.worksheets.getItem("Looks").getRange("H1:H2");
      range.values = [["a much longer heading than usual"], [1]];
      range.format.autofitColumns();
      range.load("format/columnWidth");
      await context.sync();
      return range.format.columnWidth;
    });
    expect(width).toBeGreaterThan(150);
    expect(width).toBeLessThan(250);
  });

  it("link a cell to a place in the workbook", async () => {
    await desk.Excel.run(async (context) => {
      const range = context.workbook.worksheets.getItem("Looks").getRange("A5");
      range.hyperlink = { documentReference: "Typed!A1", textToDisplay: "row 1" };
      await context.sync();
    });
    expect(await load(desk, "Looks!A5", "hyperlink")).toMatchObject({
      documentReference: "Typed!A1",
      textToDisplay: "row 1",
    });
    expect(desk.snapshot().sheets.find(({ name }) => name === "Looks")?.links).toEqual([
      { cell: "A5", target: "Typed!A1" },
    ]);
  });
});

describe("a batch that fails", () => {
  it("stops at the fault, keeps what was done before, and names the statement", async () => {
    const failing = desk.Excel.run(async (context) => {
      const sheet = context.workbook.worksheets.getItem("Order");
      sheet.getRange("A1").values = [["done"]];
      sheet.getRange("A2:B2").values = [["wrong shape"]];
      sheet.getRange("A3").values = [["never"]];
      await context.sync();
    });
    await expect(failing).rejects.toMatchObject({
      code: "InvalidArgument",
      debugInfo: { statement: "range1.values = ...;" },
    });
    expect(await load(desk, "Order!A1:A3", "values")).toEqual([["done"], [""], [""]]);
  });

  it.each([
    ["values", (sheet: Excel.Worksheet) => (sheet.getRange("A1").values = [[1]])],
    ["formats", (sheet: Excel.Worksheet) => (sheet.getRange("A1").format.fill.color = "red")],
    ["charts", (sheet: Excel.Worksheet) => sheet.charts.add("Line", sheet.getRange("A1:B2"))],
    ["tables", (sheet: Excel.Worksheet) => sheet.tables.add("A1:B2", true)],
  ])("has no access to %s of a protected sheet", async (_what, write) => {
    const code = await codeOf(() =>
      desk.Excel.run(async (context) => {
        write(context.workbook.worksheets.getItem("Locked"));
        await context.sync();
      }),
    );
    expect(code).toBe("AccessDenied");
  });

  it("writes again once the protection is taken off", async () => {
    await desk.Excel.run(async (context) => {
      const sheet = context.workbook.worksheets.getItem("Locked");
      sheet.protection.load("protected");
      await context.sync();
      expect(sheet.protection.protected).toBe(true);
      sheet.protection.unprotect();
      sheet.getRange("A1").values = [[1]];
      await context.sync();
    });
    expect(desk.value("Locked!A1")).toBe(1);
  });
});

describe("large blocks", () => {
  it("are written whole although the client cuts them up, in time that grows with their size", async () => {
    const rows = (count: number) => Array.from({ length: count }, (_, row) => [row, row * 2, `row ${row}`]);
    const timed = async (count: number): Promise<number> => {
      const start = performance.now();
      await set(desk, `Large!A1:C${count}`, { values: rows(count) });
      return performance.now() - start;
    };
    await timed(2_000);
    const [small, large] = [await timed(5_000), await timed(40_000)];
    expect(desk.values("Large!A40000:C40000")).toEqual([[39_999, 79_998, "row 39999"]]);
    // Eight times the cells: far from the sixty-four times of work that looks through the whole sheet at each piece.
    expect(large / small).toBeLessThan(30);
  });
});
