import { readSettings, settingPairs } from "../core/answer/settings.ts";
import type { Settings } from "../core/answer/settingValues.ts";
import { type Result, success } from "../core/problem/result.ts";
import { plainValue, rawCells } from "./rawCells.ts";

/**
 * Settings as a text, "rows: time; lags: 4", or as two columns of names and values; a name without a value says nothing.
 * A heading row above the two columns is passed over.
 */
export function readSettingsArgument(value: unknown): Result<Settings> {
  const rows = rawCells(value).map((row) => row.map(written));
  const inTwoColumns = rows.some((row) => row.length > 1);
  const pairs = inTwoColumns ? success(pairsOf(rows)) : settingPairs(rows.flat().join(";"));
  return pairs.ok ? readSettings(pairs.value) : pairs;
}

const pairsOf = (rows: readonly (readonly string[])[]): (readonly [string, string])[] =>
  rows
    .filter((row, index) => !(index === 0 && /^(settings?|names?)$/i.test(row[0]?.trim() ?? "")))
    .map(([name = "", value = ""]) => [name, value] as const)
    .filter(([name, value]) => name.trim() !== "" && value.trim() !== "");

/** A cell as it would be typed into a text. */
export function written(cell: unknown): string {
  const value = plainValue(cell);
  if (value === null) return "";
  return typeof value === "object" ? value.error : String(value);
}
