import type { Claim } from "../../core/review/claim.ts";
import type { BookReview, ClaimReview } from "../../core/review/claimReview.ts";
import { rangeOfLine } from "../../core/review/reviewWords.ts";
import { addressOf, localAddressOf, parseAddress } from "../../core/table/address.ts";
import type { Asked, BookClaims, Pointed } from "../../core/review/claimsOf.ts";

/** A regression that the workbook reports, and what a review says of it; null until it has been reviewed. */
export interface FoundRegression {
  readonly claim: Claim;
  readonly review: ClaimReview | null;
}

/** What was found in the workbook, as it stood when it was read. */
export interface ReviewInHand extends Omit<BookClaims, "claims"> {
  readonly asked: Asked;
  readonly regressions: readonly FoundRegression[];
  /** Which of them is shown in full, from 0; null shows the list. */
  readonly open: number | null;
  readonly listing: Listing;
  /** The first cell that has changed since, null as long as none has. */
  readonly changedCell: string | null;
  /** The sheet that was written last, null where none was. */
  readonly written: string | null;
}

/** What the user says of a report that Footing cannot read by itself; as typed. */
export interface Pointing {
  readonly reported: string;
  readonly outcome: string;
  /** Headings or addresses with commas between them. */
  readonly drivers: string;
}

export const emptyPointing: Pointing = { reported: "", outcome: "", drivers: "" };

/** What is pointed at, blanks left for Footing to find. */
export function pointedFrom({ reported, outcome, drivers }: Pointing): Pointed {
  const named = drivers.split(",").map((driver) => driver.trim());
  const filled = named.filter((driver) => driver !== "").flatMap(linesIn);
  return {
    reported: reported.trim(),
    outcome: outcome.trim() === "" ? null : outcome.trim(),
    drivers: filled.length === 0 ? null : filled,
  };
}

/** A block of several drivers taken apart into its columns, or into its rows where it is wider than high. */
function linesIn(driver: string): readonly string[] {
  const area = parseAddress(driver);
  if (area === null || area.rows === 1 || area.columns === 1) return [driver];
  const down = area.rows >= area.columns;
  return Array.from({ length: down ? area.columns : area.rows }, (_, index) => {
    const line = down
      ? { ...area, column: area.column + index, columns: 1 }
      : { ...area, row: area.row + index, rows: 1 };
    return area.sheet === "" ? localAddressOf(line) : addressOf(line);
  });
}

export const takeInHand = (asked: Asked, { claims, ...rest }: BookClaims): ReviewInHand => ({
  ...rest,
  asked,
  regressions: claims.map((claim) => ({ claim, review: null })),
  open: claims.length === 1 ? 0 : null,
  listing: wholeListing,
  changedCell: null,
  written: null,
});

/** The cells that a review rests on, those around the claimed ones too: the reports, and the lines of the data. */
export function cellsReviewed({ regressions }: ReviewInHand): readonly string[] {
  const claims = regressions.map(({ claim }) => claim);
  const lines = claims.flatMap(({ outcome, drivers }) => [outcome, ...drivers]);
  const whole = lines.map((line) => rangeOfLine({ ...line, from: line.first, count: line.cells.kinds.length }));
  return [...new Set([...claims.map(({ place }) => place), ...whole])];
}

const reviewedOf = (regressions: readonly FoundRegression[]): readonly ClaimReview[] =>
  regressions.flatMap(({ review }) => (review === null ? [] : [review]));

/** The reviews that are shown: the one that is open with the craft of its sheets, or all that are ready. */
export function reviewShown({ regressions, unread, craft, open }: ReviewInHand): BookReview {
  const one = open === null ? undefined : regressions[open];
  if (one === undefined || regressions.length === 1) return { claims: reviewedOf(regressions), unread, craft };
  return { claims: reviewedOf([one]), unread: [], craft: craft.filter(({ cells }) => concerns(one.claim, cells)) };
}

/** Whether cells stand on a sheet that a regression rests on or is reported on. */
function concerns({ place, outcome, drivers, others }: Claim, cells: readonly string[]): boolean {
  const sheets = new Set([outcome, ...drivers, ...others].map(({ sheet }) => sheet));
  const named = [...sheets].flatMap((sheet) => [sheet, `'${sheet.replaceAll("'", "''")}'`]);
  const reports = place.slice(0, place.lastIndexOf("!"));
  return cells.some((cell) => [...named, reports].includes(cell.slice(0, cell.lastIndexOf("!"))));
}

/** How the list of regressions is looked at. */
export interface Listing {
  /** The sheets whose regressions are shown one by one. */
  readonly open: readonly string[];
  readonly onlyFindings: boolean;
}

export const wholeListing: Listing = { open: [], onlyFindings: false };
