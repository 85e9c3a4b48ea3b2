import { describe, expect, it } from "vitest";
import { type Figure, computed, notApplicable } from "../../../src/core/diagnostics/outcome.ts";

const sound: Figure = { statistic: 3.5, law: "chi-square", df: [2], pValue: 0.17 };
const outcomeWith = (figure: Figure, fForm: Figure | null = null) =>
  computed({ test: "koenker", form: null, order: null, figure, fForm, details: {} });

describe("computed outcomes", () => {
  it.each([
    { statistic: Number.NaN },
    { statistic: Infinity },
    { pValue: Number.NaN },
    { pValue: -0.001 },
    { pValue: 1.001 },
  ])("refuse %o in either form", (fault) => {
    expect(() => outcomeWith({ ...sound, ...fault })).toThrow("koenker");
    expect(() => outcomeWith({ ...sound, ...fault }, sound)).toThrow("koenker");
    expect(() => outcomeWith(sound, { ...sound, ...fault })).toThrow("koenker");
  });

  it("take the ends of the scale", () => {
    for (const pValue of [0, 1]) expect(outcomeWith({ ...sound, pValue }, sound).figure.pValue).toBe(pValue);
    expect(notApplicable("arch", "too few rows", 3)).toMatchObject({ kind: "not-applicable", order: 3 });
  });
});
