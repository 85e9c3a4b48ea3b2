/** The parts of a formula, with the blanks between them left away. */
export type Token =
  | { readonly kind: "number"; readonly value: number }
  | { readonly kind: "text"; readonly value: string }
  | { readonly kind: "error"; readonly sign: string }
  /** The name of a function, its opening bracket included. */
  | { readonly kind: "function"; readonly name: string }
  /** Cells, whole columns or whole rows, with the sheet where one is named: "Months!$B$5:$B$100". */
  | { readonly kind: "cells"; readonly sheet: string | null; readonly cells: string }
  | { readonly kind: "name"; readonly sheet: string | null; readonly name: string }
  /** A reference to a table's parts: the name may be empty inside the table itself. */
  | { readonly kind: "structured"; readonly table: string; readonly inside: string }
  | { readonly kind: "sign"; readonly sign: string };

const name = String.raw`[\p{L}_\\][\p{L}\p{N}_.\\?]*`;
const cell = String.raw`\$?[A-Za-z]{1,3}\$?[0-9]{1,7}`;
const column = String.raw`\$?[A-Za-z]{1,3}`;
const row = String.raw`\$?[0-9]{1,7}`;
const wordEnd = String.raw`(?![\p{L}\p{N}_.\\?(])`;
/** Brackets with one level of brackets within; an apostrophe takes the sign behind it for a letter. */
const brackets = String.raw`\[(?:'[^]|[^[\]']|\[(?:'[^]|[^[\]'])*\])*\]`;

/** A sheet as a formula names it: quoted, or a plain word; workbooks and stretches of sheets are named in front of it. */
const sheet = String.raw`(?:'((?:[^']|'')+)'|((?:\[[^\]]*\])?[\p{L}_][\p{L}\p{N}_.]*(?::[\p{L}_][\p{L}\p{N}_.]*)?))!`;

interface Pattern {
  readonly pattern: RegExp;
  readonly token: (found: RegExpExecArray) => Token;
}

const sticky = (source: string): RegExp => new RegExp(source, "uy");

const sheetIn = (found: RegExpExecArray): string | null => found[1]?.replaceAll("''", "'") ?? found[2] ?? null;

/** The first that fits takes its part of the formula. */
const patterns: readonly Pattern[] = [
  {
    pattern: sticky(String.raw`"((?:[^"]|"")*)"`),
    token: ([, text = ""]) => ({ kind: "text", value: text.replaceAll('""', '"') }),
  },
  {
    pattern: sticky(String.raw`#(?:NULL!|DIV/0!|VALUE!|REF!|NAME\?|NUM!|N/A|SPILL!|CALC!|BUSY!|GETTING_DATA|FIELD!)`),
    token: ([sign]) => ({ kind: "error", sign }),
  },
  {
    pattern: sticky(
      `(?:${sheet})?(${cell}(?::${cell})?${wordEnd}|${column}:${column}${wordEnd}|${row}:${row}(?![\\p{L}\\p{N}_.]))`,
    ),
    token: (found) => ({ kind: "cells", sheet: sheetIn(found), cells: found[3]! }),
  },
  {
    pattern: sticky(String.raw`(?:[0-9]+\.?[0-9]*|\.[0-9]+)(?:[eE][+-]?[0-9]+)?`),
    token: ([digits]) => ({ kind: "number", value: Number(digits) }),
  },
  {
    pattern: sticky(String.raw`(${name})\s*\(`),
    token: ([, called]) => ({ kind: "function", name: plainName(called!) }),
  },
  {
    pattern: sticky(`(${name})?(${brackets})`),
    token: ([, table = "", inside = ""]) => ({ kind: "structured", table, inside: inside.slice(1, -1) }),
  },
  {
    pattern: sticky(`(?:${sheet})?(${name})`),
    token: (found) => ({ kind: "name", sheet: sheetIn(found), name: plainName(found[3]!) }),
  },
  { pattern: sticky(String.raw`<>|<=|>=|[-+*/^&=<>%(),;:{}@#!]`), token: ([sign]) => ({ kind: "sign", sign }) },
];

/** Files write newer functions, and the names within LET, with marks in front. */
const plainName = (name: string): string => name.replace(/^(?:_xlfn\.|_xlws\.|_xlpm\.|_xludf\.)+/i, "");

/** @returns null where something stands in the formula that no formula has. */
export function tokensOf(formula: string): readonly Token[] | null {
  const text = formula.replace(/^\s*=/, "");
  const tokens: Token[] = [];
  let at = 0;
  while (at < text.length) {
    if (/\s/.test(text[at]!)) {
      at++;
      continue;
    }
    const next = tokenAt(text, at);
    if (next === null) return null;
    tokens.push(next.token);
    at = next.end;
  }
  return tokens;
}

function tokenAt(text: string, at: number): { readonly token: Token; readonly end: number } | null {
  for (const { pattern, token } of patterns) {
    pattern.lastIndex = at;
    const found = pattern.exec(text);
    if (found !== null) return { token: token(found), end: at + found[0].length };
  }
  return null;
}
