import { nearestName } from "../../problem/nearestName.ts";
import { plainHeading } from "../../table/headingRow.ts";
import type { ClaimedForm } from "../claim.ts";
import type { DataColumn, DataTable } from "./dataTables.ts";

/** A name of a driver, matched to a column of data and the form in which it enters. */
export interface Match {
  readonly column: DataColumn;
  readonly form: ClaimedForm;
  readonly score: number;
}

/** How the names of a report fit the columns of a table: one match a name, null where none fits. */
export interface Matched {
  readonly table: DataTable;
  readonly matches: readonly (Match | null)[];
  readonly score: number;
}

/** The best fits first, every column taken once in each form. */
export function matchNames(names: readonly string[], table: DataTable): Matched {
  const all = names.flatMap((name, index) => candidatesFor(name, table).map((match) => ({ index, ...match })));
  const matches: (Match | null)[] = names.map(() => null);
  const taken = new Set<string>();
  for (const { index, ...match } of all.sort((one, other) => other.score - one.score)) {
    const key = `${match.column.column} ${match.form}`;
    if (matches[index] !== null || taken.has(key)) continue;
    matches[index] = match;
    taken.add(key);
  }
  return { table, matches, score: matches.reduce((sum, match) => sum + (match?.score ?? 0), 0) };
}

function candidatesFor(name: string, { columns }: DataTable): Match[] {
  const { base, form } = formIn(name);
  return columns.flatMap((column): Match[] => {
    const whole = scoreOf(name, column.name);
    const inside = form === "as it is" ? 0 : scoreOf(base, column.name);
    if (whole === 0 && inside === 0) return [];
    return whole >= inside ? [{ column, form: "as it is", score: whole }] : [{ column, form, score: inside }];
  });
}

const forms: readonly (readonly [RegExp, ClaimedForm])[] = [
  [/^(?:ln|log|natural log(?:arithm)? of|log(?:arithm)? of)\b[\s(]*(.+?)\)?$/i, "logarithm"],
  [/^(.+?)[\s,]*\((?:ln|log|logs|logarithm)\)$/i, "logarithm"],
  [/^(.+?)\s*(?:squared|\^\s*2|²|sq\.?)$/i, "square"],
  [/^square of (.+)$/i, "square"],
  [/^(.+?)\s*(?:cubed|\^\s*3|³)$/i, "cube"],
];

/** "log price", "Price squared": the column that is meant, and what is made of it. */
export function formIn(name: string): { readonly base: string; readonly form: ClaimedForm } {
  for (const [pattern, form] of forms) {
    const base = pattern.exec(name.trim())?.[1];
    if (base !== undefined) return { base, form };
  }
  return { base: name, form: "as it is" };
}

const letters = (text: string): string => text.toLowerCase().replaceAll(/[^\p{L}\p{N}]/gu, "");

/** Brackets behind a name hold units. */
const withoutUnits = (text: string): string => text.replace(/\s*[([][^)\]]*[)\]]\s*$/, "");

/** Fewer letters are found in too many words. */
const fewestLetters = 3;

/** From 5 for the same heading down to 1 for one that differs by a slip of the hand; 0 for another. */
export function scoreOf(name: string, heading: string): number {
  if (plainHeading(name) === plainHeading(heading)) return 5;
  const [sought, known] = [letters(name), letters(heading)];
  if (sought === "" || known === "") return 0;
  if (sought === known) return 4;
  if (letters(withoutUnits(name)) === letters(withoutUnits(heading))) return 3;
  const [short, long] = [sought, known].sort((one, other) => one.length - other.length) as [string, string];
  if (short.length >= fewestLetters && long.startsWith(short)) return 2;
  if (short.length < fewestLetters) return 0;
  return long.includes(short) || nearestName(name, [heading]) !== null ? 1 : 0;
}

/** The table whose columns the names fit: the most names first, then the closest, then one that is spoken of. */
export function bestTable(
  names: readonly string[],
  tables: readonly DataTable[],
  isSpokenOf: (sheet: string) => boolean,
): Matched | null {
  const found = tables.map((table) => matchNames(names, table));
  const count = ({ matches }: Matched): number => matches.filter((match) => match !== null).length;
  const spoken = ({ table }: Matched): number => Number(isSpokenOf(table.sheet.sheet));
  const [best] = found.sort(
    (one, other) => count(other) - count(one) || other.score - one.score || spoken(other) - spoken(one),
  );
  return best === undefined || count(best) === 0 ? null : best;
}
