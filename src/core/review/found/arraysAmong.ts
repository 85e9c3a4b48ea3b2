import type { BookFormula, BookSheet } from "../book.ts";
import { numberAt } from "../cellsOfBook.ts";

/**
 * Formulas with those that were entered over a block at once taken as one: Excel tells the same formula in each of its
 * cells. The same formula in cells that all show the same number was entered cell by cell.
 */
export function arraysAmong(sheet: BookSheet, formulas: readonly BookFormula[]): readonly BookFormula[] {
  const free = new Map(formulas.map((one) => [keyOf(one.row, one.column), one]));
  const found: BookFormula[] = [];
  for (const first of formulas) {
    if (!free.has(keyOf(first.row, first.column))) continue;
    const block = blockFrom(first, free);
    const isArray = block.rows * block.columns > 1 && differ(sheet, block);
    const taken = isArray ? block : first;
    for (let row = 0; row < (isArray ? block.rows : 1); row++) {
      for (let column = 0; column < (isArray ? block.columns : 1); column++) {
        free.delete(keyOf(first.row + row, first.column + column));
      }
    }
    found.push(taken);
  }
  return found;
}

const keyOf = (row: number, column: number): string => `${row},${column}`;

/** The block to the right and below in which every cell has the same formula. */
function blockFrom(first: BookFormula, free: ReadonlyMap<string, BookFormula>): BookFormula {
  if (first.rows * first.columns > 1) return first;
  const isSame = (row: number, column: number): boolean =>
    free.get(keyOf(first.row + row, first.column + column))?.formula === first.formula;
  let columns = 1;
  while (isSame(0, columns)) columns++;
  const isSameRow = (row: number): boolean =>
    Array.from({ length: columns }, (_, column) => column).every((column) => isSame(row, column));
  let rows = 1;
  while (isSameRow(rows)) rows++;
  return { ...first, rows, columns };
}

function differ(sheet: BookSheet, { row, column, rows, columns }: BookFormula): boolean {
  const first = numberAt({ sheet, row, column });
  for (let r = 0; r < rows; r++) {
    for (let c = 0; c < columns; c++) if (numberAt({ sheet, row: row + r, column: column + c }) !== first) return true;
  }
  return false;
}
