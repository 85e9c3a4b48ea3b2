import { addressOf, type SheetArea } from "../../table/address.ts";
import { type CellColumn, cellKind } from "../../table/cells.ts";
import type { BookSheet } from "../book.ts";
import { type CellPlace, isTextAt, kindAt, wordsAt } from "../cellsOfBook.ts";
import type { ClaimedForm, ClaimedLine } from "../claim.ts";
import { positionName } from "../reviewWords.ts";

/** A line of a sheet, and the stretch of it that a regression says it uses. */
export interface Stretch {
  readonly sheet: BookSheet;
  readonly runs: ClaimedLine["runs"];
  readonly track: number;
  readonly from: number;
  readonly count: number;
}

/** The line of cells with what stands before and behind the claimed ones. */
export function claimedLine(stretch: Stretch, form: ClaimedForm): ClaimedLine {
  const { sheet, runs, track, from, count } = stretch;
  const down = runs === "down";
  const first = down ? sheet.firstRow : sheet.firstColumn;
  const cells = down ? sheet.columns[track - sheet.firstColumn]! : rowOf(sheet, track);
  return {
    name: form === "position" ? positionName : (headingOf(stretch) ?? addressOf(areaOf(stretch))),
    sheet: sheet.sheet,
    runs,
    track,
    first,
    cells: form === "position" ? positionsAlong(cells, from - first) : cells,
    from,
    count,
    form,
    hidden: down ? sheet.hiddenRows : sheet.hiddenColumns,
  };
}

/** 1 for the first claimed cell, and so on along the line, wherever a number stands there. */
function positionsAlong({ kinds }: CellColumn, start: number): CellColumn {
  const isNumber = (kind: number): boolean => kind === cellKind.number || kind === cellKind.date;
  return {
    kinds: kinds.map((kind) => (isNumber(kind) ? cellKind.number : cellKind.blank)),
    numbers: Float64Array.from(kinds, (_, at) => at - start + 1),
    texts: [],
  };
}

export const areaOf = ({ sheet, runs, track, from, count }: Stretch): SheetArea =>
  runs === "down"
    ? { sheet: sheet.sheet, row: from, column: track, rows: count, columns: 1 }
    : { sheet: sheet.sheet, row: track, column: from, rows: 1, columns: count };

/** The place of a cell of a line by its position along the line. */
export const placeAlong = ({ sheet, runs, track }: Omit<Stretch, "from" | "count">, position: number): CellPlace =>
  runs === "down" ? { sheet, row: position, column: track } : { sheet, row: track, column: position };

/** A row of a sheet in the form in which columns are kept. */
export function rowOf(sheet: BookSheet, row: number): CellColumn {
  const at = row - sheet.firstRow;
  const kinds = new Uint8Array(sheet.columns.length);
  const numbers = new Float64Array(sheet.columns.length);
  const texts: string[] = [];
  sheet.columns.forEach((column, index) => {
    const kind = column.kinds[at]!;
    kinds[index] = kind;
    const inWords = kind === cellKind.text || kind === cellKind.error;
    numbers[index] = inWords ? texts.push(column.texts[column.numbers[at]!]!) - 1 : column.numbers[at]!;
  });
  return { kinds, numbers, texts };
}

/** The text nearest before the claimed cells, over a line of units and over cells of the same line that were not claimed. */
export function headingOf(stretch: Stretch): string | null {
  const at = positionOfHeading(stretch);
  return at === null ? null : wordsAt(placeAlong(stretch, at));
}

/** Where that text stands along the line; null where there is none. */
export function positionOfHeading(stretch: Stretch): number | null {
  const { sheet, runs, from } = stretch;
  const first = runs === "down" ? sheet.firstRow : sheet.firstColumn;
  let position = from;
  while (position >= first && !isWordAt(stretch, position)) position--;
  if (position < first) return null;
  return isUnitsAt(stretch, position) ? position - 1 : position;
}

const isWordAt = (stretch: Stretch, position: number): boolean => {
  const place = placeAlong(stretch, position);
  return isTextAt(place) && /\p{L}|%/u.test(wordsAt(place));
};

/** Whether a word says what is counted, under a line of headings that is about as full as its own. */
function isUnitsAt(stretch: Stretch, position: number): boolean {
  const isUnits = unitWords.test(wordsAt(placeAlong(stretch, position)));
  if (!isUnits || !isWordAt(stretch, position - 1)) return false;
  return 2 * wordsBeside(stretch, position - 1) >= wordsBeside(stretch, position);
}

/** How many lines of the sheet hold a word at a position. */
function wordsBeside({ sheet, runs }: Stretch, position: number): number {
  const [first, count] = runs === "down" ? [sheet.firstColumn, sheet.columns.length] : [sheet.firstRow, sheet.rowCount];
  let words = 0;
  for (let track = first; track < first + count; track++) {
    if (isWordAt({ sheet, runs, track, from: 0, count: 0 }, position)) words++;
  }
  return words;
}

/** What stands below headings to say what is counted. */
const unitWords =
  /^[([]?(?:%|per ?cent|[$€£¥]|usd|eur|gbp|chf|k|m|mn|bn|'?000s?|thousands?|millions?|units?|pcs|pieces|kg|g|t|tons?|km|m2|sqm|l|litres?|h|hrs?|hours?|days?|weeks?|months?|years?|index|number|count|mm|°c)(?:[ /.].{0,12})?[)\]]?$/i;

/** Whether a cell holds a number: what Excel's regressions take a date for too. */
export function isNumberAlong(stretch: Omit<Stretch, "from" | "count">, position: number): boolean {
  const kind = kindAt(placeAlong(stretch, position));
  return kind === cellKind.number || kind === cellKind.date;
}
