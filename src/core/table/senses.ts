import { type CellColumn, cellKind } from "./cells.ts";
import { isTextNumber } from "./textNumbers.ts";

/**
 * What a cell amounts to for an analysis, as a byte. A mark stands for a missing value ("NA", a lone dash, #N/A);
 * a text number is text that is plainly a number; text of blanks alone counts as blank.
 */
export const sense = {
  blank: 0,
  number: 1,
  date: 2,
  boolean: 3,
  mark: 4,
  textNumber: 5,
  text: 6,
  error: 7,
} as const;

/** One sense a row; each distinct text is looked at once. */
export function sensesOf({ kinds, numbers, texts }: CellColumn): Uint8Array<ArrayBuffer> {
  const known = new Uint8Array(texts.length).fill(unknown);
  const senses = new Uint8Array(kinds.length);
  for (let row = 0; row < kinds.length; row++) {
    const kind = kinds[row]!;
    const index = numbers[row]!;
    if (kind === cellKind.text) {
      if (known[index] === unknown) known[index] = senseOfText(texts[index]!);
      senses[row] = known[index]!;
    } else {
      const missing = kind === cellKind.error && isMissingMark(texts[index]!);
      senses[row] = missing ? sense.mark : senseOfKind[kind]!;
    }
  }
  return senses;
}

const unknown = 255;

/** In the order of `cellKind`; text is looked at one by one. */
const senseOfKind: readonly number[] = [sense.blank, sense.number, sense.text, sense.boolean, sense.error, sense.date];

export function senseOfText(text: string): number {
  const word = text.trim();
  if (word === "") return sense.blank;
  if (isMissingMark(word)) return sense.mark;
  if (errorSigns.has(word)) return sense.error;
  return isTextNumber(word) ? sense.textNumber : sense.text;
}

const missingMarks = new Set(["na", "n/a", "nan", "null", "none", "-", "−", "–", "—", ".", "?", "#n/a"]);

/** The usual marks for a missing value, free of case. */
export const isMissingMark = (text: string): boolean => missingMarks.has(text.trim().toLowerCase());

/** Errors that a file kept as plain text. */
const errorSigns = new Set(["#DIV/0!", "#VALUE!", "#REF!", "#NAME?", "#NUM!", "#NULL!", "#SPILL!", "#CALC!"]);

/** How many cells have each sense, by its byte. */
export function countSenses(senses: Uint8Array): Int32Array {
  const counts = new Int32Array(Object.keys(sense).length);
  for (let row = 0; row < senses.length; row++) counts[senses[row]!]!++;
  return counts;
}

/** The values of the rows whose byte is the one wanted. A typed array's own filter collects them in slow memory first. */
export function picked(values: Float64Array, bytes: Uint8Array, wanted: number): Float64Array<ArrayBuffer> {
  let count = 0;
  for (let row = 0; row < bytes.length; row++) if (bytes[row] === wanted) count++;
  const found = new Float64Array(count);
  let next = 0;
  for (let row = 0; row < bytes.length; row++) if (bytes[row] === wanted) found[next++] = values[row]!;
  return found;
}
