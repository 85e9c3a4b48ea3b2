import { listInWords } from "../core/answer/wording.ts";
import type { BookReview } from "../core/review/claimReview.ts";
import { summaryOf, titleOf } from "../core/review/reviewWords.ts";
import { lineHeight } from "./columns.ts";
import { pageBreaksOf } from "./pageBreaks.ts";
import { cautionLine } from "./plainWordsSection.ts";
import type { PlanFormat, SheetPlan } from "./plan.ts";
import { claimSections } from "./review/claimSections.ts";
import { findingsSection } from "./review/findingsSection.ts";
import { type ReviewFacts, howMadeSection, signOffSection, unreadSection } from "./review/madeSections.ts";
import { acrossReview, heightOver, reviewColumns, reviewWidths } from "./review/reviewPage.ts";
import { type Section, rectangle, section, stack, text } from "./section.ts";

/**
 * Lays a review out on a sheet that someone who was not there can read, follow to the cells, and sign.
 * @param review - what is said of one or several regressions, and of the sheets they rest on.
 * @param facts - date, version, the fingerprint of each regression's data.
 */
export function planReview(review: BookReview, facts: ReviewFacts): SheetPlan {
  const parts = partsOf(review, facts);
  const { rows, formats, links } = stack(parts);
  return {
    name: sheetName(review),
    holds: "review",
    blocks: [{ row: 0, column: 0, cells: rectangle(rows, reviewColumns) }],
    formats: [evenRows(rows.length), ...formats],
    links,
    columnWidths: reviewWidths,
    frozenRows: 1,
    charts: [],
    // One blank row follows each part.
    pageBreaks: pageBreaksOf(
      parts.map((part) => ({
        rows: part.rows.length + 1,
        parted: part.rows.length <= mostWhole ? "seldom" : "anywhere",
      })),
      formats,
      reviewWidths,
    ),
    printArea: { row: 0, column: 0, rows: rows.length, columns: reviewColumns },
  };
}

/** Longer parts than these are tables and lists, which may be parted. */
const mostWhole = 20;

/** Every row has its height, also those that nothing else says it of. */
const evenRows = (rows: number): PlanFormat => ({
  area: { row: 0, column: 0, rows, columns: reviewColumns },
  rowHeight: lineHeight,
});

function partsOf(review: BookReview, facts: ReviewFacts): Section[] {
  const { claims, craft, unread } = review;
  return [
    titleSection(review, facts),
    ...claims.flatMap(claimSections),
    findingsSection("Sheet craft", craft, "Nothing was found against the sheets."),
    ...(unread.length === 0 ? [] : [unreadSection(unread)]),
    howMadeSection(
      claims.map(({ claim }) => claim),
      facts,
    ),
    signOffSection(),
  ];
}

/** In points: the title is larger than a standard row. */
const titleHeight = 28;

function titleSection({ claims }: BookReview, { date, version }: ReviewFacts): Section {
  const [first] = claims;
  const title =
    claims.length === 1 && first !== undefined
      ? `Review: ${titleOf(first.claim)}`
      : `Review of ${claims.length} regressions`;
  const summary = summaryOf(claims);
  return section(
    [[text(title)], [text(`${date}. Made with Footing ${version}.`)], [text(cautionLine)], [text(summary)]],
    [
      { ...acrossReview(0, "title"), rowHeight: titleHeight },
      acrossReview(1, "note"),
      { ...acrossReview(2, "caution"), merge: true, wrap: true, rowHeight: heightOver(cautionLine, 0) },
      { ...acrossReview(3, "sentence"), merge: true, wrap: true, rowHeight: heightOver(summary, 0) },
    ],
  );
}

/** Excel's limit for the name of a sheet is 31 characters; " review 12" must have room. */
const longestOutcome = 20;

/** The outcomes reviewed, where they are few, then "review". */
function sheetName({ claims }: BookReview): string {
  const outcomes = [...new Set(claims.map(({ claim }) => claim.outcome.name))];
  return outcomes.length === 0 || outcomes.length > 2
    ? "Review"
    : `${listInWords(outcomes).slice(0, longestOutcome).trim()} review`;
}
