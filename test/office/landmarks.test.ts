import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { parseAddress } from "../../src/core/table/address.ts";
import type { BookData } from "../../src/desk/book/bookData.ts";
import { type DeskPane, openAnsweredMonths } from "../support/deskPane.ts";
import { errand } from "../support/deskHost.ts";

const sheet = "Repairs answer";

let at: DeskPane;
beforeEach(async () => {
  at = await openAnsweredMonths();
});
afterEach(() => at.close());

const own = ({ names }: BookData, name = sheet) => names.filter((one) => one.sheet === name);
const onSheet = (name = sheet) => own(at.desk.snapshot(), name);

/** The text of a cell as its sheet shows it. */
function textAt(address: string): unknown {
  return at.desk.value(address.replaceAll("$", ""));
}

/** The tables by the area that their name holds, with the cell that the name stands for. */
const tablesOf = (names: BookData["names"]) =>
  names.flatMap(({ name, refersTo }) => {
    const [, first, last, position] = /^TitleRegion\d+\.([A-Z]+\d+)\.([A-Z]+\d+)\.(\d+)$/.exec(name) ?? [];
    return first === undefined ? [] : [{ corner: refersTo, area: parseAddress(`${first}:${last}`)!, first, position }];
  });

describe.each(["kept", "live"] as const)("headings on a %s result sheet", { timeout: 120_000 }, (kind) => {
  it("are names of the sheet: its sections in their order, and its tables", async () => {
    await at.carryOut(() => at.pane.commands.write(kind));
    const sections = onSheet().filter(({ name }) => name.startsWith("Section_"));
    expect(sections.map(({ name }) => name).toSorted()).toEqual([
      "Section_1_In_plain_words",
      "Section_2_Which_standard_errors",
      "Section_3_Drivers",
      "Section_4_Pictures",
      "Section_5_Evidence",
      "Section_6_Guards",
      "Section_7_How_this_was_made",
    ]);
    for (const { name, refersTo } of sections) {
      const words = String(textAt(refersTo)).replace(/,.*$/, "").replaceAll(" ", "_");
      expect(name).toMatch(new RegExp(`^Section_\\d_${words}$`));
    }
    const tables = tablesOf(onSheet());
    expect(tables.map(({ corner }) => textAt(corner))).toEqual([
      "Spread of the errors",
      "driver",
      "test",
      "The fit as a whole",
      "Most influential rows",
      "Setting",
    ]);
    for (const { corner, area, first, position } of tables) {
      expect(corner.replaceAll("$", "")).toBe(`'${sheet}'!${first}`);
      expect(position).toBe("7");
      expect(textAt(`'${sheet}'!A${area.row + area.rows}`)).not.toBe("");
      expect(textAt(`'${sheet}'!A${area.row + area.rows}`)).not.toBeNull();
    }
    const drivers = tables[1]!.area;
    const rowNames = Array.from({ length: drivers.rows - 1 }, (_, row) =>
      textAt(`'${sheet}'!A${drivers.row + 2 + row}`),
    );
    expect(rowNames).toEqual(["constant", "Price index", "Advertising", "Rainy days"]);
  });
});

describe("the names of a result sheet", { timeout: 120_000 }, () => {
  it("are the same on a second one, and offered to nobody as data", async () => {
    await at.carryOut(() => at.pane.commands.write("kept"));
    await at.carryOut(() => at.pane.commands.write("kept"));
    const sections = (name: string) => onSheet(name).filter((one) => one.name.startsWith("Section_"));
    expect(sections(`${sheet} 2`).map(({ name }) => name)).toEqual(sections(sheet).map(({ name }) => name));
    const listed = await at.host.listPlaces();
    const names = listed.ok ? listed.value.filter(({ kind }) => kind === "name") : [];
    expect(names.map(({ name }) => name)).toEqual(["Purchase_lots", "Footing_data_1"]);
    const book = await at.host.readBook(errand());
    expect(book.ok && book.value.names.filter(({ sheet: owner }) => owner !== null)).toEqual([]);
  });

  it("follow the sheet when it is redone, and leave a name that someone else gave it", async () => {
    await at.carryOut(() => at.pane.commands.write("kept"));
    const before = onSheet();
    await at.desk.Excel.run(async (context) => {
      const result = context.workbook.worksheets.getItem(sheet);
      result.names.add("Board_figure", result.getRange("B20"));
      await context.sync();
    });
    at.desk.edit("Months!B50", "");
    await at.carryOut(at.pane.commands.checkSheets);
    await at.carryOut(() => at.pane.commands.redoSheet(sheet));
    const after = onSheet();
    expect(after.filter(({ name }) => name === "Board_figure")).toHaveLength(1);
    expect(after).toHaveLength(before.length + 2);
    const added = after.filter(({ name }) => !before.some((one) => one.name.split(".")[0] === name.split(".")[0]));
    expect(added.map(({ refersTo, name }) => (name === "Board_figure" ? name : textAt(refersTo))).toSorted()).toEqual([
      "Board_figure",
      "Row",
    ]);
  });

  it("are in the file, and known for headings when it is opened again", async () => {
    await at.carryOut(() => at.pane.commands.write("kept"));
    const written = onSheet();
    const saved = await at.saved();
    expect(own(saved)).toEqual(written);
  });
});
