import { type DecimalMark, readTextNumber } from "../../table/textNumbers.ts";
import { type CellPlace, formatAt, isCalculatedAt, isTextAt, numberAt, wordsAt } from "../cellsOfBook.ts";
import type { ReportedNumber } from "../claim.ts";
import { type NumberFormat, readNumberFormat } from "./numberFormat.ts";

/** A number as its cell shows it. */
export type ShownNumber = Pick<ReportedNumber, "value" | "halfUnit" | "shown">;

/** Excel's General format shows so many digits where the column is wide enough. */
const digitsOfGeneral = 10;

/**
 * What a cell reports: a number in its format, or a text that is a number with marks behind it ("3.10**").
 * A number typed under the General format counts to the digits that were typed, a formula's to those that Excel shows.
 * @param calculated - true too for a cell that the formula of another fills.
 * @returns null where the cell reports no number.
 */
export function shownNumberAt(place: CellPlace, calculated = isCalculatedAt(place)): ShownNumber | null {
  if (isTextAt(place)) return readShownText(wordsAt(place));
  const value = numberAt(place);
  if (value === null) return null;
  const format = readNumberFormat(formatAt(place) ?? "General", value);
  if (format !== null) return inFormat(value, format);
  return inGeneral(value, calculated ? digitsOfGeneral : Math.min(digitsIn(value), digitsOfGeneral));
}

function inFormat(
  value: number,
  { decimals, percents, scale, scientific, grouped, percentSign }: NumberFormat,
): ShownNumber {
  if (scientific) {
    const exponent = value === 0 ? 0 : Math.floor(Math.log10(Math.abs(value)));
    const text = value.toExponential(decimals).replace(/e([+-])(\d)$/, "e$10$2");
    return { value, halfUnit: 0.5 * 10 ** (exponent - decimals), shown: text.replace("e", "E") };
  }
  const factor = 100 ** percents * scale;
  const text = writerWith(decimals, grouped)
    .format(value * factor)
    .replace(/^-(?=[0.,]*$)/, "");
  return { value, halfUnit: (0.5 * 10 ** -decimals) / factor, shown: text + percentSign };
}

/** Making a writer of numbers costs a hundred times as much as writing one. */
const writers = new Map<string, Intl.NumberFormat>();

function writerWith(decimals: number, grouped: boolean): Intl.NumberFormat {
  const key = `${decimals} ${grouped}`;
  const known = writers.get(key);
  if (known !== undefined) return known;
  const digits = { minimumFractionDigits: decimals, maximumFractionDigits: decimals, useGrouping: grouped };
  const writer = new Intl.NumberFormat("en-US", digits);
  writers.set(key, writer);
  return writer;
}

/** The digits of a number as someone would type it, zeros at either end not counted. */
const digitsIn = (value: number): number =>
  value.toExponential().replace(/e.*$/, "").replaceAll(/[-.]/g, "").replace(/0+$/, "").length;

/** Whole numbers count to the last digit, whatever zeros they end in. */
function inGeneral(value: number, digits: number): ShownNumber {
  const exponent = value === 0 ? 0 : Math.floor(Math.log10(Math.abs(value)));
  const text = String(Number(value.toPrecision(Math.max(1, Math.min(17, Math.max(digits, exponent + 1))))));
  return { value, halfUnit: 0.5 * Math.min(1, 10 ** (exponent - digits + 1)), shown: text.replace("e", "E") };
}

/** "3.10**", "(0.42)", "4.2 %": the digits that stand there are the digits that count. */
export function readShownText(text: string): ShownNumber | null {
  const plain = text.replace(/\s*[*†‡]+\s*$/, "").trim();
  const [byPoint, byComma] = readingsOfNumber;
  return byPoint(plain) ?? byComma(plain);
}

/** A number as it is read with decimals behind a point, and behind a comma. */
export const readingsOfNumber: readonly [Reading, Reading] = [
  // "0,125" has its decimals behind the comma: nobody sets apart thousands behind a zero.
  (text) => (/^\D*0,/.test(text) ? null : readWith(text, ".")),
  (text) => readWith(text, ","),
];

type Reading = (text: string) => ShownNumber | null;

function readWith(text: string, mark: DecimalMark): ShownNumber | null {
  const value = readTextNumber(text, mark);
  if (value === null) return null;
  const [, decimals = "", exponent = "0"] = new RegExp(`\\${mark}(\\d*)(?:e([+-]?\\d+))?`, "i").exec(text) ?? [];
  const shift = Number(exponent) - (text.includes("%") ? 2 : 0);
  return { value, halfUnit: 0.5 * 10 ** (shift - decimals.length), shown: text };
}
