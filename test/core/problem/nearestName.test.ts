import { describe, expect, it } from "vitest";
import { nearestName } from "../../../src/core/problem/nearestName.ts";

const headings = ["Repairs", "Price", "Advertising", "Rainy days"];

describe("nearestName", () => {
  it.each([
    ["Pirce", "Price"],
    ["price ", "Price"],
    ["Rainydays", "Rainy days"],
    ["REPAIR", "Repairs"],
    ["Advertizing", "Advertising"],
  ])("takes %s for %s", (word, expected) => {
    expect(nearestName(word, headings)).toBe(expected);
  });

  it("offers a name that begins with the word, else one that contains it", () => {
    expect(nearestName("advert", headings)).toBe("Advertising");
    expect(nearestName("days", headings)).toBe("Rainy days");
  });

  it("offers nothing where nothing is near", () => {
    expect(nearestName("Wages", headings)).toBeNull();
    expect(nearestName("xy", headings)).toBeNull();
    expect(nearestName("Price", [])).toBeNull();
  });

  it("prefers fewer edits", () => {
    expect(nearestName("lagz", ["bags", "lags"])).toBe("lags");
  });

  it("counts two swapped letters as one edit", () => {
    expect(nearestName("ab", ["ba"])).toBe("ba");
    expect(nearestName("ab", ["cd"])).toBeNull();
  });
});
