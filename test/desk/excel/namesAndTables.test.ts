import { afterAll, beforeAll, describe, expect, it } from "vitest";
import type { NodeDesk } from "../../../src/desk/client/openDesk.ts";
import { bookOf, sheetOf } from "../../support/deskBook.ts";
import { codeOf, testDesk } from "../../support/desk.ts";

let desk: NodeDesk;
beforeAll(async () => {
  const rows = [
    ["Repairs", "Price"],
    [5, 2],
    [6, 3],
    [7, 4],
  ];
  const sheets = bookOf(
    sheetOf("Data", rows, { tables: [{ name: "Months", address: "A1:B4" }] }),
    sheetOf("Plain", [
      ["a", "a"],
      [1, 2],
    ]),
  );
  desk = await testDesk({ book: { ...sheets, names: [{ name: "Outcome", refersTo: "Data!$A$1:$A$4" }] } });
});
afterAll(() => desk.close());

const inBatch = (work: (context: Excel.RequestContext) => unknown) => () =>
  desk.Excel.run(async (context) => {
    work(context);
    await context.sync();
  });

describe("tables", () => {
  it("tell their ranges, headings and columns", async () => {
    const told = await desk.Excel.run(async (context) => {
      const { tables } = context.workbook;
      tables.load("items/name,count");
      const table = tables.getItem("months");
      const [all, body, heading] = [table.getRange(), table.getDataBodyRange(), table.getHeaderRowRange()];
      const column = table.columns.getItem("Price");
      const values = column.getDataBodyRange();
      table.columns.load("items/name,items/index");
      values.load("address,values");
      for (const range of [all, body, heading]) range.load("address");
      await context.sync();
      return [
        tables.items.map(({ name }) => name),
        [all.address, body.address, heading.address],
        table.columns.items.map(({ name }) => name),
        [values.address, values.values],
      ];
    });
    expect(told).toEqual([
      ["Months"],
      ["Data!A1:B4", "Data!A2:B4", "Data!A1:B1"],
      ["Repairs", "Price"],
      ["Data!B2:B4", [[2], [3], [4]]],
    ]);
  });

  it("are found from a range that touches them", async () => {
    const found = await desk.Excel.run(async (context) => {
      const sheet = context.workbook.worksheets.getItem("Data");
      const touching = sheet.getRange("B3:D9").getTables(false);
      const whole = sheet.getRange("B3:D9").getTables(true);
      touching.load("items/name");
      whole.load("items/name");
      await context.sync();
      return [touching.items.map(({ name }) => name), whole.items.length];
    });
    expect(found).toEqual([["Months"], 0]);
  });

  it("serve formulas by their columns' names, also after a heading is changed", async () => {
    desk.edit("Data!D1", "=SUM(Months[Price])");
    await desk.settle();
    expect(desk.value("Data!D1")).toBe(9);
    desk.edit("Data!B1", "Cost");
    desk.edit("Data!D2", "=SUM(Months[Cost])");
    await desk.settle();
    expect(desk.value("Data!D2")).toBe(9);
  });

  it("are added with headings made unique, renamed and removed", async () => {
    await inBatch((context) => {
      const table = context.workbook.tables.add("Plain!A1:B2", true);
      table.name = "Pairs";
    })();
    expect(desk.values("Plain!A1:B1")).toEqual([["a", "a2"]]);
    expect(desk.snapshot().sheets[1]?.tables).toEqual([{ name: "Pairs", address: "A1:B2" }]);
    const overlapping = inBatch((context) => context.workbook.tables.add("Plain!B2:C3", true));
    expect(await codeOf(overlapping)).toBe("InvalidArgument");
    const taken = inBatch((context) => (context.workbook.tables.getItem("Pairs").name = "MONTHS"));
    expect(await codeOf(taken)).toBe("ItemAlreadyExists");
    await inBatch((context) => context.workbook.tables.getItem("Pairs").convertToRange())();
    expect(desk.snapshot().sheets[1]?.tables).toEqual([]);
    expect(desk.values("Plain!A2:B2")).toEqual([[1, 2]]);
  });

  it("answer ItemNotFound where there is none", async () => {
    expect(await codeOf(inBatch((context) => context.workbook.tables.getItem("None").load("name")))).toBe(
      "ItemNotFound",
    );
  });
});

describe("names", () => {
  it("tell what they refer to", async () => {
    const told = await desk.Excel.run(async (context) => {
      const item = context.workbook.names.getItem("outcome");
      const range = item.getRange();
      const none = context.workbook.names.getItemOrNullObject("none");
      item.load("name,type,formula,scope");
      range.load("address");
      await context.sync();
      return [item.name, item.type, String(item.formula), item.scope, range.address, none.isNullObject];
    });
    expect(told).toEqual(["Outcome", "Range", "=Data!$A$1:$A$4", "Workbook", "Data!A1:A4", true]);
  });

  it("are added from ranges and serve formulas", async () => {
    await desk.Excel.run(async (context) => {
      const range = context.workbook.worksheets.getItem("Data").getRange("A2:A4");
      context.workbook.names.add("Counts", range);
      context.workbook.worksheets.getItem("Data").getRange("F1").formulas = [["=SUM(Counts)"]];
      await context.sync();
    });
    await desk.settle();
    expect(desk.value("Data!F1")).toBe(18);
    expect(desk.snapshot().names).toContainEqual({ name: "Counts", refersTo: "Data!$A$2:$A$4" });
  });

  it.each(["A1", "R1C1", "two words", "1st", ""])("refuse %j", async (name) => {
    const adding = inBatch((context) => context.workbook.names.add(name, "=1"));
    expect(await codeOf(adding)).toBe("InvalidArgument");
  });

  it("refuse what is taken", async () => {
    expect(await codeOf(inBatch((context) => context.workbook.names.add("OUTCOME", "=1")))).toBe("ItemAlreadyExists");
  });

  it("belong to a sheet too, which may call its own as another calls one, and go with it", async () => {
    await inBatch(({ workbook }) => {
      const { worksheets } = workbook;
      worksheets.add("Passing");
      for (const name of ["Passing", "Plain"]) {
        const sheet = worksheets.getItem(name);
        sheet.names.add("Heading", sheet.getRange("A1"));
      }
      workbook.names.add("Heading", worksheets.getItem("Data").getRange("A1"));
    })();
    const again = inBatch(({ workbook }) => workbook.worksheets.getItem("Plain").names.add("heading", "=1"));
    expect(await codeOf(again)).toBe("ItemAlreadyExists");
    const kept = () => desk.snapshot().names.filter(({ name }) => name === "Heading");
    expect(kept()).toEqual([
      { name: "Heading", refersTo: "Passing!$A$1", sheet: "Passing" },
      { name: "Heading", refersTo: "Plain!$A$1", sheet: "Plain" },
      { name: "Heading", refersTo: "Data!$A$1" },
    ]);
    await inBatch(({ workbook }) => workbook.worksheets.getItem("Passing").delete())();
    expect(kept().map(({ sheet }) => sheet)).toEqual(["Plain", undefined]);
    await inBatch(({ workbook }) => {
      workbook.names.getItem("Heading").delete();
      workbook.worksheets.getItem("Plain").names.getItem("Heading").delete();
    })();
    expect(kept()).toEqual([]);
  });

  it("are deleted", async () => {
    await inBatch((context) => context.workbook.names.getItem("Counts").delete())();
    expect(desk.snapshot().names.map(({ name }) => name)).toEqual(["Outcome"]);
  });
});
