const unequalRanges = "The ranges are not equally long";

/** Whether a formula was left unread because its ranges do not fit one another. */
export const saysUnequal = (why: string): boolean => why.startsWith(unequalRanges);

/** Why a formula that looks like a regression could not be read: every sentence about it. */
export const whyUnread = {
  notAFormula: "The formula could not be taken apart.",
  tooDeep: "Names refer to names in a circle, or too deep to follow.",
  unknownName: (name: string) => `The workbook has no name "${name}".`,
  unknownSheet: (sheet: string) => `The workbook has no sheet "${sheet}".`,
  otherWorkbook: (sheet: string) => `The data lie in another workbook (${sheet}).`,
  severalSheets: (sheets: string) => `The data lie on several sheets at once (${sheets}).`,
  unknownTable: (table: string) => `The workbook has no table "${table}".`,
  noTableHere: "The formula speaks of its own table, but stands in none.",
  unknownColumn: (table: string, column: string) => `Table "${table}" has no column "${column}".`,
  tablePart: (table: string) => `A part of table "${table}" is meant that holds no data.`,
  computedPlace: (name: string) => `${name} works out at calculation which cells are used.`,
  spilledPlace: "The cells are those that another formula spills into.",
  joinedPlace: "The cells are put together of several ranges.",
  computedData: (name: string) => `The data go through ${name}, so that they stand in no cells.`,
  arithmetic: "The data go through arithmetic that a review cannot follow.",
  product: "Two ranges are multiplied with each other.",
  typedData: "The data are typed into the formula.",
  noCells: (cells: string) => `There are no cells in use in ${cells}.`,
  wideOutcome: (cells: string) => `The outcome is a block of several columns (${cells}).`,
  unequal: (first: Ranged, second: Ranged) =>
    `${unequalRanges}: ${first.count} cells in ${first.cells}, ${second.count} in ${second.cells}.`,
  oneDriver: (name: string, cells: string) => `${name} takes one driver, but ${cells} holds several.`,
  computedConstant: "Whether there is a constant is worked out at calculation.",
  fewArguments: (name: string) => `${name} has too few arguments.`,
  computedPrediction: "The rows that are predicted are worked out at calculation.",
  goesInto: (name: string) => `The result goes into ${name}, so that what the cell shows cannot be compared.`,
  goesIntoArithmetic: "The result goes into arithmetic that a review cannot follow.",
  goesIntoText: "The result goes into a text.",
  severalAtOnce: "Results of several regressions go into one cell.",
  noNumber: (shows: string) => `The cell shows ${shows === "" ? "nothing" : shows} in place of a number.`,
  noNumberAmong: (shows: string, cell: string, holds: string) =>
    `${whyUnread.noNumber(shows).replace(/\.$/, "")}: ${cell}, which it is to use, ${holds === "" ? "is empty" : `holds "${holds}"`}.`,
  moreWindows: (count: number, last: string) =>
    `${count.toLocaleString("en-US")} more regressions of the same columns over other rows, as far as ${last}, are not reviewed one by one.`,
  beyondTheBlock: (name: string) => `A cell beyond what ${name} gives is asked for.`,
} as const;

interface Ranged {
  readonly cells: string;
  readonly count: number;
}
