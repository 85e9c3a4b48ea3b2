import { type Result, failure, success } from "../problem/result.ts";
import { cellKind } from "../table/cells.ts";
import { cellOf, rowNumberOf } from "../table/place.ts";
import type { Column, Source } from "../table/source.ts";
import { spotsOf } from "../table/spots.ts";
import type { LeftOut } from "./design.ts";
import type { Ingredient, Lack } from "./ingredient.ts";
import type { RowFrame } from "./rowFrame.ts";
import { everyRow, keptRows } from "./rows.ts";
import { type Timeline, unreadableTime } from "./timeline.ts";

/** Which rows of a source are used, in design order, and which are not. */
export interface UsedRows {
  readonly rows: Int32Array<ArrayBuffer>;
  readonly leftOut: readonly LeftOut[];
  readonly leftOutCount: number;
}

/** What decides on the rows: each ingredient in turn; the outcome is the first of them. */
export interface Needs {
  readonly outcome: { readonly column: Column };
  readonly ingredients: readonly Ingredient[];
  readonly frame: RowFrame;
}

/**
 * Leaves out the rows that lack anything, and puts the rest in order: as they stand for cases, by time, or group by
 * group and by time within each.
 * @returns Problem "missing-time", "unreadable-time" or "dates-as-text" where a row has an outcome but no time.
 */
export function chooseRows(source: Source, needs: Needs): Result<UsedRows> {
  const { ingredients, frame } = needs;
  const timeless = frame.timeline === null ? null : timeFault(frame.timeline, ingredients[0]!.present);
  if (timeless !== null) return timeless;
  const usable = new Uint8Array(source.rowCount).fill(1);
  for (const { present } of ingredients) {
    for (let row = 0; row < usable.length; row++) usable[row]! &= present[row]!;
  }
  const rows = keptRows(inOrder(frame, source.rowCount), usable);
  return success({
    rows,
    leftOut: leftOutRows(source, needs, usable),
    leftOutCount: source.rowCount - rows.length,
  });
}

function timeFault({ column, positions, isUnreadable }: Timeline, outcome: Uint8Array) {
  if (column === null) return null;
  const isTimeless = (row: number): boolean => outcome[row] === 1 && positions[row]! < 0;
  const unreadable = spotsOf(column, (row) => isTimeless(row) && isUnreadable(row));
  if (unreadable.count > 0) return failure(unreadableTime(column, unreadable));
  const missing = spotsOf(column, isTimeless);
  return missing.count > 0 ? failure({ code: "missing-time", ...missing }) : null;
}

function inOrder({ sequence, groups }: RowFrame, rowCount: number): Int32Array<ArrayBuffer> {
  if (sequence !== null) return sequence.rows;
  const rows = everyRow(rowCount);
  if (groups === null) return rows;
  const { codes } = groups.cells;
  return rows.sort((a, b) => codes[a]! - codes[b]! || a - b);
}

/** More rows than these are counted, not listed. */
const mostListed = 1000;

function leftOutRows(source: Source, { outcome, ingredients }: Needs, usable: Uint8Array): readonly LeftOut[] {
  const hidden = new Set(source.hidden?.leftOut === true ? source.hidden.rows : []);
  const listed: LeftOut[] = [];
  for (let row = 0; row < usable.length && listed.length < mostListed; row++) {
    if (usable[row] === 1) continue;
    const lack = hidden.has(row)
      ? lackOfRow(outcome.column, row, "the row is hidden")
      : lackAt(source, { outcome, ingredients }, row);
    listed.push({ row: rowNumberOf(outcome.column.place, row), ...lack });
  }
  return listed;
}

const isBlankRow = ({ columns }: Source, row: number): boolean =>
  columns.every(({ cells }) => cells.kinds[row] === cellKind.blank);

const lackAt = (source: Source, { outcome, ingredients }: Pick<Needs, "outcome" | "ingredients">, row: number): Lack =>
  isBlankRow(source, row) ? lackOfRow(outcome.column, row, "the row is blank") : firstLack(ingredients, row);

const lackOfRow = ({ place }: Column, row: number, because: string): Lack => ({ cell: cellOf(place, row), because });

const firstLack = (ingredients: readonly Ingredient[], row: number): Lack =>
  ingredients.find(({ present }) => present[row] === 0)!.lackOf(row);
