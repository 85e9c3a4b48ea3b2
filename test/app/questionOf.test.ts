import { describe, expect, it } from "vitest";
import { takeInHand } from "../../src/app/dataInHand.ts";
import { proposeSetup } from "../../src/app/proposal.ts";
import { questionOf } from "../../src/app/questionOf.ts";
import { assignRole, changeColumn, type Setup } from "../../src/app/setup.ts";
import { must } from "../support/sheet.ts";
import { repairMonths } from "../support/repairs.ts";
import { toCellColumn } from "../support/cellColumns.ts";

const rows = repairMonths(24).map((cells, row) => [...cells, row === 0 ? "Shop" : ["North", "South"][row % 2]!]);
const data = must(
  await takeInHand({
    sheet: "Months",
    firstRow: 0,
    firstColumn: 0,
    rowCount: rows.length,
    columns: rows[0]!.map((_, column) => toCellColumn(rows.map((cells) => cells[column]!))),
    address: "Months!A1:F25",
    table: null,
  }),
);
const setup = proposeSetup(data.columns);
const ask = (changed: Setup) => questionOf(data.source, changed);

describe("the question that a set-up asks", () => {
  it("has the outcome and drivers of the guess, through time", () => {
    const { model } = must(ask(setup));
    expect(model.outcome).toEqual({ column: "Repairs", transform: { kind: "none" } });
    expect(model.drivers.map(({ column }) => column)).toEqual(["Price index", "Advertising", "Rainy days"]);
    expect(model.rows).toEqual({ kind: "time", order: "Month" });
  });

  it("reads a category as one, with its base", () => {
    const changed = changeColumn(assignRole(setup, "Shop", "driver"), "Shop", { base: "South" });
    expect(must(ask(changed)).model.drivers.at(-1)).toEqual({
      column: "Shop",
      as: "category",
      base: "South",
      transform: { kind: "none" },
    });
  });

  it("carries units, tested values and agreed text numbers of the columns that take part", () => {
    const changed = [
      ["Repairs", { unit: " repairs a month " }],
      ["Price index", { against: -2, textNumbers: "," }],
      ["Rainy days", { unit: "   " }],
      ["Shop", { textNumbers: "." }],
    ] as const;
    const question = must(ask(changed.reduce((all, [column, details]) => changeColumn(all, column, details), setup)));
    expect(question.options.units).toEqual({ Repairs: "repairs a month" });
    expect(question.options.against).toEqual({ "Price index": -2 });
    expect(question.model.textNumbers).toEqual([{ column: "Price index", decimal: "," }]);
  });

  it("lets a driver enter in two forms, and the outcome as its earlier values", () => {
    const square = changeColumn(setup, "Price index", { also: { kind: "square" }, against: 4 });
    const both = changeColumn(square, "Repairs", { also: { kind: "lag", periods: 1 } });
    const { model, options } = must(ask(both));
    expect(model.drivers.map(({ column, transform }) => [column, transform.kind])).toEqual([
      ["Price index", "none"],
      ["Price index", "square"],
      ["Advertising", "none"],
      ["Rainy days", "none"],
      ["Repairs", "lag"],
    ]);
    expect(options.against).toEqual({});
  });

  it("takes of the outcome its earlier values alone, whatever was chosen while it was a driver", () => {
    const left = changeColumn(setup, "Repairs", { also: { kind: "square" } });
    expect(must(ask(left)).model.drivers.map(({ column }) => column)).not.toContain("Repairs");
  });

  it("has groups that cross the first ones", () => {
    const grouped = assignRole(assignRole(setup, "Shop", "group"), "Rainy days", "second group");
    expect(must(ask(grouped)).model.rows).toEqual({
      kind: "groups",
      by: "Shop",
      second: "Rainy days",
      order: "Month",
    });
  });

  it("tests nothing against a value given before a column ceased to be a driver", () => {
    const changed = assignRole(changeColumn(setup, "Price index", { against: 5 }), "Price index", "unused");
    expect(must(ask(changed)).options.against).toEqual({});
  });

  it("groups by the group column, in the order of the time column", () => {
    const { model } = must(ask(assignRole(setup, "Shop", "group")));
    expect(model.rows).toEqual({ kind: "groups", by: "Shop", second: null, order: "Month" });
  });

  it("says which role is missing", () => {
    const problemOf = (changed: Setup): string => {
      const asked = ask(changed);
      return asked.ok ? "none" : asked.problem.code;
    };
    const without = (names: readonly string[]): Setup =>
      names.reduce((all, name) => assignRole(all, name, "unused"), setup);
    expect(problemOf(without(["Repairs"]))).toBe("no-outcome");
    expect(problemOf(without(["Price index", "Advertising", "Rainy days"]))).toBe("no-drivers");
    expect(problemOf({ ...setup, rows: "groups" })).toBe("no-group-column");
  });
});
