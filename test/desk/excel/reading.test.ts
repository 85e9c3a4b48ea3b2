import { afterAll, beforeAll, describe, expect, it } from "vitest";
import type { NodeDesk } from "../../../src/desk/client/openDesk.ts";
import { bookOf, sheetOf } from "../../support/deskBook.ts";
import { codeOf, load, testDesk } from "../../support/desk.ts";

const date = { value: 45293, style: { numberFormat: "yyyy-mm-dd" } } as const;

const book = bookOf(
  sheetOf("Data", [
    ["Month", "Repairs", null, "Flag"],
    [date, 12.5, null, true],
    [{ value: 0.125, style: { numberFormat: "0.0%" } }, { error: "#N/A" }, "", "text"],
    [null, { value: "", formula: '=""' }, { value: 4, formula: "=2+2" }],
  ]),
  sheetOf("Away", [[7]]),
  sheetOf("Hidden rows", [["a"], [1], [2], [3]], { hiddenRows: [2] }),
  sheetOf("Empty", []),
);

let desk: NodeDesk;
beforeAll(async () => {
  desk = await testDesk({ book });
});
afterAll(() => desk.close());

describe("reading cells", () => {
  it("tells values as Excel does: dates as serials, blanks as empty text, errors by their signs", async () => {
    expect(await load(desk, "Data!A1:D4", "values")).toEqual([
      ["Month", "Repairs", "", "Flag"],
      [45293, 12.5, "", true],
      [0.125, "#N/A", "", "text"],
      ["", "", 4, ""],
    ]);
  });

  it("tells a blank from an empty text by the kinds", async () => {
    expect(await load(desk, "Data!A1:D4", "valueTypes")).toEqual([
      ["String", "String", "Empty", "String"],
      ["Double", "Double", "Empty", "Boolean"],
      ["Double", "Error", "String", "String"],
      ["Empty", "String", "Double", "Empty"],
    ]);
  });

  it("shows numbers in their formats", async () => {
    expect(await load(desk, "Data!A2:D3", "text")).toEqual([
      ["2024-01-02", "12.5", "", "TRUE"],
      ["12.5%", "#N/A", "", "text"],
    ]);
    expect(await load(desk, "Data!A2:B2", "numberFormat")).toEqual([["yyyy-mm-dd", "General"]]);
    expect(await load(desk, "Data!A2:B3", "numberFormatCategories")).toEqual([
      ["Date", "General"],
      ["Percentage", "General"],
    ]);
  });

  it("tells formulas, and the values of cells without one", async () => {
    expect(await load(desk, "Data!B3:C4", "formulas")).toEqual([
      ["#N/A", ""],
      ['=""', "=2+2"],
    ]);
  });

  it("answers null for whole columns and beyond five million cells, without an error", async () => {
    expect(await load(desk, "Data!A:B", "values")).toBeNull();
    expect(await load(desk, "Data!A:B", "address")).toBe("Data!A:B");
    expect(await load(desk, "Data!A:B", "isEntireColumn")).toBe(true);
    expect(await load(desk, "Data!A1:E1000001", "valueTypes")).toBeNull();
    expect(await load(desk, "Data!A1:E1000001", "cellCount")).toBe(5_000_005);
    expect(await load(desk, "Data!A:XFD", "cellCount")).toBe(-1);
  });

  it("quotes sheet names in addresses where Excel does", async () => {
    expect(await load(desk, "'Hidden rows'!B2:C3", "address")).toBe("'Hidden rows'!B2:C3");
  });

  it("finds the used range, and a null object where there is none", async () => {
    const found = await desk.Excel.run(async (context) => {
      const { worksheets } = context.workbook;
      const used = worksheets.getItem("Data").getUsedRange(true);
      const column = worksheets.getItem("Data").getRange("B:B").getUsedRangeOrNullObject(true);
      const none = worksheets.getItem("Empty").getUsedRangeOrNullObject(true);
      used.load("address");
      column.load("address");
      await context.sync();
      return [used.address, column.address, none.isNullObject];
    });
    expect(found).toEqual(["Data!A1:D4", "Data!B1:B4", true]);
  });

  it("finds the block around a cell", async () => {
    const region = await desk.Excel.run(async (context) => {
      const range = context.workbook.worksheets.getItem("Data").getRange("B2").getSurroundingRegion();
      range.load("address");
      await context.sync();
      return range.address;
    });
    expect(region).toBe("Data!A1:D4");
  });

  it("leaves hidden rows out of the visible view", async () => {
    const seen = await desk.Excel.run(async (context) => {
      const range = context.workbook.worksheets.getItem("Hidden rows").getRange("A1:A4");
      const view = range.getVisibleView();
      view.load("values,rowCount");
      range.load("rowHidden");
      await context.sync();
      return [view.values, view.rowCount, range.rowHidden];
    });
    expect(seen).toEqual([[["a"], [1], [3]], 3, null]);
  });
});

describe("the client's rules of loading", () => {
  it("refuses a property before load and before sync", async () => {
    const before = (loads: boolean) => async () =>
      desk.Excel.run(async (context) => {
        const range = context.workbook.worksheets.getItem("Data").getRange("A1");
        if (loads) range.load("values");
        else range.load("address");
        if (!loads) await context.sync();
        return range.values;
      });
    expect(await codeOf(before(false))).toBe("PropertyNotLoaded");
    expect(await codeOf(before(true))).toBe("PropertyNotLoaded");
  });

  it("refuses a result before sync", async () => {
    const code = await codeOf(() =>
      desk.Excel.run((context) => Promise.resolve(context.workbook.worksheets.getCount().value)),
    );
    expect(code).toBe("ValueNotLoaded");
  });

  it("refuses a misspelt property as wrong, one that the stand-in lacks as not found", async () => {
    const loading = (name: string) => () =>
      desk.Excel.run(async (context) => {
        context.workbook.worksheets.getItem("Data").getRange("A1").load(name);
        await context.sync();
      });
    expect(await codeOf(loading("vlaues"))).toBe("InvalidArgument");
    expect(await codeOf(loading("formulasR1C1"))).toBe("ApiNotFound");
  });

  it("refuses methods that the stand-in lacks", async () => {
    const code = await codeOf(() =>
      desk.Excel.run(async (context) => {
        context.workbook.worksheets.getItem("Data").getRange("A1").removeDuplicates([0], false);
        await context.sync();
      }),
    );
    expect(code).toBe("ApiNotFound");
  });

  it("tells a null object only after the sync", async () => {
    const found = await desk.Excel.run(async (context) => {
      const sheet = context.workbook.worksheets.getItemOrNullObject("None");
      const early = await codeOf(() => Promise.resolve(sheet.isNullObject));
      await context.sync();
      return [early, sheet.isNullObject];
    });
    expect(found[1]).toBe(true);
    expect(found[0]).not.toBe("true");
  });

  it("refuses an object of another batch", async () => {
    const code = await codeOf(() =>
      desk.Excel.run(async (first) => {
        const range = first.workbook.worksheets.getItem("Data").getRange("A1");
        await desk.Excel.run(async (second) => {
          second.workbook.worksheets.getItem("Data").getRange("A1:B2").getIntersection(range);
          await second.sync();
        });
      }),
    );
    expect(code).toBe("InvalidRequestContext");
  });

  it("loads nested properties and members of collections", async () => {
    const seen = await desk.Excel.run(async (context) => {
      const { worksheets } = context.workbook;
      worksheets.load("items/name,items/visibility");
      const range = worksheets.getItem("Data").getRange("A1");
      range.load("address,format/font/bold,worksheet/name");
      await context.sync();
      return [worksheets.items.map(({ name }) => name), range.format.font.bold, range.worksheet.name];
    });
    expect(seen).toEqual([["Data", "Away", "Hidden rows", "Empty"], false, "Data"]);
  });
});

describe("a range kept over several syncs", () => {
  it("stays where it was found when the selection moves on", async () => {
    desk.select("Away!A1");
    const address = await desk.Excel.run(async (context) => {
      const range = context.workbook.getSelectedRange();
      range.load("address");
      await context.sync();
      desk.select("Data!B2:C3");
      range.load("values");
      await context.sync();
      return [range.address, range.values];
    });
    expect(address).toEqual(["Away!A1", [[7]]]);
  });

  it("gives its reference back at the end of the batch", async () => {
    const before = desk.host.references.kept.size;
    await load(desk, "Data!A1", "values");
    await desk.settle();
    expect(desk.host.references.kept.size).toBe(before);
  });
});
