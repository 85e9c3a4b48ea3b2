import { type Rank, ranks } from "../../core/review/finding.ts";
import { gravestRank } from "../../core/review/reviewWords.ts";
import { counted } from "../../core/problem/spots.ts";
import { parseAddress } from "../../core/table/address.ts";
import type { FoundRegression, ReviewInHand } from "./reviewState.ts";

/** More regressions than these are listed sheet by sheet. */
const mostAtOnce = 12;

/** A regression, and its place in the review. */
export interface Listed {
  readonly regression: FoundRegression;
  readonly index: number;
}

/** The regressions that one sheet reports. */
export interface SheetGroup {
  readonly sheet: string;
  /** How many there are, those that are not shown counted. */
  readonly count: number;
  /** How they came out: "2 change the conclusion, 30 nothing found". */
  readonly words: string;
  /** Null where nothing was found in any that is reviewed. */
  readonly gravest: Rank | null;
  readonly isReviewed: boolean;
  /** As far as they are to be shown. */
  readonly entries: readonly Listed[];
}

/** Whether the list is so long that it is parted by sheets and can be narrowed. */
export const isLong = ({ regressions }: Pick<ReviewInHand, "regressions">): boolean => regressions.length > mostAtOnce;

/** The regressions that are to be shown, in the order in which they were found. */
export function listedOf({ regressions, listing }: Pick<ReviewInHand, "regressions" | "listing">): readonly Listed[] {
  const all = regressions.map((regression, index) => ({ regression, index }));
  return listing.onlyFindings ? all.filter(({ regression }) => hasFindings(regression)) : all;
}

const hasFindings = ({ review }: FoundRegression): boolean => (review?.findings.length ?? 0) > 0;

/** The same sheet by sheet, in the order of their first regressions; sheets of which none is to be shown are left out. */
export function groupsOf(review: Pick<ReviewInHand, "regressions" | "listing">): readonly SheetGroup[] {
  const bySheet = new Map<string, Listed[]>();
  const shown = new Set(listedOf(review).map(({ index }) => index));
  for (const [index, regression] of review.regressions.entries()) {
    const sheet = parseAddress(regression.claim.place)?.sheet ?? "";
    const group = bySheet.get(sheet);
    if (group === undefined) bySheet.set(sheet, [{ regression, index }]);
    else group.push({ regression, index });
  }
  return [...bySheet].flatMap(([sheet, all]) => {
    const entries = all.filter(({ index }) => shown.has(index));
    return entries.length === 0 ? [] : [{ sheet, count: all.length, ...stateOf(all), entries }];
  });
}

function stateOf(all: readonly Listed[]): Pick<SheetGroup, "words" | "gravest" | "isReviewed"> {
  const reviewed = all.flatMap(({ regression: { review } }) => (review === null ? [] : [gravestRank(review.findings)]));
  const having = (rank: Rank | null): number => reviewed.filter((one) => one === rank).length;
  const parts = [
    ...ranks.map((rank) => [having(rank), rankWords[rank](having(rank))] as const),
    [having(null), "nothing found"] as const,
    [all.length - reviewed.length, "not reviewed yet"] as const,
  ];
  const said = parts.filter(([count]) => count > 0).map(([count, words]) => `${count} ${words}`);
  const gravest = ranks.find((rank) => reviewed.includes(rank)) ?? null;
  return { words: said.join(", "), gravest, isReviewed: reviewed.length > 0 };
}

const rankWords: Readonly<Record<Rank, (count: number) => string>> = {
  "changes the conclusion": (count) => (count === 1 ? "changes the conclusion" : "change the conclusion"),
  "changes a number": (count) => (count === 1 ? "changes a number" : "change a number"),
  "worth knowing": () => "worth knowing",
};

/** How much of the list is shown, to be said when that changes. */
export function shownWords(review: ReviewInHand): string {
  const [shown, all] = [listedOf(review).length, review.regressions.length];
  const waiting = review.regressions.filter((one) => one.review === null).length;
  const isSaid = waiting > 0 && review.listing.onlyFindings;
  const rest = isSaid ? ` Not reviewed yet: ${waiting}.` : "";
  return shown === all
    ? `All ${counted(all, "regression")} shown.`
    : `${shown} of ${counted(all, "regression")} shown.${rest}`;
}
