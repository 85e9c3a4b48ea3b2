import { describe, expect, it } from "vitest";
import type { Quantity } from "../../../../src/core/review/claim.ts";
import { agrees } from "../../../../src/core/review/engine/agreement.ts";
import { type Moved, evidenceOf } from "../../../../src/core/review/engine/evidence.ts";

const moved = (quantity: Quantity, [found, asClaimed, halfUnit]: readonly [number, number | null, number]): Moved => ({
  reported: { quantity, value: found, halfUnit, cell: "R!A1", shown: String(found) },
  found,
  asClaimed,
});

const slope = (term: number): Quantity => ({ kind: "coefficient", term });

describe("how much an agreement is worth", () => {
  it("is half a unit over the way a number was moved, fact by fact", () => {
    const evidence = evidenceOf([moved(slope(0), [5, 3, 0.01]), moved(slope(1), [1, 1.4, 0.02])], 0);
    expect(evidence.chance).toBeCloseTo(0.005 * 0.05, 12);
    expect(evidence.telling).toBe(2);
  });

  it("counts numbers that follow from one another once, by the sharpest", () => {
    const fit = [moved({ kind: "r-squared" }, [0.8, 0.7, 0.001]), moved({ kind: "sigma" }, [2, 2.5, 0.001])];
    const evidence = evidenceOf(fit, 0);
    expect(evidence.chance).toBeCloseTo(0.002, 12);
    expect(evidence.telling).toBe(1);
  });

  it("gives nothing for a number that was not moved, nor for the number of rows", () => {
    const evidence = evidenceOf([moved(slope(0), [5, 5.001, 0.01]), moved({ kind: "observations" }, [9, 19, 0.5])], 0);
    expect(evidence).toEqual({ chance: 1, telling: 0 });
  });

  it("pays for every kind of standard errors that was looked at", () => {
    const error = moved({ kind: "standard-error", term: 0 }, [0.4, 0.3, 0.0001]);
    expect(evidenceOf([error], 1).chance).toBeCloseTo(0.001, 12);
    expect(evidenceOf([error], 20).chance).toBeCloseTo(0.02, 12);
    expect(evidenceOf([error], 5000).chance).toBe(1);
  });

  it("measures from zero where the cells give nothing as claimed", () => {
    expect(evidenceOf([moved(slope(0), [5, null, 0.05])], 0).chance).toBeCloseTo(0.01, 12);
  });
});

describe("agreement to the digits shown", () => {
  const shown = { value: 3.1, halfUnit: 0.05 };

  it("takes whatever rounds to the number, fives either way", () => {
    expect([3.05, 3.1, 3.15].map((found) => agrees(shown, found))).toEqual([true, true, true]);
  });

  it("takes what was rounded twice, and no more", () => {
    expect(agrees(shown, 3.1549)).toBe(true);
    expect(agrees(shown, 3.157)).toBe(false);
    expect(agrees(shown, 3.04)).toBe(false);
  });

  it("lets rounding alone stand between numbers in full", () => {
    expect(agrees({ value: 1234.5678, halfUnit: 0 }, 1234.5678 * (1 + 1e-10))).toBe(true);
    expect(agrees({ value: 1234.5678, halfUnit: 0 }, 1234.5679)).toBe(false);
  });
});
