import { afterEach, describe, expect, it } from "vitest";
import type { BookCell } from "../../src/desk/book/bookData.ts";
import type { NodeDesk } from "../../src/desk/client/openDesk.ts";
import type { BlankArrival } from "../../src/desk/workbook/metadata.ts";
import { registerFunctions } from "../../src/functions/register.ts";
import { inlineAnalyst } from "../../src/worker/inlineAnalyst.ts";
import type { Question } from "../../src/core/answer/question.ts";
import { bookOf, sheetOf } from "../support/deskBook.ts";
import { openDeskHost } from "../support/deskHost.ts";

/** Forty rows: repairs = 50 - 2 price + 0.5 rain and an error of no pattern that sums to nothing in particular. */
const errors = [3, -2, 5, -4, 1, -3, 2, 4, -5, -1, 2, 3, -4, 1, -2, 5, -3, 0.5, -1.5, 2.5];
const data = Array.from({ length: 40 }, (_, row) => {
  const price = 10 + ((row * 7) % 13) / 2;
  const rain = (row * 11) % 17;
  return [50 - 2 * price + 0.5 * rain + errors[(row * 3) % 20]!, price, rain] as const;
});
const rows: readonly BookCell[][] = [["Repairs", "Price", "Rain"], ...data.map((row) => [...row])];

let desk: NodeDesk | null = null;
afterEach(() => desk?.close());

async function open(cells: readonly (readonly BookCell[])[] = rows, blank: BlankArrival = null) {
  const asked: Question[] = [];
  const opened = await openDeskHost(bookOf(sheetOf("Data", cells), sheetOf("Work", [])), { blank });
  registerFunctions(opened.desk.CustomFunctions, {
    ...inlineAnalyst,
    analyse: (question, errand) => {
      asked.push(question);
      return inlineAnalyst.analyse(question, errand);
    },
  });
  desk = opened.desk;
  const type = async (formula: string, cell = "Work!A1") => {
    opened.desk.edit(cell, formula);
    await opened.desk.settle();
  };
  return { desk: opened.desk, asked, type };
}

/** Least squares by the normal equations, for these well-behaved numbers: another way than the product's. */
function leastSquares(y: readonly number[], x: readonly (readonly number[])[]): number[] {
  const design = x.map((row) => [1, ...row]);
  const k = design[0]!.length;
  const system = Array.from({ length: k }, (_, i) => [
    ...Array.from({ length: k }, (_, j) => design.reduce((sum, row) => sum + row[i]! * row[j]!, 0)),
    design.reduce((sum, row, r) => sum + row[i]! * y[r]!, 0),
  ]);
  for (let i = 0; i < k; i++) {
    for (let j = 0; j < k; j++) {
      if (j === i) continue;
      const factor = system[j]![i]! / system[i]![i]!;
      system[j] = system[j]!.map((value, c) => value - factor * system[i]![c]!);
    }
  }
  return system.map((row, i) => row[k]! / row[i]!);
}

const expected = (used: readonly (readonly number[])[]) =>
  leastSquares(
    used.map(([y]) => y!),
    used.map(([, ...x]) => x),
  );

const near = (found: readonly unknown[], wanted: readonly number[]) =>
  wanted.forEach((value, index) => expect(found[index]).toBeCloseTo(value, 9));

describe("functions typed into a sheet", () => {
  it("ANSWER spills its table, and moves when a cell moves", async () => {
    const { desk: sheet, type } = await open();
    await type("=FOOTING.ANSWER(Data!A1:A41,Data!B1:C41)");
    const table = sheet.values("Work!A1:K4");
    expect(table[0]).toEqual([
      "driver",
      "coefficient",
      "classical",
      "White",
      "Newey-West",
      "in force",
      "ratio",
      "p-value",
      "low",
      "high",
      "conclusion",
    ]);
    expect(table.slice(1).map(([name]) => name)).toEqual(["constant", "Price", "Rain"]);
    near(
      table.slice(1).map((row) => row[1]),
      expected(data),
    );
    expect(table.slice(1).map((row) => row[4])).toEqual(["", "", ""]);
    for (const row of table.slice(1)) {
      expect(row.slice(1, 4).every((cell) => typeof cell === "number" && Number.isFinite(cell))).toBe(true);
      expect(Number(row[6])).toBeCloseTo(Number(row[1]) / Number(row[5]), 9);
    }
    sheet.edit("Data!A5", 80);
    await sheet.settle();
    const moved = data.with(3, [80, data[3]![1], data[3]![2]]);
    near(
      sheet.values("Work!B2:B4").map(([cell]) => cell),
      expected(moved),
    );
  });

  it("share one fit, and do not ask again while nothing they read changes", async () => {
    const { desk: sheet, asked, type } = await open();
    await type("=FOOTING.ANSWER(Data!A1:A41,Data!B1:C41)");
    await type("=FOOTING.ERRORS(Data!A1:A41,Data!B1:C41)", "Work!M1");
    await type('=FOOTING.ERRORS(Data!A1:A41,Data!B1:C41,"white")', "Work!N1");
    await type("=FOOTING.VERDICT(Data!A1:A41,Data!B1:C41)", "Work!O1");
    await type("=FOOTING.CHOICE(Data!A1:A41,Data!B1:C41)", "Work!P1");
    await type("=FOOTING.EVIDENCE(Data!A1:A41,Data!B1:C41)", "Work!R1");
    expect(asked).toHaveLength(1);
    expect(sheet.values("Work!N1:N3")).toEqual(sheet.values("Work!D2:D4"));
    expect(sheet.values("Work!M1:M3")).toEqual(sheet.values("Work!F2:F4"));
    expect(sheet.value("Work!O1")).toMatch(/Repairs/);
    expect(sheet.value("Work!P1")).toMatch(/standard errors|classical|White/i);
    expect(sheet.value("Work!R1")).toBe("test");
    sheet.edit("Data!F9", 1);
    await sheet.settle();
    expect(asked).toHaveLength(1);
    sheet.edit("Data!B9", 12.25);
    await sheet.settle();
    expect(asked).toHaveLength(2);
  });

  it.each(["", null] as const)("leave out rows with blanks that arrive as %o, and keep zeros", async (blank) => {
    const gaps = rows.map((row, index) =>
      index === 7 ? [row[0]!, null, row[2]!] : index === 12 ? [0, ...row.slice(1)] : row,
    );
    const { desk: sheet, type } = await open(gaps, blank);
    await type("=FOOTING.COEFFICIENTS(Data!A1:A41,Data!B1:C41)");
    const used = data.with(11, [0, data[11]![1], data[11]![2]]).toSpliced(6, 1);
    near(
      sheet.values("Work!A1:A3").map(([cell]) => cell),
      expected(used),
    );
  });

  it("cannot tell a blank that arrives as 0 from a zero, on versions of Excel that hand it over so", async () => {
    const gaps = rows.map((row, index) => (index === 7 ? [row[0]!, null, row[2]!] : row));
    const { desk: sheet, type } = await open(gaps, 0);
    await type("=FOOTING.COEFFICIENTS(Data!A1:A41,Data!B1:C41)");
    near(
      sheet.values("Work!A1:A3").map(([cell]) => cell),
      expected(data.with(6, [data[6]![0], 0, data[6]![2]])),
    );
  });

  it.each(["", null, 0] as const)("take whole columns, blanks below them as %o", async (blank) => {
    const { desk: sheet, type } = await open(rows, blank);
    await type("=FOOTING.COEFFICIENTS(Data!A:A,Data!B:C)");
    near(
      sheet.values("Work!A1:A3").map(([cell]) => cell),
      expected(data),
    );
  });

  it("run through time when a key says so, with settings from cells", async () => {
    const keyed = rows.map((row, index) => [...row, index === 0 ? "Month" : 45_291 + index]);
    const { desk: sheet, asked, type } = await open(keyed);
    sheet.edit("Data!F1", "lags");
    sheet.edit("Data!G1", 3);
    await type("=FOOTING.ANSWER(Data!A1:A41,Data!B1:C41,Data!F1:G2,Data!D1:D41)");
    expect(asked.at(-1)?.model.rows).toEqual({ kind: "time", order: "Month" });
    expect(sheet.values("Work!E2:E4").every(([cell]) => typeof cell === "number" && cell > 0)).toBe(true);
    sheet.edit("Data!G1", 5);
    await sheet.settle();
    expect(asked.at(-1)?.options.lags).toEqual({ kind: "given", lags: 5 });
  });

  it("say in the cell's error what is wrong, and where", async () => {
    const { desk: sheet, type } = await open(rows.map((row, index) => (index === 5 ? ["x1", ...row.slice(1)] : row)));
    await type("=FOOTING.ANSWER(Data!A1:A41,Data!B1:C41)");
    expect(sheet.error("Work!A1")).toBe("#VALUE!");
    expect(sheet.message("Work!A1")).toContain("ow 6 of outcome");
    expect(sheet.message("Work!A1")).toContain('"x1"');
    await type("=FOOTING.ANSWER(Data!A1:A3,Data!B1:C3)");
    expect(sheet.error("Work!A1")).toBe("#N/A");
    await type('=FOOTING.ANSWER(Data!A1:A41,Data!B1:C41,"polcy: careful")');
    expect(sheet.message("Work!A1")).toContain("policy");
  });

  it("receive error cells and say where they are", async () => {
    const { desk: sheet, type } = await open(
      rows.map((row, index) =>
        index === 9 ? [row[0]!, { value: { error: "#DIV/0!" }, formula: "=1/0" }, row[2]!] : row,
      ),
    );
    await type("=FOOTING.ANSWER(Data!A1:A41,Data!B1:C41)");
    expect(sheet.error("Work!A1")).toBe("#VALUE!");
    expect(sheet.message("Work!A1")).toContain("ow 10 of drivers, column 1");
  });

  it("RESIDUALS and FITTED stand beside the data, row by row", async () => {
    const gaps = rows.map((row, index) => (index === 7 ? [row[0]!, null, row[2]!] : row));
    const { desk: sheet, asked, type } = await open(gaps);
    await type("=FOOTING.RESIDUALS(Data!A1:A41,Data!B1:C41)", "Data!E1");
    await type("=FOOTING.FITTED(Data!A1:A41,Data!B1:C41)", "Data!F1");
    expect(sheet.values("Data!E1:F1")).toEqual([["residuals", "fitted"]]);
    expect(sheet.values("Data!E8:F8")).toEqual([["", ""]]);
    const [constant = 0, price = 0, rain = 0] = expected(data.toSpliced(6, 1));
    for (const [index, cells] of sheet.values("Data!A2:F41").entries()) {
      if (index === 6) continue;
      const [y, x1, x2] = data[index]!;
      near(cells.slice(4), [y - (constant + price * x1 + rain * x2), constant + price * x1 + rain * x2]);
    }
    expect(asked).toHaveLength(1);
  });

  it("COVARIANCE, JOINT and PREDICT agree with the answer", async () => {
    const { desk: sheet, type } = await open();
    await type("=FOOTING.ANSWER(Data!A1:A41,Data!B1:C41)");
    await type('=FOOTING.COVARIANCE(Data!A1:A41,Data!B1:C41,"white")', "Work!M1");
    const [, ...table] = sheet.values("Work!A1:J4").map((row) => row.map(Number));
    const covariance = sheet.values("Work!M1:O3").map((row) => row.map(Number));
    near(
      covariance.map((row, index) => Math.sqrt(row[index]!)),
      table.map((row) => row[3]!),
    );
    sheet.edit("Data!H1", 1);
    sheet.edit("Data!I1", 0);
    await type('=FOOTING.JOINT(Data!A1:A41,Data!B1:C41,Data!H1:I1,-1.5,"classical")', "Work!A10");
    const ratio = (table[1]![1]! + 1.5) / table[1]![2]!;
    near(sheet.values("Work!A10:A10")[0]!, [ratio ** 2]);
    expect(sheet.value("Work!B10")).toBe("1, 37");
    sheet.edit("Data!H5", 12);
    sheet.edit("Data!I5", 4);
    await type("=FOOTING.PREDICT(Data!A1:A41,Data!B1:C41,Data!H5:I6)", "Work!A20");
    near(sheet.values("Work!A20:A20")[0]!, [table[0]![1]! + 12 * table[1]![1]! + 4 * table[2]![1]!]);
    const [value, low, high] = sheet.values("Work!A20:C20")[0]!.map(Number);
    expect(low).toBeLessThan(value!);
    expect(value! - low!).toBeCloseTo(high! - value!, 9);
    expect(sheet.values("Work!A21:C21")).toEqual([["", "", ""]]);
  });

  it("JOINT and PREDICT say what their own arguments lack", async () => {
    const { desk: sheet, type } = await open();
    await type("=FOOTING.JOINT(Data!A1:A41,Data!B1:C41,Data!B2:B3)");
    expect(sheet.error("Work!A1")).toBe("#VALUE!");
    expect(sheet.message("Work!A1")).toContain("3 columns");
    await type("=FOOTING.PREDICT(Data!A1:A41,Data!B1:C41,Data!B2:B3)");
    expect(sheet.message("Work!A1")).toContain("Price, Rain");
    await type('=FOOTING.COVARIANCE(Data!A1:A41,Data!B1:C41,"newey-west")');
    expect(sheet.error("Work!A1")).toBe("#N/A");
  });

  it("SETTINGS spills the manual", async () => {
    const { desk: sheet, type } = await open();
    await type("=FOOTING.SETTINGS()");
    expect(sheet.values("Work!A1:D1")).toEqual([["setting", "values", "when left out", "meaning"]]);
    expect(sheet.value("Work!A3")).toBe("policy");
  });
});
