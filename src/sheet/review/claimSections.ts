import type { ClaimReview, Consequence } from "../../core/review/claimReview.ts";
import { explanationsOf, originInWords, titleOf } from "../../core/review/reviewWords.ts";
import type { PlanCell, PlanFormat } from "../plan.ts";
import { type Section, section, text } from "../section.ts";
import { comparedSection } from "./comparedSection.ts";
import { findingsSection } from "./findingsSection.ts";
import { acrossReview, heightOver, linkTo, reviewColumns, sentencesSection } from "./reviewPage.ts";

/** Everything that the sheet says of one regression. */
export function claimSections(review: ClaimReview): Section[] {
  const { verdict, findings, tried, errors, consequences } = review;
  const explanations = explanationsOf(review);
  const { assumed = [] } = review.claim;
  return [
    placeSection(review),
    sentencesSection("Verdict on the work", [verdict]),
    ...(assumed.length === 0 ? [] : [sentencesSection("Taken for granted", assumed)]),
    findingsSection("Findings", findings, "Nothing was found against the work."),
    comparedSection(review),
    ...(explanations.length === 0 ? [] : [sentencesSection("What explains the difference", explanations)]),
    ...(tried.length === 0 ? [] : [sentencesSection("Tried, and does not explain the difference", tried)]),
    ...(errors === null ? [] : [sentencesSection("Which standard errors were reported", [errors.sentence])]),
    ...(consequences.length === 0 ? [] : [consequencesSection(consequences)]),
  ];
}

/** Which regression it is, and a link to its report. */
function placeSection({ claim }: ClaimReview): Section {
  const title = titleOf(claim);
  return section(
    [[text(title)], [text(`Reported by ${originInWords(claim)} at`)]],
    [
      { ...acrossReview(0, "banner"), merge: true, wrap: true, rowHeight: heightOver(title, 0) },
      { area: { row: 1, column: 0, rows: 1, columns: 1 }, style: "label" },
    ],
    linkTo(1, 1, claim.place),
  );
}

/** Columns of the table of consequences: driver, as reported, as it should be, what that means. */
const spans = [
  { column: 0, columns: 1 },
  { column: 1, columns: 2 },
  { column: 3, columns: 2 },
  { column: 5, columns: 1 },
] as const;

function consequencesSection(consequences: readonly Consequence[]): Section {
  const lines = [
    ["Driver", "As reported", "As it should be", "What that means"],
    ...consequences.map(({ driver, asReported, asItShouldBe, changes }) => [
      ...[driver, asReported, asItShouldBe],
      changes ? "The conclusion changes." : "No conclusion changes.",
    ]),
  ];
  return section(
    [[text("What follows for each driver")], ...lines.map(spread)],
    [
      acrossReview(0, "heading"),
      ...lines.flatMap((words, index) => lineFormats(words, index + 1)),
      { ...acrossReview(1, "table heading"), heads: consequences.length },
    ],
  );
}

function spread(words: readonly string[]): PlanCell[] {
  const cells = Array.from({ length: reviewColumns }, (): PlanCell => null);
  spans.forEach(({ column }, index) => (cells[column] = text(words[index] ?? "")));
  return cells;
}

const lineFormats = (words: readonly string[], row: number): PlanFormat[] =>
  spans.map(({ column, columns }): PlanFormat => ({
    area: { row, column, rows: 1, columns },
    style: "sentence",
    merge: columns > 1,
    wrap: true,
    rowHeight: Math.max(
      ...spans.map((span, index) => heightOver(words[index] ?? "", span.column, span.column + span.columns - 1)),
    ),
  }));
