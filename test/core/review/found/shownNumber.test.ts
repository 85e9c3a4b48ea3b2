import { describe, expect, it } from "vitest";
import type { BookSheet } from "../../../../src/core/review/book.ts";
import { readShownText, shownNumberAt } from "../../../../src/core/review/found/shownNumber.ts";
import { toCellColumn } from "../../../support/cellColumns.ts";

/** One cell with its format. */
const sheetWith = (value: number, format: string | null): BookSheet => ({
  sheet: "S",
  firstRow: 4,
  firstColumn: 2,
  rowCount: 1,
  columns: [toCellColumn([value])],
  visible: true,
  hiddenRows: [],
  hiddenColumns: [],
  formulas: [],
  readers: [],
  calculated: [null],
  formats: format === null ? [] : [{ firstRow: 4, rowCount: 1, indices: new Uint16Array(1), formats: [format] }],
  tables: [],
});

const shownIn = (value: number, format: string | null, calculated = false) =>
  shownNumberAt({ sheet: sheetWith(value, format), row: 4, column: 2 }, calculated)!;

describe("a number as its cell shows it", () => {
  it.each([
    [3.1, "General", 0.05, "3.1"],
    [3.1, null, 0.05, "3.1"],
    [3, "General", 0.5, "3"],
    [1200, "General", 0.5, "1200"],
    [0.00012, "General", 0.000005, "0.00012"],
    [-0.0625, "General", 0.00005, "-0.0625"],
    [3.1, "0.000", 0.0005, "3.100"],
    [-3.14159, "0.00", 0.005, "-3.14"],
    [-3.14159, "0.00;(0.000)", 0.0005, "-3.142"],
    [0, "0.0;-0.0;0", 0.5, "0"],
    [-0.0004, "0.00", 0.005, "0.00"],
    [0.0416, "0.0%", 0.0005, "4.2%"],
    [0.0416, "0.00 %", 0.00005, "4.16 %"],
    [1234567.8, "#,##0.0", 0.05, "1,234,567.8"],
    [1234567.8, "#,##0,", 500, "1,235"],
    [1234567.8, '0.00,,"m"', 5000, "1.23"],
    [12345, "0.00E+00", 50, "1.23E+04"],
    [0.00012345, "0.0E+00", 5e-6, "1.2E-04"],
    [5.5, '[Red]0.0" per m";[Blue]-0.0', 0.05, "5.5"],
    [2.5, "_-* #,##0.00_-", 0.005, "2.50"],
    [3.25, "# ?/?", 0.005, "3.25"],
  ])("%s in the format %s counts to %s", (value, format, halfUnit, shown) => {
    const found = shownIn(value, format);
    expect(found).toMatchObject({ value, shown });
    expect(found.halfUnit / halfUnit).toBeCloseTo(1, 9);
  });

  it("counts to the digits that General shows where it is pasted or calculated in full", () => {
    expect(shownIn(3.14159265358979, "General")).toMatchObject({ shown: "3.141592654" });
    expect(shownIn(3.14159265358979, "General").halfUnit).toBeCloseTo(5e-10, 15);
    expect(shownIn(2, "General", true).halfUnit).toBeCloseTo(5e-10, 15);
    expect(shownIn(2, "0.0", true).halfUnit).toBe(0.05);
  });
});

describe("a number in a text", () => {
  it.each([
    ["3.10**", 3.1, 0.005, "3.10"],
    ["(0.42)", -0.42, 0.005, "(0.42)"],
    ["4.2 %", 0.042, 0.0005, "4.2 %"],
    ["1,234.5", 1234.5, 0.05, "1,234.5"],
    ["0,125", 0.125, 0.0005, "0,125"],
    ["−7", -7, 0.5, "−7"],
    ["1.50E-03", 0.0015, 0.000005, "1.50E-03"],
  ])("%s counts to its digits", (text, value, halfUnit, shown) => {
    const found = readShownText(text)!;
    expect(found).toMatchObject({ shown });
    expect([found.value, found.halfUnit / halfUnit].map((one) => Number(one.toPrecision(12)))).toEqual([value, 1]);
  });

  it("is none where the text is words", () => {
    expect(readShownText("n/a")).toBeNull();
    expect(readShownText("<0.001")).toBeNull();
  });
});
