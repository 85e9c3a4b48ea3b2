import { dayInDigits, dayInWords, isoWeek, minutesADay, monthNames } from "./calendar.ts";

/** How the periods of a time column follow one another. */
export interface Period {
  /** "monthly", "quarterly", "yearly", "weekly", "daily", "business-daily", "hourly", "every 3 days", "by running number" or "row by row". */
  readonly name: string;
  /** One period in words: "month", "quarter", "3 days", "step", "row". */
  readonly unit: string;
  /** How many periods make a season: 12, 4, 52, 5, 7 or 24; 1 where there is none. */
  readonly season: number;
}

/** What the positions of a grid count: calendar units, days without weekends, minutes, or plain steps. */
export type GridUnit = "year" | "quarter" | "month" | "week" | "day" | "business day" | "hour" | "minute" | "step";

/** How many of a unit make a season of its own: a year's months, a week's days, a day's hours. */
const seasonOf: Readonly<Record<GridUnit, number>> = {
  year: 1,
  quarter: 4,
  month: 12,
  week: 52,
  day: 7,
  "business day": 5,
  hour: 24,
  minute: minutesADay,
  step: 1,
};

const nameOf: Readonly<Record<GridUnit, string>> = {
  year: "yearly",
  quarter: "quarterly",
  month: "monthly",
  week: "weekly",
  day: "daily",
  "business day": "business-daily",
  hour: "hourly",
  minute: "by the minute",
  step: "by running number",
};

/** Units that make up greater ones, the greatest first. */
const greater: Readonly<Partial<Record<GridUnit, readonly (readonly [factor: number, unit: GridUnit])[]>>> = {
  quarter: [[4, "year"]],
  month: [
    [12, "year"],
    [3, "quarter"],
  ],
  day: [[7, "week"]],
  minute: [
    [minutesADay, "day"],
    [60, "hour"],
  ],
};

/** The period that steps of so many units make: 3 months are a quarter, 2 weeks stay "every 2 weeks". */
export function periodOf(unit: GridUnit, step: number): Period {
  const whole = greater[unit]?.find(([factor]) => step % factor === 0);
  if (whole !== undefined) return periodOf(whole[1], step / whole[0]);
  const season = seasonOf[unit] / step;
  return {
    name: step === 1 ? nameOf[unit] : `every ${step} ${unit}s`,
    unit: step === 1 ? unit : `${step} ${unit}s`,
    season: Number.isInteger(season) ? season : 1,
  };
}

/** Rows that each count as one step, whatever lies between them. */
export const rowByRow: Period = { name: "row by row", unit: "row", season: 1 };

/** "1 month", "3 months", "4 weeks" for two periods of "2 weeks". */
export function periodsInWords({ unit }: Period, periods: number): string {
  const several = /^(\d+) (.+)s$/.exec(unit);
  const count = periods * Number(several?.[1] ?? 1);
  return `${count} ${several?.[2] ?? unit}${count === 1 ? "" : "s"}`;
}

/** A time in words: 24228 in months is "January 2019", 43830 in days "31 December 2019". */
export function timeInWords(unit: GridUnit, time: number): string {
  switch (unit) {
    case "quarter":
      return `Q${(time % 4) + 1} ${Math.floor(time / 4)}`;
    case "month":
      return `${monthNames[time % 12] ?? ""} ${Math.floor(time / 12)}`;
    case "week": {
      const { year, week } = isoWeek(time);
      return `week ${week} of ${year}`;
    }
    case "day":
      return dayInWords(time);
    case "minute":
      return dayInDigits(time / minutesADay);
    case "business day":
      return dayInWords(dayOfBusinessDay(time));
    case "year":
    case "hour":
    case "step":
      return String(time);
  }
}

/** Business days are counted five to the week, from Monday on. */
export const businessDay = (weekIndex: number, weekday: number): number => weekIndex * 5 + weekday;

const dayOfBusinessDay = (index: number): number => Math.floor(index / 5) * 7 + 2 + (index % 5);
