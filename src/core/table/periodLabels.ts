import { serialOf, weekIndexOfIso, monthNames } from "./calendar.ts";

/** What a time is counted in. "number" is a running number with no place in the calendar. */
export type TimeUnit = "year" | "quarter" | "month" | "week" | "day" | "number";

/**
 * A time as a number of its unit: the year; year x 4 + quarter from 0; year x 12 + month from 0;
 * running week; serial of the day, the hour as its fraction; running number.
 */
export interface Moment {
  readonly unit: TimeUnit;
  readonly index: number;
}

/** Reads the label of a period or a date kept as text, whatever its form; null where it has none. */
export function readLabel(text: string): Moment | null {
  for (const form of labelForms) {
    const moment = readInForm(text, form);
    if (moment !== null) return moment;
  }
  return null;
}

export function readInForm(text: string, { pattern, read }: LabelForm): Moment | null {
  const parts = pattern.exec(text.trim());
  return parts === null ? null : read(parts.slice(1).map((part) => part || ""));
}

export interface LabelForm {
  readonly pattern: RegExp;
  readonly read: (parts: readonly string[]) => Moment | null;
}

const monthPattern = `(${monthNames.map((name) => `${name.slice(0, 3)}(?:${name.slice(3)})?`).join("|")}|Sept)`;
const inWords = (pattern: string): RegExp => new RegExp(`^${pattern.replace("MONTH", monthPattern)}$`, "i");

/** Forms that say the same in every country. */
export const labelForms: readonly LabelForm[] = [
  {
    pattern: /^(\d{4})-(\d{1,2})-(\d{1,2})(?:[T ](\d{1,2}):(\d{2})(?::(\d{2})(?:\.\d+)?)?Z?)?$/,
    read: ([year, month, day, ...time]) => withClock(dayMoment(year, month, day), time),
  },
  { pattern: /^(\d{4})[/.](\d{1,2})[/.](\d{1,2})$/, read: ([year, month, day]) => dayMoment(year, month, day) },
  { pattern: /^(\d{1,2})\.(\d{1,2})\.(\d{4})$/, read: ([day, month, year]) => dayMoment(year, month, day) },
  { pattern: /^(\d{4})([01]\d)([0-3]\d)$/, read: ([year, month, day]) => dayMoment(year, month, day) },
  { pattern: /^(?:FY ?)?(\d{4})$/i, read: ([year]) => yearMoment(year) },
  { pattern: /^(\d{4})[-./: ]?Q([1-4])$/i, read: ([year, quarter]) => quarterMoment(year, quarter) },
  { pattern: /^Q([1-4])[-./' ]*(\d{4}|\d{2})$/i, read: ([quarter, year]) => quarterMoment(year, quarter) },
  { pattern: /^([1-4])Q[-./' ]*(\d{4}|\d{2})$/i, read: ([quarter, year]) => quarterMoment(year, quarter) },
  { pattern: /^(\d{4})(?:[-./: ]?M|[-./: ])(\d{1,2})$/i, read: ([year, month]) => monthMoment(year, month) },
  { pattern: /^(\d{4})(\d{2})$/, read: ([year, month]) => monthMoment(year, month) },
  { pattern: /^(\d{1,2})[-./](\d{4})$/, read: ([month, year]) => monthMoment(year, month) },
  { pattern: inWords("MONTH[-./,'_ ]*(\\d{4}|\\d{2})"), read: ([month, year]) => monthMoment(year, monthOf(month)) },
  { pattern: inWords("(\\d{4})[-./_ ]*MONTH"), read: ([year, month]) => monthMoment(year, monthOf(month)) },
  {
    pattern: inWords("(\\d{1,2})[-./ ]*MONTH[-./, ]*(\\d{4}|\\d{2})"),
    read: ([day, month, year]) => dayMoment(fullYear(year), monthOf(month), day),
  },
  {
    pattern: inWords("MONTH[-. ]*(\\d{1,2}), ?(\\d{4})"),
    read: ([month, day, year]) => dayMoment(year, monthOf(month), day),
  },
  { pattern: /^(\d{4})[-./ ]?(?:W|week ?)(\d{1,2})$/i, read: ([year, week]) => weekMoment(year, week) },
  { pattern: /^(?:W|week ?)(\d{1,2})[-./, ]+(\d{4})$/i, read: ([week, year]) => weekMoment(year, week) },
  {
    pattern: /^(?:year|quarter|month|week|day|period|[yqmwdpt])[-. #]*(\d{1,6})$/i,
    read: ([number]) => ({ unit: "number", index: Number(number) }),
  },
];

/** What running numbers under a heading count, "Week" or "Month no.": null where it does not say. */
export function numberedThing(heading: string): Exclude<TimeUnit, "number"> | null {
  const units = ["year", "quarter", "month", "week", "day"] as const;
  return units.find((unit) => new RegExp(`\\b${unit}s?\\b`, "i").test(heading)) ?? null;
}

/** Forms that must be read by the whole column, because one cell alone can be read in two ways. */
export const columnForms = {
  /** "2019/20", "2019-20": a business year, named by its first half. */
  businessYear: {
    pattern: /^(?:FY ?)?(\d{4})[-/](\d{2}|\d{4})$/i,
    read: ([year, next]) => (Number(next) % 100 === (Number(year) + 1) % 100 ? yearMoment(year) : null),
  },
  dayFirst: {
    pattern: /^(\d{1,2})[-/](\d{1,2})[-/](\d{4}|\d{2})$/,
    read: ([day, month, year]) => dayMoment(fullYear(year), month, day),
  },
  monthFirst: {
    pattern: /^(\d{1,2})[-/](\d{1,2})[-/](\d{4}|\d{2})$/,
    read: ([month, day, year]) => dayMoment(fullYear(year), month, day),
  },
} satisfies Record<string, LabelForm>;

/** Years that a heading-less number may plausibly be. */
export const isYear = (year: number): boolean => Number.isInteger(year) && year >= 1500 && year <= 2500;

type Part = string | number | undefined;

const yearMoment = (year: Part): Moment | null => (isYear(Number(year)) ? { unit: "year", index: Number(year) } : null);

function quarterMoment(year: Part, quarter: Part): Moment | null {
  const full = fullYear(year);
  return isYear(full) ? { unit: "quarter", index: full * 4 + Number(quarter) - 1 } : null;
}

function monthMoment(year: Part, month: Part): Moment | null {
  const full = fullYear(year);
  const inYear = Number(month) >= 1 && Number(month) <= 12;
  return isYear(full) && inYear ? { unit: "month", index: full * 12 + Number(month) - 1 } : null;
}

function weekMoment(year: Part, week: Part): Moment | null {
  const index = isYear(Number(year)) ? weekIndexOfIso(Number(year), Number(week)) : null;
  return index === null ? null : { unit: "week", index };
}

function dayMoment(year: Part, month: Part, day: Part): Moment | null {
  if (!isYear(Number(year))) return null;
  const serial = serialOf({ year: Number(year), month: Number(month), day: Number(day) });
  return serial === null ? null : { unit: "day", index: serial };
}

/** Adds the time of day as a share of it; null where there is no such time. */
function withClock(day: Moment | null, time: readonly Part[]): Moment | null {
  const [hour = 0, minute = 0, second = 0] = time.map(Number);
  if (day === null || hour > 23 || minute > 59 || second > 59) return null;
  return { unit: "day", index: day.index + (hour * 3600 + minute * 60 + second) / 86_400 };
}

/** Two digits stand for 1930 to 2029, as in the spreadsheet itself. */
function fullYear(year: Part): number {
  const number = Number(year);
  return String(year).length > 2 ? number : number + (number < 30 ? 2000 : 1900);
}

const monthOf = (name: Part): number =>
  monthNames.findIndex((month) => month.slice(0, 3).toLowerCase() === String(name).slice(0, 3).toLowerCase()) + 1;
