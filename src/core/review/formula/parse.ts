import { mostColumns, mostRows, parseAddress, type SheetArea } from "../../table/address.ts";
import { type Token, tokensOf } from "./tokens.ts";
import type { Formula } from "./tree.ts";

/** @returns null where the text is no formula as Excel writes it, in English with commas. */
export function parseFormula(text: string): Formula | null {
  const tokens = tokensOf(text);
  if (tokens === null) return null;
  const reader: Reader = { tokens, at: 0, depth: 0 };
  const formula = operations(reader, 0);
  return formula !== null && reader.at === tokens.length ? formula : null;
}

/** The place that has been read up to. */
interface Reader {
  readonly tokens: readonly Token[];
  at: number;
  depth: number;
}

/** Excel nests functions at most 64 deep; brackets beyond that are nobody's work. */
const deepest = 200;

/** Weakest first. A minus in front binds closer than a power: -2^2 is 4. */
const strengths: readonly (readonly string[])[] = [
  ["=", "<>", "<", ">", "<=", ">="],
  ["&"],
  ["+", "-"],
  ["*", "/"],
  ["^"],
];

function operations(reader: Reader, level: number): Formula | null {
  const signs = strengths[level];
  if (signs === undefined) return prefixed(reader);
  let left = operations(reader, level + 1);
  while (left !== null) {
    const sign = signAt(reader);
    if (sign === null || !signs.includes(sign)) return left;
    reader.at++;
    const right = operations(reader, level + 1);
    left = right === null ? null : { kind: "operation", sign, left, right };
  }
  return null;
}

function signAt({ tokens, at }: Reader): string | null {
  const token = tokens[at];
  return token?.kind === "sign" ? token.sign : null;
}

/** Steps over a sign if it is there. */
function take(reader: Reader, sign: string): boolean {
  const there = signAt(reader) === sign;
  if (there) reader.at++;
  return there;
}

function prefixed(reader: Reader): Formula | null {
  const sign = signAt(reader);
  if (sign !== "+" && sign !== "-" && sign !== "@") return suffixed(reader);
  if (reader.depth >= deepest) return null;
  reader.at++;
  reader.depth++;
  const of = prefixed(reader);
  reader.depth--;
  return of === null ? null : { kind: "prefix", sign, of };
}

function suffixed(reader: Reader): Formula | null {
  let formula = ranges(reader);
  while (formula !== null && take(reader, "%")) formula = { kind: "percent", of: formula };
  return formula;
}

/** References that are put together of two: INDEX(...):INDEX(...). */
function ranges(reader: Reader): Formula | null {
  let formula = primary(reader);
  while (formula !== null) {
    if (take(reader, "#")) formula = { kind: "spill", of: formula };
    else if (take(reader, ":")) {
      const right = primary(reader);
      formula = right === null ? null : { kind: "operation", sign: ":", left: formula, right };
    } else return formula;
  }
  return null;
}

function primary(reader: Reader): Formula | null {
  const token = reader.tokens[reader.at];
  if (token === undefined || reader.depth >= deepest) return null;
  reader.at++;
  reader.depth++;
  const formula = startingWith(token, reader);
  reader.depth--;
  return formula;
}

function startingWith(token: Token, reader: Reader): Formula | null {
  switch (token.kind) {
    case "number":
    case "text":
    case "error":
    case "structured":
      return token;
    case "cells":
      return cellsOf(token.sheet ?? "", token.cells);
    case "name":
      return booleanCalled(token.name) ?? token;
    case "function":
      return call(reader, token.name.toUpperCase());
    case "sign":
      return openedBy(token.sign, reader);
  }
}

function openedBy(sign: string, reader: Reader): Formula | null {
  if (sign === "{") return constants(reader);
  return sign === "(" ? bracketed(reader) : null;
}

const booleanCalled = (name: string): Formula | null =>
  /^(?:true|false)$/i.test(name) ? { kind: "boolean", value: name.toLowerCase() === "true" } : null;

function cellsOf(sheet: string, cells: string): Formula | null {
  const area = wholeRows(cells) ?? parseAddress(cells);
  return area === null ? null : { kind: "cells", area: { ...area, sheet } };
}

function wholeRows(cells: string): SheetArea | null {
  const ends = /^\$?(\d+):\$?(\d+)$/.exec(cells);
  if (ends === null) return null;
  const [first, last] = [Number(ends[1]), Number(ends[2])].sort((a, b) => a - b) as [number, number];
  const inside = first >= 1 && last <= mostRows;
  return inside ? { sheet: "", row: first - 1, column: 0, rows: last - first + 1, columns: mostColumns } : null;
}

function call(reader: Reader, name: string): Formula | null {
  const given: Formula[] = [];
  if (take(reader, ")")) return { kind: "call", name, arguments: given };
  for (;;) {
    const argument = argumentAt(reader);
    if (argument === null) return null;
    given.push(argument);
    if (take(reader, ")")) return calling(name, given);
    if (!take(reader, ",")) return null;
  }
}

/** Files write "A1#" as a function of the cell. */
const calling = (name: string, given: readonly Formula[]): Formula =>
  name === "ANCHORARRAY" && given.length === 1
    ? { kind: "spill", of: given[0]! }
    : { kind: "call", name, arguments: given };

function argumentAt(reader: Reader): Formula | null {
  const sign = signAt(reader);
  return sign === "," || sign === ")" ? { kind: "missing" } : operations(reader, 0);
}

/** "{1,2;3,4}" */
function constants(reader: Reader): Formula | null {
  const rows: Formula[][] = [[]];
  for (;;) {
    const value = prefixed(reader);
    if (value === null) return null;
    rows.at(-1)!.push(value);
    if (take(reader, "}"))
      return rows.every(({ length }) => length === rows[0]!.length) ? { kind: "array", rows } : null;
    if (take(reader, ";")) rows.push([]);
    else if (!take(reader, ",")) return null;
  }
}

/** Several references in one pair of brackets are read as one list, which no regression takes. */
function bracketed(reader: Reader): Formula | null {
  let formula = operations(reader, 0);
  while (formula !== null) {
    if (take(reader, ")")) return formula;
    if (!take(reader, ",")) return null;
    const right = operations(reader, 0);
    formula = right === null ? null : { kind: "operation", sign: ",", left: formula, right };
  }
  return null;
}
