import { type Result, failure, success } from "../problem/result.ts";
import type { NumberCells } from "../table/numberCells.ts";
import { type Period, periodsInWords } from "../table/periodNames.ts";
import { cellOf } from "../table/place.ts";
import type { Column } from "../table/source.ts";
import { spotsOf } from "../table/spots.ts";
import { type Lack, missingCell } from "./ingredient.ts";
import type { Transform } from "./model.ts";

/** What transforms that look back in time need: for each row the row so many periods earlier, -1 where there is none. */
export interface LookBack {
  readonly earlier: (periods: number) => Int32Array;
  readonly period: Period;
}

/** A column of numbers after its transform, one value a source row. */
export interface Transformed {
  readonly values: Float64Array<ArrayBuffer>;
  readonly present: Uint8Array<ArrayBuffer>;
  readonly lackOf: (row: number) => Lack;
  /** "logarithm of Price", "Price 1 month earlier". */
  readonly name: string;
}

/** A column and the numbers in it. */
export interface NumberColumn {
  readonly column: Column;
  readonly numbers: NumberCells;
}

/**
 * Applies a transform: natural logarithm; square; the value of earlier periods (lag); the value minus it (change);
 * the change in per cent of it (growth rate).
 * @param lookBack - null where rows have no order in time.
 * @returns Problem "numbers-too-large", "logarithm-of-nonpositive", "growth-from-nonpositive", "transform-needs-time",
 *   or "unknown-value" for a number of periods below 1.
 */
export function transformed(
  source: NumberColumn,
  transform: Transform,
  lookBack: LookBack | null,
): Result<Transformed> {
  const raw = tooLarge(source.column, source.numbers);
  if (raw !== null) return raw;
  const made = applied(source, transform, lookBack);
  if (transform.kind === "none") return made;
  return (made.ok ? tooLarge(source.column, made.value) : null) ?? made;
}

/** Squares of larger numbers, summed over all rows of a sheet, leave the range of double precision. */
const largest = 1e150;

function tooLarge({ name, place }: Column, { values, present }: Pick<NumberCells, "values" | "present">) {
  let row = 0;
  while (row < values.length && (present[row] === 0 || Math.abs(values[row]!) <= largest)) row++;
  if (row === values.length) return null;
  return failure({ code: "numbers-too-large", column: name, cell: cellOf(place, row), value: values[row]! });
}

function applied(source: NumberColumn, transform: Transform, lookBack: LookBack | null): Result<Transformed> {
  const { column, numbers } = source;
  const plain = { present: numbers.present, lackOf: (row: number) => missingCell(column, row) };
  switch (transform.kind) {
    case "none":
      return success({ ...plain, values: numbers.values, name: column.name });
    case "square":
      return success({ ...plain, values: numbers.values.map((value) => value ** 2), name: `square of ${column.name}` });
    case "logarithm":
      return logarithm(source);
    case "lag":
    case "change":
    case "growth rate":
      return lookBack === null
        ? failure({ code: "transform-needs-time", column: column.name, transform: transform.kind })
        : lookedBack(source, transform, lookBack);
  }
}

function logarithm({ column, numbers }: NumberColumn): Result<Transformed> {
  const { values, present } = numbers;
  const { cells, count } = spotsOf(column, (row) => present[row] === 1 && values[row]! <= 0);
  if (count > 0) return failure({ code: "logarithm-of-nonpositive", column: column.name, cells, count });
  const logarithms = values.map((value, row) => (present[row] === 1 ? Math.log(value) : 0));
  const lackOf = (row: number): Lack => missingCell(column, row);
  return success({ values: logarithms, present, lackOf, name: `logarithm of ${column.name}` });
}

type BackTransform = Extract<Transform, { readonly periods: number }>;

/** What becomes of the value now and the value some periods earlier. */
const comparisons: Readonly<Record<BackTransform["kind"], (now: number, then: number) => number>> = {
  lag: (_, then) => then,
  change: (now, then) => now - then,
  "growth rate": (now, then) => (100 * (now - then)) / then,
};

function lookedBack(source: NumberColumn, transform: BackTransform, lookBack: LookBack): Result<Transformed> {
  const { column, numbers } = source;
  const { kind, periods } = transform;
  if (!(Number.isInteger(periods) && periods >= 1)) {
    const allowed = ["a whole number of periods, 1 or more"];
    return failure({ code: "unknown-value", setting: kind, value: String(periods), allowed, nearest: null });
  }
  const earlier = lookBack.earlier(periods);
  const compare = comparisons[kind];
  const values = new Float64Array(earlier.length);
  const present = new Uint8Array(earlier.length);
  for (let row = 0; row < earlier.length; row++) {
    const then = earlier[row]!;
    if (then < 0 || numbers.present[then] === 0 || (kind !== "lag" && numbers.present[row] === 0)) continue;
    values[row] = compare(numbers.values[row]!, numbers.values[then]!);
    present[row] = 1;
  }
  const fault = kind === "growth rate" ? growthFault(source, earlier, present) : null;
  if (fault !== null) return fault;
  const back = periodsInWords(lookBack.period, periods);
  const lackOf = (row: number): Lack => lackEarlier(source, { row, then: earlier[row]!, back });
  return success({ values, present, lackOf, name: nameBack(column.name, transform, back) });
}

function nameBack(name: string, { kind, periods }: BackTransform, back: string): string {
  if (kind === "lag") return `${name} ${back} earlier`;
  return periods === 1 ? `${kind} of ${name}` : `${kind} of ${name} over ${back}`;
}

function growthFault({ column, numbers }: NumberColumn, earlier: Int32Array, present: Uint8Array) {
  const isBase = new Uint8Array(present.length);
  present.forEach((one, row) => {
    if (one === 1) isBase[earlier[row]!] = 1;
  });
  const { cells, count } = spotsOf(column, (row) => isBase[row] === 1 && numbers.values[row]! <= 0);
  return count === 0 ? null : failure({ code: "growth-from-nonpositive", column: column.name, cells, count });
}

interface Back {
  readonly row: number;
  /** The earlier row, -1 where there is none. */
  readonly then: number;
  readonly back: string;
}

function lackEarlier({ column, numbers }: NumberColumn, { row, then, back }: Back): Lack {
  if (then < 0) return { cell: cellOf(column.place, row), because: `"${column.name}" has no row ${back} earlier` };
  if (numbers.present[then] === 1) return missingCell(column, row);
  const { cell, because } = missingCell(column, then);
  return { cell, because: `${because} ${back} earlier` };
}
