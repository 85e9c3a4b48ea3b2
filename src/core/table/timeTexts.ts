import { type Moment, columnForms, readInForm, readLabel } from "./periodLabels.ts";

export interface TimeTexts {
  /** One for each text; null where it cannot be read. */
  readonly moments: readonly (Moment | null)[];
  /** How dates such as 3/4/2024 were told apart, where there were any. */
  readonly convention: "day/month/year" | "month/day/year" | null;
}

/**
 * Reads the distinct texts of a time column. Dates such as 3/4/2024 are read only if one of the two conventions
 * alone suits them all, and no true date stands beside them (a sheet that turned some of them into dates may have
 * taken the day for the month).
 */
export function readTimeTexts(texts: readonly string[], besideDates: boolean): TimeTexts {
  const businessYears = texts.map((text) => readInForm(text, columnForms.businessYear));
  if (texts.length > 1 && businessYears.every((moment) => moment !== null)) {
    return { moments: businessYears, convention: null };
  }
  const moments = texts.map((text) => readLabel(text));
  const convention = besideDates ? null : conventionOf(texts);
  if (convention === null) return { moments, convention };
  const form = convention === "day/month/year" ? columnForms.dayFirst : columnForms.monthFirst;
  return { moments: moments.map((moment, i) => moment ?? readInForm(texts[i]!, form)), convention };
}

/** Whether a text looks like a date whose day and month cannot be told apart. */
export const isSlashedDate = (text: string): boolean =>
  readInForm(text, columnForms.dayFirst) !== null || readInForm(text, columnForms.monthFirst) !== null;

function conventionOf(texts: readonly string[]): TimeTexts["convention"] {
  const slashed = texts.filter(isSlashedDate);
  if (slashed.length === 0) return null;
  const dayFirst = slashed.every((text) => readInForm(text, columnForms.dayFirst) !== null);
  const monthFirst = slashed.every((text) => readInForm(text, columnForms.monthFirst) !== null);
  if (dayFirst === monthFirst) return null;
  return dayFirst ? "day/month/year" : "month/day/year";
}
