import { numberInWords } from "../../answer/wording.ts";
import type { Hypothesis } from "./change.ts";
import type { Searched } from "./search.ts";

/** What was tried, in words, where nothing explains the report. */
export function triedInWords({ tried, looked, untelling, inPairs }: Searched): readonly string[] {
  const sorts = Object.entries(sortsInWords).flatMap(([words, hypotheses]) =>
    hypotheses.some((one) => tried.has(one)) ? [words] : [],
  );
  const count = numberInWords(looked, 0);
  const whole = inPairs ? `All of these alone and in pairs: ${count} changes in all.` : `${count} changes in all.`;
  return [...sorts, whole, ...(untelling === 0 ? [] : [untellingInWords(untelling)])];
}

const untellingInWords = (untelling: number): string =>
  `${numberInWords(untelling, 0)} of them ${untelling === 1 ? "fits" : "fit"} the numbers shown beside the standard errors, but with so few digits a change that was never made would fit as well: none of them is an explanation.`;

const sortsInWords: Readonly<Record<string, readonly Hypothesis[]>> = {
  "Rows left off at either end.": ["rows-left-off-at-end", "rows-left-off-at-start"],
  "Rows beyond the claimed ones counted in, a total among them.": [
    "extra-rows-at-end",
    "extra-rows-at-start",
    "total-row-counted",
  ],
  "The heading or empty rows counted in as zeros.": ["heading-row-counted", "empty-rows-counted"],
  "Hidden rows left out.": ["hidden-rows-left-out"],
  "Empty cells counted as zero.": ["empty-cells-as-zero"],
  "Words or numbers kept as text counted as zero, or read.": [
    "text-as-zero",
    "text-numbers-read",
    "text-numbers-as-zero",
  ],
  "The constant left out or put in.": ["no-constant", "with-constant"],
  "Coefficients listed in another order.": ["reverse-order", "drivers-exchanged"],
  "A column a tenth, a hundredth or a thousandth, or ten, a hundred or a thousand times as large.": ["factor"],
  "The outcome and a driver changed, a driver left out, another column in its place.": [
    "swapped",
    "driver-left-out",
    "another-driver",
    "another-column",
  ],
  "Columns set against one another shifted.": ["shifted"],
  "Logarithms, natural and to base 10.": ["logarithm", "base-10-logarithm", "no-logarithm"],
  "Changes from row to row in place of values.": ["changes"],
  "A column sorted apart from the others.": ["sorted-alone"],
  "Any one row, or any block of rows, left out.": ["row-left-out", "rows-left-out"],
  "A block of rows counted once or twice.": ["block-repeated", "repeat-left-out"],
};
