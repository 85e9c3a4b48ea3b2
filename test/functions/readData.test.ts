import { describe, expect, it } from "vitest";
import type { Problem } from "../../src/core/problem/problem.ts";
import type { Cell, CellColumn } from "../../src/core/table/cells.ts";
import { readData } from "../../src/functions/readData.ts";
import { ErrorCode } from "../support/functionsRuntime.ts";
import { toCellColumn } from "../support/cellColumns.ts";

const column = (...cells: unknown[]): unknown[][] => cells.map((cell) => [cell]);

const read = (outcome: unknown, drivers: unknown, key: unknown = null) => {
  const result = readData({ outcome, drivers, key });
  if (!result.ok) throw new Error(result.problem.code);
  return result.value;
};

const problemOf = (outcome: unknown, drivers: unknown, key: unknown = null): Problem => {
  const result = readData({ outcome, drivers, key });
  if (result.ok) throw new Error("no problem");
  return result.problem;
};

const cells = (...list: Cell[]): CellColumn => toCellColumn(list);

describe("arguments as columns", () => {
  it("take names from headings and keep every kind of cell", () => {
    const error = { code: ErrorCode.notAvailable, type: "CustomFunctionError" };
    const { source, parts } = read(column("Repairs", 5, null, 0, "n/a", true), [
      ["Price", "Region"],
      [1.5, "North"],
      [error, ""],
      [0, undefined],
      ["", "North"],
      [false, "South"],
    ]);
    expect(parts).toEqual({ outcome: "Repairs", drivers: ["Price", "Region"], key: null, keyIs: "time", order: null });
    expect(source.rowCount).toBe(5);
    expect(source.columns.map(({ cells: found }) => found)).toEqual([
      cells(5, null, 0, "n/a", true),
      cells(1.5, { error: "#N/A" }, 0, null, false),
      cells("North", null, null, "North", "South"),
    ]);
    expect(source.columns.map(({ place }) => place)).toEqual([
      { kind: "argument", argument: "outcome", column: 0, firstRow: 1 },
      { kind: "argument", argument: "drivers", column: 0, firstRow: 1 },
      { kind: "argument", argument: "drivers", column: 1, firstRow: 1 },
    ]);
  });

  it.each([null, undefined, ""])("count a blank that arrives as %o as missing, and a zero as zero", (blank) => {
    const { source } = read(column("Repairs", 5, blank, 0, blank), column("Price", blank, 0, 2, blank));
    expect(source.columns.map(({ cells: found }) => found)).toEqual([cells(5, null, 0), cells(null, 0, 2)]);
  });

  it("do without headings", () => {
    const { source, parts } = read(
      column(5, 6),
      [
        [1, "North"],
        [2, "South"],
      ],
      column(2020, 2021),
    );
    expect(parts).toMatchObject({ outcome: "outcome", drivers: ["driver 1", "driver 2"], key: "key", keyIs: "time" });
    expect(source.rowCount).toBe(2);
    expect(source.columns[0]?.place).toMatchObject({ firstRow: 0 });
  });

  it("take a missing mark or a number kept as text above the outcome for data", () => {
    expect(read(column("NA", 5, 6), column(1, 2, 3)).parts.outcome).toBe("outcome");
    expect(read(column("1,234", 5, 6), column(1, 2, 3)).source.rowCount).toBe(3);
  });

  it("take a number above a driver for its heading where the outcome has one", () => {
    const { parts } = read(column("Sales", 5, 6), [
      [2019, ""],
      [1, 2],
      [3, 4],
    ]);
    expect(parts.drivers).toEqual(["2019", "driver 2"]);
  });

  it("know headings above the drivers when the outcome has none", () => {
    expect(read(column(null, 5, 6), column("Price", 1, 2)).parts).toMatchObject({
      outcome: "outcome",
      drivers: ["Price"],
    });
  });

  it("unwrap rich values", () => {
    const { source } = read(
      column({ type: "FormattedNumber", basicValue: 12.5, numberFormat: "0.0" }, 3),
      column({ type: "Error", basicValue: "#DIV/0!", errorType: "Div0" }, { type: "Entity", text: "Oslo" }),
    );
    expect(source.columns.map(({ cells: found }) => found)).toEqual([
      cells(12.5, 3),
      cells({ error: "#DIV/0!" }, null),
    ]);
  });

  it("tell times from groups, and the time within groups", () => {
    expect(read(column(1, 2, 3), column(4, 5, 6), column("a", "b", "a")).parts).toMatchObject({ keyIs: "groups" });
    expect(read(column(1, 2, 3), column(4, 5, 6), column(7, 8, 9)).parts).toMatchObject({ keyIs: "time" });
    const panel = [
      ["Shop", "Month"],
      ["a", 1],
      ["b", 2],
    ];
    const { parts, source } = read(column("y", 1, 2), column("x", 4, 5), panel);
    expect(parts).toMatchObject({ key: "Shop", keyIs: "groups", order: "Month" });
    expect(source.columns.map(({ name }) => name)).toEqual(["y", "x", "Shop", "Month"]);
  });

  it("let a time column be a driver and the key at once", () => {
    const { parts } = read(column("y", 1, 2), column("Month", 1, 2), column("Month", 1, 2));
    expect(parts).toMatchObject({ drivers: ["Month"], key: "Month (key)" });
  });

  it("stop at the last row in use of all arguments together", () => {
    const { source } = read(column("y", 1, 2, null, null, null), column("x", 4, 5, 6, null));
    expect(source.rowCount).toBe(3);
    expect(source.columns[0]?.cells).toEqual(cells(1, 2, null));
  });

  it("take a scalar for a single cell", () => {
    expect(read(5, 7).source.rowCount).toBe(1);
  });
});

describe("arguments that cannot be used", () => {
  it("are told apart", () => {
    expect(problemOf(null, column(1, 2))).toEqual({ code: "no-outcome" });
    expect(problemOf(column("", null), column(1, 2))).toEqual({ code: "no-outcome" });
    expect(problemOf(column(1, 2), null)).toEqual({ code: "no-drivers" });
    expect(problemOf([[1, 2, 3]], column(1))).toEqual({
      code: "too-many-columns",
      where: "the outcome",
      columns: 3,
      most: 1,
    });
    expect(problemOf(column(1, 2, 3), column(4, 5))).toEqual({
      code: "unequal-heights",
      first: "the outcome",
      rows: 3,
      second: "the drivers",
      otherRows: 2,
    });
    expect(problemOf(column(1, 2), column(4, 5), column(7, 8, 9))).toMatchObject({
      code: "unequal-heights",
      rows: 2,
      otherRows: 3,
    });
    expect(problemOf(column("Repairs", 5, 6), column(4, 7, 9))).toEqual({
      code: "unequal-heights",
      first: "the outcome",
      rows: 2,
      second: "the drivers",
      otherRows: 3,
    });
    expect(problemOf(column("Repairs", 5, 6), column(1990, 2010, 2005))).toMatchObject({ code: "unequal-heights" });
    expect(problemOf(column("Repairs", 5, 6), column("Price", 7, 9), column(45_292, 45_323, 45_352))).toMatchObject({
      code: "unequal-heights",
      second: "the key",
    });
    expect(
      problemOf(column("Repairs", 1), [
        ["price", "Price"],
        [2, 3],
      ]),
    ).toMatchObject({
      code: "repeated-heading",
      cells: ["row 1 of drivers, column 1", "row 1 of drivers, column 2"],
    });
  });

  it("takes drivers whose rectangle spans the outcome, under a name of its own there", () => {
    const { parts, spanned } = read(column("Price", 1), [
      ["Rain", "price", "Fuel"],
      [4, 1, 6],
    ]);
    expect(parts).toMatchObject({ outcome: "Price", drivers: ["Rain", "price (outcome)", "Fuel"] });
    expect(spanned).toEqual({
      column: "price (outcome)",
      problem: {
        code: "repeated-heading",
        heading: "Price",
        cells: ["row 1 of outcome, column 1", "row 1 of drivers, column 2"],
      },
    });
    expect(read(column("Price", 1), [["Rain"], [4]]).spanned).toBeNull();
  });
});

describe("whole columns", () => {
  const whole = (used: number, blank: unknown, cell: (row: number) => unknown): unknown[][] =>
    Array.from({ length: 1_048_576 }, (_, row) => [row < used ? cell(row) : blank]);

  it.each([null, "", 0])("with 50,000 rows in use and blanks as %o are read down to the last row in use", (blank) => {
    const outcome = whole(50_000, blank, (row) => (row === 0 ? "y" : row));
    const drivers = whole(50_000, blank, (row) => (row === 0 ? "x" : row % 7));
    const { source } = read(outcome, drivers);
    expect(source.rowCount).toBe(49_999);
  });

  it("keep zeros at the end where they are few, or where blanks are told from zeros", () => {
    const ending = (zeros: number, first: unknown) => [
      ["y"],
      [first],
      [2],
      ...Array.from({ length: zeros }, () => [0]),
    ];
    expect(read(ending(99, 1), ending(99, 3).with(0, ["x"])).source.rowCount).toBe(101);
    expect(read(ending(100, 1), ending(100, 3).with(0, ["x"])).source.rowCount).toBe(2);
    expect(read(ending(100, 1), ending(100, null).with(0, ["x"])).source.rowCount).toBe(102);
  });
});
