import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { buildDesign } from "../../../src/core/design/buildDesign.ts";
import type { Design } from "../../../src/core/design/design.ts";
import type { Model, Transform } from "../../../src/core/design/model.ts";
import type { Cell } from "../../../src/core/table/cells.ts";
import { driver, modelWith } from "../../support/models.ts";
import { day, faultOf, must, sourceOf } from "../../support/sheet.ts";

const month = (number: number): Cell => day(2024, number, 1);
const through = (transform: Transform, parts: Partial<Model> = {}): Model =>
  modelWith({ rows: { kind: "time", order: "Month" }, drivers: [driver("Price", { transform })], ...parts });
const built = (months: readonly number[], price: readonly Cell[], model: Model): Design =>
  must(buildDesign(sourceOf({ Month: months.map(month), Repairs: months.map((_, i) => i * i), Price: price }), model));

const six = [1, 2, 3, 4, 5, 6];
const price = [10, 12, 15, 12, 18, 9];

describe("transforms", () => {
  it.each<[Transform, string, number[]]>([
    [{ kind: "logarithm" }, "logarithm of Price", price.map(Math.log)],
    [{ kind: "square" }, "square of Price", [100, 144, 225, 144, 324, 81]],
    [{ kind: "lag", periods: 1 }, "Price 1 month earlier", [10, 12, 15, 12, 18]],
    [{ kind: "lag", periods: 3 }, "Price 3 months earlier", [10, 12, 15]],
    [{ kind: "change", periods: 1 }, "change of Price", [2, 3, -3, 6, -9]],
    [{ kind: "change", periods: 2 }, "change of Price over 2 months", [5, 0, 3, -3]],
    [{ kind: "growth rate", periods: 1 }, "growth rate of Price", [20, 25, -20, 50, -50]],
  ])("makes %o", (transform, name, values) => {
    const design = built(six, price, through(transform));
    expect(design.terms[1]!.name).toBe(name);
    expect(design.terms[1]!.meaning).toEqual({ kind: "number", column: "Price", transform });
    expect([...design.terms[1]!.values].map((value) => Number(value.toFixed(12)))).toEqual(
      values.map((value) => Number(value.toFixed(12))),
    );
    expect(design.outcome.values).toHaveLength(values.length);
  });

  it("transforms the outcome too, and names it", () => {
    const model = through(
      { kind: "none" },
      { outcome: { column: "Repairs", transform: { kind: "change", periods: 1 } } },
    );
    const { outcome } = built(six, price, model);
    expect(outcome).toMatchObject({
      name: "change of Repairs",
      column: "Repairs",
      transform: { kind: "change", periods: 1 },
    });
    expect([...outcome.values]).toEqual([1, 3, 5, 7, 9]);
  });

  it("looks back by time and never steps over a missing month", () => {
    const design = built([1, 2, 3, 5, 6, 7, 8], [10, 12, 15, 18, 9, 11, 14], through({ kind: "lag", periods: 1 }));
    expect([...design.terms[1]!.values]).toEqual([10, 12, 18, 9, 11]);
    expect(design.leftOut).toEqual([
      { row: 2, cell: "Months!C2", because: '"Price" has no row 1 month earlier' },
      { row: 5, cell: "Months!C5", because: '"Price" has no row 1 month earlier' },
    ]);
  });

  it("looks back to rows that are themselves left out, and says which cell is missing", () => {
    const source = sourceOf({
      Month: six.map(month),
      Repairs: [1, null, 9, 16, 25, 36],
      Price: [10, 12, 15, "NA", 18, 9],
    });
    const design = must(buildDesign(source, through({ kind: "lag", periods: 1 })));
    expect([...design.terms[1]!.values]).toEqual([12, 15, 18]);
    expect(design.leftOut).toEqual([
      { row: 2, cell: "Months!C2", because: '"Price" has no row 1 month earlier' },
      { row: 3, cell: "Months!B3", because: '"Repairs" is blank' },
      { row: 6, cell: "Months!C5", because: '"Price" holds "NA" 1 month earlier' },
    ]);
  });

  it("takes the outcome's own past as a driver", () => {
    const model = through(
      { kind: "none" },
      { drivers: [driver("Repairs", { transform: { kind: "lag", periods: 1 } })] },
    );
    expect([...built(six, price, model).terms[1]!.values]).toEqual([0, 1, 4, 9, 16]);
  });

  it("looks back within groups only", () => {
    const source = sourceOf({
      Shop: ["A", "A", "A", "B", "B", "B"],
      Year: [2019, 2020, 2021, 2019, 2020, 2021],
      Repairs: [1, 4, 9, 17, 25, 36],
      Price: price,
    });
    const rows = { kind: "groups", by: "Shop", second: null, order: "Year" } as const;
    const design = must(buildDesign(source, through({ kind: "change", periods: 1 }, { rows })));
    expect([...design.terms[1]!.values]).toEqual([2, 3, 6, -9]);
    const unordered = through({ kind: "change", periods: 1 }, { rows: { ...rows, order: null } });
    expect(faultOf(buildDesign(source, unordered))).toMatchObject({ code: "transform-needs-time" });
  });

  it("faults growth from nothing with the cell it would start from", () => {
    const source = sourceOf({ Month: six.map(month), Repairs: price, Price: [10, 0, 5, 7, 8, -2] });
    expect(faultOf(buildDesign(source, through({ kind: "growth rate", periods: 1 })))).toEqual({
      code: "growth-from-nonpositive",
      column: "Price",
      cells: ["Months!C3"],
      count: 1,
    });
  });

  it("faults a number of periods that is none", () => {
    const source = sourceOf({ Month: six.map(month), Repairs: price, Price: price });
    expect(faultOf(buildDesign(source, through({ kind: "lag", periods: 0 })))).toMatchObject({
      code: "unknown-value",
      setting: "lag",
      value: "0",
    });
  });

  it("finds for every row the value so many periods earlier, whatever the order and the gaps", () => {
    const months = fc.uniqueArray(fc.integer({ min: 0, max: 40 }), { minLength: 8, maxLength: 30 });
    const shuffled = months.chain((list) => fc.shuffledSubarray(list, { minLength: list.length }));
    const label = (at: number): string => `${2019 + Math.floor(at / 12)}-${(at % 12) + 1}`;
    const valueOf = (at: number): number => ((at * 37) % 101) + at / 100;
    fc.assert(
      fc.property(shuffled, fc.integer({ min: 1, max: 3 }), (list, periods) => {
        const source = sourceOf({
          Month: list.map(label),
          Repairs: list.map((at) => (at * 53) % 97),
          Price: list.map(valueOf),
        });
        const withPast = list.filter((at) => list.includes(at - periods)).sort((a, b) => a - b);
        fc.pre(withPast.length > 1);
        const { terms, sourceRows } = must(buildDesign(source, through({ kind: "lag", periods }, { constant: false })));
        expect([...sourceRows].map((row) => list[row])).toEqual(withPast);
        expect([...terms[0]!.values]).toEqual(withPast.map((at) => valueOf(at - periods)));
      }),
      { seed: 18, numRuns: 200 },
    );
  });
});
