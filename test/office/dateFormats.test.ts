import { describe, expect, it } from "vitest";
import { isDateFormat } from "../../src/office/dateFormats.ts";

describe("number formats of dates", () => {
  it.each([
    "m/d/yyyy",
    "yyyy-mm-dd",
    "mmm-yy",
    "mmmm",
    "d-mmm",
    "dddd",
    "m/d/yyyy h:mm",
    "[$-409]d-mmm-yy;@",
    "[$-F800]dddd\\, mmmm dd\\, yyyy",
    'yyyy"Q"',
    "yyyy\\-mm",
    "[Red]yyyy;[Blue]0",
  ])("%s shows a date", (format) => expect(isDateFormat(format)).toBe(true));

  it.each([
    "General",
    "0.00",
    "#,##0.00_);[Red](#,##0.00)",
    "0.00E+00",
    "0%",
    "@",
    "# ?/?",
    "h:mm AM/PM",
    "h:mm:ss",
    "mm:ss.0",
    "[h]:mm:ss",
    "[h]:mm",
    "[mm]",
    "[Blue][ss].00",
    '0 "days"',
    "0 \\d",
    '_($* #,##0.00_);_($* (#,##0.00);_($* "-"??_);_(@_)',
    "[Magenta]0.0",
    "",
  ])("%s shows a quantity", (format) => expect(isDateFormat(format)).toBe(false));
});
