import type { LagRule } from "../covariance/choice.ts";
import type { Model, Transform } from "../design/model.ts";
import { type Options, defaultOptions } from "./options.ts";

export type SettingPair = readonly [string, string];

/**
 * The settings that lead to a model and its options, as names and values: what a report states and what the worksheet
 * functions of a live sheet read. Defaults are left unsaid; reading the pairs gives the same model and options again.
 */
export function settingsSaid(model: Model, options: Options): SettingPair[] {
  return [...modelPairs(model), ...optionPairs(options)];
}

function modelPairs(model: Model): SettingPair[] {
  const categories = model.drivers.filter(({ as }) => as === "category");
  const bases = categories.flatMap(({ column, base }) =>
    base === null ? [] : [`${quoted(column)} = ${quoted(base)}`],
  );
  const [decimal] = model.textNumbers.map((entry) => entry.decimal);
  return said([
    ["rows", model.rows.kind],
    ["constant", model.constant ? "" : "no"],
    ["categories", categories.map(({ column }) => quoted(column)).join(", ")],
    ["base", bases.join(", ")],
    ...transformPairs(model),
    ["calendar", model.calendar.join(", ")],
    ["text numbers", decimal === undefined ? "" : decimal === "." ? "point" : "comma"],
  ]);
}

/** A name that a list would take apart stands in double quotes; quotes of its own could not be told from them. */
const quoted = (name: string): string => (/[,;=]|\sby\s+\d+$/i.test(name) ? `"${name.replaceAll('"', "")}"` : name);

const said = (pairs: readonly SettingPair[]): SettingPair[] => pairs.filter(([, value]) => value !== "");

const transformNames = ["logarithm", "square", "lag", "change", "growth rate"] as const;

function transformPairs({ outcome, drivers }: Model): SettingPair[] {
  const columns = [outcome, ...drivers];
  return transformNames.map((name) => [
    name,
    columns
      .flatMap(({ column, transform }) => (transform.kind === name ? [transformed(column, transform)] : []))
      .join(", "),
  ]);
}

const transformed = (column: string, transform: Transform): string =>
  "periods" in transform && transform.periods !== 1 ? `${quoted(column)} by ${transform.periods}` : quoted(column);

function optionPairs(options: Options): SettingPair[] {
  const differs = (key: keyof Options): boolean => options[key] !== defaultOptions[key];
  return said([
    ["policy", differs("policy") ? options.policy : ""],
    ["errors", options.fixed?.errors ?? ""],
    ["reason", options.fixed?.reason ?? ""],
    ["white version", differs("whiteVersion") ? options.whiteVersion : ""],
    ["grouped version", differs("groupedVersion") ? options.groupedVersion : ""],
    ["lags", options.lags === null ? "" : lagsInWords(options.lags)],
    ["small-sample factor", options.adjusted ? "" : "no"],
    ["level", differs("level") ? String(options.level) : ""],
    ["against", named(options.against)],
    ["estimates", options.estimates.join(", ")],
    ["joint test", options.jointTest.join(", ")],
    ["units", named(options.units)],
  ]);
}

const named = (values: Readonly<Record<string, string | number>>): string =>
  Object.entries(values)
    .map(([name, value]) => `${quoted(name)} = ${quoted(String(value))}`)
    .join(", ");

/** A rule for the number of lags in the words that the setting takes. */
export function lagsInWords(rule: LagRule): string {
  switch (rule.kind) {
    case "given":
      return String(rule.lags);
    case "careful":
    case "thumb":
    case "cube root":
      return rule.kind;
    case "newey-west 1994":
      return rule.prewhiten ? "newey-west 1994 prewhitened" : "newey-west 1994";
    case "andrews 1991":
      return `andrews 1991 ${rule.kernel}${rule.prewhiten ? " prewhitened" : ""}`;
  }
}
