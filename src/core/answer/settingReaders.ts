import type { ErrorsChoice, Kernel, LagRule } from "../covariance/choice.ts";
import type { CalendarDriver, Transform } from "../design/model.ts";
import type { NotUnderstood } from "./settingValues.ts";

const normal = (text: string): string =>
  text
    .trim()
    .toLowerCase()
    .replaceAll(/[-_\s]+/g, " ");

/** A reader of one of several words, free of case, hyphens and spaces alike. */
export const readOneOf =
  <const Word extends string>(...words: readonly Word[]) =>
  (text: string): Word | NotUnderstood =>
    words.find((word) => normal(word) === normal(text)) ?? { allowed: words };

export const readText = (text: string): string => text.trim();

export const readErrors = readOneOf<"by tests" | ErrorsChoice["kind"]>(
  "by tests",
  "classical",
  "white",
  "newey-west",
  "grouped",
);

export function readYesNo(text: string): boolean | NotUnderstood {
  const word = normal(text);
  if (["yes", "true", "1", "on"].includes(word)) return true;
  return ["no", "false", "0", "off"].includes(word) ? false : { allowed: ["yes", "no"] };
}

export function readCount(text: string): number | NotUnderstood {
  return /^[1-9]\d*$/.test(text.trim()) ? Number(text) : { allowed: ["a whole number, 1 or more"] };
}

export function readLevel(text: string): number | NotUnderstood {
  const share = text.trim().endsWith("%") ? Number(text.trim().slice(0, -1)) / 100 : Number(text);
  const inside = share > 0 && share < 1 && text.trim() !== "";
  return inside ? share : { allowed: ["a number between 0 and 1, such as 0.05"] };
}

/** Parts between separators, without the blanks around them; a separator inside double quotes separates nothing. */
export const partsBetween = (text: string, separator: "," | ";"): string[] =>
  (text.match(separator === "," ? /(?:"[^"]*"|[^",])+/g : /(?:"[^"]*"|[^";])+/g) ?? [])
    .map((part) => part.trim())
    .filter((part) => part !== "");

const unquoted = (part: string): string => part.replace(/^"(.*)"$/s, "$1").trim();

/** Headings between commas; one that holds a comma or an equals sign stands in double quotes. */
export const readList = (text: string): string[] => partsBetween(text, ",").map(unquoted);

/** Arithmetic between commas, left as it is written: which names it may use is known once the columns are. */
export const readExpressions = (text: string): string[] => partsBetween(text, ",");

const kernels: readonly Kernel[] = ["bartlett", "parzen", "quadratic spectral"];

const simpleRules = ["careful", "thumb", "cube root"] as const;

/** The words that name a rule for the number of lags, as they are offered to the user. */
export const lagWords: readonly string[] = [
  "a whole number",
  ...simpleRules,
  "newey-west 1994",
  "newey-west 1994 prewhitened",
  ...kernels.flatMap((kernel) => [`andrews 1991 ${kernel}`, `andrews 1991 ${kernel} prewhitened`]),
];

export function readLags(text: string): LagRule | NotUnderstood {
  const words = normal(text);
  if (/^\d+$/.test(words)) return { kind: "given", lags: Number(words) };
  const simple = simpleRules.find((rule) => rule === words);
  if (simple !== undefined) return { kind: simple };
  const prewhiten = words.endsWith(" prewhitened");
  const rule = prewhiten ? words.slice(0, -" prewhitened".length) : words;
  if (rule === "newey west 1994") return { kind: "newey-west 1994", prewhiten };
  const kernel = kernels.find((candidate) => rule === `andrews 1991 ${candidate}` || rule === `andrews ${candidate}`);
  return kernel === undefined ? { allowed: lagWords } : { kind: "andrews 1991", kernel, prewhiten };
}

type TransformKind = Exclude<Transform["kind"], "none">;

/** "Price by 2, Advertising" for the transforms that look back; plain headings for the others. */
export function transformsOf(kind: TransformKind, text: string): { column: string; transform: Transform }[] {
  const looksBack = kind === "lag" || kind === "change" || kind === "growth rate";
  return partsBetween(text, ",").map((part) => {
    const found = looksBack ? /^(.*?)\s+by\s+(\d+)$/i.exec(part) : null;
    const column = unquoted(found?.[1] ?? part);
    const transform: Transform = looksBack ? { kind, periods: Number(found?.[2] ?? 1) } : { kind };
    return { column, transform };
  });
}

const named = /^(logarithm|square|lag|change|growth\s+rate)\s+of\s+(.+)$/is;

/** "square of Price, lag of Repairs by 2": one further driver each. */
export function readAdded(text: string): { column: string; transform: Transform }[] | NotUnderstood {
  const added: { column: string; transform: Transform }[] = [];
  for (const part of partsBetween(text, ",")) {
    const [, kind, column] = named.exec(part) ?? [];
    const [transform] = column === undefined ? [] : transformsOf(kindOf(kind), column);
    if (transform === undefined) return { allowed: addedWords };
    added.push(transform);
  }
  return added;
}

const addedWords = ["logarithm", "square", "lag", "change", "growth rate"].map((kind) => `${kind} of Heading`);

const kindOf = (kind = ""): TransformKind => kind.toLowerCase().replaceAll(/\s+/g, " ") as TransformKind;

export function readCalendar(text: string): CalendarDriver[] | NotUnderstood {
  const known: readonly CalendarDriver[] = ["trend", "month indicators", "quarter indicators"];
  const found = readList(text).map((part) => known.find((candidate) => candidate === normal(part)));
  return found.includes(undefined) ? { allowed: known } : found.filter((word) => word !== undefined);
}

export function readDecimal(text: string): "." | "," | null | NotUnderstood {
  const word = readOneOf("no", "point", "comma")(text);
  if (typeof word !== "string") return word;
  return word === "no" ? null : word === "point" ? "." : ",";
}

/** "Heading = value" parts as pairs; null where a part is not of that form. */
function namedPairs(text: string): (readonly [string, string])[] | null {
  const pairs = partsBetween(text, ",").map((part) => {
    const found = /^("[^"]*"|[^"=]+?)\s*=\s*(.+)$/s.exec(part);
    const [, name, value] = found ?? [];
    return name === undefined || value === undefined ? null : ([unquoted(name), unquoted(value)] as const);
  });
  return pairs.every((pair) => pair !== null) ? pairs : null;
}

export function readNamedTexts(text: string): Record<string, string> | NotUnderstood {
  const pairs = namedPairs(text);
  return pairs === null ? { allowed: ["Heading = value"] } : Object.fromEntries(pairs);
}

export function readNamedNumbers(text: string): Record<string, number> | NotUnderstood {
  const pairs = (namedPairs(text) ?? [["", ""]]).map(([name, value]) => [name, Number(value)] as const);
  const usable = pairs.every(([name, value]) => name !== "" && Number.isFinite(value));
  return usable ? Object.fromEntries(pairs) : { allowed: ["Heading = number"] };
}
