import type { LagRule } from "../covariance/choice.ts";
import { sameColumn } from "../design/columns.ts";
import type { DriverChoice, Model, Transform } from "../design/model.ts";
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
  const [plain, added] = plainAndAdded(model);
  const categories = plain.filter(({ as }) => as === "category");
  const bases = categories.flatMap(({ column, base }) =>
    base === null ? [] : [`${quoted(column)} = ${quoted(base)}`],
  );
  const [decimal] = model.textNumbers.map((entry) => entry.decimal);
  return said([
    ["rows", model.rows.kind],
    ["constant", model.constant ? "" : "no"],
    ["categories", listed(categories)],
    ["dates", listed(plain.filter(({ as }) => as === "date"))],
    ["base", bases.join(", ")],
    ...transformPairs({ ...model, drivers: plain }),
    ["add", added.map(addedInWords).join(", ")],
    ["calendar", model.calendar.join(", ")],
    ["text numbers", decimal === undefined ? "" : decimal === "." ? "point" : "comma"],
    ["second groups", (model.rows.kind === "groups" ? model.rows.second : null) ?? ""],
  ]);
}

/** The first driver made of a column stands for the column; what else is made of it, or of the outcome, is added. */
function plainAndAdded({ outcome, drivers }: Model): readonly [DriverChoice[], DriverChoice[]] {
  const isAdded = ({ column }: DriverChoice, place: number): boolean =>
    sameColumn(column, outcome.column) || drivers.slice(0, place).some((earlier) => sameColumn(earlier.column, column));
  return [
    drivers.filter((driver, place) => !isAdded(driver, place)),
    drivers.filter((driver, place) => isAdded(driver, place)),
  ];
}

const addedInWords = ({ column, transform }: DriverChoice): string =>
  `${transform.kind} of ${transformed(column, transform)}`;

const listed = (drivers: readonly DriverChoice[]): string => drivers.map(({ column }) => quoted(column)).join(", ");

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
  const whereOwn = (
    key: "policy" | "whiteVersion" | "groupedVersion" | "level" | "breakAfter" | "predictFor",
  ): string => (options[key] === defaultOptions[key] ? "" : String(options[key]));
  return said([
    ["policy", whereOwn("policy")],
    ["errors", options.fixed?.errors ?? ""],
    ["reason", options.fixed?.reason ?? ""],
    ["white version", whereOwn("whiteVersion")],
    ["grouped version", whereOwn("groupedVersion")],
    ["lags", options.lags === null ? "" : lagsInWords(options.lags)],
    ["small-sample factor", options.adjusted ? "" : "no"],
    ["level", whereOwn("level")],
    ["against", named(options.against)],
    ["break after", whereOwn("breakAfter")],
    ["predict for", whereOwn("predictFor")],
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
