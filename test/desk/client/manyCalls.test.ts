import { afterEach, expect, it } from "vitest";
import { openDesk, type NodeDesk } from "../../../src/desk/client/openDesk.ts";
import type { FunctionsMetadata } from "../../../src/desk/workbook/metadata.ts";
import { bookOf, sheetOf } from "../../support/deskBook.ts";

const functions: FunctionsMetadata = {
  allowErrorForDataTypeAny: true,
  functions: ["SEEN", "WRITES"].map((id) => ({
    id,
    name: id,
    parameters: [{ name: "data", type: "any", dimensionality: "matrix" as const }],
  })),
};

const rows = Array.from({ length: 30 }, (_, row) => [row, `text ${row}`, row % 3 === 0 ? null : { error: "#N/A" }]);

let desk: NodeDesk | null = null;
afterEach(() => desk?.close());

async function open() {
  const opened = await openDesk({ book: bookOf(sheetOf("Data", rows), sheetOf("Out", [])), functions });
  desk = opened;
  const seen: unknown[][][] = [];
  opened.CustomFunctions.associate("SEEN", (data: unknown[][]) => seen.push(data));
  opened.CustomFunctions.associate("WRITES", (data: unknown[][]) => {
    data[0]![0] = "mine";
    return 1;
  });
  await opened.Office.onReady();
  return { desk: opened, seen };
}

it("hands one range to many calls as one object, and other ranges as others", async () => {
  const { desk: sheet, seen } = await open();
  for (let row = 1; row <= 20; row++) sheet.edit(`Out!A${row}`, "=FOOTING.SEEN(Data!$A$1:$B$30)");
  sheet.edit("Out!B1", "=FOOTING.SEEN(Data!$A$1:$B$29)");
  await sheet.settle();
  expect(seen).toHaveLength(21);
  expect(new Set(seen).size).toBe(2);
  expect(seen[0]).toEqual(rows.map((row) => row.slice(0, 2)));
});

it("lets no call write into the cells of another: that one fails, as a function that throws", async () => {
  const { desk: sheet, seen } = await open();
  sheet.edit("Out!A1", "=FOOTING.WRITES(Data!$A$1:$B$30)");
  sheet.edit("Out!A2", "=FOOTING.SEEN(Data!$A$1:$B$30)");
  await sheet.settle();
  expect(sheet.error("Out!A1")).toBe("#VALUE!");
  expect(seen[0]?.[0]).toEqual([0, "text 0"]);
});

it("hands over error values as the runtime's own, call by call", async () => {
  const { desk: sheet, seen } = await open();
  sheet.edit("Out!A1", "=FOOTING.SEEN(Data!$C$1:$C$4)");
  sheet.edit("Out!A2", "=FOOTING.SEEN(Data!$C$1:$C$4)");
  await sheet.settle();
  expect(seen).toHaveLength(2);
  for (const [first, second] of seen) {
    expect(first).toEqual([null]);
    expect(second![0]).toBeInstanceOf(sheet.CustomFunctions.Error);
  }
});
