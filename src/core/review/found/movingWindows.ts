import { addressAt } from "../cellsOfBook.ts";
import type { BookReview } from "../claimReview.ts";
import { whyUnread } from "../formula/whyUnread.ts";
import type { Gathered } from "./gatherClaims.ts";

/** So many regressions over moving windows of the same columns are reviewed one by one. */
const mostWindows = 50;

interface Kept {
  readonly groups: readonly Gathered[];
  readonly unread: BookReview["unread"];
}

/** The first regressions of each set of columns; of formulas filled down over a moving window the rest is said, not made. */
export function firstWindows(groups: readonly Gathered[]): Kept {
  const seen = new Map<string, number>();
  const left = new Map<string, Gathered[]>();
  const kept = groups.filter((group) => {
    const key = columnsOf(group);
    const count = (seen.get(key) ?? 0) + 1;
    seen.set(key, count);
    if (count > mostWindows) left.set(key, [...(left.get(key) ?? []), group]);
    return count <= mostWindows;
  });
  const unread = [...left.values()].map((more) => {
    const cells = more.flatMap((group) => group.cells.slice(0, 1)).map(({ place }) => addressAt(place));
    return { cell: cells[0]!, why: whyUnread.moreWindows(more.length, cells.at(-1)!) };
  });
  return { groups: kept, unread };
}

/** The lines of a regression without their ends. */
const columnsOf = ({ aligned, regression }: Gathered): string =>
  [
    ...aligned.map(({ sheet, runs, track }) => `${sheet.sheet} ${runs} ${track}`),
    ...[regression.outcome, ...regression.drivers].map(({ form }) => form),
    regression.constant,
  ].join("|");

/** Cells one below the other that could not be read for the same reason, as one entry. */
export function onceEach(unread: BookReview["unread"]): BookReview["unread"] {
  const runs: { first: string; last: string; why: string }[] = [];
  for (const { cell, why } of unread) {
    const run = runs.at(-1);
    if (run?.why === why && isBelow(run.last, cell)) run.last = cell;
    else runs.push({ first: cell, last: cell, why });
  }
  return runs.map(({ first, last, why }) => ({ cell: first === last ? first : `${first}:${localPart(last)}`, why }));
}

const localPart = (cell: string): string => cell.slice(cell.lastIndexOf("!") + 1);

function isBelow(above: string, cell: string): boolean {
  const [, column, row] = /^(.+?)(\d+)$/.exec(above) ?? [];
  return cell === `${column}${Number(row) + 1}`;
}
