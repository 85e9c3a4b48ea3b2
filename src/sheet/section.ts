import type { ChartPlan, PlanCell, PlanFormat, PlanLink } from "./plan.ts";

/** A part of a sheet laid out from its own row 0; `stack` moves it to its place. */
export interface Section {
  readonly rows: readonly (readonly PlanCell[])[];
  readonly formats: readonly PlanFormat[];
  readonly links: readonly PlanLink[];
}

export const text = (value: string): PlanCell => (value === "" ? null : { kind: "text", text: value });
export const number = (value: number): PlanCell => ({ kind: "number", number: value });
export const formula = (value: string): PlanCell => ({ kind: "formula", formula: value });

/** A value of a table as a cell. */
export const cellOf = (value: string | number): PlanCell => (typeof value === "number" ? number(value) : text(value));

export const section = (
  rows: Section["rows"],
  formats: readonly PlanFormat[] = [],
  links: readonly PlanLink[] = [],
): Section => ({
  rows,
  formats,
  links,
});

export interface Stacked extends Section {
  /** The row each part begins at. */
  readonly starts: readonly number[];
}

/** Rows that a section takes on the page, with the blank row that follows it; one without rows takes none. */
export const rowsTaken = ({ rows }: Section): number => (rows.length === 0 ? 0 : rows.length + 1);

/** Puts sections one below the other with a blank row between them. */
export function stack(parts: readonly Section[]): Stacked {
  const rows: (readonly PlanCell[])[] = [];
  const formats: PlanFormat[] = [];
  const links: PlanLink[] = [];
  const starts: number[] = [];
  for (const part of parts) {
    const start = rows.length;
    starts.push(start);
    formats.push(...part.formats.map((format) => movedFormat(format, start)));
    links.push(...part.links.map((link) => ({ ...link, row: link.row + start })));
    rows.push(...part.rows, ...(part.rows.length === 0 ? [] : [[]]));
  }
  return { rows, formats, links, starts };
}

const movedFormat = (format: PlanFormat, rows: number): PlanFormat => ({
  ...format,
  area: { ...format.area, row: format.area.row + rows },
});

/** Rows of unequal length made into a rectangle, blanks to the right. */
export function rectangle(rows: Section["rows"], columns: number): (readonly PlanCell[])[] {
  return rows.map((row) => [...row, ...Array.from({ length: columns - row.length }, (): PlanCell => null)]);
}

export const movedChart = (chart: ChartPlan, row: number): ChartPlan => ({ ...chart, place: { ...chart.place, row } });
