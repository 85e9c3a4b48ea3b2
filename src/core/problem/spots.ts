import type { Spots } from "./problem.ts";

/** Parts of the sentences in messages.ts: where a fault is, and how many cells share it. */

type Cells = Pick<Spots, "cells" | "count">;

/** More than this many cells are a number, not a list. */
const mostListed = 10;

export const counted = (count: number, word: string): string =>
  `${count.toLocaleString("en-US")} ${word}${count === 1 ? "" : "s"}`;

export const capitalised = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

/** "Cell Months!C14", "Cells Months!C14, Months!C20 and 31 more"; places in an argument need no "cell" before them. */
export function theCells(spots: Cells, letter: "capital" | "lower" = "capital"): string {
  const single = spots.count === 1 && spots.cells[0] !== undefined ? asCell(spots.cells[0]) : null;
  const words = single ?? `${isInArgument(spots.cells[0]) ? "" : "cells "}${listed(spots.cells, spots.count)}`;
  return letter === "capital" ? capitalised(words) : words;
}

export const asCell = (cell: string): string => (isInArgument(cell) ? cell : `cell ${cell}`);

const isInArgument = (cell: string | undefined): boolean => cell?.startsWith("row ") === true;

export const cellWord = ({ count }: Cells): string => (count === 1 ? "cell" : "cells");

export const isOrAre = ({ count }: Cells): string => (count === 1 ? "is" : "are");

/** `holds "n.k."`, `hold "n.k.", "12 pcs"`: each distinct value once. */
export const holds = (spots: Spots): string => `${spots.count === 1 ? "holds" : "hold"} ${valuesOf(spots)}`;

/** The distinct values, in quotation marks, and whether there are others. */
export function valuesOf({ values, count }: Pick<Spots, "values" | "count">): string {
  const distinct = [...new Set(values)].slice(0, mostListed).map((value) => `"${shortened(value)}"`);
  return distinct.join(", ") + (count > values.length ? " and others" : "");
}

const longestValue = 40;

const shortened = (value: string): string =>
  value.length <= longestValue ? value : `${value.slice(0, longestValue - 1).trimEnd()}…`;

/** At most ten cells and how many more there are; places that hold commas themselves are set apart by semicolons. */
export function listed(cells: readonly string[], count: number): string {
  const shown = cells.slice(0, mostListed);
  const more = count - shown.length;
  const separator = shown.some((cell) => cell.includes(", ")) ? "; " : ", ";
  if (more > 0) return `${shown.join(separator)} and ${more.toLocaleString("en-US")} more`;
  return shown.length < 2 ? shown.join("") : `${shown.slice(0, -1).join(separator)} and ${shown.at(-1) ?? ""}`;
}

export const suggestion = (nearest: string | null, otherwise: string): string =>
  nearest === null ? otherwise : `Did you mean "${nearest}"?`;
