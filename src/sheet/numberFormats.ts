const significant = 4;

/** Blank of a bracket's width behind a number, so that it does not touch the words in the next column. */
const room = "_)";

/** A number format that shows four significant digits of the smallest of the values that is not zero. */
export function formatFor(values: readonly number[]): string {
  const sizes = values.filter((value) => value !== 0 && Number.isFinite(value)).map(Math.abs);
  if (sizes.length === 0) return `0.000${room}`;
  const smallest = Math.min(...sizes);
  if (smallest < 1e-7 || Math.max(...sizes) >= 1e12) return `0.000E+00${room}`;
  const decimals = Math.max(0, Math.min(10, significant - 1 - Math.floor(Math.log10(smallest))));
  return decimals === 0 ? `#,##0${room}` : `#,##0.${"0".repeat(decimals)}${room}`;
}

/** p-values: the cell holds every digit, the format says "< 0.0001" where four decimals would show zeros. */
export const pValueFormat = `[<0.0001]"< 0.0001"${room};0.0000${room}`;

export const ratioFormat = `0.00${room}`;
const countFormat = `#,##0${room}`;

/** For a column of figures of different kinds: counts without decimals, the rest with four significant digits. */
export const figureFormat = (value: string | number | undefined): string =>
  typeof value === "number" && Number.isInteger(value)
    ? countFormat
    : formatFor(typeof value === "number" ? [value] : []);

/** For the headings of such columns: the same room behind them. */
export const numberHeadingFormat = `General;General;General;@${room}`;
