import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { buildDesign } from "../../../src/core/design/buildDesign.ts";
import type { Design } from "../../../src/core/design/design.ts";
import type { Cell } from "../../../src/core/table/cells.ts";
import { readBlock } from "../../../src/core/table/locate.ts";
import type { Source } from "../../../src/core/table/source.ts";
import { driver, modelWith } from "../../support/models.ts";
import { blockOf, day, faultOf, must, sourceOf } from "../../support/sheet.ts";

const repairs = [210, 198, 240, 205, 222];
const price = [31, 33, 29, 32, 30.5];

const termValues = ({ terms }: Design): number[][] => terms.map(({ values }) => [...values]);
const argumentSource = (columns: Readonly<Record<string, readonly Cell[]>>): Source => {
  const source = sourceOf(columns);
  const place = (column: number) =>
    ({
      kind: "argument",
      argument: column === 0 ? "outcome" : "drivers",
      column: Math.max(column - 1, 0),
      firstRow: 1,
    }) as const;
  return { ...source, columns: source.columns.map((column, i) => ({ ...column, place: place(i) })) };
};

describe("a design of separate cases", () => {
  it("puts the constant first and the drivers in the order chosen", () => {
    const source = sourceOf({ Rain: [9, 12, 4, 7, 6], Price: price, Repairs: repairs });
    const design = must(buildDesign(source, modelWith({ drivers: [driver("Price"), driver("rain ")] })));
    expect(design.terms.map(({ name }) => name)).toEqual(["constant", "Price", "Rain"]);
    expect(termValues(design)).toEqual([[1, 1, 1, 1, 1], price, [9, 12, 4, 7, 6]]);
    expect([...design.outcome.values]).toEqual(repairs);
    expect(design).toMatchObject({ hasConstant: true, rowCount: 5, order: { kind: "cases" }, leftOut: [], notes: [] });
    expect([...design.sourceRows]).toEqual([0, 1, 2, 3, 4]);
    expect(design.terms[1]!.meaning).toEqual({ kind: "number", column: "Price", transform: { kind: "none" } });
  });

  it("has no constant where none is wanted, and then takes a constant driver", () => {
    const source = sourceOf({ Repairs: repairs, Ones: [1, 1, 1, 1, 1] });
    const design = must(buildDesign(source, modelWith({ drivers: [driver("Ones")], constant: false })));
    expect([design.terms.map(({ name }) => name), design.hasConstant]).toEqual([["Ones"], false]);
  });

  it("leaves rows out with row, cell and the first reason", () => {
    const source = sourceOf({
      Repairs: [210, null, 240, "NA", 205, null, 222, 231],
      Price: [31, 33, "?", null, 32, null, { error: "#N/A" }, 35],
    });
    const design = must(buildDesign(source, modelWith()));
    expect([...design.sourceRows]).toEqual([0, 4, 7]);
    expect(design.leftOutCount).toBe(5);
    expect(design.leftOut).toEqual([
      { row: 3, cell: "Months!A3", because: '"Repairs" is blank' },
      { row: 4, cell: "Months!B4", because: '"Price" holds "?"' },
      { row: 5, cell: "Months!A5", because: '"Repairs" holds "NA"' },
      { row: 7, cell: "Months!A7", because: "the row is blank" },
      { row: 8, cell: "Months!B8", because: '"Price" holds "#N/A"' },
    ]);
  });

  it("does not leave out a row for a column that is not used", () => {
    const source = sourceOf({ Repairs: repairs, Price: price, Rain: [null, 9, "n.k.", 7, { error: "#REF!" }] });
    expect(must(buildDesign(source, modelWith())).leftOutCount).toBe(0);
  });

  it("lists a thousand rows left out and counts them all", () => {
    const gaps = Array.from({ length: 1500 }, () => null);
    const source = sourceOf({ Repairs: [...repairs, ...gaps], Price: [...price, ...gaps.map((_, i) => i)] });
    const design = must(buildDesign(source, modelWith()));
    expect([design.leftOut.length, design.leftOutCount]).toEqual([1000, 1500]);
  });

  it("names rows and cells of arguments", () => {
    const source = argumentSource({
      Repairs: [210, null, 240, 205, 222],
      Rain: [9, 12, 4, 7, 5],
      Price: [31, 33, 29, "-", 28],
    });
    const design = must(buildDesign(source, modelWith({ drivers: [driver("Price")] })));
    expect(design.leftOut).toEqual([
      { row: 3, cell: "row 3 of outcome, column 1", because: '"Repairs" is blank' },
      { row: 5, cell: "row 5 of drivers, column 2", because: '"Price" holds "-"' },
    ]);
  });

  it("reads text numbers where the model says so, and notes it", () => {
    const source = sourceOf({ Repairs: repairs, Price: ["31", "33,5", "29", "32", "30"] });
    expect(faultOf(buildDesign(source, modelWith()))).toMatchObject({
      code: "text-numbers",
      column: "Price",
      count: 5,
    });
    const agreed = modelWith({ textNumbers: [{ column: "price", decimal: "," }] });
    const design = must(buildDesign(source, agreed));
    expect([...design.terms[1]!.values]).toEqual([31, 33.5, 29, 32, 30]);
    expect(design.notes).toEqual(['Price: 5 texts were read as numbers, such as "31".']);
  });

  it("uses the same rows whatever their order, and exactly those that lack nothing", () => {
    const cell = fc.oneof(
      { weight: 4, arbitrary: fc.integer({ min: -50, max: 50 }) },
      fc.constantFrom(null, "NA", "-"),
    );
    const rows = fc.array(fc.tuple(cell, cell), { minLength: 6, maxLength: 40 });
    const shuffled = rows.chain((list) =>
      fc.tuple(fc.constant(list), fc.shuffledSubarray(list, { minLength: list.length })),
    );
    const isWhole = (row: readonly unknown[]): boolean => row.every((one) => typeof one === "number");
    const design = (list: readonly (readonly [Cell, Cell])[]) =>
      buildDesign(sourceOf({ Repairs: list.map(([y]) => y), Price: list.map(([, x]) => x) }), modelWith());
    const sorted = ({ outcome, terms }: Design): string[] =>
      [...outcome.values].map((y, i) => `${y} ${terms[1]!.values[i]!}`).sort();
    fc.assert(
      fc.property(shuffled, ([list, other]) => {
        const whole = list.filter(isWhole);
        fc.pre(whole.length > 2);
        const one = must(design(list));
        expect([...one.sourceRows]).toEqual(list.flatMap((row, i) => (isWhole(row) ? [i] : [])));
        expect(one.leftOut.map(({ row }) => row - 2)).toEqual(list.flatMap((row, i) => (isWhole(row) ? [] : [i])));
        expect(sorted(must(design(other)))).toEqual(sorted(one));
      }),
      { seed: 16, numRuns: 200 },
    );
  });
});

describe("what was said of the cells", () => {
  it("goes with the design", () => {
    const rows = [["Repairs", "Price"], ...repairs.map((one, i) => [one, price[i]!]), ["Total", 155.5]];
    const { source } = must(readBlock(blockOf(rows)));
    expect(must(buildDesign(source, modelWith())).notes).toEqual([
      'Row 7 ("Total") sums up the rows above it and was not read.',
    ]);
  });
});

describe("faults of a model", () => {
  const source = sourceOf({
    Repairs: repairs,
    Price: price,
    Region: ["N", "S", "N", "S", "N"],
    Month: [1, 2, 3, 4, 5].map((month) => day(2024, month, 1)),
    Huge: [1, 2, 1e200, 3, 4],
    Zero: [1, 2, 0, 3, -4],
  });
  const fault = (parts: Parameters<typeof modelWith>[0]) => faultOf(buildDesign(source, modelWith(parts)));
  const none = { kind: "none" } as const;

  it("names roles that are missing", () => {
    expect(fault({ outcome: { column: " ", transform: none } })).toEqual({ code: "no-outcome" });
    expect(fault({ drivers: [] })).toEqual({ code: "no-drivers" });
    expect(fault({ rows: { kind: "groups", by: "", second: null, order: null } })).toEqual({ code: "no-group-column" });
  });

  it("names headings that do not exist, with the nearest", () => {
    expect(fault({ drivers: [driver("Pirce")] })).toEqual({
      code: "unknown-heading",
      heading: "Pirce",
      nearest: "Price",
      where: "the columns chosen on Months",
    });
    expect(fault({ rows: { kind: "time", order: "Moth" } })).toMatchObject({ heading: "Moth", nearest: "Month" });
  });

  it("names headings that stand above two columns", () => {
    const twice = { ...source, columns: [...source.columns, { ...source.columns[1]!, name: "price" }] };
    expect(must(buildDesign(twice, modelWith())).terms).toHaveLength(2);
    const both = { ...source, columns: [...source.columns, source.columns[1]!] };
    expect(faultOf(buildDesign(both, modelWith()))).toEqual({
      code: "repeated-heading",
      heading: "Price",
      cells: ["Months!B2:B6", "Months!B2:B6"],
    });
  });

  it("names columns that are used twice", () => {
    expect(fault({ drivers: [driver("repairs")] })).toEqual({
      code: "column-used-twice",
      column: "Repairs",
      first: "the outcome",
      second: "a driver",
    });
    expect(fault({ drivers: [driver("Repairs", { transform: { kind: "square" } })] })).toMatchObject({
      second: "a driver",
    });
    expect(fault({ drivers: [driver("Price"), driver("price")] })).toMatchObject({
      first: "a driver",
      second: "the same driver",
    });
    expect(fault({ rows: { kind: "time", order: "Repairs" } })).toMatchObject({ second: "the time column" });
    expect(fault({ rows: { kind: "groups", by: "Repairs", second: null, order: null } })).toMatchObject({
      second: "the group column",
    });
  });

  it("takes a column twice under different transforms", () => {
    const drivers = [driver("Price"), driver("Price", { transform: { kind: "square" } })];
    expect(must(buildDesign(source, modelWith({ drivers }))).terms.map(({ name }) => name)).toEqual([
      "constant",
      "Price",
      "square of Price",
    ]);
  });

  it("names columns that cannot be fitted", () => {
    expect(fault({ drivers: [driver("Region")] })).toMatchObject({ code: "no-numbers", column: "Region" });
    expect(fault({ drivers: [driver("Month")] })).toMatchObject({ code: "dates-in-number-column", column: "Month" });
    expect(fault({ drivers: [driver("Huge")] })).toEqual({
      code: "numbers-too-large",
      column: "Huge",
      cell: "Months!E4",
      value: 1e200,
    });
  });

  it("names numbers whose square or logarithm cannot be had", () => {
    const big = sourceOf({ Repairs: repairs, Price: [1, 2, 3e80, 4, 5] });
    const squared = modelWith({ drivers: [driver("Price", { transform: { kind: "square" } })] });
    expect(faultOf(buildDesign(big, squared))).toMatchObject({ code: "numbers-too-large", cell: "Months!B4" });
    expect(fault({ drivers: [driver("Zero", { transform: { kind: "logarithm" } })] })).toEqual({
      code: "logarithm-of-nonpositive",
      column: "Zero",
      cells: ["Months!F4", "Months!F6"],
      count: 2,
    });
  });

  it("counts the rows that are needed", () => {
    const short = sourceOf({ Repairs: [210, 198, null], Price: [31, 33, 29] });
    expect(faultOf(buildDesign(short, modelWith()))).toEqual({ code: "too-few-rows", rows: 2, needed: 3, leftOut: 1 });
    const none = sourceOf({ Repairs: [210, 198, 240], Price: [null, null, 5], Rain: [1, 2, null] });
    const two = modelWith({ drivers: [driver("Price"), driver("Rain")] });
    expect(faultOf(buildDesign(none, two))).toEqual({ code: "too-few-rows", rows: 0, needed: 4, leftOut: 3 });
  });

  it("takes as many rows as columns and one more", () => {
    const least = sourceOf({ Repairs: [210, 198, 240], Price: [31, 33, 29] });
    expect(must(buildDesign(least, modelWith())).rowCount).toBe(3);
  });

  it("wants an order in time for transforms that look back and for the calendar", () => {
    const change = driver("Price", { transform: { kind: "change", periods: 1 } });
    expect(fault({ drivers: [change] })).toEqual({
      code: "transform-needs-time",
      column: "Price",
      transform: "change",
    });
    expect(fault({ calendar: ["trend"] })).toEqual({ code: "calendar-needs-dates", driver: "trend", column: null });
  });
});
