import type { ICellData, IStyleData } from "@univerjs/core";
import { hasSheet, type Book } from "./book.ts";
import { carryOut, command, styleTrigger } from "./grid.ts";

/**
 * Changes that are gathered before they go to the grid, which looks through a sheet's every cell at each change:
 * the client cuts large blocks into hundreds of small ones.
 */
export interface Draft {
  readonly cells: Record<number, Record<number, ICellData>>;
  /** Looks alone set no calculation off. */
  changesValues: boolean;
}

function draftOf(book: Book, sheet: string): Draft {
  const known = book.drafts.get(sheet);
  if (known !== undefined) return known;
  const draft: Draft = { cells: {}, changesValues: false };
  book.drafts.set(sheet, draft);
  return draft;
}

/** One row of a draft, to put cells in. */
export function draftRow(book: Book, sheet: string, row: number): Record<number, ICellData> {
  return (draftOf(book, sheet).cells[row] ??= {});
}

export function markValues(book: Book, sheet: string): void {
  draftOf(book, sheet).changesValues = true;
}

/** Lays a cell's change over what the draft already holds of it. */
export function overlay(before: ICellData | undefined, change: ICellData): ICellData {
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
  for (const [sheet, { cells, changesValues }] of drafts) {
    if (!hasSheet(book, sheet)) continue;
    const trigger = changesValues ? {} : { trigger: styleTrigger };
    carryOut(book.grid, command.setValues, { unitId: book.unit, subUnitId: sheet, cellValue: cells, ...trigger });
  }
}
