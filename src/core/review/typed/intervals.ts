import { isTextNumber } from "../../table/textNumbers.ts";
import { type CellPlace, isTextAt, wordsAt } from "../cellsOfBook.ts";
import { type ShownNumber, readingsOfNumber } from "../found/shownNumber.ts";

/** Both ends of an interval that stand in one cell. */
export interface ShownInterval {
  readonly low: ShownNumber;
  readonly high: ShownNumber;
}

const bracketed = /^([([])\s*(.+?)\s*[)\]]\s*[*†‡]*$/;

/** "1.2; 5.0", "1.2, 5.0", "1.2 to 5.0", "1.2 – 5.0", "1.2 - 5.0", "1.2 ... 5.0": what may stand between the ends. */
const between = /\s*(?:;|,(?=\s)|,|\bto\b|[–—…]|\.{2,}|\s-\s)\s*/;

/**
 * "[1.2, 5.0]", "(1,2; 5,0)"; null for anything else, one number in brackets among it.
 * @param around - the coefficient that it is to hold: it tells decimals behind a comma from thousands.
 */
export function intervalInBrackets(place: CellPlace, around: number | null = null): ShownInterval | null {
  const [, , inside] = isTextAt(place) ? (bracketed.exec(wordsAt(place).trim()) ?? []) : [];
  return inside === undefined ? null : readInterval(inside, around);
}

/** An interval with or without brackets, where a heading says that one stands there. */
export function intervalAt(place: CellPlace, around: number | null): ShownInterval | null {
  if (!isTextAt(place)) return null;
  const text = wordsAt(place).trim();
  return readInterval(bracketed.exec(text)?.[2] ?? text, around);
}

/** "1.234,5" is one number, and "1,5" may be. */
export function readInterval(text: string, around: number | null = null): ShownInterval | null {
  if (text.length > longest || isTextNumber(text)) return null;
  // Both ends are written with the same mark before their decimals.
  const both = readingsOfNumber.flatMap((reading) => partedBy(text, reading) ?? []);
  const holding = both.find(({ low, high }) => around !== null && low.value <= around && around <= high.value);
  return holding ?? both[0] ?? null;
}

/** A comma may be the decimals' too: of several places to part the text the one counts that leaves two numbers. */
function partedBy(text: string, reading: (part: string) => ShownNumber | null): ShownInterval | null {
  const splits = [...text.matchAll(new RegExp(between, "g"))].map(({ 0: { length }, index }) => [
    text.slice(0, index),
    text.slice(index + length),
  ]);
  const read = splits.flatMap(([first = "", second = ""]): ShownInterval[] => {
    const [low, high] = [reading(first), reading(second)];
    return low === null || high === null || !(low.value < high.value) ? [] : [{ low, high }];
  });
  return read.length === 1 ? read[0]! : null;
}

const longest = 60;

const spoken = /\b(?:conf(?:idence)?|intervals?|c\.?i\.?s?|bounds?|limits?|lower|upper|low|high)(?![\p{L}\p{N}])/iu;
const percent = /(\d{1,2}(?:[.,]\d+)?)\s?(?:%|per ?cent)/gi;

/** The two-sided level that a text says of intervals or bounds: 0.05 for "95 % CI"; null where it says none, or several. */
export function levelIn(text: string): number | null {
  const said = [...text.matchAll(percent)].map(([, digits = ""]) => Number(digits.replace(",", ".")));
  const shares = said.filter((share) => share >= leastShare);
  const [share] = shares;
  if (share === undefined || shares.length > 1) return tailAlone.test(text) ? 0.05 : null;
  const isTail = share === 97.5 || share === 99.5;
  if (!spoken.test(text) && !(isTail && said.length === 1)) return null;
  return Number(((isTail ? 2 : 1) * (1 - share / 100)).toFixed(4));
}

/** "2.5 %" over the lower bounds. */
const tailAlone = /^\s*2[.,]5\s?%\s*$/;

/** Nobody reports intervals that hold what they speak of in less than half of all cases. */
const leastShare = 50;
