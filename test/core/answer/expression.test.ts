import { describe, expect, it } from "vitest";
import { type Expression, readExpression } from "../../../src/core/answer/expression.ts";
import type { Result } from "../../../src/core/problem/result.ts";

const names = ["constant", "Price", "Prices abroad", "Month: Jan-19", "R&D (new)", "Rain, heavy"].map((name, term) => ({
  name,
  term,
}));
const read = (text: string): Result<Expression> => readExpression(text, { names, size: 6, setting: "estimates" });

function found(text: string): Expression {
  const expression = read(text);
  if (!expression.ok) throw new Error(JSON.stringify(expression.problem));
  return expression.value;
}
const weights = (...values: number[]): number[] => [...values, ...Array<number>(6 - values.length).fill(0)];

describe("arithmetic of coefficients", () => {
  it.each([
    ["Price", 0, weights(0, 1)],
    ["price + prices ABROAD", 0, weights(0, 1, 1)],
    ["-Price - -2.5*Prices abroad", 0, weights(0, -1, 2.5)],
    ["3 - 2 * (Price - constant) / 4", 3, weights(0.5, -0.5)],
    ["Month: Jan-19 - Price", 0, weights(0, -1, 0, 1)],
    ['R&D (new) * 1e2 + "Rain, heavy"', 0, weights(0, 0, 0, 0, 100, 1)],
    ["+(Price)", 0, weights(0, 1)],
    ["Price × 2 − .5", -0.5, weights(0, 2)],
    ["Price / 4 + Prices abroad / (2 + 2)", 0, weights(0, 0.25, 0.25)],
    ["2 * 3 * Price / 2 / 3", 0, weights(0, 1)],
  ])("%s", (text, offset, expected) => {
    const { above, below, against, side } = found(text);
    expect(above.offset).toBeCloseTo(offset, 14);
    above.weights.forEach((weight, j) => expect(weight).toBeCloseTo(expected[j]!, 14));
    expect([below, against, side]).toEqual([null, 0, "both"]);
  });

  it("knows quotients of two sums, and no other", () => {
    const longRun = found("2 * Price / (1 - Prices abroad)");
    expect(longRun.above).toEqual({ offset: 0, weights: weights(0, 2) });
    expect(longRun.below?.offset).toBe(1);
    expect(longRun.below?.weights[2]).toBe(-1);
    const turning = found("-Price / (2 * Prices abroad) = 3");
    expect(turning).toMatchObject({ against: 3, above: { weights: weights(-0, -1, -0, -0, -0, -0) } });
    expect(turning.below?.weights[2]).toBe(2);
    for (const text of [
      "Price * Prices abroad",
      "Price / Prices abroad + Price",
      "Price / Prices abroad / Price * constant",
    ]) {
      expect(read(text)).toMatchObject({ problem: { code: "unknown-value", setting: "estimates", value: text } });
    }
  });

  it("adds a number to a quotient", () => {
    const { above, below } = found("1 + Price / constant");
    expect(above.weights.slice(0, 2)).toEqual([1, 1]);
    expect(below?.weights[0]).toBe(1);
  });

  it("holds it against a value, on both sides or on one", () => {
    expect(found("Price = -1.5")).toMatchObject({ against: -1.5, side: "both" });
    expect(found("Price > 2 * 3")).toMatchObject({ against: 6, side: "above", text: "Price > 2 * 3" });
    expect(found(" Price < 0 ")).toMatchObject({ against: 0, side: "below", text: "Price < 0" });
    const equal = found("Price = 2 * Prices abroad + 1");
    expect(equal).toMatchObject({ against: 0, above: { offset: -1, weights: weights(0, 1, -2) }, below: null });
    expect(found("3 > Price")).toMatchObject({ above: { offset: 3, weights: weights(0, -1) }, side: "above" });
  });

  it.each([
    "",
    "Price +",
    "(Price",
    "Price)",
    "2",
    "2 = 3",
    "Price = 1 = 2",
    "Price / 0",
    "Price - Price",
    "Price = 1/0",
    "Price Price",
    "1 / Price = constant",
  ])("does not make do with %s", (text) => {
    expect(read(text)).toMatchObject({ ok: false, problem: { code: "unknown-value" } });
  });

  it.each([
    ["Prise + 1", "Prise", "Price"],
    ["Price + Prices", "Prices", "Price"],
    ["2Price", "2Price", "Price"],
    ['"Rain, heavyy" > 0', "Rain, heavyy", "Rain, heavy"],
  ])("%s: names what no coefficient is called", (text, heading, nearest) => {
    expect(read(text)).toMatchObject({
      problem: { code: "unknown-coefficient", name: heading, nearest },
    });
  });
});
