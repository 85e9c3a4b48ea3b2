const dayLength = 86_400_000;
/** Serial numbers count from here; days before 1 March 1900 have two countings and are left as text. */
const dayZero = Date.UTC(1899, 11, 30);
const firstSerial = 61;

const pattern = /^(\d{4})-(\d{2})-(\d{2})(?:[T ](\d{2}):(\d{2})(?::(\d{2}))?)?Z?$/;

/** "2016-01-31" or "2016-01-31 14:30" as a serial number, without any time zone; null for other text and days that are none. */
export function readIsoDate(text: string): { readonly serial: number; readonly format: string } | null {
  const parts = pattern.exec(text);
  if (parts === null) return null;
  const [year, month, day, hour, minute, second] = [1, 2, 3, 4, 5, 6].map((group) => Number(parts[group] ?? 0));
  const time = Date.UTC(year!, month! - 1, day, hour, minute, second);
  const serial = (time - dayZero) / dayLength;
  if (serial < firstSerial || !isoText(time, hasTime(parts)).startsWith(text.slice(0, 10))) return null;
  return { serial, format: hasTime(parts) ? "yyyy-mm-dd hh:mm:ss" : "yyyy-mm-dd" };
}

const hasTime = (parts: RegExpExecArray): boolean => parts[4] !== undefined;

/** A serial number as "2016-01-31", or with its time where it has one, rounded to the second. */
export function writeIsoDate(serial: number): string {
  const time = dayZero + Math.round(serial * 86_400) * 1000;
  return isoText(time, time % dayLength !== 0);
}

function isoText(time: number, withTime: boolean): string {
  const iso = new Date(time).toISOString();
  return withTime ? `${iso.slice(0, 10)} ${iso.slice(11, 19)}` : iso.slice(0, 10);
}
