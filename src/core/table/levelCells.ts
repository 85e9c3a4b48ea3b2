import { type Result, failure, success } from "../problem/result.ts";
import { type CellColumn, cellKind } from "./cells.ts";
import { rangeOf } from "./place.ts";
import { sense, sensesOf } from "./senses.ts";
import type { Column } from "./source.ts";
import { cellInWords, spotsOf } from "./spots.ts";

/** A column read as categories or groups. */
export interface LevelCells {
  /** One a row: an index into `levels`, or -1 where the cell is missing. */
  readonly codes: Int32Array<ArrayBuffer>;
  /** Each distinct level once, in order: numbers by size, all else by alphabet with numbers inside counted. */
  readonly levels: readonly string[];
}

/**
 * Reads a column as categories. Text counts without the blanks around it, numbers and dates as they are written out.
 * @returns Problem "empty-column" or "error-cells".
 */
export function readLevelCells(column: Column): Result<LevelCells> {
  const senses = sensesOf(column.cells);
  if (senses.includes(sense.error)) {
    return failure({ code: "error-cells", ...spotsOf(column, (row) => senses[row] === sense.error) });
  }
  const { codes, levels } = inOrderMet(column.cells, senses);
  if (levels.length === 0) {
    const where = rangeOf(column.place, senses.length);
    return failure({ code: "empty-column", column: column.name, where });
  }
  const sorted = inOrder(levels);
  const ranks = new Map(sorted.map((level, rank) => [level, rank]));
  const rankOf = levels.map((level) => ranks.get(level)!);
  return success({ codes: codes.map((code) => (code < 0 ? -1 : rankOf[code]!)), levels: sorted });
}

/** The same order on every machine; numbers inside text count as numbers, so that Shop 2 stands before Shop 10. */
const alphabet = new Intl.Collator("en", { numeric: true });

/** Beyond this many levels nobody reads them in order, and the alphabet's comparison would take seconds. */
const mostReadable = 20_000;

function inOrder(levels: readonly string[]): string[] {
  if (levels.every((level) => Number.isFinite(Number(level)))) return levels.toSorted((a, b) => Number(a) - Number(b));
  return levels.length > mostReadable ? levels.toSorted() : levels.toSorted(alphabet.compare);
}

function inOrderMet(cells: CellColumn, senses: Uint8Array): { codes: Int32Array<ArrayBuffer>; levels: string[] } {
  const codes = new Int32Array(senses.length).fill(-1);
  const levels: string[] = [];
  const codeOfLevel = new Map<string, number>();
  const codeOfText = new Int32Array(cells.texts.length).fill(-1);
  for (let row = 0; row < senses.length; row++) {
    if (senses[row] === sense.blank || senses[row] === sense.mark) continue;
    const text = cells.kinds[row] === cellKind.text ? cells.numbers[row]! : null;
    if (text !== null && codeOfText[text] !== -1) {
      codes[row] = codeOfText[text]!;
      continue;
    }
    const level = cellInWords(cells, row);
    const code = codeOfLevel.get(level) ?? levels.push(level) - 1;
    codeOfLevel.set(level, code);
    codes[row] = code;
    if (text !== null) codeOfText[text] = code;
  }
  return { codes, levels };
}
