import { isEntireColumn, isEntireRow, type Area } from "../workbook/areas.ts";
import { hasSheet, recordOf, sheetIds } from "../workbook/book.ts";
import { fault } from "./fault.ts";
import type { Host } from "./host.ts";

/** Excel reads no more cells at once; beyond, the values come back as null without a word. */
const mostCellsRead = 5_000_000;

export const isUnbounded = (area: Area): boolean => isEntireColumn(area) || isEntireRow(area);

export const isTooLarge = (area: Area): boolean => area.rows * area.columns > mostCellsRead;

/** Whether the values of an area can be read cell by cell; where not, Excel answers null for the whole. */
export const isReadable = (area: Area): boolean => !isUnbounded(area) && !isTooLarge(area);

export function ensureSheet(host: Host, sheet: string): void {
  if (!hasSheet(host.book, sheet)) throw fault("InvalidObjectPath", "The sheet is gone.");
}

export function ensureWritable(host: Host, sheet: string): void {
  ensureSheet(host, sheet);
  if (recordOf(host.book, sheet).protected) throw fault("AccessDenied");
}

export function ensureStructure(host: Host): void {
  if (host.switches.structureProtected) throw fault("AccessDenied");
}

/** With another workbook in front, Excel neither adds nor shows sheets. */
export function ensureInFront(host: Host): void {
  if (host.switches.otherWorkbook) throw fault("GeneralException");
}

export function ensureSelection(host: Host): void {
  if (host.switches.chartSelected || host.switches.otherWorkbook) throw fault("InvalidSelection");
}

/** The last visible sheet can be neither deleted nor hidden. */
export function ensureNotLast(host: Host, isVisible: (sheet: string) => boolean, sheet: string): void {
  if (isVisible(sheet) && sheetIds(host.book).filter(isVisible).length === 1) throw fault("InvalidOperation");
}
