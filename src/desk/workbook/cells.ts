import {
  CellValueType,
  type ICellData,
  type IObjectArrayPrimitiveType,
  type IObjectMatrixPrimitiveType,
  type IRange,
  type Nullable,
} from "@univerjs/core";
import { FormulaDataModel } from "@univerjs/engine-formula";
import { boundsOf, fromRange, intersectionOf, type Area } from "./areas.ts";
import { worksheetOf, type Book } from "./book.ts";
import { flushDrafts } from "./drafts.ts";

type Matrix<T> = IObjectMatrixPrimitiveType<Nullable<T>>;

/** The cells of a sheet as they show: what is stored, and what formulas spill over it. */
export interface SheetCells {
  readonly stored: Matrix<ICellData>;
  readonly spilled: Matrix<ICellData>;
  readonly spills: Matrix<IRange>;
}

export function cellsOf(book: Book, sheet: string): SheetCells {
  flushDrafts(book);
  const model = book.grid.injector.get(FormulaDataModel);
  return {
    stored: worksheetOf(book, sheet).getCellMatrix().getMatrix(),
    spilled: model.getArrayFormulaCellData()[book.unit]?.[sheet] ?? {},
    spills: model.getArrayFormulaRange()[book.unit]?.[sheet] ?? {},
  };
}

/** No value and no formula. An apostrophe alone is an empty text, and a text is no blank. */
function isBlank(cell: ICellData | null | undefined): boolean {
  if (cell === undefined || cell === null) return true;
  if (isFormula(cell)) return false;
  const value = contentOf(cell);
  return value === null || (value === "" && !isForcedText(cell));
}

/** Text that is pasted with its looks is kept as a little document, which ends in a line break. */
function contentOf({ v, p }: ICellData): string | number | boolean | null {
  return v ?? p?.body?.dataStream.replace(/[\r\n]+$/, "") ?? null;
}

export function cellAt(cells: SheetCells, row: number, column: number): ICellData | undefined {
  const stored = cells.stored[row]?.[column] ?? undefined;
  return isBlank(stored) ? resultOver(stored, cells.spilled[row]?.[column]) : stored;
}

/** What a formula elsewhere spills into an empty cell, in the cell's own looks. */
function resultOver(stored: ICellData | undefined, spilled: Nullable<ICellData>): ICellData | undefined {
  const value = spilled?.v ?? null;
  if (value === null) return stored;
  // An empty text that a formula spills is a text.
  const t = value === "" ? CellValueType.FORCE_STRING : (spilled?.t ?? null);
  return { v: value, t, ...(stored?.s === undefined ? {} : { s: stored.s }) };
}

export type CellValue = number | string | boolean;
export type CellKind = "Empty" | "Double" | "String" | "Boolean" | "Error";

const errorSign = /^#(NULL!|DIV\/0!|VALUE!|REF!|NAME\?|NUM!|N\/A|SPILL!|BUSY!|CALC!|GETTING_DATA|CYCLE!|ERROR!)$/;

/** Text written with an apostrophe or into a cell of text format is never an error, whatever it reads. */
const isForcedText = (cell: ICellData): boolean => cell.t === CellValueType.FORCE_STRING;

export const isErrorSign = (text: string): boolean => errorSign.test(text);

export const isFormula = (cell: ICellData | undefined): boolean =>
  cell !== undefined && ((cell.f !== undefined && cell.f !== null && cell.f !== "") || (cell.si ?? "") !== "");

/** The formula of a cell, "" where it has none; cells filled from one another share theirs. */
export function formulaAt(book: Book, sheet: string, at: { row: number; column: number }): string {
  const cell = cellsOf(book, sheet).stored[at.row]?.[at.column] ?? undefined;
  if (!isFormula(cell)) return "";
  if ((cell?.f ?? "") !== "") return cell?.f ?? "";
  const model = book.grid.injector.get(FormulaDataModel);
  return model.getFormulaStringByCell(at.row, at.column, sheet, book.unit) ?? "";
}

export function valueOf(cell: ICellData | undefined): CellValue {
  const value = cell === undefined ? null : contentOf(cell);
  if (cell === undefined || value === null) return "";
  if (cell.t === CellValueType.BOOLEAN) return value === 1 || value === true || value === "1" || value === "TRUE";
  return value;
}

export function kindOf(cell: ICellData | undefined): CellKind {
  const value = valueOf(cell);
  if (typeof value === "boolean") return "Boolean";
  if (typeof value === "number") return "Double";
  if (cell !== undefined && errorSign.test(value) && !isForcedText(cell)) return "Error";
  return isBlank(cell) ? "Empty" : "String";
}

/** The area a formula in this cell fills, the cell itself included; null where it fills no other. */
export function spillFrom(book: Book, sheet: string, cell: { row: number; column: number }): Area | null {
  const cells = cellsOf(book, sheet);
  const range = cells.spills[cell.row]?.[cell.column];
  if (range === undefined || range === null) return null;
  if (valueOf(cells.stored[cell.row]?.[cell.column] ?? undefined) === "#SPILL!") return null;
  const area = fromRange(sheet, range);
  return area.rows * area.columns > 1 ? area : null;
}

/** Every spill of a sheet, by the cell it comes from. */
export function spillsOf(book: Book, sheet: string): readonly Area[] {
  const { spills } = cellsOf(book, sheet);
  return Object.keys(spills).flatMap((row) =>
    Object.keys(spills[Number(row)] ?? {}).flatMap((column) => {
      const area = spillFrom(book, sheet, { row: Number(row), column: Number(column) });
      return area === null ? [] : [area];
    }),
  );
}

/**
 * The smallest area around the cells in use, within the area given.
 * @param valuesOnly - leaves out cells that hold a format and nothing else.
 */
export function usedWithin(book: Book, area: Area, valuesOnly: boolean): Area | null {
  const cells = cellsOf(book, area.sheet);
  let used: Area | null = null;
  for (const key of Object.keys(cells.stored)) {
    const row = Number(key);
    if (row < area.row || row >= area.row + area.rows) continue;
    const columns = usedColumns(cells.stored[row] ?? {}, valuesOnly, area);
    if (columns === null) continue;
    const strip = { sheet: area.sheet, row, column: columns.first, rows: 1, columns: columns.last - columns.first + 1 };
    used = used === null ? strip : boundsOf(used, strip);
  }
  for (const spill of spillsOf(book, area.sheet)) {
    const part = intersectionOf(spill, area);
    if (part !== null) used = used === null ? part : boundsOf(used, part);
  }
  return used;
}

function usedColumns(
  row: IObjectArrayPrimitiveType<Nullable<ICellData>>,
  valuesOnly: boolean,
  area: Area,
): { readonly first: number; readonly last: number } | null {
  let first = -1;
  let last = -1;
  for (const key of Object.keys(row)) {
    const column = Number(key);
    if (column < area.column || column >= area.column + area.columns) continue;
    const cell = row[column] ?? undefined;
    const styled = !valuesOnly && (cell?.s ?? null) !== null;
    if (isBlank(cell) && !styled) continue;
    if (first < 0) first = column;
    last = column;
  }
  return first < 0 ? null : { first, last };
}
