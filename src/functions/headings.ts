import type { Problem } from "../core/problem/problem.ts";
import { isYear } from "../core/table/periodLabels.ts";
import { sense, senseOfText } from "../core/table/senses.ts";
import type { Column } from "../core/table/source.ts";
import { type RawCells, isMissing, plainValue } from "./rawCells.ts";

/** An outcome is numbers, so a word above it is its heading; so is a row of words above the drivers where it has none. */
export function hasHeadings(outcome: RawCells, drivers: RawCells): boolean {
  const above = outcome[0]?.[0];
  if (!isMissing(above)) return isWord(above);
  return isHeadings(drivers);
}

/** Whether a range begins with a row of words. */
export const isHeadings = ([first = []]: RawCells): boolean => first.every(isWord);

/**
 * Whether a range begins with numbers where the outcome has its heading: it was chosen without its headings, and its
 * rows would not line up. A blank above a column may arrive as zero; a year above other numbers is a heading.
 */
export function beginsWithNumbers([first = [], second = []]: RawCells): boolean {
  const filled = first.flatMap((cell, column) => (isMissing(cell) || cell === 0 ? [] : [column]));
  const isData = (column: number): boolean => {
    const above = plainValue(first[column]);
    return typeof above === "number" && (!isYear(above) || isYear(Number(plainValue(second[column]))));
  };
  return filled.length > 0 && filled.every(isData);
}

function isWord(cell: unknown): boolean {
  const value = plainValue(cell);
  return typeof value === "string" && senseOfText(value) === sense.text;
}

/** The text of a heading cell; null where there is none. */
export function headingOf(cell: unknown): string | null {
  const value = plainValue(cell);
  const text = value === null || typeof value === "object" ? "" : String(value).trim();
  return text === "" ? null : text;
}

const sameName = (a: string, b: string): boolean => a.toLowerCase() === b.toLowerCase();

export function repeatedHeading(columns: readonly Column[]): Problem | null {
  const first = columns.find(({ name }, index) => columns.slice(index + 1).some((other) => sameName(name, other.name)));
  if (first === undefined) return null;
  const cells = columns
    .filter(({ name }) => sameName(name, first.name))
    .map(({ place }) => `row 1 of ${place.kind === "argument" ? place.argument : ""}, column ${place.column + 1}`);
  return { code: "repeated-heading", heading: first.name, cells };
}

/** A column that stands in two arguments goes by a name of its own in the later one: a time column may be a driver too. */
export const apartFrom = (others: readonly Column[], column: Column, as: "key" | "outcome"): Column =>
  others.some(({ name }) => sameName(name, column.name)) ? { ...column, name: `${column.name} (${as})` } : column;
