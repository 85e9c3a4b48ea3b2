import { describe, expect, it } from "vitest";
import { readSettings, settingPairs } from "../../../src/core/answer/settings.ts";
import { settingTable } from "../../../src/core/answer/settingTable.ts";
import { defaultSettings } from "../../../src/core/answer/settingValues.ts";

const read = (text: string) => {
  const pairs = settingPairs(text);
  return pairs.ok ? readSettings(pairs.value) : pairs;
};

const value = (text: string) => {
  const result = read(text);
  if (!result.ok) throw new Error(result.problem.code);
  return result.value;
};

describe("settings as text", () => {
  it("are the defaults where nothing is said", () => {
    expect(value("")).toEqual(defaultSettings);
    expect(value(" ; ")).toEqual(defaultSettings);
  });

  it("are free of case, and hyphens count as spaces", () => {
    const settings = value("Rows: TIME; White-Version: hc1; policy: always robust");
    expect(settings.rows).toBe("time");
    expect(settings.options.whiteVersion).toBe("HC1");
    expect(settings.options.policy).toBe("always-robust");
  });

  it.each([
    ["lags: 4", { kind: "given", lags: 4 }],
    ["lags: thumb", { kind: "thumb" }],
    ["lags: cube root", { kind: "cube root" }],
    ["lags: Newey-West 1994", { kind: "newey-west 1994", prewhiten: false }],
    ["lags: newey-west 1994 prewhitened", { kind: "newey-west 1994", prewhiten: true }],
    ["lags: andrews 1991 parzen", { kind: "andrews 1991", kernel: "parzen", prewhiten: false }],
    [
      "lags: andrews 1991 quadratic spectral prewhitened",
      { kind: "andrews 1991", kernel: "quadratic spectral", prewhiten: true },
    ],
  ])("%s", (text, lags) => {
    expect(value(text).options.lags).toEqual(lags);
  });

  it("keep the reason for a fixed kind in whatever order they stand", () => {
    const fixed = { errors: "white", reason: "agreed in March" };
    expect(value("errors: white; reason: agreed in March").options.fixed).toEqual(fixed);
    expect(value("reason: agreed in March; errors: white").options.fixed).toEqual(fixed);
    expect(value("errors: by tests; reason: none needed").options.fixed).toBeNull();
  });

  it("read what is added beside the columns", () => {
    expect(value('add: square of Price, Lag of "Fuel, net" by 2, growth  rate of Takings by 12').added).toEqual([
      { column: "Price", transform: { kind: "square" } },
      { column: "Fuel, net", transform: { kind: "lag", periods: 2 } },
      { column: "Takings", transform: { kind: "growth rate", periods: 12 } },
    ]);
    for (const text of ["root of Price", "square Price", "square of Price, Fuel"]) {
      expect(read(`add: ${text}`)).toMatchObject({ ok: false, problem: { code: "unknown-value", setting: "add" } });
    }
  });

  it("read what is asked beyond the drivers", () => {
    const { options, dates, secondGroups } = value(
      'break after: 12; predict for: Single-Row; estimates: Price > 1, "A, b" / 2; joint test: Price = 0, Fuel = 1; dates: Opened; second groups: Year',
    );
    expect(options).toMatchObject({ breakAfter: 12, predictFor: "single row", jointTest: ["Price = 0", "Fuel = 1"] });
    expect(options.estimates).toEqual(["Price > 1", '"A, b" / 2']);
    expect([dates, secondGroups]).toEqual([["Opened"], "Year"]);
    for (const count of ["0", "1.5", "-3", "half", ""]) {
      expect(read(`break after: ${count}`)).toMatchObject({ ok: false, problem: { setting: "break after" } });
    }
  });

  it("read lists, transforms and named values", () => {
    const settings = value(
      "columns: Price, 3; lag: Price by 2, Fuel; logarithm: Takings; base: Region = North; against: Price = -1.5; units: Repairs = repairs a month; level: 10 %; constant: no; text numbers: comma; small-sample factor: no",
    );
    expect(settings.columns).toEqual(["Price", "3"]);
    expect(settings.transforms).toEqual([
      { column: "Price", transform: { kind: "lag", periods: 2 } },
      { column: "Fuel", transform: { kind: "lag", periods: 1 } },
      { column: "Takings", transform: { kind: "logarithm" } },
    ]);
    expect(settings.bases).toEqual({ Region: "North" });
    expect(settings.options.against).toEqual({ Price: -1.5 });
    expect(settings.options.units).toEqual({ Repairs: "repairs a month" });
    expect(settings.options.level).toBeCloseTo(0.1, 12);
    expect([settings.constant, settings.textNumbers, settings.options.adjusted]).toEqual([false, ",", false]);
  });
});

describe("settings that are not understood", () => {
  it("name the nearest known setting", () => {
    expect(read("polcy: careful")).toEqual({
      ok: false,
      problem: { code: "unknown-setting", setting: "polcy", nearest: "policy" },
    });
  });

  it("name the nearest known value", () => {
    const result = read("policy: carefull");
    expect(result.ok ? null : result.problem).toMatchObject({
      code: "unknown-value",
      setting: "policy",
      nearest: "careful",
    });
  });

  it.each([
    "level: 0",
    "level: 1",
    "level: five",
    "level:",
    "lags: -1",
    "lags: many",
    "against: Price",
    "calendar: moon",
  ])("%s is refused", (text) => {
    const result = read(text);
    expect(result.ok ? null : result.problem.code).toBe("unknown-value");
  });

  it("a part without a colon is a setting that is not known", () => {
    expect(read("lags 4")).toMatchObject({ ok: false, problem: { code: "unknown-setting", setting: "lags 4" } });
  });
});

describe("the table of settings", () => {
  it("has each name once, and a sentence for each", () => {
    const names = settingTable.map(({ name }) => name);
    expect(new Set(names).size).toBe(names.length);
    for (const { meaning, values, standard } of settingTable) {
      expect(meaning.endsWith(".")).toBe(true);
      expect(values.length * standard.length).toBeGreaterThan(0);
    }
  });
});
