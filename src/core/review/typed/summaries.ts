import type { SheetArea } from "../../table/address.ts";
import type { BookSheet } from "../book.ts";
import { type CellPlace, kindAt } from "../cellsOfBook.ts";
import { cellKind } from "../../table/cells.ts";
import { readShownText, shownNumberAt } from "../found/shownNumber.ts";
import type { Label } from "./labels.ts";
import type { ReportBlock, SummaryNumber } from "./reportBlock.ts";

/** So many rows above, below or beside a block its other numbers may stand. */
export const farthestRows = 14;
const farthestColumns = 6;

/** Each block with the numbers that stand nearest to it. */
export function summariesOf(
  sheet: BookSheet,
  blocks: readonly ReportBlock[],
  labels: readonly Label[],
): readonly ReportBlock[] {
  const found = blocks.map(({ summaries }): SummaryNumber[] => [...summaries]);
  const areas = blocks.map(({ area }) => area);
  for (const label of labels) {
    if (blocks.some(({ area }) => isIn(area, label.place))) continue;
    const nearest = nearestArea(areas, label.place);
    if (nearest !== null) found[nearest]!.push(...numbersAt(sheet, label));
  }
  return blocks.map((block, index) => ({ ...block, summaries: firstOfEach(found[index]!) }));
}

const isIn = (area: SheetArea, { row, column }: CellPlace): boolean =>
  row >= area.row && row < area.row + area.rows && column >= area.column && column < area.column + area.columns;

/** Which of some areas a cell speaks of; null where none is near. */
export function nearestArea(areas: readonly SheetArea[], place: CellPlace): number | null {
  let nearest: number | null = null;
  let least = Infinity;
  for (const [index, area] of areas.entries()) {
    const rows = distance(place.row, area.row, area.rows);
    const columns = distance(place.column, area.column, area.columns);
    if (rows > farthestRows || columns > farthestColumns) continue;
    // What stands above a block belongs sooner to the one before it.
    const apart = rows + columns + (place.row < area.row ? 0.5 : 0);
    if (apart < least) [nearest, least] = [index, apart];
  }
  return nearest;
}

const distance = (at: number, first: number, count: number): number =>
  Math.max(0, first - at, at - (first + count - 1));

function numbersAt(sheet: BookSheet, { place, summary, inText }: Label): SummaryNumber[] {
  if (inText.length > 0) {
    return inText.flatMap(({ word, number }) => {
      const shown = readShownText(number);
      return shown === null ? [] : [{ word, place, shown }];
    });
  }
  const beside = summary === null ? null : numberBeside(sheet, place);
  return beside === null ? [] : [{ word: summary!, ...beside }];
}

/** The number to the right, over at most two blanks, or below, unless a column of numbers begins there. */
function numberBeside(sheet: BookSheet, { row, column }: CellPlace): Pick<SummaryNumber, "place" | "shown"> | null {
  for (let step = 1; step <= 3; step++) {
    const place = { sheet, row, column: column + step };
    const shown = shownNumberAt(place);
    if (shown !== null) return { place, shown };
    if (kindAt(place) !== cellKind.blank) break;
  }
  const below = { sheet, row: row + 1, column };
  const shown = shownNumberAt(below);
  const isColumn = shownNumberAt({ sheet, row: row + 2, column }) !== null;
  return shown === null || isColumn ? null : { place: below, shown };
}

export const firstOfEach = (numbers: readonly SummaryNumber[]): SummaryNumber[] =>
  numbers.filter(({ word }, index) => numbers.findIndex((other) => other.word === word) === index);
