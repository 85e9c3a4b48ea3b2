import { IUniverInstanceService, UniverInstanceType, type Workbook, type Worksheet } from "@univerjs/core";
import type { Grid } from "./grid.ts";
import { emptySheetRecord, type CustomXmlRecord, type Draft, type SheetRecord } from "./records.ts";

/** An open workbook: the cells live in the grid, everything beside them in records by the grid's sheet id. */
export interface Book {
  readonly grid: Grid;
  /** The grid's id of the workbook; never the same twice in a process, since Univer's formula cache is shared. */
  readonly unit: string;
  readonly sheets: Map<string, SheetRecord>;
  readonly customXml: CustomXmlRecord[];
  readonly settings: Map<string, unknown>;
  /** What the workbook says of itself; the desk calculates at once either way. */
  readonly manualCalculation: boolean;
  /** Changes to cells on their way to the grid, by sheet. */
  readonly drafts: Map<string, Draft>;
  readonly listeners: Set<(change: BookChange) => void>;
}

/** What those who draw beside the grid, or tell an add-in, need to hear. */
export type BookChange =
  | {
      readonly kind: "edited" | "calculated";
      readonly sheet: string;
      readonly row: number;
      readonly column: number;
      readonly rows: number;
      readonly columns: number;
      /** Rows or columns that came or went, where the change was of that kind. */
      readonly shift?: "RowInserted" | "RowDeleted" | "ColumnInserted" | "ColumnDeleted";
      /** Cells that the grid itself wrote anew because others moved. */
      readonly moved?: true;
    }
  | { readonly kind: "selected"; readonly sheet: string }
  /** Before is the sheet shown until then, or the name it had. */
  | { readonly kind: "activated" | "renamed"; readonly sheet: string; readonly before: string }
  | { readonly kind: "added" | "deleted" | "charts"; readonly sheet: string };

export function announce(book: Book, change: BookChange): void {
  for (const listener of book.listeners) listener(change);
}

export function workbookOf(book: Book): Workbook {
  const workbook = book.grid.injector
    .get(IUniverInstanceService)
    .getUnit<Workbook>(book.unit, UniverInstanceType.UNIVER_SHEET);
  if (workbook === null || workbook === undefined) throw new Error("The workbook is closed.");
  return workbook;
}

export function worksheetOf(book: Book, sheet: string): Worksheet {
  const worksheet = workbookOf(book).getSheetBySheetId(sheet);
  if (worksheet === null || worksheet === undefined) throw new Error(`There is no sheet ${sheet}.`);
  return worksheet;
}

export const hasSheet = (book: Book, sheet: string): boolean =>
  workbookOf(book).getSheetBySheetId(sheet) !== null && workbookOf(book).getSheetBySheetId(sheet) !== undefined;

export const sheetIds = (book: Book): readonly string[] => workbookOf(book).getSheetOrders();

export const nameOf = (book: Book, sheet: string): string => worksheetOf(book, sheet).getName();

/** Excel holds sheet names equal without regard to case. */
export function sheetNamed(book: Book, name: string): string | null {
  const wanted = name.toLowerCase();
  return sheetIds(book).find((sheet) => nameOf(book, sheet).toLowerCase() === wanted) ?? null;
}

export function recordOf(book: Book, sheet: string): SheetRecord {
  const known = book.sheets.get(sheet);
  if (known !== undefined) return known;
  const record = emptySheetRecord();
  book.sheets.set(sheet, record);
  return record;
}

export const activeSheet = (book: Book): string => workbookOf(book).getActiveSheet().getSheetId();
