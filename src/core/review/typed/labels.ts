import { cellKind } from "../../table/cells.ts";
import { cellInWords } from "../../table/spots.ts";
import type { BookSheet } from "../book.ts";
import { type CellPlace, wordsAt } from "../cellsOfBook.ts";
import {
  type SummaryWord,
  type TermWord,
  isIntervalHeading,
  summaryWordIn,
  termWordIn,
  wordWithNumber,
} from "./reportWords.ts";

/** A cell whose text says what the numbers beside or below it are. */
export interface Label {
  readonly place: CellPlace;
  /** Under such a word stand numbers of each driver; null where the text is no such word. */
  readonly term: TermWord | "interval" | null;
  /** Beside such a word stands a number of the whole regression. */
  readonly summary: SummaryWord | null;
  /** Numbers that stand in the text itself, with their words. */
  readonly inText: ReturnType<typeof wordWithNumber>;
}

/** The labels of a sheet, column by column; each different text of a column is looked at once. */
export function labelsOf(sheet: BookSheet): readonly Label[] {
  return sheet.columns.flatMap((cells, index) => {
    const readings = cells.texts.map(readingOf);
    if (!readings.some((reading) => reading !== null)) return [];
    const found: Label[] = [];
    for (let row = 0; row < cells.kinds.length; row++) {
      const reading = cells.kinds[row] === cellKind.text ? readings[cells.numbers[row]!]! : null;
      if (reading === null) continue;
      const place = { sheet, row: sheet.firstRow + row, column: sheet.firstColumn + index };
      found.push({ place, ...reading });
    }
    return found;
  });
}

function readingOf(text: string): Omit<Label, "place"> | null {
  const term = termWordIn(text) ?? (isIntervalHeading(text) ? "interval" : null);
  const [summary, inText] = [summaryWordIn(text), wordWithNumber(text)];
  return term === null && summary === null && inText.length === 0 ? null : { term, summary, inText };
}

/** Rows of a sheet, and the columns of it that speak of something else. */
interface Surroundings {
  readonly firstRow: number;
  readonly lastRow: number;
  readonly without: Tracks;
}

/** Columns of a sheet, or rows of it. */
export interface Tracks {
  readonly lie: "columns" | "rows";
  readonly at: readonly number[];
}

/** The texts that stand in some rows of a sheet. */
export function textsBetween(sheet: BookSheet, { firstRow, lastRow, without }: Surroundings): string[] {
  const from = Math.max(firstRow, sheet.firstRow);
  const to = Math.min(lastRow, sheet.firstRow + sheet.rowCount - 1);
  const texts: string[] = [];
  for (let row = from; row <= to; row++) {
    for (const [index, cells] of sheet.columns.entries()) {
      const isElse = without.at.includes(without.lie === "rows" ? row : sheet.firstColumn + index);
      if (cells.kinds[row - sheet.firstRow] !== cellKind.text || isElse) continue;
      texts.push(cellInWords(cells, row - sheet.firstRow));
      if (index > mostColumnsRead) break;
    }
  }
  return texts;
}

/** Beyond these stand data, not titles. */
const mostColumnsRead = 40;

export const textAt = (sheet: BookSheet, row: number, column: number): string =>
  row < 0 || column < 0 ? "" : wordsAt({ sheet, row, column });
