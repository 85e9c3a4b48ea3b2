import { nearestName } from "../problem/nearestName.ts";
import { type Result, failure, success } from "../problem/result.ts";
import { partsBetween } from "./settingReaders.ts";
import { isNotUnderstood } from "./settingSpec.ts";
import { settingTable } from "./settingTable.ts";
import { type Settings, defaultSettings } from "./settingValues.ts";

const plainName = (name: string): string =>
  name
    .trim()
    .toLowerCase()
    .replaceAll(/[-_\s]+/g, " ");

/**
 * Reads settings given as names and values; names are free of case, hyphens count as spaces.
 * @returns Problem "unknown-setting" or "unknown-value" with the nearest known one.
 */
export function readSettings(pairs: readonly (readonly [string, string])[]): Result<Settings> {
  let settings = defaultSettings;
  for (const [name, value] of inReadingOrder(pairs)) {
    const spec = settingTable.find((candidate) => plainName(candidate.name) === plainName(name));
    if (spec === undefined) {
      const names = settingTable.map((candidate) => candidate.name);
      return failure({ code: "unknown-setting", setting: name, nearest: nearestName(name, names) });
    }
    const next = spec.read(value.trim(), settings);
    if (isNotUnderstood(next)) {
      const { allowed } = next;
      return failure({
        code: "unknown-value",
        setting: spec.name,
        value,
        allowed,
        nearest: nearestName(value, allowed),
      });
    }
    settings = next;
  }
  return success(settings);
}

/** A reason belongs to a fixed kind, so it is read after it. */
const inReadingOrder = (pairs: readonly (readonly [string, string])[]): (readonly [string, string])[] =>
  pairs.toSorted(([a], [b]) => Number(plainName(a) === "reason") - Number(plainName(b) === "reason"));

/** Settings written as one text, "rows: time; lags: 4", as names and values. */
export function settingPairs(text: string): Result<(readonly [string, string])[]> {
  const pairs: (readonly [string, string])[] = [];
  for (const part of partsBetween(text, ";")) {
    const mark = part.indexOf(":");
    if (mark < 0) {
      const names = settingTable.map(({ name }) => name);
      return failure({ code: "unknown-setting", setting: part, nearest: nearestName(part, names) });
    }
    pairs.push([part.slice(0, mark), part.slice(mark + 1)]);
  }
  return success(pairs);
}
