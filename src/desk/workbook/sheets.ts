import { BooleanNumber, generateRandomId, mergeWorksheetSnapshotWithDefault } from "@univerjs/core";
import { activeSheet, hasSheet, nameOf, sheetIds, worksheetOf, type Book } from "./book.ts";
import { carryOut, command } from "./grid.ts";
import { standardHeight, standardWidth } from "./sizes.ts";

/** Adds an empty sheet behind the others, without showing it, as Excel's API does. */
export function addSheet(book: Book, name: string): string {
  const id = generateRandomId(8);
  const sizes = {
    rowCount: 1000,
    columnCount: 26,
    defaultColumnWidth: standardWidth,
    defaultRowHeight: standardHeight,
  };
  const sheet = mergeWorksheetSnapshotWithDefault({ id, name, ...sizes });
  const shown = activeSheet(book);
  carryOut(book.grid, command.insertSheet, { unitId: book.unit, index: sheetIds(book).length, sheet });
  if (activeSheet(book) !== shown) showSheet(book, shown);
  return id;
}

/** Excel's own next name: "Sheet" and the first free number. */
export function freeSheetName(book: Book): string {
  const taken = new Set(sheetIds(book).map((sheet) => nameOf(book, sheet).toLowerCase()));
  let number = taken.size + 1;
  while (taken.has(`sheet${number}`)) number += 1;
  return `Sheet${number}`;
}

export function removeSheet(book: Book, sheet: string): void {
  const ids = sheetIds(book);
  if (activeSheet(book) === sheet) {
    const next = ids[ids.indexOf(sheet) + 1] ?? ids[ids.indexOf(sheet) - 1];
    if (next !== undefined) showSheet(book, next);
  }
  carryOut(book.grid, command.removeEverywhere, { unitId: book.unit, subUnitId: sheet });
}

export const showSheet = (book: Book, sheet: string): void =>
  carryOut(book.grid, command.activate, { unitId: book.unit, subUnitId: sheet });

export const renameSheet = (book: Book, sheet: string, name: string): void =>
  carryOut(book.grid, command.renameEverywhere, { unitId: book.unit, subUnitId: sheet, name });

export function moveSheet(book: Book, sheet: string, toOrder: number): void {
  const fromOrder = sheetIds(book).indexOf(sheet);
  if (fromOrder !== toOrder)
    carryOut(book.grid, command.order, { unitId: book.unit, subUnitId: sheet, fromOrder, toOrder });
}

export function hideSheet(book: Book, sheet: string, hide: boolean): void {
  const hidden = hide ? BooleanNumber.TRUE : BooleanNumber.FALSE;
  carryOut(book.grid, command.hideSheet, { unitId: book.unit, subUnitId: sheet, hidden });
}

export const isHidden = (book: Book, sheet: string): boolean =>
  hasSheet(book, sheet) && worksheetOf(book, sheet).isSheetHidden() === BooleanNumber.TRUE;

/** How many rows and columns stay in view. */
export function freeze(book: Book, sheet: string, { rows, columns }: { rows: number; columns: number }): void {
  const start = { startRow: rows === 0 ? -1 : rows, startColumn: columns === 0 ? -1 : columns };
  const params = { unitId: book.unit, subUnitId: sheet, xSplit: columns, ySplit: rows, ...start };
  carryOut(book.grid, command.freeze, params);
}
