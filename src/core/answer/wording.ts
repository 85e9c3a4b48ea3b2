const smallestPrinted = 0.0001;

/** A p-value in a sentence: "p = 0.034", "p under 0.0001"; never rounded across the level it is held against. */
export function pValueInWords(pValue: number, level: number): string {
  if (pValue < smallestPrinted) return "p under 0.0001";
  const digits = pValue < 0.01 ? 4 : pValue < 0.1 ? 3 : 2;
  return `p = ${roundedAwayFrom(level, pValue, digits)}`;
}

function roundedAwayFrom(level: number, pValue: number, digits: number): string {
  const text = pValue.toFixed(digits);
  const keepsSide = Number(text) < level === pValue < level || digits >= 8;
  return keepsSide ? text : roundedAwayFrom(level, pValue, digits + 1);
}

/** Decimals that show two significant digits of a half-width: what the standard error supports; negative for tens and more. */
export function decimalsFor(halfWidth: number): number {
  if (!(halfWidth > 0) || !Number.isFinite(halfWidth)) return 2;
  return 1 - Math.floor(Math.log10(halfWidth));
}

const mostDecimals = 9;
/** Numbers outside of these are written with a power of ten, as a spreadsheet shows them: zeros beyond hide the figure. */
const plain = { smallest: 1e-4, largest: 1e15 } as const;
/** As many as a number of double precision always holds. */
const mostDigits = 15;

/** A number with so many decimals, thousands apart by commas: 12,300 at -2, 0.31 at 2, 2.51E+26 at -24. */
export function numberInWords(value: number, decimals: number): string {
  const size = Math.abs(value);
  if (size >= plain.largest || (decimals > mostDecimals && size > 0 && size < plain.smallest)) {
    const digits = Math.floor(Math.log10(size)) + decimals;
    return value.toExponential(Math.min(Math.max(digits, 0), mostDigits - 1)).replace("e", "E");
  }
  const step = 10 ** Math.min(decimals, 0);
  const rounded = decimals < 0 ? Math.round(value * step) / step : value;
  const shown = Math.min(Math.max(decimals, 0), mostDecimals);
  const text = rounded.toLocaleString("en-US", { minimumFractionDigits: shown, maximumFractionDigits: shown });
  return /^-0(\.0*)?$/.test(text) ? text.slice(1) : text;
}

/** "a", "a and b", "a, b and c". */
export function listInWords(words: readonly string[]): string {
  const last = words.at(-1) ?? "";
  return words.length < 2 ? last : `${words.slice(0, -1).join(", ")} and ${last}`;
}

/** So many names are listed; of more, the first three and how many follow. */
const mostNamed = 4;
const namedOfMany = 3;

/** The drivers in a title or a first sentence: "Price, Advertising and Rainy days", "Price, Advertising, Rainy days and 17 more". */
export const driversInWords = (names: readonly string[]): string =>
  names.length <= mostNamed
    ? listInWords(names)
    : listInWords([...names.slice(0, namedOfMany), `${names.length - namedOfMany} more`]);

export const confidenceInWords = (level: number): string => `${Number((100 * (1 - level)).toPrecision(6))} %`;

/** A share of variation, "62 %"; a fit that leaves something over is never called 100 %. */
export function shareInWords(share: number): string {
  const percent = 100 * share;
  if (percent > 99 && percent < 100) return `${Math.min(percent, 99.99).toFixed(percent > 99.9 ? 2 : 1)} %`;
  return percent > 0 && percent < 1 ? `${percent.toFixed(1)} %` : `${percent.toFixed(0)} %`;
}

/** The name of something made of a column, where a sentence begins with it; a heading of the user's stays as it is written. */
export const atStart = (name: string, column: string): string => (name.startsWith(column) ? name : capitalised(name));

export const capitalised = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);
