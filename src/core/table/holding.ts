import type { CellColumn } from "./cells.ts";
import { cellKind } from "./cells.ts";
import type { Contents } from "./contents.ts";
import { isYear, numberedThing, readLabel } from "./periodLabels.ts";
import { picked, sense } from "./senses.ts";
import type { Column } from "./source.ts";
import { readingOf } from "./timeNumbers.ts";
import { isSlashedDate } from "./timeTexts.ts";

export type Holding = "numbers" | "dates" | "periods" | "categories" | "text" | "mixed" | "nothing";

/** A column is taken for what three of four of its filled cells are. */
const mostOf = 0.75;

/** Categories are few, and each stands for several rows. */
const mostCategories = 50;
const fewestRowsEach = 2;

export function holdingOf(column: Column, { senses, counts, values }: Contents): Holding {
  const present = counts.rows - counts.blanks - counts.marks;
  const most = (count: number): boolean => count >= mostOf * present;
  if (present === 0) return "nothing";
  if (most(counts.dates)) return "dates";
  if (most(counts.texts + counts.textNumbers + counts.dates) && textsArePeriods(column.cells, senses)) return "periods";
  if (most(counts.numbers) && numbersArePeriods(column, senses)) return "periods";
  if (most(counts.numbers + counts.textNumbers)) return "numbers";
  if (!most(counts.texts + counts.booleans)) return "mixed";
  const few = values.distinct <= mostCategories && values.distinct * fewestRowsEach <= present;
  return few ? "categories" : "text";
}

/** So many cells from the top tell whether a column of text holds periods. */
const sampleSize = 100;

function textsArePeriods({ kinds, numbers, texts }: CellColumn, senses: Uint8Array): boolean {
  let seen = 0;
  let read = 0;
  for (let row = 0; row < senses.length && seen < sampleSize; row++) {
    if (kinds[row] !== cellKind.text || senses[row] === sense.mark || senses[row] === sense.blank) continue;
    const text = texts[numbers[row]!]!;
    seen++;
    if (readLabel(text) !== null || isSlashedDate(text)) read++;
  }
  return seen > 0 && read >= mostOf * seen;
}

/**
 * Years, or years with month and day run together: numbers of that look whose heading says so or that go up row by row.
 * Serials of dates are not guessed here, because sheets mark dates as such.
 */
function numbersArePeriods({ name, cells }: Column, senses: Uint8Array): boolean {
  const numbers = picked(cells.numbers, senses, sense.number);
  const ascending = numbers.every((one, i) => i === 0 || one > numbers[i - 1]!);
  if (numbers.every(isYear)) return numberedThing(name) === "year" || (ascending && numbers.length >= fewestToRun);
  const { unit } = readingOf(numbers);
  return (
    numbers.every(Number.isInteger) &&
    (unit === "month" || (unit === "day" && numbers[0]! > mostDigitsOfSerial)) &&
    ascending
  );
}

/** Fewer years in a row may be chance. */
const fewestToRun = 5;

/** Serials of dates have five digits; days run together with year and month have eight. */
const mostDigitsOfSerial = 99_999;
