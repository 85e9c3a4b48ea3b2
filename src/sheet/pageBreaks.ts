import { lineHeight, page, pageWidths, pointsOf } from "./columns.ts";
import type { PlanFormat } from "./plan.ts";

/** A stretch of rows with what is known of it. */
export interface Stretch {
  readonly rows: number;
  /** Whether it may be parted: pictures never where it can be helped, a short table seldom, a long one anywhere. */
  readonly parted: "never" | "seldom" | "anywhere";
}

/** Height of the print to its width on a lying page within the margins: A4, Letter. */
const shapes = [(595 - 65) / (842 - 72), (612 - 65) / (792 - 72)];
/** Width of a digit to that of the usual font's: programs without it take a wider one, and print all smaller. */
const wider = 1.29;
const papers = shapes.flatMap((shape) => [
  { shape, usual: true },
  { shape: shape * wider, usual: false },
]);

/**
 * The rows that a new page begins with: pictures that would run over the page's end on any paper begin the next, a short
 * table where it would with the usual font, so that no page is left nearly empty for the sake of a rare one; and a long
 * table does not begin with its last few lines at the foot of a page.
 * @param widths - of the columns that are printed, in characters; those of a result sheet where none are given.
 */
export function pageBreaksOf(
  stretches: readonly Stretch[],
  formats: readonly PlanFormat[],
  widths: readonly number[] = pageWidths.slice(0, page.columns),
): number[] {
  const heights = heightsOf(formats);
  const width = sum(widths.map(pointsOf));
  const breaks: number[] = [];
  let row = 0;
  let sheets: readonly Paper[] = papers.map(({ shape, usual }) => ({ full: shape * width, used: 0, usual }));
  for (const { rows, parted } of stretches) {
    const lines = Array.from({ length: rows }, (_, index) => heights.get(row + index) ?? lineHeight);
    const needed = sum(parted === "anywhere" ? lines.slice(0, fewestLines) : lines);
    const asked = parted === "never" ? sheets : sheets.filter(({ usual }) => usual);
    if (asked.some(({ full, used }) => used > 0 && used + needed > full && needed <= full)) {
      breaks.push(row);
      sheets = sheets.map((sheet) => ({ ...sheet, used: 0 }));
    }
    sheets = sheets.map((sheet) => ({ ...sheet, used: usedAfter(lines, sheet) }));
    row += rows;
  }
  return breaks;
}

interface Paper {
  readonly full: number;
  readonly used: number;
  /** Whether the font is the usual one. */
  readonly usual: boolean;
}

/** How far down the last page the lines end; programs begin another page where one is full. */
const usedAfter = (lines: readonly number[], { full, used }: Paper): number =>
  lines.reduce((sofar, line) => (sofar + line > full ? line : sofar + line), used);

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
