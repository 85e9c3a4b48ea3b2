import { fileSentences } from "./messagesFiles.ts";
import { reviewSentences } from "./messagesReview.ts";
import { storedSentences } from "./messagesStored.ts";
import type { Problem } from "./problem.ts";
import {
  asCell,
  capitalised,
  cellWord,
  counted,
  holds,
  isOrAre,
  listed,
  suggestion,
  theCells,
  valuesOf,
} from "./spots.ts";

/** The sentence about a fault: what is wrong and where, then what to do. */
export function messageOf(problem: Problem): string {
  // Each entry takes the member of the union that its key names; the compiler cannot follow that through the look-up.
  const sentence = sentences[problem.code] as (problem: Problem) => Sentence;
  return sentence(problem).join(" ");
}

type Sentence = readonly [whatAndWhere: string, whatToDo: string];

const sentences: { readonly [Code in Problem["code"]]: (problem: Extract<Problem, { code: Code }>) => Sentence } = {
  "no-data": ({ where }) => [
    `There are no data in ${where}.`,
    "Choose the cells that hold your columns, headings included.",
  ],
  "no-headings": ({ where }) => [
    `No row of headings was found in ${where}.`,
    "Write a name above each column, or name the columns by their ranges.",
  ],
  "empty-column": ({ column, where }) => [
    `Column "${column}" (${where}) is empty.`,
    "Fill it or choose another column.",
  ],
  "no-numbers": ({ column, where }) => [
    `Column "${column}" (${where}) holds no numbers.`,
    "Choose another column, or use this one as a category.",
  ],
  "text-in-number-column": (spots) => [
    `${theCells(spots)} in column "${spots.column}" ${holds(spots)}, which ${spots.count === 1 ? "is not a number" : "are not numbers"}.`,
    `Correct the ${cellWord(spots)}, empty ${spots.count === 1 ? "it to leave the row" : "them to leave the rows"} out, or read a driver as categories.`,
  ],
  "text-numbers": (spots) => [
    `${theCells(spots)} in column "${spots.column}" ${holds(spots)}: ${spots.count === 1 ? "a number" : "numbers"} kept as text.`,
    "Allow text to be read as numbers for this column (the setting text numbers), or turn the text into numbers in the sheet.",
  ],
  "dates-as-text": (spots) => [
    `${theCells(spots)} in column "${spots.column}" ${holds(spots)}: ${spots.count === 1 ? "a date" : "dates"} kept as text.`,
    "Turn the text into dates in the sheet, written year-month-day if need be.",
  ],
  "dates-in-number-column": (spots) => [
    `${theCells(spots)} in column "${spots.column}" ${spots.count === 1 ? "holds a date, not a number" : "hold dates, not numbers"}.`,
    `Give the ${cellWord(spots)} a number format if numbers are meant, or use the column as dates.`,
  ],
  "error-cells": (spots) => [
    `${theCells(spots)} in column "${spots.column}" ${spots.count === 1 ? "shows the error" : "show errors:"} ${valuesOf(spots)}.`,
    `Mend the ${spots.count === 1 ? "formula" : "formulas"} there, or empty the ${cellWord(spots)} to leave ${spots.count === 1 ? "the row" : "the rows"} out.`,
  ],
  "unreadable-time": (spots) => [
    `${theCells(spots)} in time column "${spots.column}" ${holds(spots)}, which cannot be read as a time.`,
    "Write dates, or one kind of period throughout, such as 2024, 2024Q1, 2024-01 or Jan 2024.",
  ],
  "missing-time": (spots) => [
    `${theCells(spots)} in time column "${spots.column}" ${isOrAre(spots)} empty, though ${spots.count === 1 ? "the row has" : "the rows have"} data.`,
    "Fill in the time, or empty the whole row.",
  ],
  "repeated-time": (spots) => [
    `Time column "${spots.column}" holds ${valuesOf(spots)} more than once, in ${listed(spots.cells, spots.count)}.`,
    "Keep one row for each time; where several units share a time, say that rows are in groups and name the group column.",
  ],
  "unequal-heights": ({ first, rows, second, otherRows }) => [
    `The ranges are not equally tall: ${counted(rows, "row")} in ${first}, ${counted(otherRows, "row")} in ${second}.`,
    "Choose ranges that begin and end in the same rows, all with their headings or all without.",
  ],
  "too-many-columns": ({ where, columns, most }) => [
    `${capitalised(where)} has ${counted(columns, "column")}, but takes ${most === 1 ? "one" : `at most ${most}`}.`,
    most === 1 ? "Choose the one column that is meant." : "Choose fewer columns.",
  ],
  "ranges-apart": ({ first, second }) => [
    `${capitalised(first)} and ${second} do not stand in the same rows of one sheet.`,
    "Choose ranges that begin and end in the same rows.",
  ],
  "overlapping-ranges": ({ first, second }) => [
    `${capitalised(first)} overlaps ${second}.`,
    "Choose ranges that have no cell in common.",
  ],
  "no-outcome": () => ["No outcome has been chosen.", "Choose the column that is to be explained."],
  "no-drivers": () => ["No drivers have been chosen.", "Choose at least one column that may explain the outcome."],
  "ambiguous-heading": ({ headings, sheets }) => [
    `The sheets ${listed(sheets, sheets.length)} all have the headings ${headings.join(", ")}.`,
    "Say which sheet is meant.",
  ],
  "unknown-heading": ({ heading, nearest, where }) => [
    `There is no column "${heading}" in ${where}.`,
    suggestion(nearest, "Use one of the headings as it stands in the sheet."),
  ],
  "unknown-coefficient": ({ name, nearest }) => [
    `There is no coefficient "${name}" in this regression.`,
    suggestion(nearest, "Use the names of the drivers as the answer shows them."),
  ],
  "repeated-heading": ({ heading, cells }) => [
    `The heading "${heading}" stands above more than one column, in ${listed(cells, cells.length)}.`,
    "Give each column a name of its own.",
  ],
  "column-used-twice": ({ column, first, second }) => [
    `Column "${column}" is used as ${first} and again as ${second}.`,
    "Give it one of the two roles.",
  ],
  "no-time-column": () => [
    "Rows are said to run through time, but no time column has been chosen.",
    "Choose the column that holds the dates or periods, or say that rows are separate cases.",
  ],
  "no-group-column": () => [
    "Rows are said to be in groups, but no group column has been chosen.",
    "Choose the column that names the group of each row, or say that rows are separate cases.",
  ],
  "one-group": ({ column, value }) => [
    `Every row used belongs to the same group: column "${column}" holds "${value}" throughout.`,
    "Choose a column with more than one group, or say that rows are separate cases.",
  ],
  "one-category": ({ column, value }) => [
    `Every row used falls into the same category: "${column}" is "${value}" throughout.`,
    "Leave this driver out, or bring in rows of another category.",
  ],
  "unknown-base": ({ column, base, nearest }) => [
    `Column "${column}" has no category "${base}" among the rows used to compare the others with.`,
    suggestion(nearest, "Choose one of the categories that occur."),
  ],
  "logarithm-of-nonpositive": (spots) => [
    `A logarithm needs numbers above 0, but ${theCells(spots, "lower")} in column "${spots.column}" ${spots.count === 1 ? "is" : "are"} 0 or below.`,
    `Correct the ${cellWord(spots)}, empty the ${cellWord(spots)} to leave ${spots.count === 1 ? "the row" : "the rows"} out, or use the column without a logarithm.`,
  ],
  "growth-from-nonpositive": (spots) => [
    `A growth rate starts from a number above 0, but ${theCells(spots, "lower")} in column "${spots.column}" ${spots.count === 1 ? "is" : "are"} 0 or below.`,
    `Correct the ${cellWord(spots)}, or use the change of the column instead.`,
  ],
  "too-many-categories": ({ column, categories, rows }) => [
    `Category column "${column}" holds ${counted(categories, "different value")} in ${counted(rows, "row")}, too many to set one against the others.`,
    "Put them into fewer categories, or use the column to group rows.",
  ],
  "transform-needs-time": ({ column, transform }) => [
    `The ${transform} of "${column}" looks back in time, but the rows have no order in time.`,
    "Say that rows run through time and choose the time column, or use the column as it is.",
  ],
  "calendar-needs-dates": ({ driver, column }) => [
    column === null
      ? `The driver "${driver}" is made from the time column, but there is none.`
      : `The driver "${driver}" needs dates, quarters or months, but time column "${column}" does not hold them.`,
    "Choose a time column with dates, or leave this driver out.",
  ],
  "too-few-rows": ({ rows, needed, leftOut }) => [
    `${capitalised(counted(rows, "row"))} can be used${leftOut === 0 ? "" : ` (${counted(leftOut, "row")} left out)`}, but this regression needs at least ${needed.toLocaleString("en-US")}.`,
    leftOut === 0
      ? "Bring in more rows or use fewer drivers."
      : "Fill in missing cells, bring in more rows or use fewer drivers.",
  ],
  "constant-column": ({ column }) => [
    `"${column}" is the same in every row used, so it cannot be told apart from the constant.`,
    "Leave it out, or fit without a constant.",
  ],
  "constant-outcome": ({ column }) => [
    `The outcome "${column}" is the same in every row used, so there is nothing to explain.`,
    "Choose another outcome or other rows.",
  ],
  "dependent-columns": ({ column, madeOf }) => [
    `"${column}" says nothing new: it is made up of ${madeOf.map((name) => `"${name}"`).join(", ")}.`,
    "Leave out one of them.",
  ],
  "perfect-fit": ({ column }) => [
    `The drivers reproduce "${column}" exactly, so there are no errors to judge by.`,
    "See whether the outcome is computed from a driver, and leave that driver out.",
  ],
  "numbers-too-large": ({ column, cell, value }) => [
    `${capitalised(asCell(cell))} in column "${column}" gives ${value}, which is too ${Math.abs(value) < 1 ? "small" : "large"} to calculate with.`,
    `Correct the cell, or give the column in ${Math.abs(value) < 1 ? "smaller" : "larger"} units.`,
  ],
  "too-many-lags": ({ lags, rows }) => [
    `${capitalised(counted(lags, "lag"))} cannot be used with ${counted(rows, "row")}.`,
    "Choose fewer lags than rows.",
  ],
  "zero-standard-error": ({ errors, term }) => [
    `The ${errors} standard error of "${term}" comes out as zero: the rows that tell about it are fitted exactly, whatever they hold.`,
    "Leave the driver out, or join its category with another.",
  ],
  "errors-need-order": ({ errors, rows }) => [
    `${errors === "newey-west" ? "Newey-West standard errors need rows that run through time" : "Grouped standard errors need rows in groups"}, but here rows are ${rows === "time" ? "through time" : rows === "groups" ? "in groups, and no column gives the time within them" : "separate cases"}.`,
    "Say otherwise what the rows are to each other, or choose another kind of standard errors.",
  ],
  "unknown-setting": ({ setting, nearest }) => [
    `There is no setting "${setting}".`,
    suggestion(nearest, "SETTINGS() lists all settings."),
  ],
  "unknown-value": ({ setting, value, allowed, nearest }) => [
    `"${value}" is not a value of the setting "${setting}".`,
    `${nearest === null ? "" : `Did you mean "${nearest}"? `}Possible: ${allowed.join(", ")}.`,
  ],
  "missing-option": ({ option }) => [`The option ${option} is missing.`, "Add it and its value."],
  "cell-being-edited": () => ["A cell is being edited.", "Press Enter or Escape in the sheet, then try again."],
  "several-areas-selected": ({ areas }) => [
    `${areas} separate areas are selected.`,
    "Select one block of cells; columns that are not needed can be left unused.",
  ],
  "chart-selected": () => ["A chart or picture is selected, not cells.", "Click a cell of your data, then try again."],
  "other-workbook": () => ["Another workbook is in front.", "Go back to the workbook of this pane, then try again."],
  "sheet-protected": ({ sheet }) => [
    `The sheet "${sheet}" is protected.`,
    "Lift the protection (Review, Unprotect Sheet) and try again.",
  ],
  "workbook-protected": () => [
    "The workbook's structure is protected, so no sheet can be added.",
    "Lift the protection (Review, Protect Workbook) and try again.",
  ],
  "not-a-result-sheet": ({ sheet }) => [`Footing did not write "${sheet}".`, "Show a live result sheet first."],
  "values-missing": (missing) => [
    `${theCells(missing)} ${missing.count === 1 ? "shows" : "show"} ${valuesOf(missing)} in place of a value.`,
    "Wait until all values are there, or recalculate the sheet's functions, then try again.",
  ],
  "unknown-place": ({ place, nearest }) => [
    `There is no sheet, table, name or range "${place}" in the workbook.`,
    suggestion(nearest, "Choose one from the list, or type an address such as Sheet1!A1:D97."),
  ],
  "bad-address": ({ address }) => [`"${address}" is not the address of a range.`, "Write it like Sheet1!A1:D97."],
  "too-much-for-excel": ({ cells, limit }) => [
    `${capitalised(counted(cells, "cell"))} are more than Excel can pass on at once (${limit.toLocaleString("en-US")}).`,
    "Choose fewer columns or rows.",
  ],
  "excel-too-old": ({ missing }) => [
    `This version of Excel lacks what Footing needs here (${missing}).`,
    "Update Excel, or open the workbook in Excel on the web.",
  ],
  "excel-busy": () => ["Excel is busy and did not answer.", "Wait until it has finished calculating, then try again."],
  "excel-refused": ({ detail }) => [
    `Excel refused: ${detail}.`,
    "Try again; if it stays so, save the workbook and open it anew.",
  ],
  "time-limit": ({ seconds }) => [
    `The calculation was stopped after ${counted(seconds, "second")}.`,
    "Use fewer rows or columns, or work in the pane, which has no such limit.",
  ],
  ...fileSentences,
  ...reviewSentences,
  ...storedSentences,
  cancelled: () => ["The work was cancelled; nothing was written.", "Start again whenever you like."],
};
