import { type CellColumn, cellKind } from "./cells.ts";
import { type Moment, type TimeUnit, numberedThing } from "./periodLabels.ts";
import { picked, sense, sensesOf } from "./senses.ts";
import type { Column } from "./source.ts";
import { firstDayOf, readingOf } from "./timeNumbers.ts";
import { readTimeTexts } from "./timeTexts.ts";

/** What became of a cell of a time column, as a byte. */
export const timeState = { missing: 0, read: 1, unreadable: 2 } as const;

/** A column read as times, all in one unit. */
export interface TimeCells {
  readonly unit: TimeUnit;
  /** What running numbers count, as far as the heading tells ("week"); null for all else. */
  readonly counts: Exclude<TimeUnit, "number"> | null;
  /** One a row, in the unit (see Moment); 0 where `states` does not say read. */
  readonly values: Float64Array<ArrayBuffer>;
  readonly states: Uint8Array<ArrayBuffer>;
  /** How the cells were read, as sentences. */
  readonly notes: readonly string[];
}

/** Reads dates, period labels and numbers as times; labels of several units become the days they begin with. */
export function readTimeCells({ name, cells }: Column): TimeCells {
  const senses = sensesOf(cells);
  const found: Found = {
    units: new Uint8Array(senses.length).fill(noUnit),
    values: new Float64Array(senses.length),
    states: senses.map((one) => (isMissing(one) ? timeState.missing : timeState.unreadable)),
  };
  const notes = [
    ...readDates(cells, senses, found),
    ...readNumbers(cells, senses, found),
    ...readTexts(cells, senses, found),
  ].map((words) => `${name}: ${words}.`);
  const unit = commonUnit(found.units);
  bringTo(unit, found);
  return {
    unit,
    counts: unit === "number" ? numberedThing(name) : null,
    values: found.values,
    states: found.states,
    notes,
  };
}

interface Found {
  /** Index into `units` of what each cell was read as. */
  readonly units: Uint8Array<ArrayBuffer>;
  readonly values: Float64Array<ArrayBuffer>;
  readonly states: Uint8Array<ArrayBuffer>;
}

const units: readonly TimeUnit[] = ["day", "year", "quarter", "month", "week", "number"];
const noUnit = 255;

const isMissing = (one: number): boolean => one === sense.blank || one === sense.mark;

function put(found: Found, row: number, { unit, index }: Moment): void {
  found.units[row] = units.indexOf(unit);
  found.values[row] = index;
  found.states[row] = timeState.read;
}

function readDates({ numbers }: CellColumn, senses: Uint8Array, found: Found): string[] {
  for (let row = 0; row < senses.length; row++) {
    if (senses[row] === sense.date) put(found, row, { unit: "day", index: numbers[row]! });
  }
  return [];
}

function readNumbers({ numbers }: CellColumn, senses: Uint8Array, found: Found): string[] {
  const plain = picked(numbers, senses, sense.number);
  if (plain.length === 0) return [];
  const { unit, read, words } = readingOf(plain);
  for (let row = 0; row < senses.length; row++) {
    if (senses[row] === sense.number) put(found, row, { unit, index: read(numbers[row]!) });
  }
  return words === null ? [] : [`numbers were read ${words}`];
}

function readTexts({ kinds, numbers, texts }: CellColumn, senses: Uint8Array, found: Found): string[] {
  const used: number[] = [];
  const slots = new Int32Array(texts.length).fill(-1);
  for (let row = 0; row < senses.length; row++) {
    const index = numbers[row]!;
    if (kinds[row] === cellKind.text && !isMissing(senses[row]!) && slots[index] === -1)
      slots[index] = used.push(index) - 1;
  }
  if (used.length === 0) return [];
  const { moments, convention } = readTimeTexts(
    used.map((index) => texts[index]!),
    senses.includes(sense.date),
  );
  for (let row = 0; row < senses.length; row++) {
    const moment = kinds[row] === cellKind.text ? (moments[slots[numbers[row]!]!] ?? null) : null;
    if (moment !== null) put(found, row, moment);
  }
  return convention === null ? [] : [`dates kept as text were read as ${convention}`];
}

/** The unit of all cells; days where several calendar units meet; running numbers only where they are the most. */
function commonUnit(found: Uint8Array): TimeUnit {
  const counts = new Int32Array(noUnit + 1);
  for (let row = 0; row < found.length; row++) counts[found[row]!]!++;
  const numbered = counts[units.indexOf("number")]!;
  const calendar = units.filter((unit, code) => unit !== "number" && counts[code]! > 0);
  const dated = found.length - counts[noUnit]! - numbered;
  if (numbered > dated) return "number";
  return calendar.length === 1 ? calendar[0]! : "day";
}

function bringTo(target: TimeUnit, { units: codes, values, states }: Found): void {
  for (let row = 0; row < codes.length; row++) {
    if (codes[row] === noUnit) continue;
    const unit = units[codes[row]!]!;
    if (unit === target) continue;
    const comparable = unit !== "number" && target === "day";
    states[row] = comparable ? timeState.read : timeState.unreadable;
    values[row] = comparable ? firstDayOf({ unit, index: values[row]! }) : 0;
  }
}
