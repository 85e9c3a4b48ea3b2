import type { Errand } from "../app/errand.ts";
import { type Result, failure, success } from "../core/problem/result.ts";
import type { BookFormula, FormatWindow } from "../core/review/book.ts";
import type { CellColumn } from "../core/table/cells.ts";
import type { SheetArea } from "../core/table/address.ts";
import { columnBuilder } from "./columnBuilder.ts";
import { isTooMuchAtOnce } from "./faults.ts";
import { formatWindow } from "./formatWindow.ts";
import { persist } from "./session.ts";

/** What a review takes from the cells of a sheet. */
export interface SheetCells {
  readonly columns: readonly CellColumn[];
  readonly formulas: readonly BookFormula[];
  /** The other formulas, where formats are read too: they may show what those give. */
  readonly others: readonly BookFormula[];
  readonly calculated: readonly (Uint8Array<ArrayBuffer> | null)[];
  readonly formats: readonly FormatWindow[];
}

/** Excel on the web refuses answers above 5 MB; a cell with its formula, type and format takes up to some 40 bytes. */
const cellsAtOnce = 100_000;

/** Formats are read of sheets up to this size throughout, of larger ones in so many rows at either end. */
const cellsWithFormats = 60_000;
const rowsWithFormats = 500;

export interface SheetReading {
  readonly area: SheetArea;
  /** Which formulas are kept as text. */
  readonly isTelling: (formula: string) => boolean;
  /** Told how many cells have been read. */
  readonly read: (cells: number) => void;
  readonly signal: Errand["signal"];
}

/** Reads a sheet's used range chunk by chunk; a chunk that is too much for Excel is halved and tried again. */
export async function readSheetCells(
  context: Excel.RequestContext,
  reading: SheetReading,
): Promise<Result<SheetCells>> {
  const { area, read, signal } = reading;
  const collector = collectorOf(reading);
  let height = Math.max(1, Math.floor(cellsAtOnce / area.columns));
  for (let row = 0; row < area.rows;) {
    if (signal.aborted) return failure({ code: "cancelled" });
    const stretch = stretchAt(area, row);
    const rows = Math.min(height, stretch.end - row);
    const cells = await chunk(context, { ...area, row: area.row + row, rows }, stretch.formats);
    if (cells !== null) {
      collector.take(cells, row);
      row += rows;
      read(rows * area.columns);
    } else if (rows > 1) height = Math.floor(rows / 2);
    else return failure({ code: "too-much-for-excel", cells: area.columns, limit: cellsAtOnce });
  }
  return success(collector.cells());
}

/** The rows from one on that are read in the same way: with their formats, or without. */
function stretchAt({ rows, columns }: SheetArea, row: number): { readonly end: number; readonly formats: boolean } {
  if (rows * columns <= cellsWithFormats || rows <= 2 * rowsWithFormats) return { end: rows, formats: true };
  if (row < rowsWithFormats) return { end: rowsWithFormats, formats: true };
  return row < rows - rowsWithFormats ? { end: rows - rowsWithFormats, formats: false } : { end: rows, formats: true };
}

interface Chunk {
  readonly values: Block;
  readonly formulas: Block;
  readonly valueTypes: readonly (readonly string[])[];
  readonly numberFormat: readonly (readonly string[])[] | null;
}

type Block = readonly (readonly unknown[])[];

/** null where it is too much at once; Excel says so with an error, or with values that are null and no error at all. */
async function chunk(context: Excel.RequestContext, area: SheetArea, withFormats: boolean): Promise<Chunk | null> {
  const { sheet, row, column, rows, columns } = area;
  try {
    return await persist(async () => {
      const range = context.workbook.worksheets.getItem(sheet).getRangeByIndexes(row, column, rows, columns);
      range.load("formulas,valueTypes");
      if (withFormats) range.load("numberFormat");
      await context.sync();
      const { formulas, valueTypes } = range as { readonly [Key in "formulas" | "valueTypes"]: Chunk[Key] | null };
      if (formulas === null || valueTypes === null) return null;
      const numberFormat = withFormats ? (range.numberFormat as Chunk["numberFormat"]) : null;
      // A cell without a formula tells its value in its place, so that most chunks need no second look.
      const values = formulas.some((line) => line.some(isFormula)) ? await valuesOf(range) : formulas;
      return values === null ? null : { values, formulas, valueTypes, numberFormat };
    });
  } catch (fault) {
    if (isTooMuchAtOnce(fault)) return null;
    throw fault;
  }
}

async function valuesOf(range: Excel.Range): Promise<Block | null> {
  range.load("values");
  await range.context.sync();
  return range.values as Block | null;
}

const isFormula = (content: unknown): content is string => typeof content === "string" && content.startsWith("=");

interface FormulaPlace {
  readonly row: number;
  readonly column: number;
  /** Whether its number format is read. */
  readonly isShown: boolean;
}

/** Longer formulas calculate; those that show a result are short. */
const longestReader = 300;

function collectorOf({ area, isTelling }: SheetReading) {
  const builders = Array.from({ length: area.columns }, () => columnBuilder(area.rows));
  const calculated = Array.from({ length: area.columns }, (): Uint8Array<ArrayBuffer> | null => null);
  const formulas: BookFormula[] = [];
  const others: BookFormula[] = [];
  const formats: FormatWindow[] = [];
  const takeFormula = (formula: string, { row, column, isShown }: FormulaPlace): void => {
    (calculated[column] ??= new Uint8Array(area.rows))[row] = 1;
    const kept = isTelling(formula) ? formulas : isShown && formula.length <= longestReader ? others : null;
    kept?.push({ row: area.row + row, column: area.column + column, formula, rows: 1, columns: 1 });
  };
  const take = (cells: Chunk, firstRow: number): void => {
    for (const [column, { put }] of builders.entries()) put(cells, column, firstRow);
    cells.formulas.forEach((line, row) =>
      line.forEach((content, column) => {
        // A text that begins with "=" is its own value; a formula never is.
        if (isFormula(content) && content !== cells.values[row]![column]) {
          takeFormula(content, { row: firstRow + row, column, isShown: cells.numberFormat !== null });
        }
      }),
    );
    if (cells.numberFormat !== null) formats.push(formatWindow(cells.numberFormat, area.row + firstRow));
  };
  return {
    take,
    cells: () => ({ columns: builders.map(({ column }) => column()), formulas, others, calculated, formats }),
  };
}
