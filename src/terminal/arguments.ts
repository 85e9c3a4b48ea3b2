import { settingTable } from "../core/answer/settingTable.ts";
import { type Result, failure, success } from "../core/problem/result.ts";
import { type FlagTable, type Flags, readFlags } from "./flags.ts";

/** What `footing answer` was asked. Headings and ranges stay as typed: the book says which they are. */
export interface AnswerCommand {
  readonly book: string;
  readonly sheet: string | null;
  readonly outcome: string;
  readonly drivers: readonly string[];
  readonly order: string | null;
  readonly groups: string | null;
  readonly settings: readonly (readonly [string, string])[];
  /** A sheet or range of new rows to be predicted. */
  readonly predict: string | null;
  readonly save: string | null;
  readonly live: boolean;
  /** The copy is to be one of which LibreOffice shows every figure. */
  readonly forLibreOffice: boolean;
  readonly json: boolean;
}

const flagOf = (setting: string): string => setting.replaceAll(" ", "-");

/** Settings that the command line says in a way of its own. */
const saidOtherwise = ["constant"];

const settingFlags = settingTable.map(({ name }) => name).filter((name) => !saidOtherwise.includes(name));

const flagTable: FlagTable = {
  ...Object.fromEntries(settingFlags.map((name) => [flagOf(name), { type: "string" as const }])),
  sheet: { type: "string" },
  outcome: { type: "string" },
  drivers: { type: "string", multiple: true },
  order: { type: "string" },
  groups: { type: "string" },
  "no-constant": { type: "boolean" },
  predict: { type: "string" },
  save: { type: "string" },
  live: { type: "boolean" },
  "for-libreoffice": { type: "boolean" },
  json: { type: "boolean" },
  help: { type: "boolean" },
};

/** What stands where no book is given. */
export const bookOption = "BOOK, the workbook to read (.xlsx or .csv)";

/**
 * Reads the words after `footing answer`.
 * @returns Problem "unknown-setting" for a flag that does not exist, "missing-option" where one must be given.
 */
export function readAnswerCommand(words: readonly string[]): Result<AnswerCommand> {
  const read = readFlags(words, flagTable);
  if (!read.ok) return read;
  const { text, texts, has, positionals } = read.value;
  const [book] = positionals;
  const outcome = text("outcome");
  const drivers = texts("drivers");
  if (book === undefined) return failure({ code: "missing-option", option: bookOption });
  if (outcome === null) return failure({ code: "missing-option", option: "--outcome" });
  if (drivers.length === 0) return failure({ code: "missing-option", option: "--drivers" });
  return success({
    book,
    sheet: text("sheet"),
    outcome,
    drivers,
    order: text("order"),
    groups: text("groups"),
    settings: settingsFrom(read.value),
    predict: text("predict"),
    save: text("save"),
    live: has("live"),
    forLibreOffice: has("for-libreoffice"),
    json: has("json"),
  });
}

/** Settings given as flags. */
function settingsFrom({ text, has }: Flags): (readonly [string, string])[] {
  const given = settingFlags.flatMap((name) => {
    const value = text(flagOf(name));
    return value === null ? [] : [[name, value] as const];
  });
  const constant = has("no-constant") ? [["constant", "no"] as const] : [];
  return [...given, ...constant];
}
