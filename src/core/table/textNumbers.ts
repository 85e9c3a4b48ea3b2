export type DecimalMark = "." | ",";

/**
 * Reads text that is plainly a number: "1,234.50", "(120)", "12 %", "$ 5", "7-", "1'000", "2.5E+03".
 * Brackets and a minus at either end make it negative; per cent are shares, 12 % is 0.12, as in a formatted cell.
 * @param decimal - the mark before the decimals; the other mark, blanks and apostrophes may set thousands apart.
 * @returns null for anything else, and for codes such as "007".
 */
export function readTextNumber(text: string, decimal: DecimalMark): number | null {
  const parts = text.length > longest ? null : frame.exec(text.trim());
  if (parts === null) return null;
  const [before, sign, digits, after] = [parts[1]!, parts[2]!, parts[3]!, parts[4]!];
  const minuses = minusesIn(before + sign + after);
  if (minuses === null || !shapes[decimal].test(digits)) return null;
  const plain = digits.replaceAll(decimal === "." ? /[,'’\s]/g : /[.'’\s]/g, "").replace(",", ".");
  const size = Number(plain) / (after.includes("%") ? 100 : 1);
  if (!Number.isFinite(size)) return null;
  return minuses === 0 || size === 0 ? size : -size;
}

/** One minus or one pair of brackets at most; null for more, and for half a pair. */
function minusesIn(signs: string): 0 | 1 | null {
  const minuses = signs.match(/[-−]/g)?.length ?? 0;
  const bracketed = signs.includes("(");
  if (bracketed !== signs.includes(")")) return null;
  const count = minuses + (bracketed ? 1 : 0);
  return count > 1 ? null : count === 1 ? 1 : 0;
}

/** Longer text is no number that someone typed. */
const longest = 40;

/** What may stand around the digits: bracket or sign, currency, sign; then currency, per cent, sign or bracket. */
const frame =
  /^(\(?[-−+]?)\s*(?:[$€£¥]\s*)?([-−+]?)\s*([\d.,'’\s]*\d[.,]?(?:[eE][-+]?\d{1,3})?)(\s*[$€£¥]?\s*%?\s*[-−]?\)?)$/;

const shapes: Readonly<Record<DecimalMark, RegExp>> = {
  ".": /^(?!0\d)(?:\d+|\d{1,3}(?:,\d{3})+|\d{1,3}(?:[\s'’]\d{3})+)?(?:\.\d*)?(?:[eE][-+]?\d+)?$/,
  ",": /^(?!0\d)(?:\d+|\d{1,3}(?:\.\d{3})+|\d{1,3}(?:[\s'’]\d{3})+)?(?:,\d*)?(?:[eE][-+]?\d+)?$/,
};

/** Whether a text is plainly a number under either decimal mark. */
export const isTextNumber = (text: string): boolean =>
  /\d/.test(text) && (readTextNumber(text, ".") !== null || readTextNumber(text, ",") !== null);

/** The decimal mark that reads most of the texts; `certain` is false where both read them, to different numbers. */
export function likelyDecimal(texts: readonly string[]): { readonly decimal: DecimalMark; readonly certain: boolean } {
  const read = { ".": 0, ",": 0, both: 0 };
  for (const text of texts) {
    const point = readTextNumber(text, ".");
    const comma = readTextNumber(text, ",");
    if (point !== null && comma === null) read["."]++;
    if (comma !== null && point === null) read[","]++;
    if (point !== null && comma !== null && point !== comma) read.both++;
  }
  const decimal = read[","] > read["."] ? "," : ".";
  return { decimal, certain: read.both === 0 || read["."] !== read[","] };
}
