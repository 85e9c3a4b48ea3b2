import { describe, expect, it } from "vitest";
import { residualShape } from "../../../src/core/answer/residualShape.ts";
import { expectDigits } from "../../support/digits.ts";
import { designOf, fitOf, reference, referenceFit, referenceIds, throughTime } from "../../support/referenceFit.ts";

const inTime = referenceIds.filter((id) => reference(id).rows === "time" && reference(id).n >= 16);

describe("correlations of the residuals with their own past", () => {
  // R's Box.test: Box and Pierce's statistic is n times the sum of r^2 up to the order.
  it.each(inTime)("are those behind the statistics of Box and Pierce: %s", (id) => {
    const { tests, n } = reference(id);
    const { values, bound } = residualShape(referenceFit(id)).correlations!;
    const orders = [1, 2, 4].filter((order) => tests[`box_pierce_${order}`] !== undefined);
    expect(orders[0]).toBe(1);
    for (const order of orders) {
      const sum = values.slice(0, order).reduce((total, r) => total + n * r ** 2, 0);
      expectDigits(sum, tests[`box_pierce_${order}`]!.statistic, 9);
    }
    expectDigits(bound, 1.96 / Math.sqrt(n), 14);
  });

  it("look two seasons back where there is one, and never beyond a quarter of the rows", () => {
    const y = Array.from({ length: 60 }, (_, row) => Math.sin(row * 1.3) + 0.01 * row);
    const x = [y.map((_, row) => Math.cos(row * 0.7))];
    const monthly = { ...throughTime(60), period: { name: "monthly", unit: "month", season: 12 } };
    const lags = (rows: number, order: object): number | undefined =>
      residualShape(
        fitOf(designOf(y.slice(0, rows), [x[0]!.slice(0, rows)], { order: { ...throughTime(rows), ...order } })),
      ).correlations?.values.length;
    expect([lags(60, {}), lags(60, { period: monthly.period }), lags(24, {}), lags(3, {})]).toEqual([
      12,
      15,
      6,
      undefined,
    ]);
  });

  it("are not made where rows have no time", () => {
    const cases = referenceIds.find((id) => reference(id).rows === "unordered")!;
    expect(residualShape(referenceFit(cases)).correlations).toBeNull();
  });
});

describe("quantiles of the residuals", () => {
  const fit = fitOf(designOf([2, 4, 5, 4, 9], [[1, 2, 3, 4, 5]]));
  const { quantiles } = residualShape(fit);

  it("are the residuals in order", () => {
    expect(quantiles.residuals).toEqual([...fit.residuals].sort((one, other) => one - other));
  });

  it("stand against the normal law of the same spread, at ranks less a half", () => {
    // Normal quantiles at 0.1 and 0.3 from a printed table: -1.2816, -0.5244.
    const standard = quantiles.normal.map((value) => Number((value / fit.sigma).toFixed(4)));
    expect(standard).toEqual([-1.2816, -0.5244, 0, 0.5244, 1.2816]);
  });

  it("are at most 200, the ends among them", () => {
    const y = Array.from({ length: 900 }, (_, row) => Math.sin(row * 12.9898) * 43.7);
    const many = fitOf(designOf(y, [y.map((_, row) => Math.cos(row * 78.233))]));
    const found = residualShape(many).quantiles.residuals;
    expect(found).toHaveLength(200);
    expect([found[0], found.at(-1)]).toEqual([Math.min(...many.residuals), Math.max(...many.residuals)]);
  });
});
