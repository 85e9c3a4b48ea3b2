import { nearestName } from "../problem/nearestName.ts";
import { type Result, failure, success } from "../problem/result.ts";
import { type LevelCells, readLevelCells } from "../table/levelCells.ts";
import type { Column } from "../table/source.ts";
import type { Term } from "./design.ts";
import { type Ingredient, missingCell } from "./ingredient.ts";
import { presentIn, valuesAt } from "./rows.ts";

/**
 * A driver of categories in treatment coding: one term for each level but the base, 1 in its rows and 0 elsewhere.
 * Levels are those of the rows used.
 * @param base - the level that the others are compared with; null takes the most frequent.
 * @returns Problem "empty-column" or "error-cells"; its terms "one-category", "unknown-base" or "too-many-categories".
 */
export function categoryDriver(column: Column, base: string | null): Result<Ingredient> {
  const read = readLevelCells(column);
  if (!read.ok) return read;
  const { codes } = read.value;
  return success({
    present: presentIn(codes),
    lackOf: (row) => missingCell(column, row),
    terms: (rows) => levelTerms(column, read.value, { base, rows }),
    notes: likenessNotes(column, read.value),
  });
}

interface Coding {
  readonly base: string | null;
  readonly rows: Int32Array;
}

function levelTerms({ name }: Column, { codes, levels }: LevelCells, { base, rows }: Coding): Result<readonly Term[]> {
  const counts = new Int32Array(levels.length);
  for (const row of rows) counts[codes[row]!]!++;
  const used = levels.flatMap((_, code) => (counts[code]! > 0 ? [code] : []));
  if (used.length === 1) return failure({ code: "one-category", column: name, value: levels[used[0]!]! });
  if (tooMany(used.length, rows.length)) {
    return failure({ code: "too-many-categories", column: name, categories: used.length, rows: rows.length });
  }
  const baseCode = base === null ? mostFrequent(used, counts) : used.find((code) => same(levels[code]!, base));
  if (baseCode === undefined) {
    const known = used.map((code) => levels[code]!);
    return failure({ code: "unknown-base", column: name, base: base ?? "", nearest: nearestName(base ?? "", known) });
  }
  const baseLevel = levels[baseCode]!;
  return success(
    used
      .filter((code) => code !== baseCode)
      .map((code) => ({
        name: `${name}: ${levels[code]!}`,
        meaning: { kind: "level", column: name, level: levels[code]!, base: baseLevel },
        values: valuesAt(rows, (row) => (codes[row] === code ? 1 : 0)),
      })),
  );
}

/** Half a gigabyte of terms is the most that is made of one column. */
const mostValues = 6e7;

/** So few categories are never refused: too few rows for them is a fault of its own. */
const alwaysAllowed = 50;

const tooMany = (levels: number, rows: number): boolean =>
  levels > alwaysAllowed && (levels * 2 > rows || levels * rows > mostValues);

/** The first of the most frequent, in the order of the levels, so that the order of rows does not matter. */
const mostFrequent = (used: readonly number[], counts: Int32Array): number | undefined =>
  used.reduce<number | undefined>(
    (best, code) => (best === undefined || counts[code]! > counts[best]! ? code : best),
    undefined,
  );

const same = (a: string, b: string): boolean => a.trim().toLowerCase() === b.trim().toLowerCase();

/** Levels that differ in capitals alone are likely one and the same, mistyped. */
function likenessNotes({ name }: Column, { levels }: LevelCells): string[] {
  const met = new Map<string, string>();
  const alike: string[] = [];
  for (const level of levels) {
    const first = met.get(level.toLowerCase());
    if (first === undefined) met.set(level.toLowerCase(), level);
    else alike.push(`"${first}" and "${level}"`);
  }
  return alike.length === 0 ? [] : [`${name}: ${alike.slice(0, 3).join(", ")} count as different categories.`];
}
