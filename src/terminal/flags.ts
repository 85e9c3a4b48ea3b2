import { parseArgs } from "node:util";
import { nearestName } from "../core/problem/nearestName.ts";
import { type Result, failure, success } from "../core/problem/result.ts";

/** What a command takes after its name, by flag. */
export type FlagTable = Readonly<Record<string, { readonly type: "string" | "boolean"; readonly multiple?: boolean }>>;

/** The words after a command, read. */
export interface Flags {
  readonly positionals: readonly string[];
  readonly has: (flag: string) => boolean;
  /** Null where the flag was not given. */
  readonly text: (flag: string) => string | null;
  readonly texts: (flag: string) => readonly string[];
}

/**
 * Reads the words after a command.
 * @returns Problem "unknown-setting" for a flag that the command does not take, "missing-option" where a value is missing.
 */
export function readFlags(words: readonly string[], table: FlagTable): Result<Flags> {
  const names = Object.keys(table);
  const unknown = words.find((word) => word.startsWith("--") && !names.includes(bareFlag(word)));
  if (unknown !== undefined) {
    const nearest = nearestName(bareFlag(unknown), names);
    return failure({ code: "unknown-setting", setting: unknown, nearest: nearest === null ? null : `--${nearest}` });
  }
  const { values, positionals } = parseArgs({
    args: [...words],
    options: { ...table },
    allowPositionals: true,
    strict: false,
  });
  // The next flag is never meant as a value.
  const isFlag = (value: unknown): boolean => typeof value === "string" && names.some((name) => value === `--${name}`);
  const lacksValue = (name: string): boolean => [values[name]].flat().some((value) => value === true || isFlag(value));
  const valueless = names.find((name) => table[name]?.type === "string" && lacksValue(name));
  if (valueless !== undefined) return failure({ code: "missing-option", option: `a value after --${valueless}` });
  const texts = (flag: string): string[] =>
    [values[flag]].flat().filter((value): value is string => typeof value === "string");
  return success({
    positionals,
    has: (flag) => values[flag] === true,
    text: (flag) => texts(flag)[0] ?? null,
    texts,
  });
}

const bareFlag = (word: string): string => word.replace(/^--/, "").replace(/=.*$/s, "");
