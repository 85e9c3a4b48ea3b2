import { describe, expect, it } from "vitest";
import type { ReportedNumber } from "../../../src/core/review/claim.ts";
import { digitsShown, recomputedInWords, showWith } from "../../../src/core/review/shownDigits.ts";

const reported = (value: number, shown: string, halfUnit: number): ReportedNumber => ({
  quantity: { kind: "r-squared" },
  value,
  shown,
  halfUnit,
  cell: "Handover!B10",
});

describe("a number shown in the way of a reported one", () => {
  it.each([
    ["decimals", "3.100", 0.0005, 3.14159, "3.142"],
    ["whole numbers", "95", 0.5, 96, "96"],
    ["a share with its sign close by", "4.20%", 0.00005, 0.04163, "4.16%"],
    ["a share with its sign apart", "4 %", 0.005, 0.0416, "4 %"],
    ["thousands apart", "12,345.6", 0.05, 9876.54, "9,876.5"],
    ["thousands together", "12345.6", 0.05, 9876.54, "9876.5"],
    ["powers of ten", "1.23E-05", 5e-8, 0.000045678, "4.57E-05"],
    ["tens", "1230", 5, 4567, "4567"],
    ["as many as are written, though more are meant", "0.25", 5e-12, 0.25, "0.25"],
    ["a formula's whole number, though more digits are meant", "30", 5e-9, 30, "30"],
    ["decimals behind a comma", "-5,64", 0.005, -5.6392, "-5.64"],
    ["nothing below zero", "0.00", 0.005, -0.001, "0.00"],
  ])("%s", (_, shown, halfUnit, value, expected) => {
    expect(showWith(digitsShown({ shown, halfUnit }), value)).toBe(expected);
  });

  it("takes digits enough to be told apart where the two do not agree", () => {
    const one = reported(0.5, "0.50", 0.005);
    expect(recomputedInWords({ reported: one, recomputed: 0.5004, agrees: true })).toBe("0.50");
    expect(recomputedInWords({ reported: one, recomputed: 0.5004, agrees: false })).toBe("0.5004");
  });

  it("says where there is none", () => {
    expect(recomputedInWords({ reported: reported(0.5, "0.50", 0.005), recomputed: null, agrees: false })).toBe(
      "cannot be formed",
    );
  });
});
