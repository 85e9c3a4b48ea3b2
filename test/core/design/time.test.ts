import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { buildDesign } from "../../../src/core/design/buildDesign.ts";
import type { Design, RowOrder } from "../../../src/core/design/design.ts";
import type { Model } from "../../../src/core/design/model.ts";
import type { Cell } from "../../../src/core/table/cells.ts";
import { driver, modelWith } from "../../support/models.ts";
import { day, faultOf, must, sourceOf } from "../../support/sheet.ts";

const byMonth = (parts: Partial<Model> = {}): Model => modelWith({ rows: { kind: "time", order: "Month" }, ...parts });
const timeOf = ({ order }: Design): Extract<RowOrder, { kind: "time" }> => {
  if (order.kind !== "time") throw new Error(order.kind);
  return order;
};

const month = (number: number): Cell => day(2024, number, 1);
const columns = (months: readonly Cell[]) => ({
  Month: months,
  Repairs: months.map((_, i) => 200 + ((i * 7) % 11)),
  Price: months.map((_, i) => 30 + ((i * 5) % 7)),
});

describe("a design of rows through time", () => {
  it("keeps rows that are in order, and names period and ends", () => {
    const design = must(buildDesign(sourceOf(columns([1, 2, 3, 4].map(month))), byMonth()));
    expect(timeOf(design)).toEqual({
      kind: "time",
      positions: Int32Array.from([0, 1, 2, 3]),
      period: { name: "monthly", unit: "month", season: 12 },
      labels: { first: "January 2024", last: "April 2024" },
      gaps: 0,
      gapLabels: [],
    });
    expect(design.notes).toEqual([]);
  });

  it("puts rows in order of time and says so", () => {
    const design = must(buildDesign(sourceOf(columns([3, 1, 4, 2].map(month))), byMonth()));
    expect([...design.sourceRows]).toEqual([1, 3, 0, 2]);
    expect([...design.outcome.values]).toEqual([207, 210, 200, 203]);
    expect(design.notes).toEqual(["The rows were not in order of Month; they were put in order."]);
  });

  it("keeps the place of periods that are missing or left out", () => {
    const source = columns([1, 2, 3, 5, 8].map(month));
    const lacking = { ...source, Price: [30, null, 33, 31, 35] };
    const design = must(buildDesign(sourceOf(lacking), byMonth()));
    expect(timeOf(design)).toMatchObject({
      gaps: 4,
      gapLabels: ["February 2024", "April 2024", "June 2024", "July 2024"],
    });
    expect([...timeOf(design).positions]).toEqual([0, 2, 4, 7]);
    expect(design.leftOut).toEqual([{ row: 3, cell: "Months!C3", because: '"Price" is blank' }]);
  });

  it("counts from the first row used", () => {
    const source = { ...columns([1, 2, 3, 4, 5].map(month)), Repairs: [null, 200, 205, 201, 208] };
    const design = must(buildDesign(sourceOf(source), byMonth()));
    expect([...timeOf(design).positions]).toEqual([0, 1, 2, 3]);
    expect(timeOf(design).labels).toEqual({ first: "February 2024", last: "May 2024" });
  });

  it("takes rows as they stand where no time column is chosen, blank rows included", () => {
    const source = { Repairs: [200, 205, null, 201, 208], Price: [30, 31, null, 36, 32] };
    const design = must(buildDesign(sourceOf(source), modelWith({ rows: { kind: "time", order: null } })));
    expect(timeOf(design)).toMatchObject({
      period: { name: "row by row", unit: "row", season: 1 },
      labels: { first: "row 2", last: "row 6" },
      gaps: 1,
      gapLabels: ["row 4"],
    });
    expect(design.notes).toEqual(["No time column was chosen: the rows are taken in the order in which they stand."]);
  });

  it("says that dates without a period count row by row", () => {
    const dates = [0, 1, 40, 41, 200].map((step) => ({ date: 45_292 + step }));
    const design = must(buildDesign(sourceOf(columns(dates)), byMonth()));
    expect(timeOf(design).period.name).toBe("row by row");
    expect(design.notes).toEqual([
      "Month follows no regular period, so each row counts as one step after the one before.",
    ]);
  });

  it("faults times that stand in two rows, each with its cell", () => {
    const source = columns([1, 2, 2, 3, 4].map(month));
    expect(faultOf(buildDesign(sourceOf(source), byMonth()))).toEqual({
      code: "repeated-time",
      column: "Month",
      cells: ["Months!A3", "Months!A4"],
      values: ["2024-02-01", "2024-02-01"],
      count: 2,
    });
    const labels = columns(["2024-01", "Jan 2024", "2024-02", "2024-03"]);
    expect(faultOf(buildDesign(sourceOf(labels), byMonth()))).toMatchObject({ values: ["2024-01", "Jan 2024"] });
  });

  it("faults rows that have an outcome but no time, and leaves out those that have neither", () => {
    const months = [month(1), null, month(3), "Total", month(5), month(6)];
    const source = columns(months);
    expect(faultOf(buildDesign(sourceOf(source), byMonth()))).toMatchObject({
      code: "unreadable-time",
      cells: ["Months!A5"],
      values: ["Total"],
    });
    const without = { ...source, Repairs: [200, null, 205, null, 201, 208] };
    expect(must(buildDesign(sourceOf(without), byMonth())).leftOutCount).toBe(2);
    const missing = { ...source, Repairs: [200, 207, 205, null, 201, 208] };
    expect(faultOf(buildDesign(sourceOf(missing), byMonth()))).toMatchObject({
      code: "missing-time",
      cells: ["Months!A3"],
      count: 1,
    });
  });

  it("faults dates kept as text whose day and month cannot be told apart", () => {
    const source = columns(["1/2/2024", "1/3/2024", "1/4/2024", "1/5/2024"]);
    expect(faultOf(buildDesign(sourceOf(source), byMonth()))).toMatchObject({ code: "dates-as-text", count: 4 });
    const empty = columns([null, null, null, null]);
    expect(faultOf(buildDesign(sourceOf(empty), byMonth()))).toMatchObject({ code: "empty-column", column: "Month" });
  });

  it("sorts by time whatever the order of rows, every row with its own values", () => {
    const permutation = fc.shuffledSubarray([...Array(12).keys()], { minLength: 12 });
    fc.assert(
      fc.property(permutation, fc.constantFrom("Jan 2024", "dates", "numbers"), (order, form) => {
        const label = (i: number): Cell =>
          form === "numbers" ? i + 1 : form === "dates" ? month(i + 1) : `2024-${String(i + 1).padStart(2, "0")}`;
        const source = sourceOf({
          Month: order.map(label),
          Repairs: order.map((i) => i * i),
          Price: order.map((i) => (i * 5) % 7),
        });
        const design = must(buildDesign(source, byMonth()));
        expect([...design.outcome.values]).toEqual([...Array(12).keys()].map((i) => i * i));
        expect([...timeOf(design).positions]).toEqual([...Array(12).keys()]);
        expect([...design.sourceRows].map((row) => order[row])).toEqual([...Array(12).keys()]);
      }),
      { seed: 17, numRuns: 150 },
    );
  });
});

describe("dates and the calendar as drivers", () => {
  const twelve = columns(Array.from({ length: 12 }, (_, i) => month(i + 1)));
  const terms = (model: Model) => must(buildDesign(sourceOf(twelve), model)).terms.slice(1);

  it("counts dates in the period they follow", () => {
    const source = sourceOf(columns([1, 2, 4, 5].map(month)));
    const design = must(buildDesign(source, modelWith({ drivers: [driver("Month", { as: "date" })] })));
    expect([...design.terms[1]!.values]).toEqual([0, 1, 3, 4]);
    expect(design.terms[1]!).toMatchObject({
      name: "Month",
      meaning: { kind: "date", column: "Month", unit: "month" },
    });
    expect(design.notes).toEqual(["Month counts months since January 2024."]);
  });

  it("counts irregular dates in days, and in years where they span more than two", () => {
    const dated = (steps: readonly number[]) =>
      must(
        buildDesign(
          sourceOf(columns(steps.map((step) => ({ date: 45_292 + step })))),
          modelWith({ drivers: [driver("Month", { as: "date" })] }),
        ),
      ).terms[1]!;
    expect(dated([0, 1, 40, 41, 200])).toMatchObject({ meaning: { unit: "day" } });
    expect([...dated([0, 1, 40, 41, 200]).values]).toEqual([0, 1, 40, 41, 200]);
    const long = dated([0, 1, 40, 41, 3652.425]);
    expect(long.meaning).toMatchObject({ unit: "year" });
    expect(long.values[4]).toBeCloseTo(10, 12);
  });

  it("counts a trend in periods from the first row used, gaps included", () => {
    const source = { ...columns([1, 2, 3, 6, 7].map(month)), Repairs: [null, 200, 205, 201, 208] };
    const design = must(buildDesign(sourceOf(source), byMonth({ calendar: ["trend"] })));
    const trend = design.terms.at(-1)!;
    expect([trend.name, trend.meaning, [...trend.values]]).toEqual([
      "trend",
      { kind: "trend", unit: "month" },
      [0, 1, 4, 5],
    ]);
  });

  it("makes quarter indicators, compared with the first quarter that occurs", () => {
    const made = terms(byMonth({ drivers: [], calendar: ["quarter indicators"] }));
    expect(made.map(({ name, values }) => [name, [...values].join("")])).toEqual([
      ["Q2", "000111000000"],
      ["Q3", "000000111000"],
      ["Q4", "000000000111"],
    ]);
    expect(made[0]!.meaning).toEqual({ kind: "season", level: "Q2", base: "Q1" });
  });

  it("makes month indicators from labels and dates alike", () => {
    const months = Array.from({ length: 24 }, (_, i) => `${2023 + Math.floor(i / 12)}-${String((i % 12) + 1)}`);
    const model = byMonth({ drivers: [], calendar: ["month indicators"] });
    const design = must(buildDesign(sourceOf(columns(months)), model));
    expect(design.terms).toHaveLength(12);
    expect(design.terms[1]).toMatchObject({ name: "February", meaning: { kind: "season", base: "January" } });
    expect([...design.terms[1]!.values].flatMap((one, i) => (one === 1 ? [i] : []))).toEqual([1, 13]);
  });

  it("faults a calendar that the times do not tell", () => {
    const numbered = sourceOf(columns([1, 2, 3, 4]));
    expect(faultOf(buildDesign(numbered, byMonth({ calendar: ["month indicators"] })))).toEqual({
      code: "calendar-needs-dates",
      driver: "month indicators",
      column: "Month",
    });
    const quarters = sourceOf(columns(["2023Q4", "2024Q1", "2024Q2", "2024Q3", "2024Q4", "2025Q1"]));
    expect(faultOf(buildDesign(quarters, byMonth({ calendar: ["month indicators"] })))).toMatchObject({
      code: "calendar-needs-dates",
    });
    expect(must(buildDesign(quarters, byMonth({ drivers: [], calendar: ["quarter indicators"] }))).terms).toHaveLength(
      4,
    );
    const january = sourceOf(columns([1, 2, 3, 4].map((one) => day(2020 + one, 1, 1))));
    expect(faultOf(buildDesign(january, byMonth({ calendar: ["month indicators"] })))).toEqual({
      code: "one-category",
      column: "month indicators",
      value: "January",
    });
  });
});
