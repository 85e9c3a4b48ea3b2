import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import {
  chiSquareQuantile,
  chiSquareTail,
  fQuantile,
  fTail,
  normalCdf,
  normalQuantile,
  normalTail,
  normalTwoSided,
  tQuantile,
  tTail,
  tTwoSided,
} from "../../../src/core/numeric/distributions.ts";
import { expectDigits } from "../../support/digits.ts";

interface Point {
  readonly law: string;
  readonly df: readonly number[];
  readonly at: number;
  readonly tail: number;
}

const points = JSON.parse(
  readFileSync(new URL("../../reference/distributions.json", import.meta.url), "utf8"),
) as readonly Point[];

const tails: Readonly<Record<string, (at: number, df: readonly number[]) => number>> = {
  "normal upper": (z) => normalTail(z),
  "t two-sided": (t, [df]) => tTwoSided(t, df!),
  "chi-square upper": (x, [df]) => chiSquareTail(x, df!),
  "F upper": (f, [df1, df2]) => fTail(f, df1!, df2!),
  // P(F <= f) is the upper tail of 1 / F.
  "F lower": (f, [df1, df2]) => fTail(1 / f, df2!, df1!),
};

/** The point with that tail, from the quantile functions, which take the lower side. */
const quantiles: Readonly<Record<string, (tail: number, df: readonly number[]) => number>> = {
  "normal upper": (tail) => -normalQuantile(tail),
  "t two-sided": (tail, [df]) => -tQuantile(tail / 2, df!),
  "chi-square lower": (tail, [df]) => chiSquareQuantile(tail, df!),
  "F lower": (tail, [df1, df2]) => fQuantile(tail, df1!, df2!),
};

describe.each(Object.keys(tails))("%s tails against 50 digits and more", (law) => {
  const own = points.filter((point) => point.law === law);

  it("covers probabilities from 1e-300 to 0.999", () => {
    const sizes = own.map(({ tail }) => tail);
    expect(Math.min(...sizes)).toBeLessThan(1e-299);
    expect(Math.max(...sizes)).toBeGreaterThan(0.998);
  });

  it("agrees to 1e-10", () => {
    for (const { at, df, tail } of own) expectDigits(tails[law]!(at, df), tail, 10);
  });
});

describe.each(Object.keys(quantiles))("%s quantiles", (law) => {
  const own = points.filter((point) => point.law === law);

  it("return to the point", () => {
    // Beyond a half a double holds less and less of how far the tail is from one, and so of the point.
    for (const { at, df, tail } of own.filter((point) => point.tail <= 0.5)) {
      expectDigits(quantiles[law]!(tail, df), at, 10);
    }
  });

  it("have the tail that was asked for", () => {
    const tailOf = tails[law] ?? ((x: number, [df]: readonly number[]): number => 1 - chiSquareTail(x, df!));
    // The lower tail of chi-square has no function of its own: where it is not small it is what the upper one leaves.
    const held = law in tails ? own : own.filter(({ tail }) => tail > 0.1);
    for (const { df, tail } of held) expectDigits(tailOf(quantiles[law]!(tail, df), df), tail, 11);
  });
});

describe("printed tables", () => {
  // Upper points as every handbook prints them, e.g. Fisher and Yates (1963), Statistical Tables.
  it("t, 5 % two-sided", () => {
    const table = { 1: 12.706, 2: 4.303, 5: 2.571, 10: 2.228, 30: 2.042, 120: 1.98 };
    for (const [df, point] of Object.entries(table)) expect(tQuantile(0.975, Number(df))).toBeCloseTo(point, 3);
  });

  it("chi-square, 5 %", () => {
    const table = { 1: 3.841, 2: 5.991, 5: 11.07, 10: 18.307, 30: 43.773, 100: 124.342 };
    for (const [df, point] of Object.entries(table)) expect(chiSquareQuantile(0.95, Number(df))).toBeCloseTo(point, 3);
  });

  it("F, 5 %", () => {
    expect(fQuantile(0.95, 1, 10)).toBeCloseTo(4.96, 2);
    expect(fQuantile(0.95, 4, 20)).toBeCloseTo(2.87, 2);
    expect(fQuantile(0.95, 10, 60)).toBeCloseTo(1.99, 2);
  });

  it("normal", () => {
    expect(normalQuantile(0.975)).toBeCloseTo(1.959963984540054, 14);
    expect(normalQuantile(0.5)).toBe(0);
  });
});

describe("sides", () => {
  it("two tails are twice one, and the sides of a point add to one", () => {
    for (const z of [-3, -0.4, 0, 0.7, 2.5]) {
      expect(normalTwoSided(z)).toBeCloseTo(2 * normalTail(Math.abs(z)), 14);
      expect(normalTail(z) + normalCdf(z)).toBeCloseTo(1, 14);
      expect(tTwoSided(z, 7)).toBeCloseTo(2 * tTail(Math.abs(z), 7), 14);
      expect(tTail(z, 7) + tTail(-z, 7)).toBeCloseTo(1, 14);
    }
    expect(fTail(1.3, 4, 9) + fTail(1 / 1.3, 9, 4)).toBeCloseTo(1, 14);
  });

  it("F with one degree of freedom is t squared, and t with many is normal", () => {
    expectDigits(fTail(2.3 ** 2, 1, 17), tTwoSided(2.3, 17), 13);
    expectDigits(tTwoSided(1.7, 1e15), normalTwoSided(1.7), 12);
    expectDigits(chiSquareTail(2.2 ** 2, 1), normalTwoSided(2.2), 13);
  });

  it("have their limits at the ends", () => {
    expect([normalTail(Infinity), normalTail(-Infinity)]).toEqual([0, 1]);
    expect([tTwoSided(Infinity, 3), tTwoSided(0, 3), tTail(-Infinity, 3)]).toEqual([0, 1, 1]);
    expect([fTail(Infinity, 2, 5), fTail(0, 2, 5), fTail(-1, 2, 5)]).toEqual([0, 1, 1]);
    expect([chiSquareTail(Infinity, 2), chiSquareTail(0, 2)]).toEqual([0, 1]);
  });
});
