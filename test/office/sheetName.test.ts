import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { freeSheetName } from "../../src/office/sheetName.ts";

describe("the name of a new sheet", () => {
  it("is the wanted one, or the next that is free, without regard to case", () => {
    expect(freeSheetName("Repairs answer", ["Months"])).toBe("Repairs answer");
    expect(freeSheetName("Repairs answer", ["REPAIRS ANSWER", "Repairs answer 2"])).toBe("Repairs answer 3");
  });

  it("leaves out what Excel does not take", () => {
    expect(freeSheetName("'A/B: [net]'", [])).toBe("A B net");
    expect(freeSheetName("history", [])).toBe("history 2");
    expect(freeSheetName(" ?* ", [])).toBe("Footing");
  });

  it("is one that Excel takes, for any wish", () => {
    fc.assert(
      fc.property(fc.string({ unit: "grapheme", maxLength: 60 }), fc.integer({ min: 0, max: 120 }), (wanted, count) => {
        const taken: string[] = [];
        for (let index = 0; index < count; index++) taken.push(freeSheetName(wanted, taken));
        const name = freeSheetName(wanted, taken);
        expect(name.length).toBeGreaterThan(0);
        expect(name.length).toBeLessThanOrEqual(31);
        expect(name).not.toMatch(/[\\/?*[\]:]|^'|'$|^\s|\s$/);
        expect(taken.map((other) => other.toLowerCase())).not.toContain(name.toLowerCase());
      }),
      { seed: 20261201, numRuns: 300 },
    );
  });
});
