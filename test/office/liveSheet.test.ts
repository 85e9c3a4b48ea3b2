import { afterEach, beforeEach, describe, expect, it } from "vitest";
import type { SheetData } from "../../src/desk/book/bookData.ts";
import { registerFunctions } from "../../src/functions/register.ts";
import type { PlanCell, SheetPlan } from "../../src/sheet/plan.ts";
import { inlineAnalyst } from "../../src/worker/inlineAnalyst.ts";
import { bookOf, sheetOf } from "../support/deskBook.ts";
import { type DeskHost, errand, openDeskHost } from "../support/deskHost.ts";

const rows = Array.from({ length: 30 }, (_, row) => {
  const price = 10 + ((row * 7) % 13) / 2;
  return [50 - 2 * price + (((row * 17) % 11) - 5) / 3, price];
});

const formula = (text: string): PlanCell => ({ kind: "formula", formula: text });
const text = (words: string): PlanCell => ({ kind: "text", text: words });

/** Figures that follow the data, and texts that would be something else if they were typed. */
const plan: SheetPlan = {
  name: "Repairs answer",
  blocks: [
    {
      row: 0,
      column: 0,
      cells: [[text("=Repairs")], [text("007")], [formula('=IF(D1="","",D1)')], [formula("=A3=B1")]],
    },
    { row: 0, column: 3, cells: [[formula("=FOOTING.COEFFICIENTS(Data!A1:A31,Data!B1:B31)")]] },
    { row: 5, column: 0, cells: [[formula("=D9&CHAR(61)&1")], [formula('=IF(D9="","",D9)')]] },
  ],
  formats: [],
  links: [],
  columnWidths: [],
  frozenRows: 0,
  charts: [],
  printArea: null,
};

const answerSheet = "'Repairs answer'";

let at: DeskHost;
beforeEach(async () => {
  at = await openDeskHost(bookOf(sheetOf("Data", [["Repairs", "Price"], ...rows])));
});
afterEach(() => at.desk.close());

const sheets = (): readonly SheetData[] => at.desk.snapshot().sheets;
const formulasOn = (name: string): readonly string[] =>
  sheets()
    .find((sheet) => sheet.name === name)!
    .rows.flat()
    .flatMap((cell) => (typeof cell === "object" && cell !== null && "formula" in cell ? [cell.formula] : []));

async function writeLive(): Promise<void> {
  registerFunctions(at.desk.CustomFunctions, inlineAnalyst);
  expect(await at.host.write(plan, errand())).toMatchObject({ ok: true });
  await at.desk.settle();
}

describe("turning a live sheet into a kept one", () => {
  it("puts values in the place of formulas and changes nothing that shows", async () => {
    await writeLive();
    const before = at.desk.values(`${answerSheet}!A1:D7`);
    expect(formulasOn("Repairs answer")).toHaveLength(5);
    expect(await at.host.keepSheet(errand())).toEqual({ ok: true, value: { sheet: "Repairs answer" } });
    await at.desk.settle();
    expect(formulasOn("Repairs answer")).toEqual([]);
    expect(at.desk.values(`${answerSheet}!A1:D7`)).toEqual(before);
    expect(before[0]).toEqual(["=Repairs", "", "", expect.any(Number)]);
    expect(before[1]).toEqual(["007", "", "", expect.any(Number)]);
    expect(before[5]![0]).toBe("=1");
  });

  it("keeps the figures when the data change afterwards", async () => {
    await writeLive();
    await at.host.keepSheet(errand());
    const before = at.desk.values(`${answerSheet}!A1:D7`);
    at.desk.edit("Data!A2", 400);
    await at.desk.settle();
    expect(at.desk.values(`${answerSheet}!A1:D7`)).toEqual(before);
  });

  it("refuses while values are missing, names their cells and leaves the formulas", async () => {
    await writeLive();
    at.desk.edit("Data!A9", "=1/0");
    await at.desk.settle();
    const kept = await at.host.keepSheet(errand());
    const problem = kept.ok || kept.problem.code !== "values-missing" ? null : kept.problem;
    expect(problem?.cells).toContain(`${answerSheet}!D1`);
    expect(problem?.count).toBe(problem?.cells.length);
    expect(formulasOn("Repairs answer")).toHaveLength(5);
  });

  it("refuses while functions are at work", async () => {
    // No add-in has taken up the functions: they stay busy.
    await at.host.write(plan, errand());
    const kept = await at.host.keepSheet(errand());
    expect(kept.ok ? null : kept.problem).toMatchObject({
      code: "values-missing",
      values: ["#BUSY!", "#BUSY!", "#BUSY!"],
    });
  });

  it("leaves a sheet alone that Footing did not write, though it holds formulas", async () => {
    await writeLive();
    at.desk.edit("Data!D1", "=SUM(A2:A9)");
    at.desk.select("Data!A1");
    await at.desk.settle();
    expect(await at.host.keepSheet(errand())).toEqual({
      ok: false,
      problem: { code: "not-a-result-sheet", sheet: "Data" },
    });
    expect(at.desk.formula("Data!D1")).toBe("=SUM(A2:A9)");
  });

  it("changes nothing once cancelled, and nothing on a sheet that is kept already", async () => {
    await writeLive();
    expect(await at.host.keepSheet(errand(AbortSignal.abort()))).toEqual({ ok: false, problem: { code: "cancelled" } });
    expect(formulasOn("Repairs answer")).toHaveLength(5);
    await at.host.keepSheet(errand());
    const before = at.desk.values(`${answerSheet}!A1:D7`);
    expect(await at.host.keepSheet(errand())).toEqual({ ok: true, value: { sheet: "Repairs answer" } });
    expect(at.desk.values(`${answerSheet}!A1:D7`)).toEqual(before);
  });
});

describe("recalculating the sheet in front", () => {
  it("calls its functions again, though no cell has changed", async () => {
    let calls = 0;
    registerFunctions(
      {
        ...at.desk.CustomFunctions,
        associate: (id: string, run: (...given: unknown[]) => unknown) =>
          at.desk.CustomFunctions.associate(id, (...given: unknown[]) => {
            calls += 1;
            return run(...given);
          }),
      } as typeof at.desk.CustomFunctions,
      inlineAnalyst,
    );
    await at.host.write(plan, errand());
    await at.desk.settle();
    const before = calls;
    expect(before).toBeGreaterThan(0);
    expect(await at.host.recalculateSheet()).toEqual({ ok: true, value: { sheet: "Repairs answer" } });
    await at.desk.settle();
    expect(calls).toBe(before + 1);
  });
});
