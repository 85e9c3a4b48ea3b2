import type { ICellData, IStyleData } from "@univerjs/core";
import { hasSheet, type Book } from "./book.ts";
import { carryOut, command, styleTrigger } from "./grid.ts";
import type { Draft, DraftCells } from "./records.ts";

/** The draft of one row, to put cells in. */
export interface DraftRow {
  readonly contents: Record<number, ICellData>;
  readonly looks: Record<number, ICellData>;
}

export function draftRow(book: Book, sheet: string, row: number): DraftRow {
  const { contents, looks } = draftOf(book, sheet);
  return { contents: (contents[row] ??= {}), looks: (looks[row] ??= {}) };
}

function draftOf(book: Book, sheet: string): Draft {
  const known = book.drafts.get(sheet);
  if (known !== undefined) return known;
  const draft: Draft = { contents: {}, looks: {} };
  book.drafts.set(sheet, draft);
  return draft;
}

/** What is gathered for a cell so far. */
export const draftedAt = ({ contents, looks }: DraftRow, column: number): ICellData | undefined =>
  contents[column] ?? looks[column];

export function draftContent(row: DraftRow, column: number, content: ICellData): void {
  row.contents[column] = overlay(draftedAt(row, column), content);
  Reflect.deleteProperty(row.looks, column);
}

export function draftLook(row: DraftRow, column: number, style: IStyleData): void {
  const part = row.contents[column] === undefined ? row.looks : row.contents;
  part[column] = overlay(part[column], { s: style });
}

function overlay(before: ICellData | undefined, change: ICellData): ICellData {
  if (before === undefined) return change;
  const style = mergedStyle(before.s, change.s);
  return { ...before, ...change, ...(style === null ? {} : { s: style }) };
}

function mergedStyle(before: ICellData["s"], change: ICellData["s"]): IStyleData | null {
  const [old, fresh] = [asStyle(before), asStyle(change)];
  if (old === null || fresh === null) return fresh ?? old;
  const borders = old.bd ?? fresh.bd;
  return { ...old, ...fresh, ...(borders ? { bd: { ...old.bd, ...fresh.bd } } : {}) };
}

const asStyle = (style: ICellData["s"]): IStyleData | null =>
  typeof style === "object" && style !== null ? style : null;

/** Brings everything gathered into the grid. */
export function flushDrafts(book: Book): void {
  if (book.drafts.size === 0) return;
  const drafts = [...book.drafts];
  book.drafts.clear();
  for (const [sheet, { contents, looks }] of drafts) {
    if (!hasSheet(book, sheet)) continue;
    const shared = { unitId: book.unit, subUnitId: sheet };
    if (holdsCells(contents)) carryOut(book.grid, command.setValues, { ...shared, cellValue: contents });
    if (holdsCells(looks)) {
      carryOut(book.grid, command.setValues, { ...shared, cellValue: looks, trigger: styleTrigger });
    }
  }
}

const holdsCells = (cells: DraftCells): boolean => Object.values(cells).some((row) => Object.keys(row).length > 0);
