import { describe, expect, it } from "vitest";
import {
  confidenceInWords,
  decimalsFor,
  driversInWords,
  listInWords,
  numberInWords,
  pValueInWords,
  shareInWords,
} from "../../../src/core/answer/wording.ts";

describe("p-values in sentences", () => {
  it.each([
    [0.1412, "p = 0.14"],
    [0.0341, "p = 0.034"],
    [0.00212, "p = 0.0021"],
    [0.00009, "p under 0.0001"],
    [1e-300, "p under 0.0001"],
    [0, "p under 0.0001"],
  ])("%s", (pValue, words) => {
    expect(pValueInWords(pValue, 0.05)).toBe(words);
  });

  it.each([
    [0.04996, 0.05, "p = 0.04996"],
    [0.0500004, 0.05, "p = 0.050"],
    [0.0999, 0.1, "p = 0.0999"],
    [0.00996, 0.01, "p = 0.00996"],
  ])("are never rounded across the level: %s at %s", (pValue, level, words) => {
    expect(pValueInWords(pValue, level)).toBe(words);
    const shown = Number(words.slice(4));
    expect(shown < level).toBe(pValue < level);
  });
});

describe("numbers rounded to what the standard error supports", () => {
  it.each([
    [3.1234, 1.9, "3.1"],
    [12345.6, 1234, "12,300"],
    [0.0312345, 0.0019, "0.0312"],
    [-0.04, 3.2, "0.0"],
    [1234567, 0.5, "1,234,567.00"],
    [0.00000000012, 0.00000000003, "1.20E-10"],
    [0, 0.00000000003, "0.000000000"],
    [1.2, 0.0000000000012, "1.200000000"],
    [2.51234e26, 9.9e25, "2.51E+26"],
    [-1e15, 4e16, "-1E+15"],
    [999e12, 1e14, "1,000,000,000,000,000"],
  ])("%s with a half-width of %s", (value, halfWidth, words) => {
    expect(numberInWords(value, decimalsFor(halfWidth))).toBe(words);
  });
});

describe("shares, lists and levels", () => {
  it.each([
    [0.6249, "62 %"],
    [0.9996, "99.96 %"],
    [0.99999, "99.99 %"],
    [0.992, "99.2 %"],
    [0.004, "0.4 %"],
    [0, "0 %"],
  ])("%s", (share, words) => {
    expect(shareInWords(share)).toBe(words);
  });

  it("join words as a sentence does", () => {
    expect(listInWords(["Price"])).toBe("Price");
    expect(listInWords(["Price", "Fuel", "Rainy days"])).toBe("Price, Fuel and Rainy days");
    expect([0.05, 0.1, 0.001].map(confidenceInWords)).toEqual(["95 %", "90 %", "99.9 %"]);
  });
});

it("names up to four drivers, and of more the first three", () => {
  const names = Array.from({ length: 20 }, (_, index) => `D${index + 1}`);
  expect(driversInWords(names.slice(0, 4))).toBe("D1, D2, D3 and D4");
  expect(driversInWords(names.slice(0, 5))).toBe("D1, D2, D3 and 2 more");
  expect(driversInWords(names)).toBe("D1, D2, D3 and 17 more");
});
