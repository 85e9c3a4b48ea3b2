import { whiteWishes } from "../decision/wish.ts";
import type { NotUnderstood, Settings } from "./settingValues.ts";
import {
  readCalendar,
  readDecimal,
  readErrors,
  readExpressions,
  readLags,
  readLevel,
  readList,
  readNamedNumbers,
  readNamedTexts,
  readOneOf,
  readText,
  readTransforms,
  readYesNo,
} from "./settingReaders.ts";

/** One setting: its name, what it takes, what holds when it is not given, and what it does. */
export interface SettingSpec {
  readonly name: string;
  readonly values: string;
  readonly standard: string;
  readonly meaning: string;
  readonly read: (text: string, settings: Settings) => Settings | NotUnderstood;
}

const option =
  <K extends keyof Settings["options"]>(key: K, read: (text: string) => Settings["options"][K] | NotUnderstood) =>
  (text: string, settings: Settings): Settings | NotUnderstood => {
    const value = read(text);
    return isNotUnderstood(value) ? value : { ...settings, options: { ...settings.options, [key]: value } };
  };

const plain =
  <K extends keyof Settings>(key: K, read: (text: string) => Settings[K] | NotUnderstood) =>
  (text: string, settings: Settings): Settings | NotUnderstood => {
    const value = read(text);
    return isNotUnderstood(value) ? value : { ...settings, [key]: value };
  };

export const isNotUnderstood = (value: unknown): value is NotUnderstood =>
  typeof value === "object" && value !== null && "allowed" in value;

const transformed =
  (kind: "logarithm" | "square" | "lag" | "change" | "growth rate") =>
  (text: string, settings: Settings): Settings | NotUnderstood => {
    const transforms = readTransforms(kind, text);
    return isNotUnderstood(transforms)
      ? transforms
      : { ...settings, transforms: [...settings.transforms, ...transforms] };
  };

/** Every setting, in the order a reader wants them: the manual, the worksheet functions and the terminal all read this. */
export const settingTable: readonly SettingSpec[] = [
  {
    name: "rows",
    values: "cases, time, groups",
    standard: "time or groups where a key is given, else cases",
    meaning: "What rows are to each other: separate cases, steps through time, or members of groups.",
    read: plain("rows", readOneOf("cases", "time", "groups")),
  },
  {
    name: "policy",
    values: "careful, textbook, always-robust",
    standard: "careful",
    meaning: "How the tests decide between the three kinds of standard errors.",
    read: option("policy", readOneOf("careful", "textbook", "always-robust")),
  },
  {
    name: "errors",
    values: "by tests, classical, white, newey-west, grouped",
    standard: "by tests",
    meaning: "A kind of standard errors fixed by hand; say why with the setting reason.",
    read: (text, settings) => {
      const errors = readErrors(text);
      if (isNotUnderstood(errors)) return errors;
      const fixed = errors === "by tests" ? null : { errors, reason: settings.options.fixed?.reason ?? null };
      return { ...settings, options: { ...settings.options, fixed } };
    },
  },
  {
    name: "reason",
    values: "any text",
    standard: "none given",
    meaning: "Why a kind of standard errors was fixed; it stands in the report.",
    read: (text, settings) => {
      const { fixed } = settings.options;
      return {
        ...settings,
        options: { ...settings.options, fixed: fixed === null ? null : { ...fixed, reason: readText(text) } },
      };
    },
  },
  {
    name: "white version",
    values: whiteWishes.join(", "),
    standard: "HC3",
    meaning:
      "How squared residuals are weighted in White's standard errors; bell-mccaffrey gives each coefficient t degrees of freedom of its own.",
    read: option("whiteVersion", readOneOf(...whiteWishes)),
  },
  {
    name: "grouped version",
    values: "CR0, CR1, CR2",
    standard: "CR1",
    meaning: "The small-sample correction of standard errors by group.",
    read: option("groupedVersion", readOneOf("CR0", "CR1", "CR2")),
  },
  {
    name: "lags",
    values: "a whole number, careful, thumb, cube root, newey-west 1994, andrews 1991 (with a kernel and prewhitened)",
    standard: "the policy's rule",
    meaning: "How many periods back Newey-West looks, or the rule that finds the number.",
    read: option("lags", readLags),
  },
  {
    name: "small-sample factor",
    values: "yes, no",
    standard: "yes",
    meaning: "Whether Newey-West's covariance is multiplied by n / (n - k).",
    read: option("adjusted", readYesNo),
  },
  {
    name: "level",
    values: "a number between 0 and 1",
    standard: "0.05",
    meaning: "The level at which an effect is called shown; intervals are at 1 less the level.",
    read: option("level", readLevel),
  },
  {
    name: "constant",
    values: "yes, no",
    standard: "yes",
    meaning: "Whether the regression has a constant.",
    read: plain("constant", readYesNo),
  },
  {
    name: "columns",
    values: "headings or numbers, separated by commas",
    standard: "all columns of the drivers",
    meaning: "Which columns of the drivers are used.",
    read: plain("columns", readList),
  },
  {
    name: "categories",
    values: "headings, separated by commas",
    standard: "none",
    meaning: "Drivers whose values are names of categories, one indicator for each category but one.",
    read: plain("categories", readList),
  },
  {
    name: "base",
    values: "Heading = category, separated by commas",
    standard: "the most frequent category",
    meaning: "The category the others are compared with.",
    read: plain("bases", readNamedTexts),
  },
  {
    name: "logarithm",
    values: "headings",
    standard: "none",
    meaning: "Columns taken in natural logarithms.",
    read: transformed("logarithm"),
  },
  {
    name: "square",
    values: "headings",
    standard: "none",
    meaning: "Drivers that are squared.",
    read: transformed("square"),
  },
  {
    name: "lag",
    values: "headings, or Heading by 2",
    standard: "none",
    meaning: "Drivers taken from one period (or the number given) earlier, by time and not by row.",
    read: transformed("lag"),
  },
  {
    name: "change",
    values: "headings, or Heading by 12",
    standard: "none",
    meaning: "Columns taken as the change from one period (or the number given) earlier.",
    read: transformed("change"),
  },
  {
    name: "growth rate",
    values: "headings, or Heading by 12",
    standard: "none",
    meaning: "Columns taken as the growth from one period (or the number given) earlier, in per cent.",
    read: transformed("growth rate"),
  },
  {
    name: "calendar",
    values: "trend, month indicators, quarter indicators",
    standard: "none",
    meaning: "Drivers made from the time column.",
    read: plain("calendar", readCalendar),
  },
  {
    name: "text numbers",
    values: "no, point, comma",
    standard: "no",
    meaning: "Whether text that is plainly a number is read as one, and its decimal mark.",
    read: plain("textNumbers", readDecimal),
  },
  {
    name: "against",
    values: "Heading = number, separated by commas",
    standard: "0",
    meaning: "The value each driver is tested against.",
    read: option("against", readNamedNumbers),
  },
  {
    name: "estimates",
    values: "sums of coefficients or a quotient of two, separated by commas",
    standard: "none",
    meaning:
      "Numbers made of the coefficients, each held against a value: Price + Rain, Price / (1 - Lagged) = 2, or one-sided Price > 0.",
    read: option("estimates", readExpressions),
  },
  {
    name: "joint test",
    values: "Price = 0, Rain = Fuel",
    standard: "none",
    meaning: "Equations of the coefficients that are tested all at once.",
    read: option("jointTest", readExpressions),
  },
  {
    name: "units",
    values: "Heading = words, separated by commas",
    standard: "none",
    meaning: "Words for one unit of a column, for the verdict.",
    read: option("units", readNamedTexts),
  },
];
