import { IDefinedNamesService, RemoveDefinedNameMutation, SetDefinedNameMutation } from "@univerjs/engine-formula";
import { parseArea, type Area } from "./areas.ts";
import { activeSheet, type Book } from "./book.ts";
import { carryOut } from "./grid.ts";

export interface BookName {
  readonly id: string;
  readonly name: string;
  /** Without its "=". */
  readonly refersTo: string;
  readonly comment: string;
  /** The sheet whose name it is, null for a name of the workbook. */
  readonly sheet: string | null;
}

/** What the grid writes for a name that belongs to the whole workbook. */
export const wholeWorkbook = "AllDefaultWorkbook";

export function namesOf(book: Book): readonly BookName[] {
  const map = book.grid.injector.get(IDefinedNamesService).getDefinedNameMap(book.unit) ?? {};
  return Object.values(map).map(({ id, name, formulaOrRefString, comment, localSheetId }) => ({
    id,
    name,
    refersTo: formulaOrRefString.replace(/^=/, ""),
    comment: comment ?? "",
    sheet: localSheetId === undefined || localSheetId === wholeWorkbook ? null : localSheetId,
  }));
}

/** Names are held equal without regard to case; each sheet has its own beside those of the workbook. */
export const nameCalled = (book: Book, name: string, sheet: string | null): BookName | null =>
  namesOf(book).find((known) => known.sheet === sheet && known.name.toLowerCase() === name.toLowerCase()) ?? null;

export const nameId = (name: string, sheet: string | null): string =>
  sheet === null ? `name-${name.toLowerCase()}` : `name-${sheet}-${name.toLowerCase()}`;

export function setName(book: Book, { id, name, refersTo, comment, sheet }: BookName): void {
  const localSheetId = sheet ?? wholeWorkbook;
  carryOut(book.grid, SetDefinedNameMutation.id, {
    unitId: book.unit,
    id,
    name,
    formulaOrRefString: refersTo,
    comment,
    localSheetId,
  });
}

/** Whoever goes takes its own names along. */
export function removeNamesOfSheet(book: Book, sheet: string): void {
  for (const name of namesOf(book)) if (name.sheet === sheet) removeName(book, name);
}

export function removeName(book: Book, { id, name, refersTo, comment }: BookName): void {
  const params = { unitId: book.unit, id, name, formulaOrRefString: refersTo, comment };
  carryOut(book.grid, RemoveDefinedNameMutation.id, params);
}

export const areaOfName = (book: Book, name: BookName): Area | null =>
  parseArea(book, name.refersTo, name.sheet ?? activeSheet(book));
