import type { Claim } from "../../core/review/claim.ts";
import type { BookReview } from "../../core/review/claimReview.ts";
import { rangeOfLine, reviewLimits } from "../../core/review/reviewWords.ts";
import type { PlanFormat } from "../plan.ts";
import { type Section, section, text } from "../section.ts";
import {
  type LabelledLine,
  acrossReview,
  labelledCells,
  labelledFormats,
  linkTo,
  sentenceAcross,
} from "./reviewPage.ts";

/** What the sheet must say that the review does not know. */
export interface ReviewFacts {
  /** "1 December 2026" */
  readonly date: string;
  readonly version: string;
  /** SHA-256 of the data of each regression as its author took them, in the order of the regressions. */
  readonly fingerprints: readonly string[];
}

/** What looks like a regression and could not be read. */
export function unreadSection(unread: BookReview["unread"]): Section {
  const lines = unread.map(({ why }): LabelledLine => ({ label: "", words: why, style: "sentence" }));
  return labelledSection(
    "Could not be read",
    lines,
    unread.flatMap(({ cell }, index) => linkTo(index + 1, 0, cell)),
  );
}

/** What went into each regression as it was reviewed: enough to make the review again. */
export function howMadeSection(claims: readonly Claim[], { fingerprints, version, date }: ReviewFacts): Section {
  const lines = claims.flatMap((claim, index) => claimLines(claim, fingerprints[index] ?? ""));
  return labelledSection("How this was made", [...lines, line("Date", date), line("Version", version)], []);
}

const labelledSection = (heading: string, lines: readonly LabelledLine[], links: Section["links"]): Section =>
  section(
    [[text(heading)], ...lines.map(labelledCells)],
    [acrossReview(0, "heading"), ...lines.flatMap((entry, index) => labelledFormats(index + 1, entry))],
    links,
  );

const line = (label: string, words: string): LabelledLine => ({ label, words, style: "sentence" });

function claimLines({ place, origin, outcome, drivers, constant }: Claim, fingerprint: string): LabelledLine[] {
  return [
    { label: "Reported at", words: place, style: "table heading" },
    ...(origin.kind === "formula" ? [line("Formula", origin.formula)] : []),
    line(`Outcome: ${outcome.name}`, rangeOfLine(outcome)),
    ...drivers.map((driver) => line(`Driver: ${driver.name}`, rangeOfLine(driver))),
    line("Constant", constant ? "yes" : "no"),
    line("Fingerprint of these data (SHA-256)", fingerprint),
  ];
}

const blanks = ["Reviewed by", "Date", "Signature"] as const;
/** In points: room for a hand. */
const blankHeight = 26;

/** Lines for the person who answers for the review; what stands on them is theirs to write. */
export function signOffSection(): Section {
  const lines = blanks.map((_, index): PlanFormat[] => [
    { area: { row: index + 2, column: 0, rows: 1, columns: 1 }, style: "label", rowHeight: blankHeight },
    { area: { row: index + 2, column: 1, rows: 1, columns: 3 }, style: "to fill in" },
  ]);
  return section(
    [[text("Sign-off")], [text(reviewLimits)], ...blanks.map((label) => [text(label)])],
    [acrossReview(0, "heading"), sentenceAcross(1, reviewLimits), ...lines.flat()],
  );
}
