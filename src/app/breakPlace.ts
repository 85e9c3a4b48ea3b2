import { rowPlacesOf } from "../core/answer/rowPlaces.ts";
import { buildDesign } from "../core/design/buildDesign.ts";
import type { Source } from "../core/table/source.ts";
import { questionOf } from "./questionOf.ts";
import type { Setup } from "./setup.ts";

/** Where a break may stand: the rows that are used, in time, by their place in the sheet. */
export interface BreakPlaces {
  /** Rows used. */
  readonly count: number;
  /** How many rows used stand before a row of the sheet (from 1); null where that row is not used. */
  readonly before: (sheetRow: number) => number | null;
  /** The row of the sheet that comes first after so many rows. */
  readonly after: (rows: number) => number | null;
}

/** More rows than these would hold up the pane; the break is then given as a number of rows. */
const mostRows = 20_000;

/** @returns null where there are too many rows, or the set-up has a fault that is told elsewhere. */
export function breakPlacesOf(source: Source, setup: Setup): BreakPlaces | null {
  if (source.rowCount > mostRows) return null;
  const question = questionOf(source, setup);
  if (!question.ok) return null;
  const design = buildDesign(question.value.source, question.value.model);
  if (!design.ok || design.value.order.kind !== "time") return null;
  const { number } = rowPlacesOf(design.value, question.value.source);
  const count = design.value.rowCount;
  const rows = Array.from({ length: count }, (_, row) => number(row));
  const places = new Map(rows.map((row, place) => [row, place]));
  return { count, before: (row) => places.get(row) ?? null, after: (place) => rows[place] ?? null };
}
