import { afterEach, describe, expect, it } from "vitest";
import { takeInHand } from "../../src/app/dataInHand.ts";
import { fingerprint } from "../../src/app/fingerprint.ts";
import { proposeSetup } from "../../src/app/proposal.ts";
import { questionOf } from "../../src/app/questionOf.ts";
import { sheetFactsOf } from "../../src/app/sheetFacts.ts";
import type { Answer } from "../../src/core/answer/answer.ts";
import { answerTable } from "../../src/core/answer/tables.ts";
import { localAddressOf } from "../../src/core/table/address.ts";
import type { Result } from "../../src/core/problem/result.ts";
import type { BookCell, SheetData } from "../../src/desk/book/bookData.ts";
import type { NodeDesk } from "../../src/desk/client/openDesk.ts";
import { registerFunctions } from "../../src/functions/register.ts";
import { liveColumn } from "../../src/sheet/columns.ts";
import { type SheetKind, planAnswer } from "../../src/sheet/answerSheet.ts";
import { inlineAnalyst } from "../../src/worker/inlineAnalyst.ts";
import { bookOf, sheetOf } from "../support/deskBook.ts";
import { type DeskHost, errand, openDeskHost } from "../support/deskHost.ts";

const value = <T>(result: Result<T>): T => {
  if (!result.ok) throw new Error(JSON.stringify(result.problem));
  return result.value;
};

/** Sixty months whose errors follow on: each carries over part of the one before. */
const monthlyRows = (): BookCell[][] => {
  let carried = 0;
  const rows = Array.from({ length: 60 }, (_, row): BookCell[] => {
    carried = 0.7 * carried + (((row * 37) % 23) - 11) / 2;
    const price = 20 + ((row * 5) % 11);
    const rain = (row * 13) % 19;
    const month = {
      value: new Date(Date.UTC(2020, row, 1)).getTime() / 86_400_000 + 25_569,
      style: { numberFormat: "mmm yyyy" },
    };
    return [month, row === 17 ? null : 200 - 3 * price + 1.5 * rain + carried, price, row === 30 ? "n/a" : rain];
  });
  return [["Repair shop, by month"], [], ["Month", "Repairs", "Price", "Rainy days"], ...rows];
};

/** Fifty shops, each for itself. */
const shopRows = (): BookCell[][] => [
  ["Takings", "=Staff hours", "Footfall"],
  ...Array.from({ length: 50 }, (_, row): BookCell[] => {
    const hours = 30 + ((row * 7) % 41);
    const footfall = 100 + ((row * 29) % 83);
    return [12 * hours + 2 * footfall + ((((row * 17) % 31) - 15) * hours) / 10, hours, footfall];
  }),
];

let at: DeskHost | null = null;
afterEach(() => at?.desk.close());

async function open(rows: BookCell[][], more: Partial<SheetData> = {}): Promise<DeskHost> {
  const opened = await openDeskHost(bookOf(sheetOf("Data", rows, more)));
  registerFunctions(opened.desk.CustomFunctions, inlineAnalyst);
  at = opened;
  return opened;
}

/** From a selected cell to an answer, as the pane does it. */
async function answerFrom({ desk, host }: DeskHost, cell: string) {
  desk.select(cell);
  const data = value(await takeInHand(value(await host.read({ kind: "selection" }, errand()))));
  const question = value(questionOf(data.source, proposeSetup(data.columns)));
  const answer = value(await inlineAnalyst.analyse(question, errand()));
  return { data, question, answer };
}

async function writeAnswer({ desk, host }: DeskHost, made: Awaited<ReturnType<typeof answerFrom>>, kind: SheetKind) {
  const facts = sheetFactsOf(made.question, {
    date: "1 December 2026",
    version: "1.2.3",
    fingerprint: await fingerprint(made.data.source.columns),
    headingRow: made.data.headingRow,
    table: made.data.table,
  });
  const { sheet } = value(await host.write(planAnswer(made.answer, facts, kind), errand()));
  await desk.settle();
  return sheet;
}

/** The drivers' table as it stands on a result sheet: the row of each term, its numbers alone. */
function shownFigures(desk: NodeDesk, sheet: string, { terms }: Answer): number[][] {
  const cells = desk.values(`'${sheet}'!A1:K80`);
  return terms.map((term) => {
    const row = cells.find((line) => line[0] === term);
    if (row === undefined) throw new Error(`no row of ${term}`);
    return row.filter((cell) => typeof cell === "number");
  });
}

const figuresOf = (answer: Answer): number[][] =>
  answerTable(answer)
    .slice(1)
    .map((row) => row.filter((cell) => typeof cell === "number"));

function expectSame(shown: readonly number[][], wanted: readonly number[][]): void {
  expect(shown.map(({ length }) => length)).toEqual(wanted.map(({ length }) => length));
  wanted.forEach((row, index) =>
    row.forEach((figure, place) => {
      expect(Math.abs(shown[index]![place]! - figure)).toBeLessThanOrEqual(1e-9 * Math.max(1e-6, Math.abs(figure)));
    }),
  );
}

const errorsOn = (desk: NodeDesk, sheet: string): string[] =>
  desk
    .snapshot()
    .sheets.filter(({ name }) => name === sheet)
    .flatMap(({ rows }) => rows.flat())
    .flatMap((cell) => {
      const held = typeof cell === "object" && cell !== null && "value" in cell ? cell.value : cell;
      return typeof held === "object" && held !== null ? [JSON.stringify(held)] : [];
    });

describe("from cells to a result sheet", () => {
  it.each(["kept", "live"] as const)("through time, %s: the sheet shows the answer", async (kind) => {
    const opened = await open(monthlyRows());
    const made = await answerFrom(opened, "Data!B9");
    expect(made.answer.rows).toMatchObject({ kind: "time", first: "January 2020", last: "December 2024" });
    expect(made.answer).toMatchObject({ observations: 58, leftOutCount: 2 });
    const sheet = await writeAnswer(opened, made, kind);
    expect(sheet).toBe("Repairs answer");
    expect(errorsOn(opened.desk, sheet)).toEqual([]);
    expectSame(shownFigures(opened.desk, sheet, made.answer), figuresOf(made.answer));
  });

  it("live: the sheet moves with its cells, and the kept one beside it does not", async () => {
    const opened = await open(monthlyRows());
    const before = await answerFrom(opened, "Data!B9");
    const kept = await writeAnswer(opened, before, "kept");
    const live = await writeAnswer(opened, before, "live");
    opened.desk.edit("Data!B21", 333);
    opened.desk.edit("Data!C40", 7.5);
    await opened.desk.settle();
    const after = await answerFrom(opened, "Data!B9");
    expect(after.answer.coefficients[1]).not.toBeCloseTo(before.answer.coefficients[1]!, 3);
    expectSame(shownFigures(opened.desk, live, after.answer), figuresOf(after.answer));
    expectSame(shownFigures(opened.desk, kept, before.answer), figuresOf(before.answer));
    expect(errorsOn(opened.desk, live)).toEqual([]);
  });

  it("live, over a table: a row added to the table is carried through, and the formulas name its columns", async () => {
    const [, ...shops] = shopRows();
    const rows = [["Takings", "Staff [hours]", "Footfall's #"], ...shops];
    const opened = await open(rows, { tables: [{ name: "Shops", address: "A1:C51" }] });
    const before = await answerFrom(opened, "Data!A1");
    const live = await writeAnswer(opened, before, "live");
    expectSame(shownFigures(opened.desk, live, before.answer), figuresOf(before.answer));
    const columns = "Shops[[#Headers],[#Data],[Takings]],Shops[[#Headers],[#Data],[Staff '[hours']]:[Footfall''s '#]]";
    const written = opened.desk.snapshot().sheets.find(({ name }) => name === live)!;
    expect(JSON.stringify(written.rows)).toContain(JSON.stringify(`=FOOTING.ANSWER(${columns},$`).slice(1, -1));
    for (const [cell, typed] of [
      ["A52", 999],
      ["B52", 71],
      ["C52", 120],
    ] as const)
      opened.desk.edit(`Data!${cell}`, typed);
    await opened.desk.settle();
    const after = await answerFrom(opened, "Data!A1");
    expect(after.answer.observations).toBe(51);
    expect(after.answer.coefficients[1]).not.toBeCloseTo(before.answer.coefficients[1]!, 3);
    expectSame(shownFigures(opened.desk, live, after.answer), figuresOf(after.answer));
  });

  it("live: says so where a spreadsheet shows the first cell of a result alone", async () => {
    const opened = await open(shopRows());
    const sheet = await writeAnswer(opened, await answerFrom(opened, "Data!A1"), "live");
    expect(opened.desk.value(`'${sheet}'!A4`)).toBe("");
    const fed = localAddressOf({ row: 3, column: liveColumn, rows: 1, columns: 1 });
    expect(opened.desk.value(`'${sheet}'!${fed}`)).toBe("driver");
    opened.desk.edit(`'${sheet}'!${fed}`, "driver");
    await opened.desk.settle();
    expect(opened.desk.value(`'${sheet}'!A4`)).toMatch(/first cell of each function's result and not the rest/);
  });

  it("live, then kept: the sheet looks the same and holds no formula", async () => {
    const opened = await open(monthlyRows());
    const made = await answerFrom(opened, "Data!B9");
    const sheet = await writeAnswer(opened, made, "live");
    const shown = (): unknown => opened.desk.values(`'${sheet}'!A1:BZ120`);
    const before = shown();
    expect(value(await opened.host.keepSheet(errand()))).toEqual({ sheet });
    await opened.desk.settle();
    expect(shown()).toEqual(before);
    const kept = opened.desk.snapshot().sheets.find(({ name }) => name === sheet)!;
    const cells = kept.rows.flat().filter((cell) => typeof cell === "object" && cell !== null && "formula" in cell);
    expect(cells).toEqual([]);
    expect(kept.charts).toHaveLength(3);
    expectSame(shownFigures(opened.desk, sheet, made.answer), figuresOf(made.answer));
  });

  it("separate cases: a heading that looks like a formula stays a heading all the way", async () => {
    const opened = await open(shopRows());
    const made = await answerFrom(opened, "Data!A1");
    expect(made.answer.terms).toEqual(["constant", "=Staff hours", "Footfall"]);
    for (const kind of ["kept", "live"] as const) {
      const sheet = await writeAnswer(opened, made, kind);
      expect(errorsOn(opened.desk, sheet)).toEqual([]);
      expectSame(shownFigures(opened.desk, sheet, made.answer), figuresOf(made.answer));
    }
  });
});
