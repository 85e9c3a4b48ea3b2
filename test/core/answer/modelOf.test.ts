import { describe, expect, it } from "vitest";
import { type Parts, modelOf } from "../../../src/core/answer/modelOf.ts";
import { type Settings, defaultSettings } from "../../../src/core/answer/settingValues.ts";

const parts: Parts = {
  outcome: "Repairs",
  drivers: ["Price", "Fuel", "Region"],
  key: null,
  keyIs: "time",
  order: null,
};

const model = (settings: Partial<Settings>, given: Partial<Parts> = {}) =>
  modelOf({ ...defaultSettings, ...settings }, { ...parts, ...given });

const driversOf = (settings: Partial<Settings>): string[] => {
  const result = model(settings);
  return result.ok ? result.value.drivers.map(({ column }) => column) : [result.problem.code];
};

describe("settings and columns make a model", () => {
  it("takes drivers by heading or by number, in the order asked for", () => {
    expect(driversOf({})).toEqual(["Price", "Fuel", "Region"]);
    expect(driversOf({ columns: ["3", "fuel"] })).toEqual(["Region", "Fuel"]);
    expect(driversOf({ columns: ["4"] })).toEqual(["unknown-heading"]);
    expect(driversOf({ columns: ["0"] })).toEqual(["unknown-heading"]);
  });

  it("takes rows from the key where the settings do not say what they are", () => {
    const rows = (settings: Partial<Settings>, given: Partial<Parts>) => {
      const result = model(settings, given);
      return result.ok ? result.value.rows : result.problem;
    };
    expect(rows({}, {})).toEqual({ kind: "cases" });
    expect(rows({}, { key: "Month" })).toEqual({ kind: "time", order: "Month" });
    expect(rows({}, { key: "Shop", keyIs: "groups", order: "Month" })).toEqual({
      kind: "groups",
      by: "Shop",
      second: null,
      order: "Month",
    });
    expect(rows({ rows: "cases" }, { key: "Month" })).toEqual({ kind: "cases" });
    expect(rows({ rows: "time" }, {})).toEqual({ kind: "time", order: null });
    expect(rows({ rows: "groups" }, {})).toEqual({ code: "no-group-column" });
  });

  it("reads a driver with a base as a category", () => {
    const result = model({ bases: { region: "North" }, categories: ["Fuel"] });
    expect(result.ok && result.value.drivers.map(({ as, base }) => [as, base])).toEqual([
      ["number", null],
      ["category", null],
      ["category", "North"],
    ]);
  });

  it("reads dates as time, adds further drivers behind those that stand for their columns, and crosses groups", () => {
    const added = [
      { column: "price", transform: { kind: "square" as const } },
      { column: "repairs", transform: { kind: "lag" as const, periods: 1 } },
    ];
    const settings = { dates: ["fuel"], added, secondGroups: "Month" };
    const result = model(settings, { key: "Shop", keyIs: "groups", order: "Month" });
    expect(result.ok && result.value.drivers.map(({ column, as, transform }) => [column, as, transform.kind])).toEqual([
      ["Price", "number", "none"],
      ["Fuel", "date", "none"],
      ["Region", "number", "none"],
      ["Price", "number", "square"],
      ["Repairs", "number", "lag"],
    ]);
    expect(result.ok && result.value.rows).toEqual({ kind: "groups", by: "Shop", second: "Month", order: "Month" });
    expect(model({ dates: ["Openned"] })).toMatchObject({ problem: { code: "unknown-heading", heading: "Openned" } });
    expect(model({ added: [{ column: "Prise", transform: { kind: "square" } }] })).toMatchObject({
      problem: { code: "unknown-heading", heading: "Prise", nearest: "Price" },
    });
  });

  it("takes a second column of the key for groups that cross, and for time where something looks back", () => {
    const rows = (settings: Partial<Settings>) => {
      const crossed = { secondGroups: "region code", ...settings };
      const result = model(crossed, { key: "Shop", keyIs: "groups", order: "Region code" });
      return result.ok && result.value.rows.kind === "groups" ? result.value.rows.order : result;
    };
    expect(rows({})).toBeNull();
    expect(rows({ calendar: ["trend"] })).toBe("Region code");
    expect(rows({ added: [{ column: "Price", transform: { kind: "lag", periods: 1 } }] })).toBe("Region code");
    expect(rows({ added: [{ column: "Price", transform: { kind: "square" } }] })).toBeNull();
    const fixed = { errors: "newey-west", reason: null } as const;
    expect(rows({ options: { ...defaultSettings.options, fixed } })).toBe("Region code");
    expect(rows({ secondGroups: null })).toBe("Region code");
  });

  it("names the nearest column where a setting speaks of one that plays no part", () => {
    expect(model({ categories: ["Regoin"] })).toMatchObject({
      ok: false,
      problem: { code: "unknown-heading", heading: "Regoin", nearest: "Region" },
    });
  });
});
