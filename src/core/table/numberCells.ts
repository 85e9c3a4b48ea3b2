import { type Result, failure, success } from "../problem/result.ts";
import type { CellColumn } from "./cells.ts";
import { readLabel } from "./periodLabels.ts";
import { rangeOf } from "./place.ts";
import { countSenses, sense, sensesOf } from "./senses.ts";
import type { Column } from "./source.ts";
import { cellInWords, spotsOf } from "./spots.ts";
import { type DecimalMark, readTextNumber } from "./textNumbers.ts";
import { isSlashedDate } from "./timeTexts.ts";

/** A column read as numbers. */
export interface NumberCells {
  /** One a row; 0 where the cell is missing. */
  readonly values: Float64Array<ArrayBuffer>;
  /** 1 where there is a number, 0 where the cell is missing. */
  readonly present: Uint8Array<ArrayBuffer>;
  /** What was read otherwise than it stands, as sentences. */
  readonly notes: readonly string[];
}

/**
 * Reads a column as numbers. Blanks and marks are missing; a column of TRUE and FALSE alone is read as 1 and 0.
 * @param decimal - the decimal mark of text that the user agreed to read as numbers; null where there is no such leave.
 * @returns Problem "empty-column", "no-numbers", "error-cells", "dates-as-text", "text-in-number-column",
 *   "dates-in-number-column" or "text-numbers", each with its cells.
 */
export function readNumberCells(column: Column, decimal: DecimalMark | null): Result<NumberCells> {
  const senses = sensesOf(column.cells);
  const counts = countSenses(senses);
  const fault = emptiness(column, { senses, counts }) ?? misfits(column, { senses, counts });
  if (fault !== null) return fault;
  const texts = counts[sense.textNumber]!;
  const agreed =
    decimal === null || texts === 0 ? null : column.cells.texts.map((text) => readTextNumber(text, decimal));
  const unread = texts === 0 ? null : unreadTexts(column, senses, agreed);
  if (unread !== null) return unread;
  const notes = [...textNotes(column, { senses, counts }), ...booleanNotes(column, counts)];
  return success({ ...filled(column.cells, senses, agreed ?? []), notes });
}

type Agreed = readonly (number | null)[];

function filled({ numbers }: CellColumn, senses: Uint8Array, agreed: Agreed): Omit<NumberCells, "notes"> {
  const values = new Float64Array(senses.length);
  const present = new Uint8Array(senses.length);
  for (let row = 0; row < senses.length; row++) {
    const one = senses[row]!;
    if (one === sense.blank || one === sense.mark) continue;
    present[row] = 1;
    values[row] = one === sense.textNumber ? agreed[numbers[row]!]! : numbers[row]!;
  }
  return { values, present };
}

interface Counted {
  readonly senses: Uint8Array;
  /** Cells of each sense, by its byte. */
  readonly counts: Int32Array;
}

type Fault = ReturnType<typeof failure> | null;

function emptiness(column: Column, { senses, counts }: Counted): Fault {
  const where = rangeOf(column.place, senses.length);
  const present = senses.length - counts[sense.blank]!;
  if (present === 0) return failure({ code: "empty-column", column: column.name, where });
  const wrong = counts[sense.text]! + counts[sense.mark]!;
  return wrong === present && !textsAreDates(column, senses)
    ? failure({ code: "no-numbers", column: column.name, where })
    : null;
}

/** The faults of single cells, the plainest first. */
function misfits(column: Column, { senses, counts }: Counted): Fault {
  const among = counts[sense.number]! + counts[sense.textNumber]! + counts[sense.date]! + counts[sense.text]!;
  const at = (one: number) => (row: number) => senses[row] === one;
  if (counts[sense.error]! > 0) return failure({ code: "error-cells", ...spotsOf(column, at(sense.error)) });
  if (counts[sense.text]! > 0) {
    const code = textsAreDates(column, senses) ? "dates-as-text" : "text-in-number-column";
    return failure({ code, ...spotsOf(column, at(sense.text)) });
  }
  if (counts[sense.boolean]! > 0 && among > 0) {
    return failure({ code: "text-in-number-column", ...spotsOf(column, at(sense.boolean)) });
  }
  if (counts[sense.date]! > 0) return failure({ code: "dates-in-number-column", ...spotsOf(column, at(sense.date)) });
  return null;
}

function textsAreDates(column: Column, senses: Uint8Array): boolean {
  const first = senses.indexOf(sense.text);
  if (first < 0) return false;
  const text = cellInWords(column.cells, first);
  return isSlashedDate(text) || readLabel(text)?.unit === "day";
}

/** Text that needs the user's leave, or that the agreed decimal mark does not read. */
function unreadTexts(column: Column, senses: Uint8Array, agreed: Agreed | null): Fault {
  const { numbers } = column.cells;
  const spots = spotsOf(
    column,
    (row) => senses[row] === sense.textNumber && (agreed === null || agreed[numbers[row]!] === null),
  );
  if (spots.count === 0) return null;
  return failure({ code: agreed === null ? "text-numbers" : "text-in-number-column", ...spots });
}

function textNotes(column: Column, { senses, counts }: Counted): string[] {
  const count = counts[sense.textNumber]!;
  if (count === 0) return [];
  const example = cellInWords(column.cells, senses.indexOf(sense.textNumber));
  const texts =
    count === 1 ? "one text was read as a number" : `${count.toLocaleString("en-US")} texts were read as numbers`;
  return [`${column.name}: ${texts}, such as "${example}".`];
}

const booleanNotes = (column: Column, counts: Int32Array): string[] =>
  counts[sense.boolean]! > 0 ? [`${column.name}: TRUE was read as 1 and FALSE as 0.`] : [];
