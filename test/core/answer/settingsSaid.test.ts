import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { modelOf } from "../../../src/core/answer/modelOf.ts";
import { type Options, defaultOptions } from "../../../src/core/answer/options.ts";
import { readSettings } from "../../../src/core/answer/settings.ts";
import { settingsSaid } from "../../../src/core/answer/settingsSaid.ts";
import type { LagRule } from "../../../src/core/covariance/choice.ts";
import type { DriverChoice, Model, Transform } from "../../../src/core/design/model.ts";

const columns = ["Price index, net of tax = list", "Advertising", "Region; by 2", "Opened"] as const;
/** Beside those that stand for their columns; no transform here is one of theirs. */
const addedDrivers: DriverChoice[] = [
  { column: "Repairs", as: "number", base: null, transform: { kind: "lag", periods: 13 } },
  { column: columns[0], as: "number", base: null, transform: { kind: "growth rate", periods: 14 } },
  { column: columns[1], as: "number", base: null, transform: { kind: "lag", periods: 15 } },
];
const periods = fc.integer({ min: 1, max: 12 });
const transforms: fc.Arbitrary<Transform> = fc.oneof(
  fc.constant<Transform>({ kind: "none" }),
  fc.constant<Transform>({ kind: "logarithm" }),
  fc.constant<Transform>({ kind: "square" }),
  periods.map((count): Transform => ({ kind: "lag", periods: count })),
  periods.map((count): Transform => ({ kind: "change", periods: count })),
  periods.map((count): Transform => ({ kind: "growth rate", periods: count })),
);
const lagRules: fc.Arbitrary<LagRule | null> = fc.oneof(
  fc.constant(null),
  fc.integer({ min: 0, max: 40 }).map((lags): LagRule => ({ kind: "given", lags })),
  fc.constantFrom<LagRule>({ kind: "careful" }, { kind: "thumb" }, { kind: "cube root" }),
  fc.boolean().map((prewhiten): LagRule => ({ kind: "newey-west 1994", prewhiten })),
  fc
    .tuple(fc.constantFrom("bartlett" as const, "parzen" as const, "quadratic spectral" as const), fc.boolean())
    .map(([kernel, prewhiten]): LagRule => ({ kind: "andrews 1991", kernel, prewhiten })),
);
const models: fc.Arbitrary<Model> = fc.record({
  outcome: fc.record({ column: fc.constant("Repairs"), transform: transforms }),
  drivers: fc
    .tuple(transforms, transforms, fc.option(fc.constantFrom("North, by the sea", "South")), fc.subarray(addedDrivers))
    .map(([price, advertising, base, added]) => [
      { column: columns[0], as: "number" as const, base: null, transform: price },
      { column: columns[1], as: "number" as const, base: null, transform: advertising },
      { column: columns[2], as: "category" as const, base, transform: { kind: "none" as const } },
      { column: columns[3], as: "date" as const, base: null, transform: { kind: "none" as const } },
      ...added,
    ]),
  calendar: fc.subarray(["trend" as const, "month indicators" as const]),
  rows: fc.constantFrom(
    { kind: "cases" as const },
    { kind: "time" as const, order: "Month" },
    { kind: "groups" as const, by: "Month", second: null, order: null },
    { kind: "groups" as const, by: "Month", second: "Shop", order: null },
  ),
  constant: fc.boolean(),
  textNumbers: fc.constant([]),
});
const options: fc.Arbitrary<Options> = fc.record({
  policy: fc.constantFrom("careful", "textbook", "always-robust"),
  fixed: fc.option(
    fc.record({ errors: fc.constantFrom("classical", "white"), reason: fc.option(fc.constant("agreed in March")) }),
  ),
  whiteVersion: fc.constantFrom("HC0", "HC2 bell-mccaffrey", "HC3", "HC4m"),
  groupedVersion: fc.constantFrom("CR0", "CR1", "CR2"),
  lags: lagRules,
  adjusted: fc.boolean(),
  level: fc.constantFrom(0.01, 0.05, 0.1),
  against: fc.constantFrom({}, { [columns[0]]: -1, Advertising: 0.25 }),
  breakAfter: fc.constantFrom(null, 7),
  predictFor: fc.constantFrom("mean", "single row"),
  estimates: fc.constantFrom([], ["Advertising > 1", '"Price, new" / (1 - Advertising) = 2']),
  jointTest: fc.constantFrom([], ["Advertising = 0", '"Price, new" = 2 * Advertising']),
  units: fc.constantFrom({}, { Repairs: "repairs a month, all shops" }),
});

describe("settings as a report states them", () => {
  it("lead back to the same model and options", () => {
    fc.assert(
      fc.property(models, options, (model, wanted) => {
        const settings = readSettings(settingsSaid(model, wanted));
        if (!settings.ok) throw new Error(JSON.stringify(settings.problem));
        const parts = {
          outcome: "Repairs",
          drivers: columns,
          key: model.rows.kind === "cases" ? null : "Month",
          keyIs: "time",
          order: null,
        } as const;
        expect(modelOf(settings.value, parts)).toEqual({ ok: true, value: model });
        expect(settings.value.options).toEqual(wanted);
      }),
      { seed: 20260901, numRuns: 300 },
    );
  });

  it("leave defaults unsaid", () => {
    const model: Model = {
      outcome: { column: "Repairs", transform: { kind: "none" } },
      drivers: [],
      calendar: [],
      rows: { kind: "cases" },
      constant: true,
      textNumbers: [],
    };
    expect(settingsSaid(model, defaultOptions)).toEqual([["rows", "cases"]]);
  });
});
