/**
 * Whether a number format shows its number as a date: it names a year or a day, or a month without hours and seconds.
 * Times of day and durations ("h:mm", "[h]:mm:ss") are quantities, not dates.
 * @param format - as Excel's API gives it, in English letters whatever the user's language.
 */
export function isDateFormat(format: string): boolean {
  const known = seen.get(format);
  if (known !== undefined) return known;
  const date = readFormat(format);
  seen.set(format, date);
  return date;
}

/** A sheet has millions of cells and a handful of formats. */
const seen = new Map<string, boolean>();

function readFormat(format: string): boolean {
  const [first = ""] = format
    .replaceAll(/"[^"]*"|\\.|_.|\*.|\[(?![hms]+\])[^\]]*\]/gi, "")
    .replaceAll(/AM\/PM|A\/P|General/gi, "")
    .split(";");
  return /[yd]/i.test(first) || (/m/i.test(first) && !/[hs]|\[m/i.test(first));
}
