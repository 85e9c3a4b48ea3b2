import { describe, expect, it } from "vitest";
import { analyse } from "../../src/core/answer/analyse.ts";
import { defaultOptions } from "../../src/core/answer/options.ts";
import type { Question } from "../../src/core/answer/question.ts";
import type { Model } from "../../src/core/design/model.ts";
import type { Cell } from "../../src/core/table/cells.ts";
import { type ComparedModel, comparabilityOf, comparedDrivers, comparedLines } from "../../src/sheet/comparison.ts";
import { planComparison } from "../../src/sheet/comparisonSheet.ts";
import type { PlanCell, SheetPlan } from "../../src/sheet/plan.ts";
import { driver, modelWith } from "../support/models.ts";
import { must, sourceOf } from "../support/sheet.ts";

const count = 40;
const at = (make: (row: number) => Cell): Cell[] => Array.from({ length: count }, (_, row) => make(row));
const price = at((row) => 20 + ((row * 7) % 13));
const rain = at((row) => (row === 5 ? null : (row * 11) % 17));
const repairs = at((row) => 300 - 4 * (price[row] as number) + 2 * ((row * 11) % 17) + (((row * 29) % 23) - 11));
const takings = at((row) => 9 * (price[row] as number) + ((row * 31) % 19));
const source = sourceOf({ Repairs: repairs, Price: price, Rain: rain, Takings: takings });

function compared(name: string, model: Model, more: Partial<Question> = {}): ComparedModel {
  const question = { source, model, options: defaultOptions, ...more };
  return { name, question, answer: must(analyse(question, () => undefined)), address: "Months!A1:D41" };
}

const both = compared("Both", modelWith({ drivers: [driver("Price"), driver("Rain")] }));
const one = compared("Price alone", modelWith({ drivers: [driver("Price")] }));
const models = [both, one];

describe("what can be compared", () => {
  it("says on how many rows each model rests alone", () => {
    expect(comparabilityOf(models)).toEqual([
      '"Both" and "Price alone" do not rest on the same rows: 1 row is used by "Price alone" alone.',
      "Where rows differ, so may the coefficients for that reason alone; R-squared and Akaike's criterion cannot be set against each other.",
    ]);
    expect(comparabilityOf([one, { ...one, name: "Again" }])).toEqual(["All models rest on the same 40 rows."]);
  });

  it("says where sheets, outcomes, levels or the constant differ", () => {
    const elsewhere = {
      ...source,
      columns: source.columns.map((column) => ({
        ...column,
        place: { kind: "sheet", sheet: "Other", column: 0, firstRow: 1 } as const,
      })),
    };
    const other = compared(
      "Takings",
      {
        ...modelWith({ drivers: [driver("Price")], constant: false }),
        outcome: { column: "Takings", transform: { kind: "none" } },
      },
      { source: elsewhere, options: { ...defaultOptions, level: 0.1 } },
    );
    const said = comparabilityOf([one, other]);
    expect(said[0]).toMatch(/^The models explain different outcomes \(Repairs; Takings\)/);
    expect(said[1]).toBe('"Price alone" and "Takings" rest on data of different sheets.');
    expect(said.slice(3)).toEqual([
      "The intervals are not of the same level: 95 %, 90 %.",
      "Some models have no constant: their R-squared measures from 0 and cannot be set against that of the others.",
    ]);
  });
});

it("sets every term in a row and every model in a column, the constant last", () => {
  const drivers = comparedDrivers(models);
  expect(drivers.map(({ term }) => term)).toEqual(["Price", "Rain", "constant"]);
  expect(drivers[1]?.in.map((found) => found?.coefficient ?? null)).toEqual([both.answer.coefficients[2], null]);
  const lines = new Map(comparedLines(models).map(({ label, values }) => [label, values]));
  expect(lines.get("Rows used")).toEqual([39, 40]);
  expect(lines.get("Rows left out")).toEqual([1, 0]);
  expect(lines.get("R-squared")).toEqual(models.map(({ answer }) => answer.fit.rSquared));
  expect(lines.get("Standard errors in force")?.every((words) => /ratio against/.test(String(words)))).toBe(true);
});

describe("the sheet", () => {
  const facts = {
    date: "1 December 2026",
    version: "0.1.0",
    models: [
      { fingerprint: "aa11", settings: [["rows", "cases"]] as const },
      { fingerprint: "bb22", settings: [["hidden rows", "left out"]] as const },
    ],
  };
  const plan: SheetPlan = planComparison(models, facts);
  const held = (cell: PlanCell): string | number | null =>
    cell === null ? null : cell.kind === "text" ? cell.text : cell.kind === "number" ? cell.number : cell.formula;
  const rows = plan.blocks[0]!.cells.map((line) => line.map(held));
  const after = (label: string, figure: string): (string | number | null)[] => {
    const first = rows.findIndex((line) => line[0] === label);
    return rows
      .slice(first)
      .find((line) => line[1] === figure)!
      .slice(2);
  };

  it("holds the figures in force of each model in full", () => {
    const price = models.map(({ answer }) => answer.drivers[1]!);
    expect(after("Price", "coefficient")).toEqual(price.map(({ coefficient }) => coefficient));
    expect(after("Price", "standard error")).toEqual(price.map(({ standardError }) => standardError));
    expect(after("Price", "95 % interval from")).toEqual(price.map(({ low }) => low));
    expect(after("Price", "to")).toEqual(price.map(({ high }) => high));
    expect(after("Price", "p-value")).toEqual(price.map(({ pValue }) => pValue));
    expect(after("Price", "firm or leaning")).toEqual(price.map(({ firmness }) => firmness.kind));
    expect(after("Rain", "coefficient")).toEqual([both.answer.coefficients[2], "not in it"]);
  });

  it("says what can be compared and how each model was made, in rows of equal length", () => {
    const words = rows.flat().filter((cell) => typeof cell === "string");
    expect(words).toEqual(
      expect.arrayContaining([...comparabilityOf(models), "aa11", "bb22", "hidden rows", "left out"]),
    );
    expect(new Set(rows.map(({ length }) => length))).toEqual(new Set([4]));
    expect(plan.printArea).toEqual({ row: 0, column: 0, rows: rows.length, columns: 4 });
  });
});
