import { counted } from "../../problem/spots.ts";

/** What a review says of how the sheets are made: every sentence. */
export const found = {
  textInRange: (line: string, count: number, example: string) =>
    `${counted(count, "cell")} of "${line}" ${count === 1 ? "holds" : "hold"} text where a number is meant, such as "${example}": ${rowsOf(count)} cannot take part.`,
  errorsInRange: (line: string, count: number, example: string) =>
    `${counted(count, "cell")} of "${line}" ${count === 1 ? "shows" : "show"} an error, such as ${example}: ${rowsOf(count)} cannot take part.`,
  blanksInRange: (line: string, count: number) =>
    `${counted(count, "cell")} of "${line}" inside the range ${count === 1 ? "is" : "are"} empty: ${rowsOf(count)} cannot take part.`,
  hiddenRows: (count: number, lie: "rows" | "columns") =>
    `${counted(count, lie === "rows" ? "row" : "column")} of the data ${count === 1 ? "is" : "are"} hidden or filtered away, but ${count === 1 ? "counts" : "count"} in the regression like the others.`,
  hiddenLine: (line: string, runs: "down" | "across") =>
    `"${line}" stands in a ${runs === "down" ? "column" : "row"} that is hidden.`,
  hiddenSheet: (sheet: string) => `The data stand on sheet "${sheet}", which is hidden.`,
  shifted: (outcome: string, driver: string, by: number) =>
    `Each "${outcome}" is set against the "${driver}" ${counted(Math.abs(by), "place")} ${by > 0 ? "further on" : "before it"}: the ranges are equally long but begin in different places.`,
  unequal: (why: string) => why,
  headingInside: (line: string, heading: string) =>
    `The range of "${line}" begins with its heading, "${heading}", which the function passes over.`,
  namedOtherwise: (label: string, given: string) =>
    `The number is called "${label}", but its formula gives the ${given}.`,
  overFormula: (line: string, count: number, formulas: number) =>
    `${counted(count, "number")} ${count === 1 ? "is" : "are"} typed into "${line}", where ${others(formulas)}.`,
  typedAmongFormulas: (count: number, formulas: number) =>
    `${counted(count, "number")} of the report ${count === 1 ? "is" : "are"} typed in, where ${others(formulas)}.`,
  typedResults: (count: number) =>
    `The ${counted(count, "number")} of the report ${count === 1 ? "is" : "are"} typed in: no formula leads from the data to them.`,
  olderResults: (count: number) =>
    `${counted(count, "coefficient")} of a formula ${count === 1 ? "is" : "are"} not what its cells give now: the formula was not calculated since they changed.`,
  byHand: "The workbook calculates only when someone asks, so that results may be older than the cells they rest on.",
  repeated: (count: number, first: string, again: string) =>
    `${counted(count, "row")} of data in ${first} ${count === 1 ? "stands" : "stand"} again, number for number, in ${again}.`,
} as const;

export const advice = {
  textInRange: "Put the numbers in, or say in the report that these rows were left out and why.",
  errorsInRange: "Mend the formulas there, or say in the report that these rows were left out and why.",
  blanksInRange: "Fill in what is missing; if an empty cell stands for none, write 0.",
  hiddenRows: "Show them and see whether they belong in; if not, take them out of the range.",
  hiddenLine: "Show it, so that a reader can see what was used.",
  hiddenSheet: "Show the sheet, so that a reader can see what was used.",
  shifted: "If a lag is meant, say so in the report; if not, let all ranges begin in the same row.",
  unequal: "Let all ranges begin and end in the same rows.",
  headingInside: "Let the range begin below the heading: other functions end in an error there.",
  namedOtherwise: "Put the name right, or let the formula give what the name says.",
  overFormula: "Put the formula back, or mark the number and say where it comes from.",
  typedAmongFormulas: "Put the formulas back.",
  typedResults: "Let formulas make them, or keep beside them how they were made.",
  olderResults:
    "Calculate the workbook (F9) and look at the results again; set calculation to automatic under Formulas.",
  byHand: "Calculate the workbook (F9), and set calculation to automatic under Formulas.",
  repeated: "See whether the rows were pasted twice; if so, take one copy out.",
} as const;

const others = (formulas: number): string =>
  formulas === 1 ? "the other is a formula" : `the other ${formulas.toLocaleString("en-US")} are formulas`;

const rowsOf = (count: number): string => (count === 1 ? "its row" : "their rows");
