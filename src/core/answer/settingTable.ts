import { whiteWishes } from "../decision/wish.ts";
import { columnSettings } from "./columnSettings.ts";
import {
  readCount,
  readErrors,
  readExpressions,
  readLags,
  readLevel,
  readNamedNumbers,
  readNamedTexts,
  readOneOf,
  readText,
  readYesNo,
} from "./settingReaders.ts";
import { type SettingSpec, isNotUnderstood, option, plain } from "./settingSpec.ts";

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
  ...columnSettings,
  {
    name: "against",
    values: "Heading = number, separated by commas",
    standard: "0",
    meaning: "The value each driver is tested against.",
    read: option("against", readNamedNumbers),
  },
  {
    name: "break after",
    values: "a number of rows",
    standard: "half of the rows",
    meaning: "After how many rows, in time, Chow's test parts them: the break that is asked about.",
    read: option("breakAfter", readCount),
  },
  {
    name: "predict for",
    values: "mean, single row",
    standard: "mean",
    meaning:
      "Whether the interval of a prediction is for the mean of many such rows, or for one (under even spread alone).",
    read: option("predictFor", readOneOf("mean", "single row")),
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
