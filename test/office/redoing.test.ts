import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { type DeskPane, openAnsweredMonths, openDeskPane } from "../support/deskPane.ts";

const sheet = "Repairs answer";

let at: DeskPane;
beforeEach(async () => {
  at = await openAnsweredMonths();
});
afterEach(() => at.close());

const write = (kind: "live" | "kept"): Promise<void> => at.carryOut(() => at.pane.commands.write(kind));
const redo = (name = sheet): Promise<void> => at.carryOut(() => at.pane.commands.redoSheet(name));
const standing = (name = sheet) => at.state().sheets.find((one) => one.sheet === name)?.standing.kind;

async function reopen(): Promise<void> {
  const book = await at.saved();
  at.close();
  at = await openDeskPane(book);
  await at.carryOut(at.pane.commands.open);
}

/** The whole sheet, looks and all. */
const sheetData = (name = sheet) => at.desk.snapshot().sheets.find((one) => one.name === name)!;

/** The same sheet written from nothing, for comparison: what stands where, and how it looks. */
async function freshSheet() {
  await at.carryOut(() => at.pane.commands.read({ kind: "address", address: "Months!A4:E100" }));
  await at.carryOut(at.pane.commands.answer);
  await write("kept");
  return sheetData(`${sheet} 2`);
}

const content = ({ rows, merges, links, pageBreaks }: ReturnType<typeof sheetData>) => ({
  pageBreaks,
  rows: rows.map((row) => row.filter((cell) => cell !== null)),
  merges: merges.toSorted(),
  links,
});

describe("a kept sheet whose data have changed", { timeout: 120_000 }, () => {
  it("is out of date at once, and after the workbook was opened again, until it is redone in place", async () => {
    await write("kept");
    const before = at.desk.value("Months!B50") as number;
    at.desk.edit("Months!B50", 700);
    at.desk.edit("Months!B50", before);
    await at.carryOut(at.pane.commands.checkSheets);
    expect(standing()).toBe("current");
    at.desk.edit("Months!B50", 700);
    await new Promise((resolve) => setTimeout(resolve, 700));
    expect(standing()).toBe("out of date");
    await reopen();
    expect(standing()).toBe("out of date");
    at.desk.edit(`'${sheet}'!A300`, "my remark");
    await redo();
    expect(standing()).toBe("current");
    const redone = sheetData();
    const fresh = await freshSheet();
    expect(at.desk.value(`'${sheet}'!A300`)).toBe("my remark");
    const { rows } = content(redone);
    expect({ ...content(redone), rows: rows.slice(0, fresh.rows.length) }).toEqual(content(fresh));
    expect(redone.charts.map(({ title, place }) => ({ title, place }))).toEqual(
      fresh.charts.map(({ title, place }) => ({ title, place })),
    );
  });

  it("is known under another name, after its data have moved", async () => {
    await write("kept");
    await at.desk.Excel.run(async (context) => {
      context.workbook.worksheets.getItem(sheet).name = "For the board";
      context.workbook.worksheets.getItem("Months").name = "Repairs by month";
      await context.sync();
    });
    at.desk.book.grid.api.getActiveWorkbook()!.getSheets()[0]!.insertRows(0, 2);
    await reopen();
    expect(standing("For the board")).toBe("current");
    at.desk.edit("'Repairs by month'!B52", 700);
    await redo("For the board");
    expect(standing("For the board")).toBe("current");
    expect(JSON.stringify(sheetData("For the board").rows)).toContain("'Repairs by month'!$B$6:$B$102");
  });

  it("is not written over where a cell of it holds what Footing did not write", async () => {
    await write("kept");
    at.desk.edit("Months!B50", 700);
    const remark = `'${sheet}'!I2`;
    at.desk.edit(remark, "checked by hand");
    at.desk.edit(`'${sheet}'!A1`, "Our repairs");
    const before = sheetData();
    expect(await at.faultOf(() => at.pane.commands.redoSheet(sheet))).toContain(
      `2 cells of the sheet "Repairs answer" that the result needs hold what Footing did not write: 'Repairs answer'!A1 and 'Repairs answer'!I2.`,
    );
    expect(sheetData()).toEqual(before);
    at.desk.edit(remark, "");
    at.desk.edit(`'${sheet}'!A1`, "");
    await redo();
    expect(at.desk.value(`'${sheet}'!A1`)).toMatch(/^Repairs explained by/);
  });

  it("leaves a chart of the user's own where it is", async () => {
    await write("kept");
    await at.desk.Excel.run(async (context) => {
      const own = context.workbook.worksheets.getItem(sheet);
      own.charts.add("Line", own.getRange("Y4:Y9"), "Columns").name = "Mine";
      await context.sync();
    });
    await redo();
    expect(sheetData().charts.map(({ name }) => name)).toEqual([
      "Mine",
      ...sheetData()
        .charts.slice(1)
        .map(({ name }) => name),
    ]);
    expect(sheetData().charts.filter(({ name }) => name === "Mine")).toHaveLength(1);
    expect(new Set(sheetData().charts.map(({ title }) => title)).size).toBe(sheetData().charts.length);
  });

  it("says that it is protected", async () => {
    await write("kept");
    await at.desk.Excel.run(async (context) => {
      context.workbook.worksheets.getItem(sheet).protection.protect();
      await context.sync();
    });
    expect(await at.faultOf(() => at.pane.commands.redoSheet(sheet))).toContain(
      'The sheet "Repairs answer" is protected.',
    );
  });

  it("says what it was made from is gone", async () => {
    await write("kept");
    at.desk.edit("Months!C4", "Price level");
    await reopen();
    expect(standing()).toBe("cut off");
    expect(await at.faultOf(() => at.pane.commands.redoSheet(sheet))).toContain('There is no column "Price index"');
  });
});

describe("a comparison sheet", { timeout: 120_000 }, () => {
  const comparison = "Comparison";
  const models = ["All drivers", "Without advertising"] as const;

  /** Two set-ups, with and without a driver, side by side on a new sheet. */
  async function writeComparison(): Promise<void> {
    const [all, without] = models;
    await at.carryOut(() => at.pane.commands.storeSetup(all));
    at.pane.store.dispatch({ kind: "role chosen", column: "Advertising", role: "unused" });
    await at.carryOut(() => at.pane.commands.storeSetup(without));
    await at.carryOut(() => at.pane.commands.compare(models));
    await at.carryOut(at.pane.commands.writeComparison);
  }

  const printed = (): string => JSON.stringify(sheetData(comparison).rows);

  it("is out of date when the data of one model change, and is redone in place from what it was made of", async () => {
    await writeComparison();
    expect(standing(comparison)).toBe("current");
    const before = printed();
    for (const name of models) await at.carryOut(() => at.pane.commands.removeSetup(name));
    at.desk.edit("Months!B50", 700);
    await new Promise((resolve) => setTimeout(resolve, 700));
    expect(standing(comparison)).toBe("out of date");
    await reopen();
    expect(standing(comparison)).toBe("out of date");
    at.desk.edit(`${comparison}!A300`, "my remark");
    await redo(comparison);
    expect(standing(comparison)).toBe("current");
    expect(at.desk.value(`${comparison}!A300`)).toBe("my remark");
    expect(printed()).not.toBe(before);
    const redone = content(sheetData(comparison)).rows;
    await at.carryOut(() => at.pane.commands.read({ kind: "address", address: "Months!A4:E100" }));
    await writeComparison();
    const fresh = content(sheetData(`${comparison} 2`)).rows;
    expect(redone.slice(0, fresh.length)).toEqual(fresh);
  });

  it("is not written over where its user wrote into it, and tells which column is gone", async () => {
    await writeComparison();
    at.desk.edit("Months!B50", 700);
    at.desk.edit(`${comparison}!A1`, "Our models");
    expect(await at.faultOf(() => at.pane.commands.redoSheet(comparison))).toContain("what Footing did not write");
    at.desk.edit(`${comparison}!A1`, "");
    await redo(comparison);
    expect(at.desk.value(`${comparison}!A1`)).toBe("2 models side by side");
    at.desk.edit("Months!D4", "Adverts");
    await at.carryOut(at.pane.commands.checkSheets);
    expect(standing(comparison)).toBe("cut off");
    expect(await at.faultOf(() => at.pane.commands.redoSheet(comparison))).toContain(
      'There is no column "Advertising"',
    );
  });
});

describe("a live sheet", { timeout: 120_000 }, () => {
  it("follows its cells; turned into a kept one it can be out of date, and is not written over", async () => {
    await write("live");
    expect(standing()).toBe("follows");
    await at.carryOut(at.pane.commands.keep);
    expect(standing()).toBe("current");
    at.desk.edit("Months!B50", 700);
    await reopen();
    expect(standing()).toBe("out of date");
    expect(await at.faultOf(() => at.pane.commands.redoSheet(sheet))).toContain("cannot tell its own cells from yours");
  });
});
