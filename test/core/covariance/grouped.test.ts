import { describe, expect, it } from "vitest";
import { covarianceOf } from "../../../src/core/covariance/covarianceOf.ts";
import type { Covariance, GroupedVersion } from "../../../src/core/covariance/choice.ts";
import type { RowOrder } from "../../../src/core/design/design.ts";
import type { Fit } from "../../../src/core/fit/fit.ts";
import { randomFrom } from "../../support/random.ts";
import { errorsOf, expectAllDigits, orderedFit } from "../../support/referenceErrors.ts";
import { designOf, fitOf, inGroups } from "../../support/referenceFit.ts";

const random = randomFrom(41);
const draws = (n: number): number[] => Array.from({ length: n }, () => random.normal());

function grouped(fit: Fit, version: GroupedVersion): Covariance {
  const covariance = covarianceOf(fit, { kind: "grouped", version });
  if (!covariance.ok) throw new Error(covariance.problem.code);
  return covariance.value;
}

describe("groups of one", () => {
  const n = 30;
  const alone = inGroups(Array.from({ length: n }, (_, i) => i));
  const fit = fitOf(designOf(draws(n), [draws(n), draws(n)], { order: alone }));

  it("give HC0, HC1 up to its factor, and HC2", () => {
    expectAllDigits(grouped(fit, "CR0").standardErrors, [...errorsOf(fit, { kind: "white", version: "HC0" })], 12);
    const hc1 = errorsOf(fit, { kind: "white", version: "HC1" });
    // G/(G-1) (n-1)/(n-k) with G = n is n/(n-k).
    expectAllDigits(grouped(fit, "CR1").standardErrors, [...hc1], 12);
    expectAllDigits(grouped(fit, "CR2").standardErrors, [...errorsOf(fit, { kind: "white", version: "HC2" })], 12);
  });
});

describe("two ways of grouping", () => {
  it("with the same groups twice is one way", () => {
    const once = orderedFit("grunfeld");
    const { order } = once.design;
    if (order.kind !== "groups") throw new Error(order.kind);
    const twice: RowOrder = { ...order, second: { groups: order.groups, labels: order.labels, by: order.by } };
    const both = grouped({ ...once, design: { ...once.design, order: twice } }, "CR1");
    expectAllDigits(both.standardErrors, [...grouped(once, "CR1").standardErrors], 12);
  });

  it("is left as it is where it is not indefinite, and says what was asked for and used", () => {
    const both = grouped(orderedFit("grunfeld", "by year too"), "CR1");
    expect(both.choice).toEqual({ kind: "grouped", version: "CR1" });
    expect(both.used).toEqual({ lags: null, bandwidth: null, version: "CR1", fallback: null });
    const once = grouped(orderedFit("grunfeld"), "CR2");
    expect(once.choice).toEqual({ kind: "grouped", version: "CR2" });
    expect(once.used).toEqual({ lags: null, bandwidth: null, version: "CR2", fallback: null });
  });

  it("keeps every version and way apart, whatever was asked for before", () => {
    const asked = (fit: Fit, versions: readonly GroupedVersion[]): Record<string, number[]> =>
      Object.fromEntries(versions.map((version) => [version, [...grouped(fit, version).standardErrors]]));
    const forwards = asked(orderedFit("grunfeld", "by year too"), ["CR0", "CR1", "CR2"]);
    expect(asked(orderedFit("grunfeld", "by year too"), ["CR2", "CR1", "CR0"])).toEqual(forwards);
  });

  it("has the degrees of freedom of the fewer groups", () => {
    expect([...grouped(orderedFit("grunfeld", "by year too"), "CR1").degreesOfFreedom!]).toEqual([10, 10, 10]);
    expect([...grouped(orderedFit("grunfeld", "by year too"), "CR2").degreesOfFreedom!]).toEqual([10, 10, 10]);
    expect([...grouped(orderedFit("grunfeld"), "CR0").degreesOfFreedom!]).toEqual([10, 10, 10]);
  });

  it("never leaves a variance below zero, and says what was done", () => {
    // Errors that cancel along both ways: V_1 and V_2 are small, V_12 is not.
    const first = [0, 0, 1, 1, 2, 2, 3, 3];
    const second = [0, 1, 0, 1, 2, 3, 2, 3];
    const y = [5, -5, -5, 5, 4, -4, -4, 4.5];
    const x = [1, 2, 3, 4, 4, 3, 2, 1.5];
    const order: RowOrder = {
      ...inGroups(first),
      second: { groups: Int32Array.from(second), labels: ["0", "1", "2", "3"], by: "Year" },
    } as RowOrder;
    const covariance = grouped(fitOf(designOf(y, [x], { order })), "CR0");
    expect(covariance.used.fallback).toContain("indefinite");
    expect(covariance.standardErrors.every((value) => value >= 0)).toBe(true);
    expect(Math.max(...covariance.standardErrors)).toBeGreaterThan(0.1);
  });
});

describe("CR2", () => {
  it("stays finite where one group alone determines a coefficient", () => {
    const groups = [0, 0, 0, 1, 1, 1, 2, 2, 2, 3, 3, 3];
    const inLast = groups.map((group) => (group === 3 ? 1 : 0));
    const fit = fitOf(designOf(draws(12), [draws(12), inLast], { order: inGroups(groups) }));
    const { standardErrors, degreesOfFreedom } = grouped(fit, "CR2");
    expect(standardErrors.every(Number.isFinite)).toBe(true);
    expect(standardErrors[1]).toBeGreaterThan(0);
    expect(degreesOfFreedom!.every((df) => df >= 1 && df <= 3)).toBe(true);
  });
});

describe("a coefficient that one group alone determines", () => {
  it("has one degree of freedom under CR2, and no error to show", () => {
    const groups = [0, 0, 0, 1, 1, 1, 2, 2, 2, 3, 3, 3];
    const indicator = (holds: (group: number) => boolean): number[] => groups.map((group) => (holds(group) ? 1 : 0));
    const columns = [indicator((group) => group === 0), indicator((group) => group > 0)];
    const fit = fitOf(designOf(draws(12), columns, { constant: false, order: inGroups(groups) }));
    const { degreesOfFreedom, standardErrors } = grouped(fit, "CR2");
    expect(degreesOfFreedom![0]).toBe(1);
    expect(standardErrors[0]).toBeLessThan(1e-12);
    expect(degreesOfFreedom![1]).toBeCloseTo(2, 12);
  });
});

describe("what rows are", () => {
  it("must be groups", () => {
    const fit = orderedFit("cars");
    expect(covarianceOf(fit, { kind: "grouped", version: "CR1" })).toEqual({
      ok: false,
      problem: { code: "errors-need-order", errors: "grouped", rows: "cases" },
    });
  });
});
