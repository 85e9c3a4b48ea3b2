import { describe, expect, it } from "vitest";
import { takeInHand } from "../../src/app/dataInHand.ts";
import { previewOf } from "../../src/app/preview.ts";
import { proposeSetup } from "../../src/app/proposal.ts";
import { changeColumn } from "../../src/app/setup.ts";
import type { Cell } from "../../src/core/table/cells.ts";
import { must } from "../support/sheet.ts";
import { repairMonths } from "../support/repairs.ts";
import { toCellColumn } from "../support/cellColumns.ts";

const dataOf = async (rows: readonly (readonly Cell[])[]) =>
  must(
    await takeInHand({
      sheet: "Months",
      firstRow: 0,
      firstColumn: 0,
      rowCount: rows.length,
      columns: rows[0]!.map((_, column) => toCellColumn(rows.map((cells) => cells[column]!))),
      address: "Months!A1:E25",
      table: null,
    }),
  );

const rows = repairMonths(24);
rows[9]![2] = null;

describe("what a set-up makes of the rows", () => {
  it("tells the rows used, their period and gap, and what is left out", async () => {
    const data = await dataOf(rows);
    const preview = must(previewOf(data.source, proposeSetup(data.columns))!);
    expect(preview).toMatchObject({
      used: 23,
      leftOutCount: 1,
      rows: { kind: "time", period: { name: "monthly" }, gaps: 1 },
    });
    expect(preview.leftOut[0]).toMatchObject({ row: 10, cell: "Months!C10" });
  });

  it("tells what is in the way, until it is out of it", async () => {
    const data = await dataOf(
      rows.map((cells, row) => cells.map((cell, column) => (row === 4 && column === 3 ? "12.5" : cell))),
    );
    const setup = proposeSetup(data.columns);
    expect(previewOf(data.source, setup)).toMatchObject({ ok: false, problem: { code: "text-numbers" } });
    expect(previewOf(data.source, changeColumn(setup, "Advertising", { textNumbers: "." }))).toMatchObject({
      ok: true,
    });
  });

  it("holds back where there are too many rows to try at each change", async () => {
    const data = await dataOf(rows);
    const setup = proposeSetup(data.columns);
    expect(previewOf({ ...data.source, rowCount: 20_001 }, setup)).toBeNull();
  });
});
