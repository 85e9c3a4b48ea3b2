import {
  type Moved,
  type RunningMoments,
  addRow,
  addRun,
  packedLength,
  rowsInRun,
  runningMoments,
  sideBySide,
  takeRow,
  takeRun,
} from "../../numeric/runningMoments.ts";
import type { Frame, FrameLine } from "./frame.ts";
import type { MadeLines } from "./madeLines.ts";
import type { Recipe, RowRecipe, Run } from "./recipe.ts";
import { completeRows, extraRows, runsOf } from "./rowList.ts";

/** The lines of a recipe summed up, so that any choice of rows and any model of them costs no pass over the rows. */
export interface SummedUp {
  readonly moved: Moved;
  /** 1 for the rows in which every claimed line has a value. */
  readonly complete: () => Uint8Array;
  /** How many rows a recipe of these lines counts. */
  readonly rows: (recipe: RowRecipe) => number;
  /** Writes the packed moments of those rows; false where a row counted in has no value. */
  readonly gather: (target: Float64Array, recipe: Recipe) => boolean;
}

/** For any number of looks, at columns beside the data too. */
export function sumUp(frame: Frame, { lines }: Recipe, made: MadeLines): SummedUp {
  const values = frame.lines.map((_, index) => made.make(index, lines[index]!));
  const complete = completeRows(values.slice(0, frame.driverCount + 1));
  const moments = runningMoments(
    values.map(({ moved }) => moved),
    complete,
  );
  const totals = runningTotals(frame.lines, complete);
  return {
    moved: moments,
    complete: () => complete,
    rows: (rows) => countRows(rows, (run) => rowsInRun(moments, run)),
    gather: (target, recipe) => {
      addRuns(target, moments, recipe.rows);
      const { zeros, summary } = recipe.rows;
      if (zeros === 0 && summary === "none") return true;
      const extra = extraRows(recipe, { totals: () => totals(recipe.rows), rows: target[0]! });
      for (const row of extra ?? []) addRow(target, moments, { values: row, times: 1 });
      return extra !== null;
    },
  };
}

/**
 * For one look at the claimed columns over the claimed rows: what two lines give together is known from other looks, and
 * the rows in which a line has no value are taken away again.
 */
export function sumUpOnce(frame: Frame, { lines }: Recipe, made: MadeLines): SummedUp {
  const values = frame.lines.slice(0, frame.driverCount + 1).map((_, index) => made.make(index, lines[index]!));
  const moved = sideBySide(values.map((line) => line.moved));
  const moments = new Float64Array(packedLength(moved.size));
  let entry = 0;
  moments[entry++] = frame.count;
  values.forEach((line, i) => {
    moments[entry++] = made.sumOf(line);
    for (let j = 0; j <= i; j++) moments[entry++] = made.productOf(line, values[j]!);
  });
  for (const row of new Set(values.flatMap(({ absent }) => absent))) takeRow(moments, moved, row);
  return {
    moved,
    complete: () => completeRows(values),
    rows: () => moments[0]!,
    gather: (target) => {
      target.set(moments);
      return true;
    },
  };
}

function addRuns(target: Float64Array, moments: RunningMoments, { span, without, again }: RowRecipe): void {
  target.fill(0);
  addRun(target, moments, span);
  for (const gap of without) {
    const inside = within(gap, span);
    if (inside !== null) takeRun(target, moments, inside);
  }
  for (const run of again) addRun(target, moments, run);
}

function countRows({ span, without, again, zeros, summary }: RowRecipe, rowsIn: (run: Run) => number): number {
  let rows = rowsIn(span) + zeros + (summary === "none" ? 0 : 1);
  for (const gap of without) {
    const inside = within(gap, span);
    if (inside !== null) rows -= rowsIn(inside);
  }
  for (const run of again) rows += rowsIn(run);
  return rows;
}

function within(gap: Run, span: Run): Run | null {
  if (gap.from >= span.from && gap.to <= span.to) return gap;
  const cut = { from: Math.max(gap.from, span.from), to: Math.min(gap.to, span.to) };
  return cut.from < cut.to ? cut : null;
}

/** The sums of each line's cells over any rows; made when first asked for. */
function runningTotals(lines: readonly FrameLine[], complete: Uint8Array): (rows: RowRecipe) => readonly number[] {
  let sums: readonly Float64Array[] | null = null;
  return (rows) => {
    sums ??= lines.map(({ numbers }) => summedBefore(numbers, complete));
    const runs = runsOf(rows);
    return sums.map((before) => runs.reduce((total, { from, to }) => total + before[to]! - before[from]!, 0));
  };
}

function summedBefore(numbers: Float64Array, complete: Uint8Array): Float64Array {
  const sums = new Float64Array(numbers.length + 1);
  for (let row = 0; row < numbers.length; row++) sums[row + 1] = sums[row]! + (complete[row] === 1 ? numbers[row]! : 0);
  return sums;
}
