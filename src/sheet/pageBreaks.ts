import { lineHeight, page, pageWidths, pointsOf } from "./columns.ts";
import type { PlanFormat } from "./plan.ts";

/** A stretch of rows with what is known of it. */
export interface Stretch {
  readonly rows: number;
  /** Whether it stands on one page where it can, because a break would cut through pictures or a short table. */
  readonly whole: boolean;
}

/** Height of the print to its width on a lying A4 page within the margins; Letter leaves more. */
const paper = (595 - 58) / (842 - 72);

/**
 * The rows that a new page begins with: one that is whole and would run over the page's end begins the next, and a long
 * table does not begin with its last few lines at the foot of a page.
 */
export function pageBreaksOf(stretches: readonly Stretch[], formats: readonly PlanFormat[]): number[] {
  const heights = heightsOf(formats);
  const full = paper * pageWidths.slice(0, page.columns).reduce((sum, width) => sum + pointsOf(width), 0);
  const breaks: number[] = [];
  let row = 0;
  let used = 0;
  for (const { rows, whole } of stretches) {
    const lines = Array.from({ length: rows }, (_, index) => heights.get(row + index) ?? lineHeight);
    const needed = sum(whole ? lines : lines.slice(0, fewestLines));
    if (used > 0 && used + needed > full && needed <= full) {
      breaks.push(row);
      used = 0;
    }
    for (const line of lines) used = used + line > full ? line : used + line;
    row += rows;
  }
  return breaks;
}

/** Of a table that may be parted, this many lines stand together at least. */
const fewestLines = 8;

const sum = (values: readonly number[]): number => values.reduce((total, value) => total + value, 0);

function heightsOf(formats: readonly PlanFormat[]): Map<number, number> {
  const heights = new Map<number, number>();
  for (const { area, rowHeight } of formats) {
    if (rowHeight === undefined) continue;
    for (let row = area.row; row < area.row + area.rows; row++) heights.set(row, rowHeight);
  }
  return heights;
}
