/** Days of the 1900 system, in which spreadsheets count: serial 1 is 1 January 1900, 25569 is 1 January 1970. */

export interface CalendarDay {
  readonly year: number;
  /** From 1 to 12. */
  readonly month: number;
  readonly day: number;
}

const unixEpochSerial = 25_569;
const millisecondsADay = 86_400_000;

/** The system takes 1900 for a leap year: serials up to this one stand a day early. */
const lastEarlySerial = 59;

/** Whole days since 30 December 1899, the same count for every serial; fractions of a day are dropped. */
export const dayCount = (serial: number): number => Math.floor(serial) + (serial <= lastEarlySerial ? 1 : 0);

export function calendarDay(serial: number): CalendarDay {
  const date = new Date((dayCount(serial) - unixEpochSerial) * millisecondsADay);
  return { year: date.getUTCFullYear(), month: date.getUTCMonth() + 1, day: date.getUTCDate() };
}

/** @returns null where there is no such day in the calendar. */
export function serialOf({ year, month, day }: CalendarDay): number | null {
  const count = Date.UTC(year, month - 1, day) / millisecondsADay + unixEpochSerial;
  const serial = count <= lastEarlySerial + 1 ? count - 1 : count;
  const back = calendarDay(serial);
  return back.year === year && back.month === month && back.day === day ? serial : null;
}

/** From 0 for Monday to 6 for Sunday. */
export const weekdayOf = (serial: number): number => (((dayCount(serial) - 2) % 7) + 7) % 7;

/** Weeks from Monday to Sunday, counted on without regard to years. */
export const weekIndexOf = (serial: number): number => Math.floor((dayCount(serial) - 2) / 7);

/** The Monday that a week begins with. */
export const mondayOf = (weekIndex: number): number => weekIndex * 7 + 2;

/** The week of ISO 8601 that a running week is: weeks belong to the year of their Thursday. */
export function isoWeek(weekIndex: number): { readonly year: number; readonly week: number } {
  const thursday = mondayOf(weekIndex) + 3;
  const { year } = calendarDay(thursday);
  return { year, week: Math.floor((thursday - serialOfDay(year, 1, 1)) / 7) + 1 };
}

/** @returns the running week, or null where the year has no such week. */
export function weekIndexOfIso(year: number, week: number): number | null {
  const index = weekIndexOf(serialOfDay(year, 1, 4)) + week - 1;
  return isoWeek(index).year === year ? index : null;
}

/** A day that is known to exist, as a count of days. */
const serialOfDay = (year: number, month: number, day: number): number =>
  Date.UTC(year, month - 1, day) / millisecondsADay + unixEpochSerial;

export const monthNames: readonly string[] = [
  "January",
  "February",
  "March",
  "April",
  "May",
  "June",
  "July",
  "August",
  "September",
  "October",
  "November",
  "December",
];

/** "5 January 2024" */
export function dayInWords(serial: number): string {
  const { year, month, day } = calendarDay(serial);
  return `${day} ${monthNames[month - 1] ?? ""} ${year}`;
}

/** "2024-01-05", and the time of day where there is one: "2024-01-05 14:30". */
export function dayInDigits(serial: number): string {
  const minutes = Math.round(serial * minutesADay);
  const { year, month, day } = calendarDay(minutes / minutesADay);
  const ofDay = minutes % minutesADay;
  const time = ofDay === 0 ? "" : ` ${twoDigits(Math.floor(ofDay / 60))}:${twoDigits(ofDay % 60)}`;
  return `${year}-${twoDigits(month)}-${twoDigits(day)}${time}`;
}

export const minutesADay = 1440;

const twoDigits = (number: number): string => String(number).padStart(2, "0");
