import { describe, expect, it } from "vitest";
import { criticalValueOf } from "../../../src/core/diagnostics/criticalValue.ts";

describe("critical values", () => {
  // Printed in every handbook, e.g. Fisher and Yates (1963), Statistical Tables.
  it.each([
    ["chi-square", [1], 0.05, 3.841],
    ["chi-square", [12], 0.1, 18.549],
    ["F", [4, 20], 0.05, 2.866],
    ["F", [2, 60], 0.01, 4.977],
  ] as const)("%s%o at %f", (law, df, level, point) => {
    expect(criticalValueOf({ law, df }, level)).toBeCloseTo(point, 3);
  });

  it("are not there for laws without degrees of freedom", () => {
    for (const law of ["normal", "exact", "limit"] as const) expect(criticalValueOf({ law, df: [] }, 0.05)).toBeNull();
  });
});
