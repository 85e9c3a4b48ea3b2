import { cellKind } from "../../table/cells.ts";
import type { BookSheet } from "../book.ts";
import { type CellPlace, formatAt, isTextAt, numberAt, wordsAt } from "../cellsOfBook.ts";
import { bracketsIn } from "../found/numberFormat.ts";
import { type ShownNumber, readShownText, shownNumberAt } from "../found/shownNumber.ts";
import { intervalInBrackets } from "./intervals.ts";

/** A number in brackets, which stand for no minus here. */
export interface InBrackets {
  readonly place: CellPlace;
  /** Without its brackets and without a sign. */
  readonly size: ShownNumber;
  /** Whether a minus is written beside the brackets or inside them. */
  readonly minus: boolean;
  readonly shape: Shape;
}

export type Shape = "round" | "square";

const inText = /^([([])\s*([-−+]?)\s*([^-−+([].*?)\s*[)\]]\s*[*†‡]*$/;

/** What a cell shows in brackets, as text or by its number format; null where it shows no number in them. */
export function inBracketsAt(place: CellPlace): InBrackets | null {
  if (isTextAt(place)) return readBracketed(wordsAt(place).trim(), place);
  const brackets = formatBrackets(place);
  const shown = brackets === null ? null : shownNumberAt(place);
  if (shown === null || brackets === null) return null;
  return {
    place,
    size: { ...shown, value: Math.abs(shown.value), shown: shown.shown.replace(/^-/, "") },
    minus: brackets.minus,
    shape: "round",
  };
}

function readBracketed(text: string, place: CellPlace): InBrackets | null {
  const [, opening, sign = "", digits = ""] = inText.exec(text) ?? [];
  const size = opening === undefined ? null : readShownText(digits);
  if (size === null) return null;
  return { place, size, minus: /[-−]/.test(sign), shape: opening === "[" ? "square" : "round" };
}

/**
 * Every cell of a sheet with a number or an interval in brackets, as far as its formats are known; each different text
 * is looked at once.
 */
export function allInBrackets(sheet: BookSheet): readonly CellPlace[] {
  const ofTexts = [...placesOfTexts(sheet)];
  const shown = ofTexts.filter((place) => inBracketsAt(place) !== null || intervalInBrackets(place) !== null);
  return [...shown, ...[...placesOfFormats(sheet)].filter((place) => formatBrackets(place) !== null)];
}

/** The brackets that a number's format puts around it. */
function formatBrackets(place: CellPlace): ReturnType<typeof bracketsIn> {
  const value = numberAt(place);
  return value === null ? null : bracketsIn(formatAt(place) ?? "General", value);
}

function* placesOfTexts(sheet: BookSheet): Generator<CellPlace> {
  for (const [across, { kinds, numbers, texts }] of sheet.columns.entries()) {
    const bracketed = texts.map((text) => inText.test(text.trim()));
    if (!bracketed.includes(true)) continue;
    for (let row = 0; row < kinds.length; row++) {
      if (kinds[row] === cellKind.text && bracketed[numbers[row]!] === true) yield cellAt(sheet, row, across);
    }
  }
}

function* placesOfFormats(sheet: BookSheet): Generator<CellPlace> {
  const width = sheet.columns.length;
  for (const { firstRow, rowCount, indices, formats } of sheet.formats) {
    const bracketed = formats.map((format) => format.includes("("));
    if (!bracketed.includes(true)) continue;
    for (let cell = 0; cell < rowCount * width; cell++) {
      const [row, across] = [firstRow - sheet.firstRow + Math.floor(cell / width), cell % width];
      if (bracketed[indices[cell]!] === true && sheet.columns[across]!.kinds[row] === cellKind.number) {
        yield cellAt(sheet, row, across);
      }
    }
  }
}

const cellAt = (sheet: BookSheet, row: number, across: number): CellPlace => ({
  sheet,
  row: sheet.firstRow + row,
  column: sheet.firstColumn + across,
});
