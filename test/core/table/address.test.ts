import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  addressOf,
  columnLetters,
  localAddressOf,
  mostColumns,
  parseAddress,
  quoteSheet,
} from "../../../src/core/table/address.ts";

describe("addresses", () => {
  it.each([
    [0, "A"],
    [25, "Z"],
    [26, "AA"],
    [701, "ZZ"],
    [702, "AAA"],
    [mostColumns - 1, "XFD"],
  ])("names column %d %s", (column, letters) => {
    expect(columnLetters(column)).toBe(letters);
  });

  it("quotes a sheet whose name is no plain word", () => {
    expect(["Months", "My data", "It's", "A1", "R1C1", "2024"].map(quoteSheet)).toEqual([
      "Months",
      "'My data'",
      "'It''s'",
      "'A1'",
      "'R1C1'",
      "'2024'",
    ]);
  });

  it.each([
    ["Months!A1:D97", { sheet: "Months", row: 0, column: 0, rows: 97, columns: 4 }],
    ["'It''s'!$B$2", { sheet: "It's", row: 1, column: 1, rows: 1, columns: 1 }],
    ["d97:a1", { sheet: "", row: 0, column: 0, rows: 97, columns: 4 }],
    ["Months!B:C", { sheet: "Months", row: 0, column: 1, rows: 1_048_576, columns: 2 }],
  ])("reads %s", (text, area) => {
    expect(parseAddress(text)).toEqual(area);
  });

  it.each(["", "Price", "A0", "A1048577", "XFE1", "A1:", "1:2"])("does not read %s", (text) => {
    expect(parseAddress(text)).toBeNull();
  });

  it("reads back what it writes", () => {
    const area = fc.record({
      sheet: fc.constantFrom("Months", "My data", "It's", "A1", "Größe"),
      row: fc.nat(1_000_000),
      column: fc.nat(16_000),
      rows: fc.integer({ min: 1, max: 40_000 }),
      columns: fc.integer({ min: 1, max: 300 }),
    });
    fc.assert(
      fc.property(area, (one) => {
        expect(parseAddress(addressOf(one))).toEqual(one);
        expect(parseAddress(localAddressOf(one))).toEqual({ ...one, sheet: "" });
      }),
      { seed: 11, numRuns: 300 },
    );
  });
});
