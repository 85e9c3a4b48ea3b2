import { describe, expect, it } from "vitest";
import { parseAddress } from "../../../src/core/table/address.ts";
import { rangesFault } from "../../../src/core/table/ranges.ts";

const faultOf = (...texts: readonly string[]) =>
  rangesFault(texts.map((words) => ({ words, area: parseAddress(words)! })));

describe("ranges side by side", () => {
  it("takes ranges of the same rows on one sheet, apart or touching", () => {
    expect(faultOf("Months!B2:B97", "C2:D97", "months!A2:A97")).toBeNull();
    expect(faultOf("B2:B97")).toBeNull();
  });

  it("faults unequal heights", () => {
    expect(faultOf("B2:B97", "C2:C97", "D2:D96")).toEqual({
      code: "unequal-heights",
      first: "B2:B97",
      rows: 96,
      second: "D2:D96",
      otherRows: 95,
    });
  });

  it("faults other rows and other sheets", () => {
    expect(faultOf("B2:B97", "C3:C98")).toEqual({ code: "ranges-apart", first: "B2:B97", second: "C3:C98" });
    expect(faultOf("Months!B2:B97", "Shops!C2:C97")).toMatchObject({ code: "ranges-apart" });
  });

  it("faults an outcome inside the drivers", () => {
    expect(faultOf("B2:B97", "A2:C97")).toEqual({ code: "overlapping-ranges", first: "B2:B97", second: "A2:C97" });
    expect(faultOf("B2:C97", "C2:D97")).toMatchObject({ code: "overlapping-ranges" });
  });
});
