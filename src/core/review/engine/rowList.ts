import type { Frame } from "./frame.ts";
import { type LineValues, formed, lineValues } from "./lineValues.ts";
import type { Recipe, RowRecipe, Run } from "./recipe.ts";

/** The numbers of a recipe row by row, as they would be fitted: one column a line of the model. */
export interface Listed {
  /** By the frame's lines; those that the model does not use are empty. */
  readonly columns: readonly Float64Array<ArrayBuffer>[];
  /** The row of the frame each stands in; -1 for a row that stands nowhere. */
  readonly rows: readonly number[];
}

/** @returns null where a row that the recipe counts in has no value, as the logarithm of a zero. */
export function listRows(frame: Frame, recipe: Recipe): Listed | null {
  const used = [recipe.model.outcome, ...recipe.model.drivers];
  const values = frame.lines.map((line, index) =>
    used.includes(index) ? lineValues(line, recipe.lines[index]!, frame) : null,
  );
  const complete = completeRows(values.filter((line) => line !== null));
  const rows = runsOf(recipe.rows).flatMap(({ from, to }) =>
    rowsBetween(from, to).filter((row) => complete[row] === 1),
  );
  const totals = (): number[] => frame.lines.map(({ numbers }) => rows.reduce((sum, row) => sum + numbers[row]!, 0));
  const extra = extraRows(recipe, { totals, rows: rows.length });
  if (extra === null) return null;
  const factors = recipe.model.factors;
  const columns = values.map((line, index) => {
    const listed = line === null ? [] : [...rows.map((row) => line.values[row]!), ...extra.map((row) => row[index]!)];
    return Float64Array.from(listed, (value) => value * (factors[index] ?? 1));
  });
  return { columns, rows: [...rows, ...extra.map(() => -1)] };
}

/** 1 where every line has a value. */
export function completeRows(lines: readonly LineValues[]): Uint8Array<ArrayBuffer> {
  const complete = new Uint8Array(lines[0]?.present.length ?? 0).fill(1);
  for (const { present } of lines) for (let row = 0; row < complete.length; row++) complete[row]! &= present[row]!;
  return complete;
}

/** The runs of rows that count, in order, those counted again last. */
export function runsOf({ span, without, again }: RowRecipe): Run[] {
  const runs: Run[] = [];
  let from = span.from;
  for (const gap of without.toSorted((a, b) => a.from - b.from)) {
    if (gap.to <= from || gap.from >= span.to) continue;
    if (gap.from > from) runs.push({ from, to: gap.from });
    from = gap.to;
  }
  if (from < span.to) runs.push({ from, to: span.to });
  return [...runs, ...again];
}

const rowsBetween = (from: number, to: number): number[] =>
  Array.from({ length: Math.max(0, to - from) }, (_, i) => from + i);

/** What a row that sums up others is made of. */
export interface Summing {
  /** The sum of each line's cells, as they stand, over the rows that count. */
  readonly totals: () => readonly number[];
  readonly rows: number;
}

/** Rows of zeros and the row that sums up, after each line's form; null where a form has no value there. */
export function extraRows(recipe: Recipe, { totals, rows }: Summing): number[][] | null {
  const { zeros, summary } = recipe.rows;
  const plain: number[][] = Array.from({ length: zeros }, () => recipe.lines.map(() => 0));
  if (summary !== "none") plain.push(totals().map((sum) => (summary === "sum" ? sum : sum / Math.max(1, rows))));
  const made = plain.map((row) => row.map((value, index) => formed(value, recipe.lines[index]!.form)));
  const unused = (index: number): boolean => index !== recipe.model.outcome && !recipe.model.drivers.includes(index);
  const whole = made.map((row) => row.map((value, index) => (value === null && unused(index) ? 0 : value)));
  return whole.every((row): row is number[] => row.every((value) => value !== null)) ? whole : null;
}
