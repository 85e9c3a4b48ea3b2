import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { addressOf, parseAddress } from "../../src/core/table/address.ts";
import type { BookCell, StyledCell } from "../../src/desk/book/bookData.ts";
import type { NodeDesk } from "../../src/desk/client/openDesk.ts";
import { demoBook } from "../../src/desk/demo/demoBook.ts";
import { functionTable } from "../../src/functions/functionTable.ts";
import { registerFunctions } from "../../src/functions/register.ts";
import { inlineAnalyst } from "../../src/worker/inlineAnalyst.ts";
import { openDeskHost } from "../support/deskHost.ts";

const sheet = demoBook().sheets.find(({ name }) => name === "Functions")!;

const isFormula = (cell: BookCell): cell is StyledCell & { readonly formula: string } =>
  typeof cell === "object" && cell !== null && "formula" in cell;

const samples = sheet.rows.flatMap((cells, row) =>
  cells.flatMap((cell, column) => {
    if (!isFormula(cell)) return [];
    const id = /^=FOOTING\.([A-Z]+)\(/.exec(cell.formula)![1]!;
    return [{ id, cell, address: addressOf({ sheet: "Functions", row, column, rows: 1, columns: 1 }), row }];
  }),
);
const at = (id: string): string => samples.find((sample) => sample.id === id)!.address;

describe("the demo's sheet of functions", () => {
  let desk: NodeDesk;
  let fits = 0;
  beforeAll(async () => {
    ({ desk } = await openDeskHost(demoBook()));
    const analyse: typeof inlineAnalyst.analyse = (question, errand) => {
      fits += 1;
      return inlineAnalyst.analyse(question, errand);
    };
    registerFunctions(desk.CustomFunctions, { ...inlineAnalyst, analyse });
    await desk.settle();
  });
  afterAll(() => desk.close());

  it("has every function once, with a sentence beside it and no value of its own", () => {
    expect(samples.map(({ id }) => id).toSorted()).toEqual(functionTable.map(({ id }) => id).toSorted());
    for (const { id, cell, row } of samples) {
      expect(cell.value).toBeNull();
      expect(desk.value(`Functions!A${row}`)).toBe(id);
      expect(desk.value(`Functions!B${row}`)).toMatch(/^[A-Z].{20,}\.$/);
    }
  });

  it.each(samples.map(({ id, address }) => [id, address]))(
    "%s comes to a value when the book is opened",
    (_, address) => {
      expect(desk.error(address)).toBeNull();
      expect(desk.value(address)).not.toBe("");
    },
  );

  it("leaves every result the room set aside for it", () => {
    const formulas = desk.snapshot().sheets.find(({ name }) => name === "Functions")!;
    for (const [index, { id, row }] of samples.entries()) {
      const cell = formulas.rows[row]!.find((one) => typeof one === "object" && one !== null && "formula" in one);
      const spill = parseAddress((cell as StyledCell).spill ?? "B1")!;
      const next = samples[index + 1]?.row ?? Infinity;
      expect(row + spill.rows, id).toBeLessThan(next - 1);
    }
  });

  it("fits the months once for each way of asking", () => {
    // By the key alone, and with the settings kept in cells.
    expect(fits).toBe(2);
  });

  it("follows the settings kept in its cells", async () => {
    const { row, column } = parseAddress(at("INTERVALS"))!;
    const corner = addressOf({ sheet: "Functions", row, column, rows: 1, columns: 2 });
    const width = ([low, high]: readonly unknown[]): number => Number(high) - Number(low);
    const before = width(desk.values(corner)[0]!);
    desk.edit(`Functions!I${row + 2}`, 0.01);
    await desk.settle();
    expect(width(desk.values(corner)[0]!)).toBeGreaterThan(before * 1.2);
  });
});
