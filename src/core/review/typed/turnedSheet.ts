import type { BookSheet, FormatWindow } from "../book.ts";
import type { CellPlace } from "../cellsOfBook.ts";
import { rowOf } from "../found/claimedLines.ts";

/** Reports stand on small sheets; larger ones hold data. */
const mostCells = 60_000;

/** A sheet with its rows as columns and its columns as rows, as far as reports are read from it; null for a large one. */
export function turnedSheet(sheet: BookSheet): BookSheet | null {
  const { rowCount, columns, calculated } = sheet;
  if (rowCount * columns.length > mostCells) return null;
  const rows = Array.from({ length: rowCount }, (_, at) => at);
  return {
    sheet: sheet.sheet,
    visible: sheet.visible,
    firstRow: sheet.firstColumn,
    firstColumn: sheet.firstRow,
    rowCount: columns.length,
    columns: rows.map((row) => rowOf(sheet, sheet.firstRow + row)),
    calculated: rows.map((row) => Uint8Array.from(calculated, (column) => column?.[row] ?? 0)),
    formats: sheet.formats.length === 0 ? [] : [turnedFormats(sheet)],
    hiddenRows: sheet.hiddenColumns,
    hiddenColumns: sheet.hiddenRows,
    formulas: [],
    readers: [],
    tables: [],
  };
}

/** All windows as one, lying; a row of which no formats are known has the usual one. */
function turnedFormats({ firstRow, rowCount, firstColumn, columns, formats }: BookSheet): FormatWindow {
  const width = columns.length;
  const all = ["General", ...formats.flatMap((one) => one.formats)];
  const indices = new Uint16Array(rowCount * width);
  let known = 1;
  for (const one of formats) {
    for (let cell = 0; cell < one.rowCount * width; cell++) {
      const row = one.firstRow - firstRow + Math.floor(cell / width);
      indices[(cell % width) * rowCount + row] = known + one.indices[cell]!;
    }
    known += one.formats.length;
  }
  return { firstRow: firstColumn, rowCount: width, indices, formats: all };
}

/** Where a cell of the one sheet stands on the other. */
export const turnedPlace = (sheet: BookSheet, { row, column }: Pick<CellPlace, "row" | "column">): CellPlace => ({
  sheet,
  row: column,
  column: row,
});
