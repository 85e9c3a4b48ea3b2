import type { Spots } from "../problem/problem.ts";
import { type Contents, type Counts, contentsOf } from "./contents.ts";
import { type Holding, holdingOf } from "./holding.ts";
import { rangeOf } from "./place.ts";
import { sense } from "./senses.ts";
import type { Column } from "./source.ts";
import { cellInWords, spotsOf } from "./spots.ts";
import { type DecimalMark, likelyDecimal } from "./textNumbers.ts";
import { readTimeCells, timeState } from "./timeCells.ts";
import { type TimeSummary, summariseTime } from "./timeSummary.ts";

/** What a column holds, for someone who chooses its role. */
export interface ColumnDescription {
  readonly name: string;
  /** "Months!C2:C97" */
  readonly range: string;
  readonly holds: Holding;
  readonly counts: Counts;
  /** Cells that cannot be used for what the column holds: blanks, marks for missing values, and whatever does not fit. */
  readonly unusable: Spots;
  /** Text that is plainly numbers, null where there is none. */
  readonly textNumbers: TextNumbers | null;
  /** Different values, counted up to 1,000. */
  readonly distinct: number;
  readonly constant: boolean;
  /** At most 40 of the numbers, evenly thinned, in row order; serials for dates. */
  readonly sample: readonly number[];
  readonly min: number | null;
  readonly max: number | null;
  /** For categories the levels, the most frequent first, else none. */
  readonly levels: readonly Level[];
  /** Whether the numbers merely count the rows, 1, 2, 3. */
  readonly counter: boolean;
  /** For dates and periods, else null. */
  readonly time: TimeSummary | null;
}

export interface TextNumbers {
  readonly count: number;
  readonly example: string;
  readonly decimal: DecimalMark;
  /** False where the decimal mark is a guess, because either reads every text. */
  readonly certain: boolean;
}

export interface Level {
  readonly level: string;
  readonly count: number;
}

export function describeColumn(column: Column): ColumnDescription {
  const contents = contentsOf(column);
  const holds = holdingOf(column, contents);
  const time = holds === "dates" || holds === "periods" ? readTimeCells(column) : null;
  const isUnusable =
    time === null ? unusableFor(holds, contents) : (row: number) => time.states[row] !== timeState.read;
  return {
    name: column.name,
    range: rangeOf(column.place, contents.senses.length),
    holds,
    counts: contents.counts,
    unusable: spotsOf(column, isUnusable),
    textNumbers: textNumbersOf(column, contents),
    ...contents.values,
    constant: contents.values.distinct === 1,
    levels: holds === "categories" ? levelsOf(column, contents) : [],
    time: time === null ? null : summariseTime(time),
  };
}

function unusableFor(holds: Holding, { senses }: Contents): (row: number) => boolean {
  if (holds === "numbers") return (row) => senses[row] !== sense.number;
  return (row) => senses[row] === sense.blank || senses[row] === sense.mark || senses[row] === sense.error;
}

/** So many texts are enough to tell the decimal mark. */
const decimalSample = 1000;

function textNumbersOf({ cells }: Column, { senses, counts }: Contents): TextNumbers | null {
  if (counts.textNumbers === 0) return null;
  const texts: string[] = [];
  for (let row = 0; row < senses.length && texts.length < decimalSample; row++) {
    if (senses[row] === sense.textNumber) texts.push(cellInWords(cells, row));
  }
  return { count: counts.textNumbers, example: texts[0]!, ...likelyDecimal(texts) };
}

function levelsOf({ cells }: Column, { senses }: Contents): readonly Level[] {
  const counts = new Map<string, number>();
  for (let row = 0; row < senses.length; row++) {
    if (senses[row] === sense.blank || senses[row] === sense.mark || senses[row] === sense.error) continue;
    const level = cellInWords(cells, row);
    counts.set(level, (counts.get(level) ?? 0) + 1);
  }
  return [...counts].map(([level, count]) => ({ level, count })).sort((a, b) => b.count - a.count);
}
