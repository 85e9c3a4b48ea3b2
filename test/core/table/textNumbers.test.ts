import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { isTextNumber, likelyDecimal, readTextNumber } from "../../../src/core/table/textNumbers.ts";

describe("text that is plainly a number", () => {
  it.each([
    ["1,234.50", 1234.5, null],
    ["1.234,50", null, 1234.5],
    ["(120)", -120, -120],
    ["12 %", 0.12, 0.12],
    ["-3.5%", -0.035, null],
    ["$ 5.25", 5.25, null],
    ["7,5 €", null, 7.5],
    ["7-", -7, -7],
    ["−3", -3, -3],
    ["1'000", 1000, 1000],
    ["1 234 567", 1_234_567, 1_234_567],
    ["1\u00a0234,5", null, 1234.5],
    ["2.5E+03", 2500, null],
    ["1,234", 1234, 1.234],
    ["1,234,567", 1_234_567, null],
    ["0", 0, 0],
    ["-0", 0, 0],
  ])("reads %s", (text, point, comma) => {
    expect(readTextNumber(text, ".")).toBe(point);
    expect(readTextNumber(text, ",")).toBe(comma);
  });

  it.each(["", "007", "12a", "12 34", "1/2", "(5", "5)", "(-5)", "-5-", "1.2.3.4", "12-5", "NaN", "1e999", ".", ","])(
    "leaves %s alone",
    (text) => {
      expect(isTextNumber(text)).toBe(false);
    },
  );

  it("tells the decimal mark from the texts that have one reading only", () => {
    expect(likelyDecimal(["1,234", "1.5"])).toEqual({ decimal: ".", certain: true });
    expect(likelyDecimal(["1.234", "1,5", "2,75"])).toEqual({ decimal: ",", certain: true });
    expect(likelyDecimal(["12", "7"])).toEqual({ decimal: ".", certain: true });
    expect(likelyDecimal(["1,234", "5,678"])).toEqual({ decimal: ".", certain: false });
  });

  it("reads back any number written with thousands apart", () => {
    fc.assert(
      fc.property(fc.integer({ min: -1_000_000_000, max: 1_000_000_000 }), (cents) => {
        const value = cents / 100;
        const text = value.toLocaleString("en-US", { minimumFractionDigits: 2, useGrouping: true });
        const other = text.replaceAll(/[.,]/g, (mark) => (mark === "." ? "," : "."));
        expect(readTextNumber(text, ".")).toBe(value === 0 ? 0 : value);
        expect(readTextNumber(other, ",")).toBe(value === 0 ? 0 : value);
      }),
      { seed: 13, numRuns: 300 },
    );
  });
});
