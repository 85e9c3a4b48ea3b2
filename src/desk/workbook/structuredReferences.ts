import { columnLetters, quoteSheet } from "../../core/table/address.ts";
import { headingIn, readTableReference, type TableReference } from "../../core/table/tableReference.ts";

/** A table as a formula may speak of it. */
export interface SpokenTable {
  /** The sheet's name, as formulas write it. */
  readonly sheet: string;
  /** The row of the headings; rows and columns count from 0. */
  readonly row: number;
  readonly column: number;
  readonly rows: number;
  readonly columns: number;
  readonly headings: readonly string[];
}

/** Where tables are found, and the row of the cell that holds the formula. */
export interface Standpoint {
  readonly row: number;
  /** A table by its name; by no name the one that the formula stands in. Null where there is none. */
  readonly tableCalled: (name: string) => SpokenTable | null;
}

/** What stands in brackets, with one level of brackets within; an apostrophe takes the sign behind it for a letter. */
export const bracketed = String.raw`\[(?:'[^]|[^[\]']|\[(?:'[^]|[^[\]'])*\])*\]`;
const name = String.raw`[\p{L}_\\][\p{L}\p{N}_.\\]*`;

/** Texts and sheet names in quotes are matched first, so that nothing is looked for in them. */
const spoken = new RegExp(
  String.raw`"(?:[^"]|"")*"|'(?:[^']|'')*'|(?<![\p{L}\p{N}_.!$])(?:(${name})?(${bracketed})(?![\p{L}\p{N}_'!])|(${name})(?![\p{L}\p{N}_.\\(![:]))`,
  "gu",
);

/**
 * Spells out a formula's references to tables as references to cells: Sales[[#Data],[Price]:[Rain]] becomes
 * Sheet1!$B$2:$C$41. The columns' names are found without regard to case, as Excel finds them.
 */
export function spellOut(formula: string, standpoint: Standpoint): string {
  return formula.replaceAll(spoken, (whole: string, ...found: (string | undefined)[]) => {
    const [called, brackets, bare] = found;
    if (brackets === undefined && bare === undefined) return whole;
    const table = standpoint.tableCalled(called ?? bare ?? "");
    return table === null
      ? whole
      : cellsOf(table, readTableReference((brackets ?? "[]").slice(1, -1).trim()), standpoint.row);
  });
}

/** New words for a table and its columns. */
export interface Renaming {
  readonly table: string;
  /** The table's new name, where it has one. */
  readonly to?: string;
  /** New headings by the old ones in small letters. */
  readonly columns: ReadonlyMap<string, string>;
}

/** The formula with a table and its columns by their new names. */
export function renamed(formula: string, { table, to, columns }: Renaming): string {
  return formula.replaceAll(spoken, (whole: string, ...found: (string | undefined)[]) => {
    const [called, brackets, bare] = found;
    if ((called ?? bare ?? "").toLowerCase() !== table.toLowerCase()) return whole;
    const name = to ?? called ?? bare ?? "";
    if (brackets === undefined) return name;
    const parts = brackets.replaceAll(/(?<=\[@?)((?:'[^]|[^@[\]'])+)(?=\])/g, (part: string) => {
      const now = columns.get(headingIn(part.trim()).toLowerCase());
      return now === undefined ? part : now.replaceAll(/['#@[\]]/g, "'$&");
    });
    return name + parts;
  });
}

function cellsOf(table: SpokenTable, { items, columns }: TableReference, row: number): string {
  const places = columns.map((column) => placeOf(table, column));
  const rows = rowsOf(table, items, row);
  if (rows === null || places.includes(-1) || places.length > 2) return "#REF!";
  const [one = 0, other = columns.length === 0 ? table.columns - 1 : one] = places;
  const letters = [Math.min(one, other), Math.max(one, other)].map((place) => columnLetters(table.column + place));
  const [first, last] = letters.map((letter, index) => `$${letter}${rows[index]!}`);
  return `${quoteSheet(table.sheet)}!${first === last ? first! : `${first!}:${last!}`}`;
}

const placeOf = ({ headings }: SpokenTable, column: string): number =>
  headings.findIndex((heading) => heading.trim().toLowerCase() === column.toLowerCase());

/** The first and the last row, "$2" and "$41"; that of the formula itself moves with it. The desk's tables have no totals. */
function rowsOf(table: SpokenTable, items: readonly string[], row: number): readonly [string, string] | null {
  const span = (first: number, last: number) => [`$${first + 1}`, `$${last + 1}`] as const;
  const last = table.row + table.rows - 1;
  const withHeadings = items.includes("#all") || items.includes("#headers");
  if (items.includes("#this row")) return row > table.row && row <= last ? [`${row + 1}`, `${row + 1}`] : null;
  if (items.length === 0 || items.every((item) => item === "#data")) return span(table.row + 1, last);
  if (items.length === 1 && items[0] === "#headers") return span(table.row, table.row);
  return withHeadings ? span(table.row, last) : null;
}
