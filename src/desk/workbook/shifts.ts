import { addressOf, parseAddress } from "../../core/table/address.ts";
import { absoluteAddress, intersectionOf, type Area } from "./areas.ts";
import { nameOf, recordOf, sheetIds, sheetNamed, type Book, type BookChange } from "./book.ts";
import { usedWithin } from "./cells.ts";
import type { LinkRecord, SeriesRecord, SheetRecord } from "./records.ts";
import { renameColumns } from "./renameInFormulas.ts";
import { announceTable, areaOfTable } from "./tables.ts";

type Edit = Extract<BookChange, { readonly kind: "edited" | "calculated" }>;

/** Rows or columns that came, or went where the count is negative. */
interface Shift {
  readonly along: "row" | "column";
  readonly at: number;
  readonly count: number;
}

/** Keeps what stands beside the grid in step with the grid: tables, links and charts move and are renamed with their cells. */
export function followChanges(book: Book, change: BookChange): void {
  if (change.kind === "deleted") book.sheets.delete(change.sheet);
  if (change.kind === "renamed") renameInCharts(book, change.before, change.sheet);
  if (change.kind !== "edited") return;
  if (change.shift !== undefined) shiftRecords(book, change.sheet, shiftOf(change, change.shift));
  else {
    refreshHeadings(book, change);
    if (change.moved !== true) takeInRows(book, change);
  }
}

/** A new heading is a new name of its column in formulas. */
function refreshHeadings(book: Book, change: Edit): void {
  for (const table of recordOf(book, change.sheet).tables) {
    const placed = { sheet: change.sheet, table };
    const headings = { ...areaOfTable(placed), rows: 1 };
    if (intersectionOf(headings, change) === null) continue;
    renameColumns(book, placed);
    announceTable(book, placed);
  }
}

/**
 * What is entered right below a table belongs to it, where nothing else stands in the same rows: the table grows, and
 * what speaks of it is calculated anew.
 */
function takeInRows(book: Book, change: Edit): void {
  for (const table of recordOf(book, change.sheet).tables) {
    const { row, column, rows, columns } = change;
    const isWithin = column >= table.column && column + columns <= table.column + table.columns;
    if (row !== table.row + table.rows || !isWithin) continue;
    const used = usedWithin(
      book,
      { sheet: change.sheet, row, column: table.column, rows, columns: table.columns },
      true,
    );
    if (used === null || intersectionOf(used, change) === null || !sameColumns(used, change)) continue;
    table.rows += rows;
    announceTable(book, { sheet: change.sheet, table });
  }
}

const sameColumns = (used: Area, change: Edit): boolean =>
  used.column >= change.column && used.column + used.columns <= change.column + change.columns;

function shiftOf({ row, column, rows, columns }: Edit, kind: NonNullable<Edit["shift"]>): Shift {
  const sign = kind.endsWith("Inserted") ? 1 : -1;
  return kind.startsWith("Row")
    ? { along: "row", at: row, count: sign * rows }
    : { along: "column", at: column, count: sign * columns };
}

function shiftRecords(book: Book, sheet: string, shift: Shift): void {
  const record = recordOf(book, sheet);
  moveLinks(record, shift);
  for (const table of [...record.tables]) {
    const moved = movedArea(areaOfTable({ sheet, table }), shift);
    if (moved === null) record.tables.splice(record.tables.indexOf(table), 1);
    else {
      Object.assign(table, { row: moved.row, column: moved.column, rows: moved.rows, columns: moved.columns });
      announceTable(book, { sheet, table });
    }
  }
  eachReference(book, (text) => {
    const area = parseAddress(text);
    if (area === null || sheetNamed(book, area.sheet) !== sheet) return text;
    const moved = movedArea({ ...area, sheet }, shift);
    return moved === null ? "" : absoluteAddress(book, moved);
  });
}

function moveLinks(record: SheetRecord, { along, at, count }: Shift): void {
  const moved: [string, LinkRecord][] = [];
  for (const [place, link] of record.links) {
    const [row = 0, column = 0] = place.split(",").map(Number);
    const position = along === "row" ? row : column;
    const isGone = count < 0 && position >= at && position < at - count;
    const next = position < at ? position : position + count;
    if (!isGone) moved.push([along === "row" ? `${next},${column}` : `${row},${next}`, link]);
  }
  record.links.clear();
  for (const [place, link] of moved) record.links.set(place, link);
}

/** Where an area is after a shift; null where nothing of it is left. */
function movedArea(area: Area, shift: Shift): Area | null {
  const size = shift.along === "row" ? "rows" : "columns";
  const first = area[shift.along];
  const start = movedEdge(first, shift, 0);
  // The last cell itself may go, and the area with it; what is inserted behind it does not belong to the area.
  const end = movedEdge(first + area[size] - 1, shift, 1);
  return end < start ? null : { ...area, [shift.along]: start, [size]: end - start + 1 };
}

/** @param counted - 1 where the cell at the edge counts among those that may go. */
function movedEdge(edge: number, { at, count }: Shift, counted: 0 | 1): number {
  if (edge < at) return edge;
  return count > 0 ? edge + count : edge - Math.min(-count, edge - at + counted);
}

function renameInCharts(book: Book, before: string, sheet: string): void {
  eachReference(book, (text) => {
    const area = parseAddress(text);
    if (area?.sheet.toLowerCase() !== before.toLowerCase()) return text;
    const renamed = addressOf({ ...area, sheet: nameOf(book, sheet) });
    return renamed.slice(0, renamed.lastIndexOf("!")) + text.slice(text.lastIndexOf("!"));
  });
}

function eachReference(book: Book, change: (text: string) => string): void {
  const series = sheetIds(book).flatMap((sheet) => recordOf(book, sheet).charts.flatMap((chart) => chart.series));
  for (const one of series) Object.assign(one, { x: change(one.x), y: change(one.y) } satisfies Partial<SeriesRecord>);
}
