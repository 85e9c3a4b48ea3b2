import type { Book, BookSheet } from "../book.ts";
import { sheetNamed } from "../cellsOfBook.ts";
import type { BookReview } from "../claimReview.ts";
import type { Claim, ClaimedLine } from "../claim.ts";
import type { Finding } from "../finding.ts";
import { standsInCells } from "../forms.ts";
import type { Stretch } from "../found/claimedLines.ts";
import type { Gathered } from "../found/gatherClaims.ts";
import { saysUnequal } from "../formula/whyUnread.ts";
import { gravestFirst } from "../reviewWords.ts";
import type { ReportBlock } from "../typed/reportBlock.ts";
import { addressesAlong, craftFinding } from "./craftFinding.ts";
import { found } from "./craftWords.ts";
import { type CheckedLine, hiddenLine, typedOverFormulas, unusableCells } from "./lineChecks.ts";
import { olderResults } from "./olderResults.ts";
import { namedOtherwise } from "./namedOtherwise.ts";
import { headingsInside, shiftedRanges } from "./rangeChecks.ts";
import { repeatedRows } from "./repeatedRows.ts";
import { typedResults } from "./reportChecks.ts";

/** What the claims were read from. */
export interface Ground {
  readonly book: Book;
  readonly claims: readonly Claim[];
  readonly groups: readonly Gathered[];
  /** Reports by headings, each with the formulas behind it. */
  readonly blocks: readonly { readonly block: ReportBlock; readonly group: Gathered | null }[];
  readonly unread: BookReview["unread"];
}

/** What is wrong with the sheets that the claims rest on, gravest first, each thing once. */
export function craftOf({ book, claims, groups, blocks, unread }: Ground): readonly Finding[] {
  const findings = [
    ...claims.flatMap((claim) => ofClaim(claim, book)),
    ...groups.flatMap(headingsInside),
    ...groups.flatMap(namedOtherwise),
    ...blocks.flatMap(({ block, group }) => typedResults(block, group)),
    ...unequalRanges(unread),
    ...byHand(book, claims),
  ];
  return gravestFirst(once(findings));
}

/** An array that was entered over a block is told once, not in each of its cells. */
function unequalRanges(unread: Ground["unread"]): Finding[] {
  const unequal = unread.filter(({ why }) => saysUnequal(why));
  return [...new Set(unequal.map(({ why }) => why))].map((why) => {
    const cells = unequal.filter((one) => one.why === why).map(({ cell }) => cell);
    return craftFinding("unequal", { rank: "changes a number", cells, what: found.unequal(why) });
  });
}

function ofClaim(claim: Claim, book: Book): Finding[] {
  const inCells = claim.drivers.filter(standsInCells);
  const [outcome, ...drivers] = [claim.outcome, ...inCells].flatMap((line) => checked(line, book));
  if (outcome === undefined || drivers.length < inCells.length) return [];
  const lines = [outcome, ...drivers];
  const named = ({ line, stretch }: CheckedLine) => ({ name: line.name, stretch });
  return [
    ...lines.flatMap(unusableCells),
    ...lines.flatMap(typedOverFormulas),
    ...lines.flatMap(hiddenLine),
    ...shiftedRanges(named(outcome), drivers.map(named)),
    ...olderResults(claim),
    ...hiddenRows(outcome),
    ...hiddenSheets(lines),
    ...repeatedRows(
      lines.map(({ line }) => line),
      outcome.stretch,
    ),
  ];
}

function checked(line: ClaimedLine, book: Book): CheckedLine[] {
  const sheet = sheetNamed(book, line.sheet);
  if (sheet === null) return [];
  const { runs, track, from, count } = line;
  return [{ line, stretch: { sheet, runs, track, from, count } }];
}

function hiddenRows({ line, stretch }: CheckedLine): Finding[] {
  const hidden = line.hidden.filter((position) => position >= line.from && position < line.from + line.count);
  if (hidden.length === 0) return [];
  const what = found.hiddenRows(hidden.length, line.runs === "down" ? "rows" : "columns");
  return [craftFinding("hiddenRows", { rank: "worth knowing", cells: addressesAlong(stretch, hidden), what })];
}

function hiddenSheets(lines: readonly CheckedLine[]): Finding[] {
  const hidden = new Map<BookSheet, Stretch>();
  for (const { stretch } of lines) if (!stretch.sheet.visible) hidden.set(stretch.sheet, stretch);
  return [...hidden].map(([sheet, stretch]) =>
    craftFinding("hiddenSheet", {
      rank: "worth knowing",
      cells: addressesAlong(stretch, [stretch.from]),
      what: found.hiddenSheet(sheet.sheet),
    }),
  );
}

function byHand({ calculation }: Book, claims: readonly Claim[]): Finding[] {
  const live = claims.filter(({ origin }) => origin.kind === "formula");
  if (calculation !== "manual" || live.length === 0) return [];
  const cells = live.map(({ place }) => place);
  return [craftFinding("byHand", { rank: "worth knowing", cells, what: found.byHand })];
}

/** Several regressions over the same cells have the same faults. */
function once(findings: readonly Finding[]): readonly Finding[] {
  const seen = new Set<string>();
  return findings.filter(({ code, cells, what }) => {
    const key = [code, what, ...cells].join("|");
    const isNew = !seen.has(key);
    seen.add(key);
    return isNew;
  });
}
