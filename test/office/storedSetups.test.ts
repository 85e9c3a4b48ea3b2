import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { messageOf } from "../../src/core/problem/messages.ts";
import { demoBook } from "../../src/desk/demo/demoBook.ts";
import { type DeskPane, openDeskPane } from "../support/deskPane.ts";

let at: DeskPane;
beforeEach(async () => {
  at = await openDeskPane(demoBook());
});
afterEach(() => at.close());

const read = (address: string): Promise<void> => at.carryOut(() => at.pane.commands.read({ kind: "address", address }));
const answer = (): Promise<void> => at.carryOut(at.pane.commands.answer);
const store = (name: string): Promise<void> => at.carryOut(() => at.pane.commands.storeSetup(name));
const open = (name: string): Promise<void> => at.carryOut(() => at.pane.commands.openSetup(name));

const sheetOf = (index: number) => at.desk.book.grid.api.getActiveWorkbook()!.getSheets()[index]!;

/** Opens what was saved in place of what is open. */
async function reopen(): Promise<void> {
  const book = await at.saved();
  at.close();
  at = await openDeskPane(book);
  await at.carryOut(at.pane.commands.open);
}

const figures = () => {
  const { coefficients, standardErrors, observations } = at.state().answered!.answer;
  return { coefficients, standardErrors, observations };
};

const setupNames = () => at.state().kept.book.setups.map(({ name }) => name);

describe("a set-up in the workbook", { timeout: 120_000 }, () => {
  it("comes back with the same answer after rows and columns were inserted, the sheet renamed, the file saved", async () => {
    await read("Months!A4:E100");
    at.pane.store.dispatch({ kind: "role chosen", column: "Advertising", role: "unused" });
    at.pane.store.dispatch({
      kind: "setup changed",
      change: { options: { ...at.state().setup!.options, policy: "textbook" } },
    });
    await answer();
    const before = figures();
    await store("Without advertising");
    sheetOf(0).insertRows(1, 3);
    sheetOf(0).insertColumnsBefore(0, 2);
    await at.desk.Excel.run(async (context) => {
      context.workbook.worksheets.getItem("Months").name = "All the months";
      await context.sync();
    });
    await reopen();
    expect(setupNames()).toEqual(["Without advertising"]);
    await open("without advertising");
    expect(at.state()).toMatchObject({ opened: "Without advertising", lost: [] });
    expect(at.state().data?.address).toBe("'All the months'!C7:G103");
    await answer();
    expect(figures()).toEqual(before);
  });

  it("goes back to a table as it has grown, and to a name of the user's own", async () => {
    await read("Shops!A1:E141");
    expect(at.state().data?.anchor).toEqual({ kind: "table", name: "Shop_figures" });
    await store("Shops");
    sheetOf(1).insertRows(50, 2);
    await open("Shops");
    expect(at.state().data?.address).toBe("Shops!A1:E143");
    await at.carryOut(at.pane.commands.open);
    const lots = at.state().places.find(({ name }) => name === "Purchase_lots")!;
    await at.carryOut(() => at.pane.commands.read({ kind: "place", place: lots }));
    await store("Lots");
    expect(at.state().kept.book.setups.map(({ anchor }) => anchor)).toEqual([
      { kind: "name", name: "Purchase_lots" },
      { kind: "table", name: "Shop_figures" },
    ]);
    expect(at.desk.snapshot().names.map(({ name }) => name)).toEqual(["Purchase_lots"]);
    await at.carryOut(() => at.pane.commands.removeSetup("Lots"));
    expect(at.desk.snapshot().names.map(({ name }) => name)).toEqual(["Purchase_lots"]);
  });

  it("tells of rows that were added right below its data, and takes them in on request", async () => {
    await read("Months!A4:E98");
    at.pane.store.dispatch({ kind: "role chosen", column: "Advertising", role: "unused" });
    await store("To October");
    await open("To October");
    expect(at.state().data).toMatchObject({ address: "Months!A4:E98", below: "Months!A99:E100" });
    await at.carryOut(at.pane.commands.takeInBelow);
    expect(at.state()).toMatchObject({ opened: "To October", waiting: null, data: { below: null } });
    expect(at.state().data?.address).toBe("Months!A4:E100");
    expect(at.state().setup?.columns.map(({ role }) => role)).toEqual([
      "time",
      "outcome",
      "driver",
      "unused",
      "driver",
    ]);
    await store("To October");
    await open("To October");
    expect(at.state().data).toMatchObject({ address: "Months!A4:E100", below: null });
    expect(at.desk.snapshot().names.map(({ name }) => name)).toEqual(["Purchase_lots", "Footing_data_2"]);
  });

  it("is renamed and removed, and takes the name of its cells with it", async () => {
    await read("Months!A4:E100");
    await store("A");
    expect(at.desk.snapshot().names.map(({ name }) => name)).toEqual(["Purchase_lots", "Footing_data_1"]);
    await store("A");
    expect(setupNames()).toEqual(["A"]);
    await read("Months!A4:E99");
    expect(await at.faultOf(() => at.pane.commands.storeSetup("a"))).toContain('There is already a set-up "A"');
    await store("B");
    expect(await at.faultOf(() => at.pane.commands.renameSetup({ from: "A", to: "b" }))).toContain('a set-up "B"');
    await at.carryOut(() => at.pane.commands.renameSetup({ from: "A", to: "All months" }));
    expect(setupNames()).toEqual(["All months", "B"]);
    await at.carryOut(() => at.pane.commands.removeSetup("All months"));
    expect(setupNames()).toEqual(["B"]);
    expect(at.desk.snapshot().names.map(({ name }) => name)).toEqual(["Purchase_lots", "Footing_data_2"]);
    await at.carryOut(at.pane.commands.open);
    expect(at.state().places.map(({ name }) => name)).not.toContain("Footing_data_2");
  });

  it("says what it can no longer find", async () => {
    await read("Months!A4:E100");
    await store("All");
    at.desk.edit("Months!C4", "Price level");
    at.desk.edit("Months!B4", "Jobs");
    await open("All");
    expect(at.state().lost.map(({ column, candidate }) => [column.column, column.role, candidate])).toEqual([
      ["Repairs", "outcome", "Jobs"],
      ["Price index", "driver", "Price level"],
    ]);
    for (const lost of at.state().lost) at.pane.store.dispatch({ kind: "lost settled", lost, by: lost.candidate });
    expect(at.state().lost).toEqual([]);
    await answer();
    expect(at.state().answered?.answer.title).toBe("Jobs explained by Price level, Advertising and Rainy days");
  });

  it("says so when its data are gone, and is for the data that are chosen next", async () => {
    await read("Months!A4:E100");
    at.pane.store.dispatch({ kind: "role chosen", column: "Advertising", role: "unused" });
    await store("All");
    sheetOf(0).deleteRows(0, 120);
    expect(await at.faultOf(() => at.pane.commands.openSetup("All"))).toContain(
      'The data of the set-up "All" are no longer found: the name Footing_data_1 is gone from the workbook (its cells stood in Months!A4:E100',
    );
    const weeks = ["Month", "Repairs", "Price index", "Advertising", "Rainy days"];
    weeks.forEach((heading, column) => at.desk.edit(`Weeks!${"ABCD"[column] ?? "E"}1`, heading));
    await read("Weeks!A1:D157");
    expect(at.state()).toMatchObject({ opened: "All", waiting: null });
    expect(at.state().setup?.columns.map(({ role }) => role)).toEqual(["time", "outcome", "driver", "unused"]);
    expect(at.state().lost.map(({ column }) => column.column)).toEqual(["Rainy days"]);
  });
});

it("puts sample data on a new sheet of their own, and reads them", { timeout: 120_000 }, async () => {
  await at.carryOut(at.pane.commands.insertSample);
  await at.carryOut(at.pane.commands.insertSample);
  expect(at.state().data?.address).toBe("'Sample months 2'!A4:E100");
  expect(at.state().setup?.columns.map(({ role }) => role)).toEqual(["time", "outcome", "driver", "driver", "driver"]);
  const rows = (name: string) => at.desk.values(`'${name}'!A5:E100`);
  expect(rows("Sample months 2")).toEqual(rows("Sample months"));
  expect(rows("Sample months")).toEqual(at.desk.values("Months!A5:E100"));
  await at.carryOut(at.pane.commands.checkSheets);
  expect(at.state().sheets).toEqual([]);
});

describe("parts that are not ours to change", { timeout: 120_000 }, () => {
  const add = (xml: string): Promise<void> =>
    at.desk.Excel.run(async (context) => {
      context.workbook.customXmlParts.add(xml);
      await context.sync();
    });

  it("are left as they are, and said, where a newer version or someone else wrote them", async () => {
    const newer = '<footing xmlns="urn:footing:workbook" version="2"><setups/></footing>';
    const foreign = '<footing xmlns="urn:footing:workbook" version="1">{"setups":7}</footing>';
    const other = '<model xmlns="urn:someone:else">kept</model>';
    for (const xml of [newer, foreign, other]) await add(xml);
    await at.carryOut(at.pane.commands.open);
    const said = at.state().kept.leftAlone.map(messageOf);
    expect(said[0]).toContain("a newer Footing stored (format 2; this one reads format 1)");
    expect(said[1]).toMatch(/cannot be read\. It was left as it is/);
    await read("Months!A4:E100");
    await store("Mine");
    await reopen();
    expect(setupNames()).toEqual(["Mine"]);
    expect(
      at.desk
        .snapshot()
        .customXml?.map(({ xml }) => xml)
        .slice(0, 3),
    ).toEqual([newer, foreign, other]);
    expect(at.state().kept.leftAlone).toHaveLength(2);
  });
});
