import {
  readAdded,
  readCalendar,
  readDecimal,
  readList,
  readNamedTexts,
  readText,
  readYesNo,
} from "./settingReaders.ts";
import { type SettingSpec, plain, transformed } from "./settingSpec.ts";

/** The settings that say what is made of the columns. */
export const columnSettings: readonly SettingSpec[] = [
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
    name: "dates",
    values: "headings, separated by commas",
    standard: "none",
    meaning: "Drivers that hold dates or periods, counted as time in the unit they come in.",
    read: plain("dates", readList),
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
    name: "add",
    values: "square of Heading, logarithm of, lag of, change of or growth rate of Heading by 2, separated by commas",
    standard: "none",
    meaning:
      "Further drivers beside the columns as they stand: a square for a curve, earlier periods of a driver or of the outcome.",
    read: plain("added", readAdded),
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
    name: "second groups",
    values: "a heading",
    standard: "none",
    meaning:
      "A second column of groups that cross the first, such as years across firms: errors may be shared along both.",
    read: plain("secondGroups", readText),
  },
];
