import type { FunctionsRuntime } from "./cellErrors.ts";

/** What may leave for the cells: a rectangle of finite numbers, texts and real errors. */
export type Leaving = (string | number | CustomFunctions.Error)[][];

/** Excel refuses longer texts in a cell. */
const longestText = 32_767;

/** Texts that a spreadsheet may take for an error. */
const errorLook = /^#(N\/A|GETTING_DATA|[A-Z0-9/]+[!?])$/i;

/**
 * The one way out to the cells. Within a spilled result Excel shows null, NaN and infinities as zeros without a word,
 * so blanks become empty texts, numbers that are none become #NUM!, rows are made equally long, and a text that looks
 * like an error is put in quotation marks.
 */
export function leave(runtime: FunctionsRuntime, rows: readonly (readonly unknown[])[]): Leaving {
  const width = Math.max(1, ...rows.map(({ length }) => length));
  const leaving = rows.map((row) => Array.from({ length: width }, (_, column) => leavingCell(runtime, row[column])));
  return leaving.length === 0 ? [[""]] : leaving;
}

function leavingCell(runtime: FunctionsRuntime, value: unknown): Leaving[number][number] {
  if (value instanceof runtime.Error) return value;
  switch (typeof value) {
    case "number":
      return Number.isFinite(value) ? value + 0 : new runtime.Error(runtime.ErrorCode.invalidNumber);
    case "string":
      return errorLook.test(value.trim()) ? `"${value.trim()}"` : value.slice(0, longestText);
    default:
      return "";
  }
}
