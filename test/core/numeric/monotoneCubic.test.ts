import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { bracketedRoot } from "../../../src/core/numeric/bracketedRoot.ts";
import { monotoneCubic } from "../../../src/core/numeric/monotoneCubic.ts";

describe("the monotone cubic", () => {
  const knots = [0, 1, 2.5, 3, 7];

  it("goes through its points and straight on beyond them", () => {
    const values = [2, 5, 5.5, 9, 30];
    const f = monotoneCubic(knots, values);
    knots.forEach((knot, i) => expect(f(knot)).toBe(values[i]));
    expect(f(8)).toBeCloseTo(30 + 21 / 4, 12);
    expect(f(-1)).toBeCloseTo(-1, 12);
  });

  it("is a straight line through points of one", () => {
    const f = monotoneCubic(
      knots,
      knots.map((x) => 4 - 3 * x),
    );
    for (const x of [0.3, 1.7, 2.9, 5.5]) expect(f(x)).toBeCloseTo(4 - 3 * x, 12);
  });

  it("rises where its points rise and never leaves their range", () => {
    const steps = fc.array(fc.double({ min: 0, max: 100, noNaN: true }), { minLength: 5, maxLength: 5 });
    fc.assert(
      fc.property(steps, (heights) => {
        let sum = 0;
        const f = monotoneCubic(
          knots,
          heights.map((height) => (sum += height)),
        );
        const path = Array.from({ length: 141 }, (_, i) => f(i / 20));
        path.slice(1).forEach((value, i) => expect(value).toBeGreaterThanOrEqual(path[i]! - 1e-9));
      }),
      { seed: 1980, numRuns: 300 },
    );
  });

  it("turns flat at a turn", () => {
    const f = monotoneCubic([0, 1, 2, 3, 4], [0, 3, 3.1, 1, 0]);
    expect(Math.max(...Array.from({ length: 401 }, (_, i) => f(i / 100)))).toBe(3.1);
  });

  it("keeps the slope from one piece to the next", () => {
    const f = monotoneCubic(knots, [2, 5, 5.5, 9, 30]);
    for (const knot of [1, 2.5, 3]) {
      const [left, right] = [(f(knot) - f(knot - 1e-6)) / 1e-6, (f(knot + 1e-6) - f(knot)) / 1e-6];
      expect(left).toBeCloseTo(right, 3);
    }
  });
});

describe("the bracketed root", () => {
  it("is found to the last digits, from either side", () => {
    expect(bracketedRoot((x) => x ** 2 - 2, [0, 2])).toBeCloseTo(Math.SQRT2, 15);
    expect(bracketedRoot((x) => 2 - x ** 2, [0, 2])).toBeCloseTo(Math.SQRT2, 15);
    expect(bracketedRoot((x) => Math.exp(x) - 1e-200, [-1000, 0]) / Math.log(1e-200)).toBeCloseTo(1, 14);
    expect(bracketedRoot((x) => x - 1e-300, [0, 1e-290]) / 1e-300).toBeCloseTo(1, 12);
  });

  it("takes an end where it is the root, and refuses a bracket without one", () => {
    expect(bracketedRoot((x) => x, [0, 3])).toBe(0);
    expect(bracketedRoot((x) => x - 3, [0, 3])).toBe(3);
    expect(() => bracketedRoot((x) => x + 1, [0, 3])).toThrow(/no sign change/);
  });
});
