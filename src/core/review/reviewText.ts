import { alignedLines } from "../answer/alignedLines.ts";
import { capitalised } from "../answer/wording.ts";
import type { BookReview, ClaimReview, Consequence } from "./claimReview.ts";
import type { Finding } from "./finding.ts";
import { comparedRows } from "./reviewTables.ts";
import { explanationsOf, gravestFirst, originInWords, reviewLimits, summaryOf, titleOf } from "./reviewWords.ts";

/** A line of a review as plain text; those of tables stand in columns and are not to be wrapped. */
export interface TextLine {
  readonly kind: "sentence" | "table";
  readonly words: string;
}

/** A review as plain text, for a terminal or a letter: each regression, then the sheets, then what could not be read. */
export function reviewText({ claims, unread, craft }: BookReview): readonly TextLine[] {
  const whole = claims.length > 1 ? [sentence(summaryOf(claims)), blank] : [];
  return [
    ...whole,
    ...claims.flatMap(claimLines),
    ...part("Sheet craft", gravestFirst(craft).flatMap(findingLines)),
    ...part(
      "Could not be read",
      unread.map(({ cell, why }) => sentence(`${cell}: ${why}`)),
    ),
    sentence(reviewLimits),
  ];
}

const sentence = (words: string): TextLine => ({ kind: "sentence", words });
const blank: TextLine = { kind: "table", words: "" };

/** Lines under their heading, with a blank one after; nothing where there are none. */
const part = (heading: string, lines: readonly TextLine[]): TextLine[] =>
  lines.length === 0 ? [] : [sentence(`${heading}:`), ...lines, blank];

/** Columns set in from the edge. */
const alignedTable = (rows: readonly (readonly string[])[]): TextLine[] =>
  alignedLines(rows).map((words) => ({ kind: "table", words: `  ${words}` }));

function claimLines(review: ClaimReview): TextLine[] {
  const { claim, verdict, tried, errors, consequences, findings } = review;
  return [
    sentence(`${claim.place}: ${titleOf(claim)} (${originInWords(claim)})`),
    blank,
    sentence(verdict),
    blank,
    ...part("Taken for granted", (claim.assumed ?? []).map(sentence)),
    ...part("Findings", gravestFirst(findings).flatMap(findingLines)),
    ...part("Reported and recomputed", alignedTable(comparedTexts(review))),
    ...part("What explains the difference", explanationsOf(review).map(sentence)),
    ...part("Tried, and does not explain the difference", tried.map(sentence)),
    ...part("Which standard errors", errors === null ? [] : [sentence(errors.sentence)]),
    ...part("What follows for each driver", consequences.map(consequenceLine)),
  ];
}

function findingLines({ rank, what, toDo, reported, recomputed, cells }: Finding): TextLine[] {
  const figures =
    reported === null && recomputed === null ? "" : ` Reported ${reported ?? "-"}, recomputed ${recomputed ?? "-"}.`;
  const where = cells.length === 0 ? "" : ` Cells: ${cells.join(", ")}.`;
  return [sentence(`${capitalised(rank)}: ${what} ${toDo}${figures}${where}`)];
}

/** Headings and a row a number; the last column stands only where there is an explanation. */
export function comparedTexts(review: ClaimReview): readonly (readonly string[])[] {
  const rows = comparedRows(review);
  const isExplained = rows.some(({ explained }) => explained !== null);
  const headings = ["number", "cell", "reported", "recomputed", "", ...(isExplained ? ["as explained"] : [])];
  if (rows.length === 0) return [];
  return [
    headings,
    ...rows.map(({ name, cell, reported, recomputed, explained, agrees }) => [
      ...[name, cell, reported, recomputed, agrees ? "agrees" : "differs"],
      ...(isExplained ? [explained ?? ""] : []),
    ]),
  ];
}

const consequenceLine = ({ driver, asReported, asItShouldBe, changes }: Consequence): TextLine =>
  sentence(
    `${driver}: as reported, ${asReported}; as it should be, ${asItShouldBe}.${changes ? " This changes the conclusion." : ""}`,
  );
