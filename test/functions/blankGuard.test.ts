import { afterEach, describe, expect, it } from "vitest";
import type { Host } from "../../src/app/host.ts";
import { failure } from "../../src/core/problem/result.ts";
import type { BookCell } from "../../src/desk/book/bookData.ts";
import type { NodeDesk } from "../../src/desk/client/openDesk.ts";
import type { BlankArrival } from "../../src/desk/workbook/metadata.ts";
import { blankGuard } from "../../src/functions/blankGuard.ts";
import { registerFunctions } from "../../src/functions/register.ts";
import { inlineAnalyst } from "../../src/worker/inlineAnalyst.ts";
import { bookOf, sheetOf } from "../support/deskBook.ts";
import { openDeskHost } from "../support/deskHost.ts";

/** Forty rows with true zeros among the drivers, and gaps where they are asked for. */
const rows = (gaps: readonly (readonly [row: number, column: number])[]): BookCell[][] => [
  ["Repairs", "Price", "Rain"],
  ...Array.from({ length: 40 }, (_, row) => {
    const price = 10 + ((row * 7) % 13) / 2;
    const rain = (row * 11) % 5;
    return [50 - 2 * price + 0.5 * rain + ((row * 29) % 17) / 3, price, rain].map((value, column) =>
      gaps.some(([r, c]) => r === row && c === column) ? null : value,
    );
  }),
];

let desk: NodeDesk | null = null;
afterEach(() => desk?.close());

interface Opening {
  readonly gaps: Parameters<typeof rows>[0];
  readonly blank: BlankArrival;
  /** In the place of the sheet's own answer. */
  readonly read?: Host["read"];
}

async function open({ gaps, blank, read }: Opening) {
  const opened = await openDeskHost(bookOf(sheetOf("Data", rows(gaps)), sheetOf("Out", [])), { blank });
  desk = opened.desk;
  const asked: unknown[] = [];
  const guard = blankGuard((where, errand) => {
    asked.push(where);
    return (read ?? opened.host.read)(where, errand);
  });
  registerFunctions(opened.desk.CustomFunctions, inlineAnalyst, guard);
  const coefficients = async (formula: string): Promise<readonly unknown[]> => {
    opened.desk.edit("Out!A1", formula);
    await opened.desk.settle();
    return opened.desk.values("Out!A1:A3").flat();
  };
  return { desk: opened.desk, asked, coefficients };
}

const gaps = [
  [3, 1],
  [17, 2],
  [30, 0],
] as const;
const bounded = "=FOOTING.COEFFICIENTS(Data!A1:A41,Data!B1:C41)";

/** What comes out where blanks arrive as such. */
async function exact(where: Opening["gaps"] = gaps): Promise<readonly unknown[]> {
  const { coefficients } = await open({ gaps: where, blank: null });
  const found = await coefficients(bounded);
  desk?.close();
  return found;
}

describe("zeros that may be blank cells", () => {
  it.each([bounded, "=FOOTING.COEFFICIENTS(Data!A:A,Data!B:C)"])("are looked up in the sheet: %s", async (formula) => {
    const wanted = await exact();
    const { asked, coefficients } = await open({ gaps, blank: 0 });
    expect(await coefficients(formula)).toEqual(wanted);
    expect(asked.length).toBeGreaterThan(0);
  });

  it("stay zeros where the cells hold zeros", async () => {
    const { desk: sheet, asked, coefficients } = await open({ gaps: [], blank: null });
    const found = await coefficients(bounded);
    expect(asked).toEqual([{ kind: "address", address: "Data!B1:C41" }]);
    sheet.edit("Data!H1", 1);
    expect(await coefficients("=FOOTING.COEFFICIENTS(Data!$A$1:$A$41,Data!$B$1:$C$41)")).toEqual(found);
  });

  it("are not looked up once a blank has arrived as one", async () => {
    const { asked, coefficients } = await open({ gaps, blank: null });
    await coefficients(bounded);
    await coefficients("=FOOTING.COEFFICIENTS(Data!A5:A20,Data!B5:C20)");
    expect(asked).toEqual([]);
  });

  it("are looked up once for all calls that wait for the same range", async () => {
    const { desk: sheet, asked } = await open({ gaps, blank: 0 });
    for (let row = 1; row <= 9; row++) sheet.edit(`Out!A${row}`, "=FOOTING.CHOICE(Data!A1:A41,Data!B1:C41)");
    await sheet.settle();
    expect(asked).toHaveLength(2);
  });

  it("are taken as they are where the sheet does not answer, unless blanks are known to arrive as zeros", async () => {
    let answers = false;
    const busy: Host["read"] = () => Promise.resolve(failure({ code: "excel-busy" }));
    let own: Host["read"] = busy;
    const opened = await open({ gaps, blank: 0, read: (...asked) => (answers ? own : busy)(...asked) });
    const asZeros = await opened.coefficients(bounded);
    const wanted = await exact();
    expect(asZeros.every((value) => typeof value === "number")).toBe(true);
    expect(asZeros).not.toEqual(wanted);
    desk = opened.desk;
    const { excelHost } = await import("../../src/office/excelHost.ts");
    own = excelHost({ run: opened.desk.Excel.run, isSetSupported: () => true }).read;
    answers = true;
    expect(await opened.coefficients("=FOOTING.COEFFICIENTS(Data!$A$1:$A$41,Data!B1:C41)")).toEqual(wanted);
    answers = false;
    await opened.coefficients("=FOOTING.COEFFICIENTS(Data!$A$1:$A$41,Data!$B$1:$C$41)");
    expect(opened.desk.error("Out!A1")).toBe("#N/A");
    expect(opened.desk.message("Out!A1")).toContain("busy");
  });

  it("cannot be told in what is calculated in the argument itself", async () => {
    const wanted = await exact([[3, 1]]);
    const { asked, coefficients } = await open({ gaps: [[3, 1]], blank: 0 });
    const found = await coefficients("=FOOTING.COEFFICIENTS(Data!A2:A41,Data!B2:C41*1)");
    expect(asked).toEqual([]);
    expect(found.every((value) => typeof value === "number")).toBe(true);
    expect(found).not.toEqual(wanted);
    expect(await coefficients("=FOOTING.COEFFICIENTS(Data!A2:A41,Data!B2:C41)")).toEqual(wanted);
  });
});
