import { messageOf } from "../../src/core/problem/messages.ts";
import type { Problem } from "../../src/core/problem/problem.ts";
import type { Result } from "../../src/core/problem/result.ts";
import type { CellBlock } from "../../src/core/table/block.ts";
import { serialOf } from "../../src/core/table/calendar.ts";
import type { Cell } from "../../src/core/table/cells.ts";
import type { Column, Source } from "../../src/core/table/source.ts";
import { toCellColumn } from "./cellColumns.ts";

/** Rows of cells as a block that begins at a cell of a sheet, A1 of "Months" unless said otherwise. */
export function blockOf(rows: readonly (readonly Cell[])[], at: Partial<CellBlock> = {}): CellBlock {
  const width = Math.max(0, ...rows.map((row) => row.length));
  return {
    sheet: "Months",
    firstRow: 0,
    firstColumn: 0,
    rowCount: rows.length,
    columns: Array.from({ length: width }, (_, column) => toCellColumn(rows.map((row) => row[column] ?? null))),
    ...at,
  };
}

/** Columns side by side on sheet "Months", data from row 2 on, in columns A, B, C. */
export function sourceOf(columns: Readonly<Record<string, readonly Cell[]>>): Source {
  const entries = Object.entries(columns);
  return {
    rowCount: entries[0]?.[1].length ?? 0,
    columns: entries.map(([name, cells], column) => columnOf(name, cells, column)),
  };
}

export const columnOf = (name: string, cells: readonly Cell[], column = 0): Column => ({
  name,
  place: { kind: "sheet", sheet: "Months", column, firstRow: 1 },
  cells: toCellColumn(cells),
});

/** A day as a date cell. */
export const day = (year: number, month: number, dayOfMonth: number): { date: number } => {
  const serial = serialOf({ year, month, day: dayOfMonth });
  if (serial === null) throw new Error(`no such day: ${year}-${month}-${dayOfMonth}`);
  return { date: serial };
};

/** The value of a result that must be one. */
export function must<T>(result: Result<T>): T {
  if (!result.ok) throw new Error(messageOf(result.problem));
  return result.value;
}

/** The fault of a result that must be one. */
export function faultOf(result: Result<unknown>): Problem {
  if (result.ok) throw new Error("no fault was found");
  return result.problem;
}
