import type { BookValue } from "../../book/bookData.ts";

/** One cell of a formula's result, the formula with its "="; row and column count from 1 within the result. */
export interface Element {
  readonly whole: string;
  readonly row: number;
  readonly column: number;
}

/** The formula of a cell for its own part of a result: it needs no other cell, and is right wherever it is calculated. */
export const elementFormula = ({ whole, row, column }: Element): string =>
  `=INDEX(${whole.replace(/^=/, "")},${row},${column})`;

const elementPattern = /^=INDEX\((.+),(\d+),(\d+)\)$/is;

export function readElement(formula: string): Element | null {
  const [, whole, row, column] = elementPattern.exec(formula) ?? [];
  return whole === undefined ? null : { whole: `=${whole}`, row: Number(row), column: Number(column) };
}

/** A part of a result that says its value itself. */
export interface StandIn {
  readonly value: BookValue;
  readonly row: number;
  readonly column: number;
}

/**
 * LibreOffice keeps the saved results of formulas that it cannot calculate only where they are numbers or texts; truth
 * values, errors and empty texts it calculates anew. These say their value themselves, and turn into an error with
 * their keeper when a cell that the result depends on is changed. The place in the result is said where it changes nothing.
 * @param keeper - a cell of the result whose value is kept, "$B$5".
 * @returns null for errors that no formula can spell.
 */
export function standInFormula({ value, row, column }: StandIn, keeper: string): string | null {
  const said = literalOf(value);
  return said === null ? null : `=IF(ISERROR(CHOOSE(1,${keeper},${row},${column})),${keeper},${said})`;
}

const standInPattern = /^=IF\(ISERROR\(CHOOSE\(1,(\$[A-Z]+\$\d+),(\d+),(\d+)\)\),\1,(.+)\)$/is;

export function readStandIn(formula: string): StandIn | null {
  const [, , row, column, said] = standInPattern.exec(formula) ?? [];
  const value = said === undefined ? undefined : spoken(said);
  return value === undefined ? null : { value, row: Number(row), column: Number(column) };
}

const errorSign = /^#(?:NULL!|DIV\/0!|VALUE!|REF!|NAME\?|NUM!|N\/A)$/;

/** Whether a saved result of this value is kept for a formula that cannot be calculated. */
export const isKept = (value: BookValue): boolean =>
  typeof value === "number" || (typeof value === "string" && !isLost(value));

/** Texts that are read as something else where they stand as the result of a formula. */
const isLost = (text: string): boolean => text.trim() === "" || errorSign.test(text);

function literalOf(value: BookValue): string | null {
  if (typeof value === "boolean") return value ? "TRUE" : "FALSE";
  if (typeof value === "object" && value !== null) return errorSign.test(value.error) ? value.error : null;
  return `"${value ?? ""}"`;
}

/** The value that a stand-in says; undefined for what none of ours says: someone has changed it. */
function spoken(said: string): BookValue | undefined {
  const truth = /^(?:TRUE|FALSE)$/.exec(said)?.[0];
  if (truth !== undefined) return truth === "TRUE";
  if (errorSign.test(said)) return { error: said };
  const text = /^"([^"]*)"$/.exec(said)?.[1];
  return text !== undefined && isLost(text) ? text : undefined;
}
