import { mostColumns, mostRows, parseAddress } from "../core/table/address.ts";
import { type Rectangle, intersection } from "./areas.ts";

/** A change to a sheet as Excel tells it: the cells meant, and whether they were edited, put in or taken out. */
export interface SheetChange {
  readonly kind: string;
  readonly area: Rectangle;
}

/** The cells an event speaks of: "B2:C4", whole columns "B:C", whole rows "5:7"; the whole sheet where that cannot be told. */
export function changedArea(address: string): Rectangle {
  const rows = /^\$?(\d+):\$?(\d+)$/.exec(address);
  if (rows === null) return parseAddress(address) ?? { row: 0, column: 0, rows: mostRows, columns: mostColumns };
  const [first, last] = [Number(rows[1]), Number(rows[2])];
  return { row: first - 1, column: 0, rows: last - first + 1, columns: mostColumns };
}

/** Where a watched area stands after a change, and whether the change touched it. null once all its cells are gone. */
export interface Moved {
  readonly area: Rectangle | null;
  readonly touched: boolean;
}

/** Follows an area through rows and columns that are put in or taken out before it or inside it. */
export function moved(area: Rectangle, { kind, area: change }: SheetChange): Moved {
  switch (kind) {
    case "RowInserted": {
      const [row, rows] = inserted([area.row, area.rows], [change.row, change.rows]);
      return { area: { ...area, row, rows }, touched: rows !== area.rows };
    }
    case "ColumnInserted": {
      const [column, columns] = inserted([area.column, area.columns], [change.column, change.columns]);
      return { area: { ...area, column, columns }, touched: columns !== area.columns };
    }
    case "RowDeleted": {
      const [row, rows] = deleted([area.row, area.rows], [change.row, change.rows]);
      return { area: rows === 0 ? null : { ...area, row, rows }, touched: rows !== area.rows };
    }
    case "ColumnDeleted": {
      const [column, columns] = deleted([area.column, area.columns], [change.column, change.columns]);
      return { area: columns === 0 ? null : { ...area, column, columns }, touched: columns !== area.columns };
    }
    // Edits and cells shifted inside a sheet: whatever meets the area counts as a change of it.
    default:
      return { area, touched: intersection(area, change) !== null };
  }
}

/** First place and length of a stretch of rows or columns. */
type Stretch = readonly [first: number, length: number];

function inserted([first, length]: Stretch, [at, count]: Stretch): Stretch {
  if (at <= first) return [first + count, length];
  return at < first + length ? [first, length + count] : [first, length];
}

function deleted([first, length]: Stretch, [at, count]: Stretch): Stretch {
  const before = Math.max(0, Math.min(first, at + count) - Math.min(first, at));
  const inside = Math.max(0, Math.min(first + length, at + count) - Math.max(first, at));
  return [first - before, length - inside];
}
