import type { FileProblem } from "./problem.ts";

type Sentence = readonly [whatAndWhere: string, whatToDo: string];

/** The sentences about files, which the terminal alone meets. */
export const fileSentences: {
  readonly [Code in FileProblem["code"]]: (problem: Extract<FileProblem, { code: Code }>) => Sentence;
} = {
  "unreadable-file": ({ file, because }) => [
    `The file ${file} cannot be read: ${because}.`,
    "Check its name and that it is an .xlsx or .csv file.",
  ],
  "unwritable-file": ({ file, because }) => [
    `The file ${file} cannot be written: ${because}.`,
    "Close it in other programs or choose another name.",
  ],
  "no-formulas": ({ file }) => [
    `The file ${file} holds values alone, so there are no formulas in it to review.`,
    "Give the workbook (.xlsx) that it was made from, or point at the typed results with --reported, --outcome and --drivers.",
  ],
};
