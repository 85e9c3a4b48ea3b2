import { parseArgs } from "node:util";
import { settingTable } from "../core/answer/settingTable.ts";
import { nearestName } from "../core/problem/nearestName.ts";
import { type Result, failure, success } from "../core/problem/result.ts";

/** What `footing answer` was asked. Headings and ranges stay as typed: the book says which they are. */
export interface AnswerCommand {
  readonly book: string;
  readonly sheet: string | null;
  readonly outcome: string;
  readonly drivers: readonly string[];
  readonly order: string | null;
  readonly groups: string | null;
  readonly settings: readonly (readonly [string, string])[];
  readonly save: string | null;
  readonly live: boolean;
  readonly json: boolean;
}

const flagOf = (setting: string): string => setting.replaceAll(" ", "-");

/** Settings that the command line says in a way of its own. */
const saidOtherwise = ["constant"];

const settingFlags = settingTable.map(({ name }) => name).filter((name) => !saidOtherwise.includes(name));

const ownFlags = {
  sheet: { type: "string" },
  outcome: { type: "string" },
  drivers: { type: "string", multiple: true },
  order: { type: "string" },
  groups: { type: "string" },
  "no-constant": { type: "boolean" },
  save: { type: "string" },
  live: { type: "boolean" },
  json: { type: "boolean" },
  help: { type: "boolean" },
} as const;

const flagNames: readonly string[] = [...Object.keys(ownFlags), ...settingFlags.map(flagOf)];

type Values = Readonly<Record<string, string | boolean | readonly (string | boolean)[] | undefined>>;

/**
 * Reads the words after `footing answer`.
 * @returns Problem "unknown-setting" for a flag that does not exist, "missing-option" where one must be given.
 */
export function readAnswerCommand(words: readonly string[]): Result<AnswerCommand> {
  const unknown = words.find((word) => word.startsWith("--") && !flagNames.includes(bareFlag(word)));
  if (unknown !== undefined) {
    return failure({
      code: "unknown-setting",
      setting: unknown,
      nearest: dashed(nearestName(bareFlag(unknown), flagNames)),
    });
  }
  const settingOptions = Object.fromEntries(settingFlags.map((name) => [flagOf(name), { type: "string" as const }]));
  const { values, positionals } = parseArgs({
    args: [...words],
    options: { ...settingOptions, ...ownFlags },
    allowPositionals: true,
    strict: false,
  });
  return commandFrom(values, positionals);
}

const bareFlag = (word: string): string => word.replace(/^--/, "").replace(/=.*$/s, "");
const dashed = (name: string | null): string | null => (name === null ? null : `--${name}`);

function commandFrom(values: Values, positionals: readonly string[]): Result<AnswerCommand> {
  const text = (name: string): string | null => {
    const value = values[name];
    return typeof value === "string" ? value : null;
  };
  const [book] = positionals;
  const outcome = text("outcome");
  const drivers = texts(values["drivers"]);
  if (book === undefined)
    return failure({ code: "missing-option", option: "BOOK, the workbook to read (.xlsx or .csv)" });
  if (outcome === null) return failure({ code: "missing-option", option: "--outcome" });
  if (drivers.length === 0) return failure({ code: "missing-option", option: "--drivers" });
  const valueless = [...Object.keys(ownFlags), ...settingFlags.map(flagOf)].find(
    (name) => needsValue(name) && values[name] === true,
  );
  if (valueless !== undefined) return failure({ code: "missing-option", option: `a value after --${valueless}` });
  return success({
    book,
    sheet: text("sheet"),
    outcome,
    drivers,
    order: text("order"),
    groups: text("groups"),
    settings: settingsFrom(values, text),
    save: text("save"),
    live: values["live"] === true,
    json: values["json"] === true,
  });
}

const needsValue = (name: string): boolean =>
  !(name in ownFlags) || ownFlags[name as keyof typeof ownFlags].type === "string";

const texts = (value: Values[string]): string[] =>
  Array.isArray(value) ? value.filter((item): item is string => typeof item === "string") : [];

/** Settings given as flags. */
function settingsFrom(values: Values, text: (name: string) => string | null): (readonly [string, string])[] {
  const given = settingFlags.flatMap((name) => {
    const value = text(flagOf(name));
    return value === null ? [] : [[name, value] as const];
  });
  const constant = values["no-constant"] === true ? [["constant", "no"] as const] : [];
  return [...given, ...constant];
}
