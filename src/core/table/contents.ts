import { cellKind } from "./cells.ts";
import { countSenses, picked, sense, sensesOf } from "./senses.ts";
import type { Column } from "./source.ts";

/** A column's cells by sense, counted, and its values in brief. */
export interface Contents {
  readonly senses: Uint8Array<ArrayBuffer>;
  readonly counts: Counts;
  readonly values: Values;
}

/** How many cells a column has of each sort; they add up to `rows`. */
export interface Counts {
  readonly rows: number;
  readonly numbers: number;
  readonly dates: number;
  readonly booleans: number;
  /** Text that is neither a number nor a mark. */
  readonly texts: number;
  readonly textNumbers: number;
  readonly errors: number;
  readonly blanks: number;
  /** Marks for a missing value: NA, a lone dash, #N/A. */
  readonly marks: number;
}

export interface Values {
  /** Different values, counted up to 1,000. */
  readonly distinct: number;
  /** At most 40 of the same, evenly thinned, in row order; serials for dates. */
  readonly sample: readonly number[];
  /** Of the numbers, or of the dates where they are the most; null where there is none. */
  readonly min: number | null;
  readonly max: number | null;
  /** Whether the numbers merely count the rows: whole, each one more than the one above. */
  readonly counter: boolean;
}

export function contentsOf(column: Column): Contents {
  const senses = sensesOf(column.cells);
  const counts = countSenses(senses);
  return {
    senses,
    counts: {
      rows: senses.length,
      numbers: counts[sense.number]!,
      dates: counts[sense.date]!,
      booleans: counts[sense.boolean]!,
      texts: counts[sense.text]!,
      textNumbers: counts[sense.textNumber]!,
      errors: counts[sense.error]!,
      blanks: counts[sense.blank]!,
      marks: counts[sense.mark]!,
    },
    values: valuesOf(column, senses, counts[sense.date]! > counts[sense.number]! ? sense.date : sense.number),
  };
}

const mostDistinct = 1000;
const sampleSize = 40;

function valuesOf(column: Column, senses: Uint8Array, most: number): Values {
  const numbers = picked(column.cells.numbers, senses, most);
  const step = Math.max(1, (numbers.length - 1) / (sampleSize - 1));
  const size = Math.min(numbers.length, sampleSize);
  return {
    distinct: countDistinct(column, senses),
    sample: Array.from({ length: size }, (_, i) => numbers[Math.round(i * step)]!),
    ...rangeOfNumbers(numbers),
    counter: countsUp(numbers),
  };
}

function rangeOfNumbers(numbers: Float64Array): Pick<Values, "min" | "max"> {
  if (numbers.length === 0) return { min: null, max: null };
  let [min, max] = [Infinity, -Infinity];
  for (let i = 0; i < numbers.length; i++) {
    if (numbers[i]! < min) min = numbers[i]!;
    if (numbers[i]! > max) max = numbers[i]!;
  }
  return { min, max };
}

function countsUp(numbers: Float64Array): boolean {
  if (numbers.length < 3 || !Number.isInteger(numbers[0])) return false;
  for (let i = 1; i < numbers.length; i++) if (numbers[i] !== numbers[i - 1]! + 1) return false;
  return true;
}

/** Texts are told apart by their index, all else by number; the kind keeps the two from meeting. */
function countDistinct({ cells }: Column, senses: Uint8Array): number {
  const texts = new Set<number>();
  const numbers = new Set<number>();
  for (let row = 0; row < senses.length && texts.size + numbers.size < mostDistinct; row++) {
    const one = senses[row]!;
    if (one === sense.blank || one === sense.mark || one === sense.error) continue;
    (cells.kinds[row] === cellKind.text ? texts : numbers).add(cells.numbers[row]!);
  }
  return texts.size + numbers.size;
}
