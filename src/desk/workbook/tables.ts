import {
  ISuperTableService,
  SetSuperTableMutation,
  RemoveSuperTableMutation,
  type ISuperTable,
} from "@univerjs/engine-formula";
import { intersectionOf, type Area } from "./areas.ts";
import { recordOf, sheetIds, type Book } from "./book.ts";
import { cellAt, cellsOf, valueOf } from "./cells.ts";
import { carryOut } from "./grid.ts";
import type { TableRecord } from "./records.ts";

export interface PlacedTable {
  readonly sheet: string;
  readonly table: TableRecord;
}

export const tablesOf = (book: Book): readonly PlacedTable[] =>
  sheetIds(book).flatMap((sheet) => recordOf(book, sheet).tables.map((table) => ({ sheet, table })));

export const areaOfTable = ({ sheet, table }: PlacedTable): Area => ({
  sheet,
  row: table.row,
  column: table.column,
  rows: table.rows,
  columns: table.columns,
});

/** A table by its name or id, as Excel's API finds it. */
export const tableNamed = (book: Book, key: string): PlacedTable | null =>
  tablesOf(book).find(({ table }) => table.id === key || table.name.toLowerCase() === key.toLowerCase()) ?? null;

export const tablesIn = (book: Book, area: Area): readonly PlacedTable[] =>
  tablesOf(book).filter((placed) => intersectionOf(areaOfTable(placed), area) !== null);

export function headingsOf(book: Book, { sheet, table }: PlacedTable): readonly string[] {
  const cells = cellsOf(book, sheet);
  return Array.from({ length: table.columns }, (_, column) =>
    String(valueOf(cellAt(cells, table.row, table.column + column))),
  );
}

/** Tells the formula engine of a table before it calculates, so that structured references resolve. */
export function registerTable(book: Book, placed: PlacedTable, headings: readonly string[]): void {
  book.grid.injector.get(ISuperTableService).registerTable(book.unit, placed.table.name, reference(placed, headings));
}

/** Tells it of a new, moved or renamed table: what refers to it is calculated anew. */
export function announceTable(book: Book, placed: PlacedTable): void {
  const { name: tableName } = placed.table;
  const headings = headingsOf(book, placed);
  carryOut(book.grid, SetSuperTableMutation.id, {
    unitId: book.unit,
    tableName,
    reference: reference(placed, headings),
  });
}

export function forgetTable(book: Book, tableName: string): void {
  carryOut(book.grid, RemoveSuperTableMutation.id, { unitId: book.unit, tableName });
}

function reference({ sheet, table }: PlacedTable, headings: readonly string[]): ISuperTable {
  return {
    sheetId: sheet,
    titleMap: new Map(headings.map((heading, column) => [heading, column])),
    range: {
      startRow: table.row,
      startColumn: table.column,
      endRow: table.row + table.rows - 1,
      endColumn: table.column + table.columns - 1,
    },
  };
}
