import type { ReviewProblem } from "./problem.ts";
import { listed } from "./spots.ts";

type Sentence = readonly [whatAndWhere: string, whatToDo: string];

/** The sentences about reviews of regressions that someone else built. */
export const reviewSentences: {
  readonly [Code in ReviewProblem["code"]]: (problem: Extract<ReviewProblem, { code: Code }>) => Sentence;
} = {
  "no-report": ({ where }) => [
    `No reported regression can be read from ${where}.`,
    "Choose the whole block with its headings (coefficient, standard error, t ratio, p-value) and the drivers' names beside the figures, or a cell with a formula such as LINEST or SLOPE.",
  ],
  "nothing-to-review": ({ where, unread }) => [
    unread.length === 0
      ? `No regression was found in ${where}: no formula such as LINEST, SLOPE or RSQ, and no block of figures under headings such as coefficient and standard error.`
      : `No regression in ${where} could be read: ${listed(unread, unread.length)}.`,
    "If results are typed in, point at their cells and say which columns are the outcome and the drivers.",
  ],
  "regression-not-in-columns": ({ title }) => [
    `The data of the regression (${title}) lie in rows or on several sheets, and answers are made from columns of one sheet.`,
    "Bring outcome and drivers into columns side by side, then choose them in the section Data.",
  ],
};
