import type { BookCell, BookValue, StyledCell } from "../book/bookData.ts";

export type Rows = readonly (readonly BookCell[])[];

export const cellIn = (rows: Rows, row: number, column: number): BookCell => rows[row]?.[column] ?? null;

export const isStyled = (cell: BookCell): cell is StyledCell =>
  typeof cell === "object" && cell !== null && "value" in cell;

export const valueOf = (cell: BookCell): BookValue => (isStyled(cell) ? cell.value : cell);

export const formulaOf = (cell: BookCell): string | null => (isStyled(cell) ? (cell.formula ?? null) : null);

export const spillOf = (cell: BookCell): string | null => (isStyled(cell) ? (cell.spill ?? null) : null);

/** The cell with a formula of its own, its value and looks as they are; what was spilled from it is left out. */
export const withFormula = (cell: BookCell, formula: string): StyledCell => ({
  value: valueOf(cell),
  formula,
  ...looksOf(cell),
});

/** The cell with this value, its looks as they are, and no formula. */
export function withValue(cell: BookCell, value: BookValue): BookCell {
  const looks = looksOf(cell);
  return looks.style === undefined ? value : { value, ...looks };
}

const looksOf = (cell: BookCell): Pick<StyledCell, "style"> =>
  isStyled(cell) && cell.style !== undefined ? { style: cell.style } : {};
