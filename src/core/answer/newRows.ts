import type { Design, Term } from "../design/design.ts";
import type { Model, Transform } from "../design/model.ts";
import { type Transformed, transformed } from "../design/transforms.ts";
import { type Result, failure, success } from "../problem/result.ts";
import { type LevelCells, readLevelCells } from "../table/levelCells.ts";
import { readNumberCells } from "../table/numberCells.ts";
import type { Column, Source } from "../table/source.ts";

/** New rows in the terms of a design: k values each, null for a row that lacks one. */
export type NewRows = readonly (Float64Array | null)[];

/** What is made of new rows, or why nothing can be. */
export type ReadNewRows = Result<{ readonly kind: "rows"; readonly rows: NewRows } | NotFromRows>;

interface NotFromRows {
  readonly kind: "not-applicable";
  readonly because: string;
}

/** One value a new row, NaN where it is missing; never leaves this file. */
type Values = Float64Array;

/**
 * Puts new rows of the drivers into the terms of a design: transforms are applied, categories become their indicators.
 * @param source - one column a driver, named as the drivers are.
 * @returns Problems of the cells as they are found, "unknown-heading" for a driver without a column, "unknown-value" for
 *   a category that the fit does not know; not-applicable where a term is made from time.
 */
export function readNewRows(source: Source, design: Design, model: Model): ReadNewRows {
  const columns: Values[] = [];
  for (const term of design.terms) {
    const values = valuesOf(term, { source, design, model });
    if (values === null) {
      const because = `"${term.name}" is made from time, so it cannot be told from a row by itself.`;
      return success({ kind: "not-applicable", because });
    }
    if (!values.ok) return values;
    columns.push(values.value);
  }
  const rows = Array.from({ length: source.rowCount }, (_, row) => {
    const values = Float64Array.from(columns, (column) => column[row]!);
    return values.some(Number.isNaN) ? null : values;
  });
  return success({ kind: "rows", rows });
}

interface Context {
  readonly source: Source;
  readonly design: Design;
  readonly model: Model;
}

/** null for a term that is made from time. */
function valuesOf({ meaning }: Term, { source, design, model }: Context): Result<Values> | null {
  if (meaning.kind === "constant") return success(new Float64Array(source.rowCount).fill(1));
  if (meaning.kind !== "number" && meaning.kind !== "level") return null;
  const column = source.columns.find(({ name }) => name === meaning.column);
  if (column === undefined) {
    return failure({ code: "unknown-heading", heading: meaning.column, nearest: null, where: "the new rows" });
  }
  if (meaning.kind === "level") return levelValues(column, meaning, knownLevels(design, meaning.column));
  return numberValues(column, meaning.transform, model);
}

/** null for a transform that looks back in time. */
function numberValues(column: Column, transform: Transform, { textNumbers }: Model): Result<Values> | null {
  if ("periods" in transform) return null;
  const decimal = textNumbers.find((leave) => leave.column === column.name)?.decimal ?? null;
  const numbers = readNumberCells(column, decimal);
  if (!numbers.ok) return numbers;
  const made = transformed({ column, numbers: numbers.value }, transform, null);
  return made.ok ? success(withGaps(made.value)) : made;
}

const withGaps = ({ values, present }: Transformed): Values =>
  values.map((value, row) => (present[row] === 1 ? value : Number.NaN));

const knownLevels = ({ terms }: Design, column: string): string[] =>
  terms.flatMap(({ meaning }) =>
    meaning.kind === "level" && meaning.column === column ? [meaning.level, meaning.base] : [],
  );

function levelValues(column: Column, { level }: { readonly level: string }, known: readonly string[]): Result<Values> {
  const read = readLevelCells(column);
  if (!read.ok) return read;
  const stranger = read.value.levels.find((found) => !known.includes(found));
  if (stranger !== undefined) {
    const allowed = [...new Set(known)];
    return failure({ code: "unknown-value", setting: column.name, value: stranger, allowed, nearest: null });
  }
  return success(indicators(read.value, level));
}

const indicators = ({ codes, levels }: LevelCells, level: string): Values =>
  Float64Array.from(codes, (code) => (code < 0 ? Number.NaN : levels[code] === level ? 1 : 0));
