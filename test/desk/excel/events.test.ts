import { afterAll, beforeAll, expect, it } from "vitest";
import type { NodeDesk } from "../../../src/desk/client/openDesk.ts";
import { bookOf, sheetOf } from "../../support/deskBook.ts";
import { testDesk } from "../../support/desk.ts";

let desk: NodeDesk;
beforeAll(async () => {
  const rows = [["y", "x"], [1, 2], [3, 4], [{ value: 4, formula: "=SUM(A2:A3)" }]];
  const tables = [{ name: "Data", address: "A1:B3" }];
  desk = await testDesk({ book: bookOf(sheetOf("Watched", rows, { tables }), sheetOf("Other", [])) });
});
afterAll(() => desk.close());

interface Seen {
  readonly address?: string;
  readonly changeType?: string;
  readonly source?: string;
  readonly type?: string;
}

/** Registers a handler on the watched sheet; answers with what it saw and a way to stop. */
async function watch(event: (sheet: Excel.Worksheet) => OfficeExtension.EventHandlers<Seen>) {
  const seen: Seen[] = [];
  const stop = await desk.Excel.run(async (context) => {
    const sheet = context.workbook.worksheets.getItem("Watched");
    sheet.load("id");
    await context.sync();
    const registered = event(sheet).add((args) => {
      seen.push(args);
      return Promise.resolve();
    });
    await context.sync();
    return registered;
  });
  const off = () =>
    desk.Excel.run(stop.context as unknown as Excel.RequestContext, async (context) => {
      stop.remove();
      await context.sync();
    });
  return { seen, off };
}

const edit = async (address: string, value: string): Promise<void> => {
  desk.edit(address, value);
  await desk.settle();
};

it("tells a handler of edits on its sheet alone, until it is removed", async () => {
  const { seen, off } = await watch((sheet) => sheet.onChanged);
  await edit("Watched!A2", "7");
  await edit("Other!A1", "1");
  expect(seen).toMatchObject([{ address: "A2", changeType: "RangeEdited", source: "Local", type: "WorksheetChanged" }]);
  await off();
  await edit("Watched!A2", "8");
  expect(seen).toHaveLength(1);
});

it("tells nothing of what the registering batch itself changed, but of the next", async () => {
  const seen: (string | undefined)[] = [];
  await desk.Excel.run(async (context) => {
    const sheet = context.workbook.worksheets.getItem("Watched");
    sheet.load("id");
    await context.sync();
    sheet.getRange("D1").values = [["before"]];
    sheet.onChanged.add((args) => {
      seen.push(args.address);
      return Promise.resolve();
    });
    sheet.getRange("D2").values = [["in the same batch"]];
    await context.sync();
    await desk.settle();
    expect(seen).toEqual([]);
    sheet.getRange("D3:E4").values = [
      [1, 2],
      [3, 4],
    ];
    await context.sync();
  });
  await desk.settle();
  expect(seen).toEqual(["D3:E4"]);
});

it("is quiet while events are switched off", async () => {
  const { seen, off } = await watch((sheet) => sheet.onChanged);
  const enable = (on: boolean) =>
    desk.Excel.run(async (context) => {
      context.runtime.enableEvents = on;
      await context.sync();
    });
  await enable(false);
  await edit("Watched!A2", "9");
  await enable(true);
  await edit("Watched!A3", "9");
  expect(seen.map(({ address }) => address)).toEqual(["A3"]);
  await off();
});

it("tells of calculated cells and of selections", async () => {
  const calculated = await watch((sheet) => sheet.onCalculated);
  const selected = await watch((sheet) => sheet.onSelectionChanged);
  await edit("Watched!A2", "11");
  desk.select("Watched!A2:B3");
  await desk.settle();
  expect(calculated.seen.map(({ address }) => address)).toEqual(["A4"]);
  expect(selected.seen.map(({ address }) => address)).toEqual(["A2:B3"]);
  await calculated.off();
  await selected.off();
});

it("tells the workbook's own handler of selections, once it is registered", async () => {
  let seen = 0;
  desk.select("Watched!A1");
  await desk.Excel.run(async (context) => {
    context.workbook.onSelectionChanged.add(() => {
      seen += 1;
      return Promise.resolve();
    });
    await context.sync();
  });
  desk.select("Other!B2");
  await desk.settle();
  expect(seen).toBe(1);
});

it("tells of sheets that are shown and left, added and deleted", async () => {
  const seen: string[] = [];
  const told = (what: string) => (args: { readonly worksheetId: string }) => {
    seen.push(`${what} ${args.worksheetId.replace(/^(?!sheet-).*/, "new")}`);
    return Promise.resolve();
  };
  await desk.Excel.run(async (context) => {
    const { worksheets } = context.workbook;
    worksheets.getItem("Watched").activate();
    worksheets.onActivated.add(told("shown"));
    worksheets.onDeactivated.add(told("left"));
    worksheets.onAdded.add(told("added"));
    worksheets.onDeleted.add(told("deleted"));
    await context.sync();
    const added = worksheets.add("New");
    worksheets.getItem("Other").activate();
    added.delete();
    await context.sync();
  });
  await desk.settle();
  expect(seen.sort()).toEqual(["added new", "deleted new", "left sheet-1", "shown sheet-2"]);
});

it("tells the workbook's handlers of every sheet", async () => {
  const seen: string[] = [];
  await desk.Excel.run(async (context) => {
    context.workbook.worksheets.onChanged.add((args) => {
      seen.push(args.address);
      return Promise.resolve();
    });
    await context.sync();
  });
  await edit("Other!B2", "1");
  expect(seen).toEqual(["B2"]);
});

it("tells a table's handler of edits inside it", async () => {
  const seen: string[] = [];
  await desk.Excel.run(async (context) => {
    const table = context.workbook.tables.getItem("Data");
    table.load("id");
    await context.sync();
    table.onChanged.add((args) => {
      seen.push(args.address);
      return Promise.resolve();
    });
    await context.sync();
  });
  await edit("Watched!B2", "5");
  await edit("Watched!G9", "5");
  expect(seen).toEqual(["B2"]);
});
