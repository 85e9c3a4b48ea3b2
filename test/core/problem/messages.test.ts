import { describe, expect, it } from "vitest";
import { messageOf } from "../../../src/core/problem/messages.ts";
import type { Problem } from "../../../src/core/problem/problem.ts";

const one = { column: "Price", cells: ["Months!C14"], values: ["n.k."], count: 1 };
const two = { column: "Price", cells: ["Months!C14", "Months!C15"], values: ["n.k.", "12 pcs"], count: 2 };

type Sentences = { readonly [Code in Problem["code"]]: readonly [Extract<Problem, { code: Code }>, string] };

/** Every fault once: a code without a sentence here does not compile. */
const sentences: Sentences = {
  "no-data": [
    { code: "no-data", where: "Months!A1:D9" },
    "There are no data in Months!A1:D9. Choose the cells that hold your columns, headings included.",
  ],
  "no-headings": [
    { code: "no-headings", where: "Months!A1:D9" },
    "No row of headings was found in Months!A1:D9. Write a name above each column, or name the columns by their ranges.",
  ],
  "empty-column": [
    { code: "empty-column", column: "Price", where: "Months!C2:C97" },
    'Column "Price" (Months!C2:C97) is empty. Fill it or choose another column.',
  ],
  "no-numbers": [
    { code: "no-numbers", column: "Region", where: "Months!D2:D97" },
    'Column "Region" (Months!D2:D97) holds no numbers. Choose another column, or use this one as a category.',
  ],
  "text-in-number-column": [
    { code: "text-in-number-column", ...one },
    'Cell Months!C14 in column "Price" holds "n.k.", which is not a number. Correct the cell, empty it to leave the row out, or read a driver as categories.',
  ],
  "text-numbers": [
    { code: "text-numbers", ...two, values: ["1,5", "2,5"] },
    'Cells Months!C14 and Months!C15 in column "Price" hold "1,5", "2,5": numbers kept as text. Allow text to be read as numbers for this column (the setting text numbers), or turn the text into numbers in the sheet.',
  ],
  "dates-as-text": [
    { code: "dates-as-text", ...one, values: ["3/4/2024"] },
    'Cell Months!C14 in column "Price" holds "3/4/2024": a date kept as text. Turn the text into dates in the sheet, written year-month-day if need be.',
  ],
  "dates-in-number-column": [
    { code: "dates-in-number-column", ...one, values: ["2024-05-03"] },
    'Cell Months!C14 in column "Price" holds a date, not a number. Give the cell a number format if numbers are meant, or use the column as dates.',
  ],
  "error-cells": [
    { code: "error-cells", ...two, values: ["#DIV/0!", "#REF!"] },
    'Cells Months!C14 and Months!C15 in column "Price" show errors: "#DIV/0!", "#REF!". Mend the formulas there, or empty the cells to leave the rows out.',
  ],
  "unreadable-time": [
    { code: "unreadable-time", ...one, values: ["Total"] },
    'Cell Months!C14 in time column "Price" holds "Total", which cannot be read as a time. Write dates, or one kind of period throughout, such as 2024, 2024Q1, 2024-01 or Jan 2024.',
  ],
  "missing-time": [
    { code: "missing-time", ...one, values: [""] },
    'Cell Months!C14 in time column "Price" is empty, though the row has data. Fill in the time, or empty the whole row.',
  ],
  "repeated-time": [
    { code: "repeated-time", ...two, values: ["2024Q1", "2024Q1"] },
    'Time column "Price" holds "2024Q1" more than once, in Months!C14 and Months!C15. Keep one row for each time; where several units share a time, say that rows are in groups and name the group column.',
  ],
  "unequal-heights": [
    { code: "unequal-heights", first: "the outcome", rows: 96, second: "the drivers", otherRows: 1 },
    "The ranges are not equally tall: 96 rows in the outcome, 1 row in the drivers. Choose ranges that begin and end in the same rows, all with their headings or all without.",
  ],
  "too-many-columns": [
    { code: "too-many-columns", where: "the outcome", columns: 3, most: 1 },
    "The outcome has 3 columns, but takes one. Choose the one column that is meant.",
  ],
  "ranges-apart": [
    { code: "ranges-apart", first: "B2:B97", second: "C3:C98" },
    "B2:B97 and C3:C98 do not stand in the same rows of one sheet. Choose ranges that begin and end in the same rows.",
  ],
  "overlapping-ranges": [
    { code: "overlapping-ranges", first: "the outcome (A2:A97)", second: "the drivers (A2:C97)" },
    "The outcome (A2:A97) overlaps the drivers (A2:C97). Choose ranges that have no cell in common.",
  ],
  "no-outcome": [{ code: "no-outcome" }, "No outcome has been chosen. Choose the column that is to be explained."],
  "no-drivers": [
    { code: "no-drivers" },
    "No drivers have been chosen. Choose at least one column that may explain the outcome.",
  ],
  "unknown-heading": [
    { code: "unknown-heading", heading: "Pirce", nearest: "Price", where: "Months" },
    'There is no column "Pirce" in Months. Did you mean "Price"?',
  ],
  "unknown-coefficient": [
    { code: "unknown-coefficient", name: "Pirce", nearest: "Price" },
    'There is no coefficient "Pirce" in this regression. Did you mean "Price"?',
  ],
  "ambiguous-heading": [
    { code: "ambiguous-heading", headings: ["Price", "Repairs"], sheets: ["Months", "Copy"] },
    "The sheets Months and Copy all have the headings Price, Repairs. Say which sheet is meant.",
  ],
  "repeated-heading": [
    { code: "repeated-heading", heading: "Price", cells: ["Months!C1", "Months!F1"] },
    'The heading "Price" stands above more than one column, in Months!C1 and Months!F1. Give each column a name of its own.',
  ],
  "column-used-twice": [
    { code: "column-used-twice", column: "Price", first: "the outcome", second: "a driver" },
    'Column "Price" is used as the outcome and again as a driver. Give it one of the two roles.',
  ],
  "no-time-column": [
    { code: "no-time-column" },
    "Rows are said to run through time, but no time column has been chosen. Choose the column that holds the dates or periods, or say that rows are separate cases.",
  ],
  "no-group-column": [
    { code: "no-group-column" },
    "Rows are said to be in groups, but no group column has been chosen. Choose the column that names the group of each row, or say that rows are separate cases.",
  ],
  "one-group": [
    { code: "one-group", column: "Shop", value: "North" },
    'Every row used belongs to the same group: column "Shop" holds "North" throughout. Choose a column with more than one group, or say that rows are separate cases.',
  ],
  "one-category": [
    { code: "one-category", column: "Region", value: "South" },
    'Every row used falls into the same category: "Region" is "South" throughout. Leave this driver out, or bring in rows of another category.',
  ],
  "unknown-base": [
    { code: "unknown-base", column: "Region", base: "Nrth", nearest: "North" },
    'Column "Region" has no category "Nrth" among the rows used to compare the others with. Did you mean "North"?',
  ],
  "logarithm-of-nonpositive": [
    { code: "logarithm-of-nonpositive", column: "Price", cells: ["Months!C14"], count: 1 },
    'A logarithm needs numbers above 0, but cell Months!C14 in column "Price" is 0 or below. Correct the cell, empty the cell to leave the row out, or use the column without a logarithm.',
  ],
  "growth-from-nonpositive": [
    { code: "growth-from-nonpositive", column: "Price", cells: ["Months!C14"], count: 1 },
    'A growth rate starts from a number above 0, but cell Months!C14 in column "Price" is 0 or below. Correct the cell, or use the change of the column instead.',
  ],
  "too-many-categories": [
    { code: "too-many-categories", column: "Customer", categories: 4000, rows: 5000 },
    'Category column "Customer" holds 4,000 different values in 5,000 rows, too many to set one against the others. Put them into fewer categories, or use the column to group rows.',
  ],
  "transform-needs-time": [
    { code: "transform-needs-time", column: "Price", transform: "growth rate" },
    'The growth rate of "Price" looks back in time, but the rows have no order in time. Say that rows run through time and choose the time column, or use the column as it is.',
  ],
  "calendar-needs-dates": [
    { code: "calendar-needs-dates", driver: "month indicators", column: "Week" },
    'The driver "month indicators" needs dates, quarters or months, but time column "Week" does not hold them. Choose a time column with dates, or leave this driver out.',
  ],
  "too-few-rows": [
    { code: "too-few-rows", rows: 3, needed: 5, leftOut: 2 },
    "3 rows can be used (2 rows left out), but this regression needs at least 5. Fill in missing cells, bring in more rows or use fewer drivers.",
  ],
  "constant-column": [
    { code: "constant-column", column: "Price" },
    '"Price" is the same in every row used, so it cannot be told apart from the constant. Leave it out, or fit without a constant.',
  ],
  "constant-outcome": [
    { code: "constant-outcome", column: "Repairs" },
    'The outcome "Repairs" is the same in every row used, so there is nothing to explain. Choose another outcome or other rows.',
  ],
  "dependent-columns": [
    { code: "dependent-columns", column: "Q4", madeOf: ["constant", "Q1", "Q2"] },
    '"Q4" says nothing new: it is made up of "constant", "Q1", "Q2". Leave out one of them.',
  ],
  "perfect-fit": [
    { code: "perfect-fit", column: "Repairs" },
    'The drivers reproduce "Repairs" exactly, so there are no errors to judge by. See whether the outcome is computed from a driver, and leave that driver out.',
  ],
  "numbers-too-large": [
    { code: "numbers-too-large", column: "Price", cell: "Months!C14", value: 1e200 },
    'Cell Months!C14 in column "Price" gives 1e+200, which is too large to calculate with. Correct the cell, or give the column in larger units.',
  ],
  "zero-standard-error": [
    { code: "zero-standard-error", errors: "white", term: "Region: North" },
    'The white standard error of "Region: North" comes out as zero: the rows that tell about it are fitted exactly, whatever they hold. Leave the driver out, or join its category with another.',
  ],
  "errors-need-order": [
    { code: "errors-need-order", errors: "newey-west", rows: "cases" },
    "Newey-West standard errors need rows that run through time, but here rows are separate cases. Say otherwise what the rows are to each other, or choose another kind of standard errors.",
  ],
  "too-many-lags": [
    { code: "too-many-lags", lags: 40, rows: 30 },
    "40 lags cannot be used with 30 rows. Choose fewer lags than rows.",
  ],
  "unknown-setting": [
    { code: "unknown-setting", setting: "lgas", nearest: "lags" },
    'There is no setting "lgas". Did you mean "lags"?',
  ],
  "unknown-value": [
    { code: "unknown-value", setting: "rows", value: "tine", allowed: ["cases", "time"], nearest: "time" },
    '"tine" is not a value of the setting "rows". Did you mean "time"? Possible: cases, time.',
  ],
  "missing-option": [
    { code: "missing-option", option: "--outcome" },
    "The option --outcome is missing. Add it and its value.",
  ],
  "unreadable-file": [
    { code: "unreadable-file", file: "book.xls", because: "it is no workbook" },
    "The file book.xls cannot be read: it is no workbook. Check its name and that it is an .xlsx or .csv file.",
  ],
  "unwritable-file": [
    { code: "unwritable-file", file: "out.xlsx", because: "it is open elsewhere" },
    "The file out.xlsx cannot be written: it is open elsewhere. Close it in other programs or choose another name.",
  ],
  "no-formulas": [
    { code: "no-formulas", file: "book.csv" },
    "The file book.csv holds values alone, so there are no formulas in it to review. Give the workbook (.xlsx) that it was made from, or point at the typed results with --reported, --outcome and --drivers.",
  ],
  "no-report": [
    { code: "no-report", where: "Handover!A1:A2" },
    "No reported regression can be read from Handover!A1:A2. Choose the whole block with its headings (coefficient, standard error, t ratio, p-value) and the drivers' names beside the figures, or a cell with a formula such as LINEST or SLOPE.",
  ],
  "nothing-to-review": [
    { code: "nothing-to-review", where: "book.xlsx", unread: [] },
    "No regression was found in book.xlsx: no formula such as LINEST, SLOPE or RSQ, and no block of figures under headings such as coefficient and standard error. If results are typed in, point at their cells and say which columns are the outcome and the drivers.",
  ],
  "regression-not-in-columns": [
    { code: "regression-not-in-columns", title: "Repairs explained by Price" },
    "The data of the regression (Repairs explained by Price) lie in rows or on several sheets, and answers are made from columns of one sheet. Bring outcome and drivers into columns side by side, then choose them in the section Data.",
  ],
  "cell-being-edited": [
    { code: "cell-being-edited" },
    "A cell is being edited. Press Enter or Escape in the sheet, then try again.",
  ],
  "read-only": [
    { code: "read-only" },
    "Excel does not let this workbook be changed: it is open for reading only, or that part of it is protected. Ask for the right to edit it, lift the protection, or work in a copy.",
  ],
  "stored-by-newer": [
    { code: "stored-by-newer", version: 3, own: 1 },
    "This workbook holds set-ups that a newer Footing stored (format 3; this one reads format 1). They were left as they are. Update Footing to open them.",
  ],
  "stored-unreadable": [
    { code: "stored-unreadable", part: "{A1}" },
    "What this workbook keeps for Footing in the part {A1} cannot be read. It was left as it is. Store the set-ups again; they go into a part of their own.",
  ],
  "setup-gone": [
    { code: "setup-gone", name: "By month" },
    'There is no set-up "By month" in the workbook any more. Choose another, or store this one again.',
  ],
  "setup-unnamed": [{ code: "setup-unnamed" }, "The set-up has no name. Type a name for it."],
  "setup-name-taken": [
    { code: "setup-name-taken", name: "By month" },
    'There is already a set-up "By month" in the workbook. Type another name, or remove that one first.',
  ],
  "setup-data-gone": [
    {
      code: "setup-data-gone",
      setup: 'the set-up "By month"',
      place: "the table Sales",
      last: "Months!A1:D97",
    },
    'The data of the set-up "By month" are no longer found: the table Sales is gone from the workbook (its cells stood in Months!A1:D97 when it was stored). Choose the data again; what was chosen for columns of the same name is taken over.',
  ],
  "cells-of-others": [
    { code: "cells-of-others", sheet: "Repairs answer", cells: ["'Repairs answer'!C4"], count: 1 },
    "1 cell of the sheet \"Repairs answer\" that the result needs holds what Footing did not write: 'Repairs answer'!C4. Move or empty what stands there, or write the result to a new sheet. Nothing was changed.",
  ],
  "sheet-not-known": [
    { code: "sheet-not-known", sheet: "Repairs answer" },
    'Footing cannot tell its own cells from yours on the sheet "Repairs answer", so it does not write over them. Write the result to a new sheet.',
  ],
  "too-few-setups": [
    { code: "too-few-setups", setups: 1 },
    "A comparison needs two set-ups or more; one is chosen. Choose those to compare.",
  ],
  "several-areas-selected": [
    { code: "several-areas-selected", areas: 2 },
    "2 separate areas are selected. Select one block of cells; columns that are not needed can be left unused.",
  ],
  "chart-selected": [
    { code: "chart-selected" },
    "A chart or picture is selected, not cells. Click a cell of your data, then try again.",
  ],
  "other-workbook": [
    { code: "other-workbook" },
    "Another workbook is in front. Go back to the workbook of this pane, then try again.",
  ],
  "sheet-protected": [
    { code: "sheet-protected", sheet: "Months" },
    'The sheet "Months" is protected. Lift the protection (Review, Unprotect Sheet) and try again.',
  ],
  "workbook-protected": [
    { code: "workbook-protected" },
    "The workbook's structure is protected, so no sheet can be added. Lift the protection (Review, Protect Workbook) and try again.",
  ],
  "not-a-result-sheet": [
    { code: "not-a-result-sheet", sheet: "Months" },
    'Footing did not write "Months". Show a live result sheet first.',
  ],
  "values-missing": [
    { code: "values-missing", cells: ["Answer!B9", "Answer!X4"], values: ["#BUSY!", "#BUSY!"], count: 2 },
    'Cells Answer!B9 and Answer!X4 show "#BUSY!" in place of a value. Wait until all values are there, or recalculate the sheet\'s functions, then try again.',
  ],
  "unknown-place": [
    { code: "unknown-place", place: "Mnths", nearest: "Months" },
    'There is no sheet, table, name or range "Mnths" in the workbook. Did you mean "Months"?',
  ],
  "bad-address": [
    { code: "bad-address", address: "A1:" },
    '"A1:" is not the address of a range. Write it like Sheet1!A1:D97.',
  ],
  "too-much-for-excel": [
    { code: "too-much-for-excel", cells: 6000000, limit: 5000000 },
    "6,000,000 cells are more than Excel can pass on at once (5,000,000). Choose fewer columns or rows.",
  ],
  "excel-too-old": [
    { code: "excel-too-old", missing: "ExcelApi 1.9" },
    "This version of Excel lacks what Footing needs here (ExcelApi 1.9). Update Excel, or open the workbook in Excel on the web.",
  ],
  "excel-busy": [
    { code: "excel-busy" },
    "Excel is busy and did not answer. Wait until it has finished calculating, then try again.",
  ],
  "excel-refused": [
    { code: "excel-refused", detail: "the range is gone" },
    "Excel refused: the range is gone. Try again; if it stays so, save the workbook and open it anew.",
  ],
  "time-limit": [
    { code: "time-limit", seconds: 60 },
    "The calculation was stopped after 60 seconds. Use fewer rows or columns, or work in the pane, which has no such limit.",
  ],
  cancelled: [{ code: "cancelled" }, "The work was cancelled; nothing was written. Start again whenever you like."],
};

describe("messageOf", () => {
  it.each(Object.entries(sentences))("%s: what and where, then what to do", (_, [problem, sentence]) => {
    expect(messageOf(problem)).toBe(sentence);
  });

  const cells = Array.from({ length: 10 }, (_, row) => `Months!C${row + 2}`);

  it("lists ten cells at most and counts the rest", () => {
    const many = { column: "Price", cells, values: cells.map(() => "n.k."), count: 1234 };
    expect(messageOf({ code: "text-in-number-column", ...many })).toBe(
      `Cells ${cells.join(", ")} and 1,224 more in column "Price" hold "n.k." and others, which are not numbers. Correct the cells, empty them to leave the rows out, or read a driver as categories.`,
    );
  });

  it("names places in an argument without calling them cells", () => {
    const place = { ...one, cells: ["row 13 of drivers, column 2"] };
    expect(messageOf({ code: "text-in-number-column", ...place })).toMatch(
      /^Row 13 of drivers, column 2 in column "Price" holds "n.k."/,
    );
    const places = { ...two, cells: ["row 13 of drivers, column 2", "row 14 of drivers, column 2"] };
    expect(messageOf({ code: "text-in-number-column", ...places })).toMatch(
      /^Row 13 of drivers, column 2 and row 14 of drivers, column 2 in column "Price" hold/,
    );
  });

  it("sets places that hold commas apart by semicolons", () => {
    const names = [13, 14, 15].map((row) => `row ${row} of drivers, column 2`);
    expect(messageOf({ code: "missing-time", column: "key", cells: names, values: ["", "", ""], count: 3 })).toContain(
      "Row 13 of drivers, column 2; row 14 of drivers, column 2 and row 15 of drivers, column 2",
    );
  });

  it("shortens long values and says each once", () => {
    const long = { ...two, values: ["x".repeat(90), "x".repeat(90)] };
    expect(messageOf({ code: "text-in-number-column", ...long })).toContain(`hold "${"x".repeat(39)}…", which`);
  });

  it("offers what to do where no name is near", () => {
    expect(messageOf({ code: "unknown-heading", heading: "Wages", nearest: null, where: "Months" })).toBe(
      'There is no column "Wages" in Months. Use one of the headings as it stands in the sheet.',
    );
  });

  it("says what Newey-West and grouped errors lack", () => {
    expect(messageOf({ code: "errors-need-order", errors: "grouped", rows: "time" })).toMatch(
      /^Grouped standard errors need rows in groups, but here rows are through time\./,
    );
    expect(messageOf({ code: "errors-need-order", errors: "newey-west", rows: "groups" })).toContain(
      "but here rows are in groups, and no column gives the time within them.",
    );
    expect(messageOf({ code: "calendar-needs-dates", driver: "trend", column: null })).toMatch(/but there is none\./);
    expect(messageOf({ code: "too-few-rows", rows: 1, needed: 3, leftOut: 0 })).toBe(
      "1 row can be used, but this regression needs at least 3. Bring in more rows or use fewer drivers.",
    );
  });
});
