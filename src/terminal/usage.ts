import { settingTable } from "../core/answer/settingTable.ts";
import { reviewLimits } from "../core/review/reviewWords.ts";

const settingLine = ({ name, values, standard, meaning }: (typeof settingTable)[number]): string =>
  `  --${name.replaceAll(" ", "-")}\n      ${meaning}\n      Takes: ${values}. Without it: ${standard}.`;

/** What `footing --help` prints. */
export const usage = `footing answer BOOK --outcome H --drivers H,H,... [options]

Reads a workbook (.xlsx or .csv), fits the outcome on the drivers, tests which standard errors the evidence
calls for, and prints the verdict. H is a heading, or a range such as B3:B99.

  --sheet S            the sheet to read; without it the sheet that has the headings
  --outcome H          the left-hand variable
  --drivers H,H,...    the right-hand variables; repeat the option for headings with commas
  --order H            the column that puts rows in time
  --groups H           the column that says which group a row belongs to
  --no-constant        fit without a constant
  --predict RANGE      new rows to predict, headings included, such as Plans!A1:C5, or the sheet that has them
  --save OUT.xlsx      write the result sheet into a copy of the workbook
  --live               with --save: figures as worksheet functions instead of values
  --for-libreoffice    with --live: in the form that LibreOffice needs to show the figures; else in that of Excel
  --json               print everything in full precision as JSON

Settings, the same as in the worksheet functions:
${settingTable
  .filter(({ name }) => name !== "constant")
  .map(settingLine)
  .join("\n")}

footing review BOOK [options]

Finds every regression that a workbook reports, in formulas or typed in, fits it again to the cells it names,
explains what differs, says which standard errors were taken and whether the evidence allows them, and what the
conclusions should have been.
${reviewLimits.replace(". ", ".\n")}

  --sheet S            the sheet whose reports are meant; without it all sheets
  --reported RANGE     the cells that report one regression, headings included, such as Handover!A4:D10
  --outcome H          with --reported: the left-hand variable, where it cannot be told
  --drivers H,H,...    with --reported: the right-hand variables, in the order of the report
  --save OUT.xlsx      write the review sheet into a copy of the workbook
  --json               print everything in full precision as JSON

Exit status: 0 done, 3 done and a finding changes a conclusion (review), 2 a fault in the input (the sentence
says what and where; a book without any regression is one), 1 a fault of the program.
A statistical check, not financial, legal or audit advice; have a qualified person look before money or a filing depends on it.
`;
