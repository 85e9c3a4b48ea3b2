import { type SheetArea, columnLetters, parseAddress } from "../../table/address.ts";
import { type Rectangle, overlap } from "../cellsOfBook.ts";

/** Cells that show the results of regressions. */
export interface Filled {
  readonly isEmpty: () => boolean;
  readonly add: (sheet: string, cells: Rectangle) => void;
  /** Whether a cell of that name shows one on any sheet. */
  readonly anywhere: (cell: string) => boolean;
  /** Whether a range reaches into where they stand, on any sheet. */
  readonly mayReach: (range: string) => boolean;
  readonly within: (area: SheetArea) => boolean;
}

/** Beyond these a result is a column of predictions, which report no regression where they are read. */
const mostRows = 5;
const mostColumns = 70;

/** Larger ranges are data. */
const mostRead = 1000;

export function filledCells(): Filled {
  const cells = new Map<string, Set<string>>();
  const anywhere = new Set<string>();
  let bounds: Rectangle | null = null;
  return {
    isEmpty: () => bounds === null,
    add: (sheet, { rows, columns, ...corner }) => {
      const own = cells.get(sheet.toLowerCase()) ?? new Set<string>();
      cells.set(sheet.toLowerCase(), own);
      const kept = { ...corner, rows: Math.min(rows, mostRows), columns: Math.min(columns, mostColumns) };
      bounds = bounds === null ? kept : around(bounds, kept);
      for (const [row, column] of placesIn(kept)) {
        own.add(`${row},${column}`);
        anywhere.add(`${columnLetters(column)}${row + 1}`);
      }
    },
    anywhere: (cell) => anywhere.has(cell),
    mayReach: (range) => {
      const area = parseAddress(range);
      return area !== null && bounds !== null && overlap(area, bounds);
    },
    within: (area) => {
      const own = cells.get(area.sheet.toLowerCase());
      if (own === undefined || area.rows * area.columns > mostRead) return false;
      for (const [row, column] of placesIn(area)) if (own.has(`${row},${column}`)) return true;
      return false;
    },
  };
}

function* placesIn({ row, column, rows, columns }: Rectangle): Generator<readonly [number, number]> {
  for (let down = 0; down < rows; down++)
    for (let across = 0; across < columns; across++) yield [row + down, column + across];
}

function around(one: Rectangle, other: Rectangle): Rectangle {
  const [row, column] = [Math.min(one.row, other.row), Math.min(one.column, other.column)];
  const bottom = Math.max(one.row + one.rows, other.row + other.rows);
  const right = Math.max(one.column + one.columns, other.column + other.columns);
  return { row, column, rows: bottom - row, columns: right - column };
}
