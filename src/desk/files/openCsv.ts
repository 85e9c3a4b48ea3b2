import { parseCsv } from "hucre/csv";
import { blankSheet } from "../book/blankSheet.ts";
import type { BookCell, BookData } from "../book/bookData.ts";
import { readIsoDate } from "./isoDates.ts";
import { readable, unreadable, type Reading } from "./reading.ts";

/**
 * Reads a text file of separated values as a book of one sheet. The separator (comma, semicolon, tab) is found
 * from the text. A cell is a number, a date or TRUE and FALSE only where its text leaves no doubt: "1,5" and
 * "005" stay text, since reading them as a number would be a guess.
 */
export function openCsv(file: string | Uint8Array, sheet: string): Reading<BookData> {
  const text = typeof file === "string" ? file.replace(/^\uFEFF/, "") : decode(file);
  if (text.trim() === "") return unreadable("the file is empty");
  if (text.includes("\0")) return unreadable("it is no text file");
  const { separator, rest } = separatorOf(text);
  const rows = parseCsv(rest, { delimiter: separator }).map((row) => row.map((cell) => toCell(String(cell ?? ""))));
  return readable({ sheets: [blankSheet(sheet, rows)], names: [], active: 0 });
}

/** UTF-8 or UTF-16 as the file's first bytes say; else UTF-8 where that fits, and the Western code page where not. */
function decode(bytes: Uint8Array): string {
  const [first, second] = bytes;
  if (first === 0xff && second === 0xfe) return new TextDecoder("utf-16le").decode(bytes);
  if (first === 0xfe && second === 0xff) return new TextDecoder("utf-16be").decode(bytes);
  try {
    return new TextDecoder("utf-8", { fatal: true }).decode(bytes);
  } catch {
    return new TextDecoder("windows-1252").decode(bytes);
  }
}

/** Of two that fit equally well the earlier is taken: commas may be decimal marks, the others hardly anything else. */
const separators = ["\t", ";", ","] as const;
const linesLookedAt = 50;

function separatorOf(text: string): { readonly separator: string; readonly rest: string } {
  const declared = /^sep=(.)\r?\n/i.exec(text);
  if (declared !== null) return { separator: declared[1]!, rest: text.slice(declared[0].length) };
  const lines = withoutQuoted(text)
    .split(/\r?\n|\r/)
    .filter((line) => line !== "")
    .slice(0, linesLookedAt);
  const best = separators.map((separator) => ({ separator, share: shareOfAlike(lines, separator) }));
  best.sort((first, second) => second.share - first.share);
  return { separator: best[0]!.share > 0 ? best[0]!.separator : ",", rest: text };
}

const withoutQuoted = (text: string): string => text.replace(/"(?:[^"]|"")*"/g, "");

/** The share of lines that have the commonest number of separators, lines without any not counted as alike. */
function shareOfAlike(lines: readonly string[], separator: string): number {
  const tally = new Map<number, number>();
  for (const line of lines) {
    const count = line.split(separator).length - 1;
    if (count > 0) tally.set(count, (tally.get(count) ?? 0) + 1);
  }
  return Math.max(0, ...tally.values()) / lines.length;
}

const plainNumber = /^[+-]?(?:(?:0|[1-9]\d*)(?:\.\d*)?|\.\d+)(?:e[+-]?\d+)?$/i;
const errorSign = /^#(?:NULL!|DIV\/0!|VALUE!|REF!|NAME\?|NUM!|N\/A)$/i;
/** Text that a spreadsheet would take for a formula is saved behind an apostrophe. */
const guardedText = /^'(?=[=+\-@\t\r])/;

function toCell(text: string): BookCell {
  const trimmed = text.trim();
  if (trimmed === "") return null;
  if (plainNumber.test(trimmed)) return finite(Number(trimmed)) ?? text;
  if (/^(?:true|false)$/i.test(trimmed)) return trimmed.toLowerCase() === "true";
  if (errorSign.test(trimmed)) return { error: trimmed.toUpperCase() };
  const date = readIsoDate(trimmed);
  return date === null ? text.replace(guardedText, "") : { value: date.serial, style: { numberFormat: date.format } };
}

const finite = (number: number): number | null => (Number.isFinite(number) ? number : null);
