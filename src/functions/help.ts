import { cellSigns } from "../app/cellSigns.ts";
import { settingTable } from "../core/answer/settingTable.ts";
import { listedFunctions } from "./listed.ts";
import { functionsMetadata } from "./metadata.ts";

/** Signs with a sentence of their own beside them. */
const ownSigns: typeof cellSigns = [
  ["#VALUE!", "The cells or the settings are to be mended; the error's own sentence says which, and what to do."],
  ["#N/A", "There is no such figure, or not now; the error's own sentence says why."],
];

/** What holds for all functions, each under a heading. */
const notes: readonly (readonly [heading: string, words: string])[] = [
  [
    "What the arguments take",
    "Ranges of equal height: one column for the outcome, the drivers side by side. Headings in the first row become names. Whole columns such as A:A may be given; rows stop at the last one in use. Columns of a table, such as Sales[[#Headers],[#Data],[Price]:[Rain]], follow the table as it grows.",
  ],
  [
    "Blank cells",
    "A blank cell is missing, never zero, and its row is left out. Older versions of Excel hand blanks to functions as zeros; as long as no blank has arrived as one, the functions look zeros up in the sheet. They cannot where an argument is calculated in the formula itself, such as B2:C41*1, or where Excel does not answer: a blank counts as zero there. The pane reads blanks exactly.",
  ],
  [
    "Results",
    "A result with several cells spills below and to the right of the formula. RESIDUALS and FITTED fill one column beside the data, up to 80,000 rows, beyond which they say so. Functions cannot be used inside conditional formats.",
  ],
  [
    "Calculation",
    "All functions over the same cells with the same settings share one fit, and calculate again when one of those cells changes. A call ends after two minutes at the latest, with the reason in its cell.",
  ],
];

/** All that the page behind the functions' help links says. */
export const functionsHelp = () => ({
  metadata: functionsMetadata(),
  functions: listedFunctions,
  settings: settingTable.map(({ name, values, standard, meaning }) => ({ name, values, standard, meaning })),
  signs: [...cellSigns, ...ownSigns],
  notes,
});
