import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { scaleOf } from "../../../src/desk/page/charts/scale.ts";

const free = { minimum: null, maximum: null };

describe("an axis", () => {
  it.each([
    [
      [0.3, 9.7],
      [0, 2, 4, 6, 8, 10],
    ],
    [
      [-41.5, 48.2],
      [-60, -40, -20, 0, 20, 40, 60],
    ],
    [
      [376, 478],
      [375, 400, 425, 450, 475, 500],
    ],
    [
      [0.0012, 0.0049],
      [0.001, 0.002, 0.003, 0.004, 0.005],
    ],
  ])("over %j has round numbers that cover it", (values, ticks) => {
    expect(scaleOf(values, free).ticks).toEqual(ticks);
  });

  it("ends where it is told to", () => {
    const scale = scaleOf([0.3, 9.7], { minimum: -1.5, maximum: 12 });
    expect([scale.minimum, scale.maximum]).toEqual([-1.5, 12]);
    expect(scale.ticks[0]).toBeGreaterThanOrEqual(-1.5);
    expect(scale.ticks.at(-1)).toBeLessThanOrEqual(12);
  });

  it("over one value or none still has a length", () => {
    for (const values of [[], [0], [7], [-3, -3]]) {
      const { minimum, maximum } = scaleOf(values, free);
      expect(maximum).toBeGreaterThan(minimum);
    }
  });

  it("covers whatever it is given, in few steps", () => {
    const numbers = fc.array(fc.double({ min: -1e9, max: 1e9, noNaN: true }), { minLength: 2, maxLength: 20 });
    fc.assert(
      fc.property(numbers, (values) => {
        const { minimum, maximum, ticks } = scaleOf(values, free);
        const slack = (maximum - minimum) * 1e-9;
        expect(minimum).toBeLessThanOrEqual(Math.min(...values) + slack);
        expect(maximum).toBeGreaterThanOrEqual(Math.max(...values) - slack);
        expect(ticks.length).toBeGreaterThanOrEqual(2);
        expect(ticks.length).toBeLessThanOrEqual(12);
      }),
      { seed: 20_240_502, numRuns: 500 },
    );
  });
});
