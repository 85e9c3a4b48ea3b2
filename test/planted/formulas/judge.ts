import type { BookReview } from "../../../src/core/review/claimReview.ts";
import type { FormulaBook } from "./books.ts";
import type { Said } from "./faults.ts";

/** Whether a review says of a workbook what was planted there; else what it says. */
export function judgeFormulas({ said }: FormulaBook, review: BookReview): string | null {
  if (said.length === 0) return soundly(review);
  const missed = said.filter((one) => !isSaid(one, review));
  const told = [...codesOf(review), ...review.unread.map(({ why }) => why)].join("; ");
  return missed.length === 0 ? null : `not said: ${missed.map(inWords).join(", ")}, but ${told || "nothing"}`;
}

const isSaid = (said: Said, review: BookReview): boolean =>
  "unread" in said ? review.unread.some(({ why }) => said.unread.test(why)) : codesOf(review).includes(said.finding);

const inWords = (said: Said): string => ("unread" in said ? said.unread.source : said.finding);

const codesOf = ({ claims, craft }: BookReview): string[] =>
  [...claims.flatMap(({ findings }) => findings), ...craft].map(({ code }) => code);

/** One report, all of its numbers out of the cells, and nothing that would change a conclusion. */
function soundly({ claims, craft, unread }: BookReview): string | null {
  if (claims.length !== 1 || unread.length > 0) {
    return `${claims.length} reports found, ${unread.map(({ why }) => why).join(" ")}`;
  }
  const { compared, findings, verdict } = claims[0]!;
  const wrong = compared.filter(({ agrees }) => !agrees);
  if (wrong.length > 0) return `${wrong.length} numbers are said to differ`;
  const told = [...findings, ...craft].filter(({ rank }) => rank !== "worth knowing");
  return told.length === 0 ? null : `${told.map(({ code }) => code).join(", ")}: ${verdict}`;
}
