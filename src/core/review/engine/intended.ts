import { defaultOptions } from "../../answer/options.ts";
import type { Question } from "../../answer/question.ts";
import type { Model, Transform } from "../../design/model.ts";
import { cellKind } from "../../table/cells.ts";
import { distinctNames } from "../../table/headings.ts";
import { rowsOf } from "../../table/locate.ts";
import { sense } from "../../table/senses.ts";
import type { Column } from "../../table/source.ts";
import type { ClaimedLine } from "../claim.ts";
import { type Frame, type FrameLine, positionOf } from "./frame.ts";
import { lineValues } from "./lineValues.ts";
import { type LineRecipe, type Recipe, type Run, withLines } from "./recipe.ts";
import { looksLikeSummary } from "./summaryRow.ts";
import type { Bench } from "./trial.ts";

/** The regression as it should be made: the claimed columns over all rows of the data, text that is plainly numbers read. */
export interface Intended {
  readonly recipe: Recipe;
  /** Rows of the data beyond the claimed ones. */
  readonly beyond: readonly Run[];
  /** Claimed rows that are no data: they sum up the others. */
  readonly summaries: readonly number[];
}

export function intendedOf({ frame, claimed, orderings }: Bench): Intended {
  const every = Array.from({ length: frame.driverCount + 1 }, (_, line) => line);
  const read = withLines(claimed, every, { textNumbers: "read" });
  const { first, count } = frame;
  const last = lastDataRow(frame, orderings.times);
  const summaries = last < first + count ? rowsFrom(last, first + count).filter((row) => isData(frame, row)) : [];
  const span = { from: firstDataRow(frame), to: last };
  const beyond = [
    { from: span.from, to: first },
    { from: first + count, to: span.to },
  ].filter(({ from, to }) => from < to);
  return { recipe: { ...read, rows: { ...read.rows, span } }, beyond, summaries };
}

const rowsFrom = (from: number, to: number): number[] => Array.from({ length: to - from }, (_, i) => from + i);

const claimedLines = ({ lines, driverCount }: Frame): readonly FrameLine[] => lines.slice(0, driverCount + 1);

/** Whether a row holds numbers and, beside them, no words in the claimed lines. */
function isData(frame: Frame, row: number): boolean {
  const senses = claimedLines(frame).map((line) => line.senses[row]!);
  return senses.some((one) => numbers.includes(one)) && !senses.includes(sense.text);
}

const numbers: readonly number[] = [sense.number, sense.textNumber, sense.date];

/** Rows above the claimed ones belong to the data only if they lack nothing: years in a heading are numbers too. */
function firstDataRow(frame: Frame): number {
  const whole = (row: number): boolean => claimedLines(frame).every(({ senses }) => senses[row] === sense.number);
  let row = frame.first;
  while (row > 0 && whole(row - 1)) row--;
  return row;
}

/** One beyond the last row of the data; a row that sums up those above is none. */
function lastDataRow(frame: Frame, times: readonly ClaimedLine[]): number {
  const { first, count, rowCount } = frame;
  let end = first + count;
  while (end > first + 1 && looksLikeSummary(frame, end - 1) !== null) end--;
  if (end < first + count) return end;
  const goesOn = (row: number): boolean => isData(frame, row) && isTimed(frame, row, times);
  while (end < rowCount && goesOn(end) && looksLikeSummary(frame, end) === null) end++;
  return end;
}

/** Whether the cells that give the time go on as they began: words there belong to a note or a total. */
const isTimed = (frame: Frame, row: number, times: readonly ClaimedLine[]): boolean =>
  times.every(({ cells, first }) => {
    const kindAt = (at: number): number | undefined => cells.kinds[positionOf(frame.lines[0]!, at, frame) - first];
    return kindAt(row) === kindAt(frame.first);
  });

/** The question whose answer the report should have been. */
export function questionFor({ frame, orderings }: Bench, { recipe }: Intended): Question {
  const { span } = recipe.rows;
  const lines = claimedLines(frame);
  const { proposed } = orderings;
  const keys = proposed.kind === "cases" ? [] : "order" in proposed ? [proposed.by, proposed.order] : [proposed.by];
  const named = distinctNames(
    [...lines.map(({ line }) => line), ...keys].map((line, at) => ({
      heading: headingOf(line),
      where: `line ${at + 1}`,
    })),
  );
  const columns = lines.map((line, index) => ({
    ...columnFor(line, { frame, span, made: recipe.lines[index]! }),
    name: named[index]!,
  }));
  const keyColumns = keys.map((key, at) => ({ ...keyFor(key, frame, span), name: named[lines.length + at]! }));
  const transforms = lines.map(({ line }) => transformOf(line));
  return {
    source: { columns: [...columns, ...keyColumns], rowCount: span.to - span.from },
    model: {
      outcome: { column: named[0]!, transform: transforms[0]! },
      drivers: lines
        .slice(1)
        .map((_, j) => ({ column: named[j + 1]!, as: "number", base: null, transform: transforms[j + 1]! })),
      calendar: [],
      rows: rowsAre(
        proposed.kind,
        keyColumns.map(({ name }) => name),
      ),
      constant: recipe.model.constant,
      textNumbers: [],
    },
    options: defaultOptions,
  };
}

const headingOf = ({ name, form }: ClaimedLine): string => (form === "cube" ? `cube of ${name}` : name);

const transformOf = ({ form }: ClaimedLine): Transform =>
  form === "logarithm" || form === "square" ? { kind: form } : { kind: "none" };

function rowsAre(kind: "cases" | "time" | "groups", keys: readonly string[]): Model["rows"] {
  if (kind === "time") return { kind, order: keys[0] ?? null };
  return kind === "groups" ? { kind, by: keys[0] ?? "", second: null, order: keys[1] ?? null } : { kind };
}

interface Laying {
  readonly frame: Frame;
  readonly span: Run;
  readonly made: LineRecipe;
}

/** The numbers of a line; logarithms and squares are left to the design, which can name them. */
function columnFor(line: FrameLine, { frame, span, made }: Laying): Omit<Column, "name"> {
  const plain = line.line.form === "cube" ? made : { ...made, form: "as it is" as const };
  const { values, present } = lineValues(line, plain, frame);
  const kinds = present.map((byte) => (byte === 1 ? cellKind.number : cellKind.blank));
  const cells = rowsOf({ kinds, numbers: values, texts: [] }, span.from, span.to);
  return { place: placeOf(line.line, positionOf(line, span.from, frame)), cells };
}

/** The cells of a line beside the data; beyond its own they are blank. */
function keyFor(line: ClaimedLine, frame: Frame, { from, to }: Run): Omit<Column, "name"> {
  const start = positionOf(frame.lines[0]!, from, frame);
  const kinds = new Uint8Array(to - from);
  const numbers = new Float64Array(to - from);
  for (let row = 0; row < kinds.length; row++) {
    const cell = start + row - line.first;
    kinds[row] = line.cells.kinds[cell] ?? cellKind.blank;
    numbers[row] = line.cells.numbers[cell] ?? 0;
  }
  return { place: placeOf(line, start), cells: { kinds, numbers, texts: line.cells.texts } };
}

function placeOf({ sheet, runs, track, name }: ClaimedLine, position: number): Column["place"] {
  return runs === "down"
    ? { kind: "sheet", sheet, column: track, firstRow: position }
    : { kind: "argument", argument: name, column: 0, firstRow: 0 };
}
