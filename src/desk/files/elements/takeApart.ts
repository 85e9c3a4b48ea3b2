import { type SheetArea, addressOf, localAddressOf, parseAddress } from "../../../core/table/address.ts";
import type { BookCell, BookData, BookName, SheetData } from "../../book/bookData.ts";
import { absolute } from "../absolute.ts";
import { isPlaceless } from "../storedFormulas.ts";
import { cellIn, formulaOf, type Rows, spillOf, valueOf, withFormula } from "../cells.ts";
import { elementFormula, isKept, standInFormula } from "./elementFormulas.ts";
import { isMissingInLibreOffice } from "./missingFunctions.ts";
import { spillName } from "./spillNames.ts";

/** A workbook whose results LibreOffice shows. */
export interface TakenApart {
  readonly book: BookData;
  /** Cells in which it shows #NAME? all the same: it would keep none of their values, or they ask for their own place. */
  readonly left: readonly string[];
}

/**
 * The workbook with every result that LibreOffice can neither calculate nor keep as one taken apart: each of its cells
 * has the formula of its own part, with its saved value, and a name says how far the result went.
 */
export function takeApart(book: BookData): TakenApart {
  const taken = book.sheets.map(sheetApart);
  return {
    book: {
      ...book,
      sheets: taken.map(({ sheet }) => sheet),
      names: [...book.names, ...taken.flatMap(({ names }) => names)],
    },
    left: taken.flatMap(({ left }) => left),
  };
}

interface SheetApart {
  readonly sheet: SheetData;
  readonly names: readonly BookName[];
  readonly left: readonly string[];
}

interface Missing {
  readonly formula: string;
  readonly area: SheetArea;
}

function sheetApart(sheet: SheetData): SheetApart {
  const missing = missingIn(sheet);
  const [names, left]: [BookName[], string[]] = [[], []];
  if (missing.length === 0) return { sheet, names, left };
  const rows = sheet.rows.map((row) => [...row]);
  for (const formula of missing) {
    const { area } = formula;
    if (!spills(area) && isKept(valueOf(cellIn(rows, area.row, area.column)))) continue;
    const cells = spills(area) ? cellsApart(rows, formula) : null;
    if (cells === null) left.push(addressOf(area));
    else {
      layOver(rows, area, cells);
      names.push(spillName(area, names.length + 1));
    }
  }
  return { sheet: { ...sheet, rows }, names, left };
}

const spills = ({ rows, columns }: SheetArea): boolean => rows * columns > 1;

/** The formulas of a sheet that LibreOffice cannot calculate, with the cells that they fill. */
const missingIn = ({ name, rows }: SheetData): readonly Missing[] =>
  rows.flatMap((cells, row) =>
    cells.flatMap((cell, column) => {
      const formula = formulaOf(cell);
      if (formula === null || !isMissingInLibreOffice(formula)) return [];
      const spilled = parseAddress(spillOf(cell) ?? "");
      return [{ formula, area: { ...(spilled ?? { row, column, rows: 1, columns: 1 }), sheet: name } }];
    }),
  );

/** The cells of a result, each with its own formula, row by row; null where that cannot be. */
function cellsApart(rows: Rows, { area, formula }: Missing): readonly (readonly BookCell[])[] | null {
  const keeper = keeperOf(rows, area);
  if (keeper === null || !isPlaceless(formula)) return null;
  const found: BookCell[][] = [];
  for (let row = 1; row <= area.rows; row++) {
    const line: BookCell[] = [];
    for (let column = 1; column <= area.columns; column++) {
      const cell = cellIn(rows, area.row + row - 1, area.column + column - 1);
      const value = valueOf(cell);
      const place = { row, column };
      const own = isKept(value)
        ? elementFormula({ whole: formula, ...place })
        : standInFormula({ value, ...place }, keeper);
      if (own === null) return null;
      line.push(withFormula(cell, own));
    }
    found.push(line);
  }
  return found;
}

/** The first cell of a result whose value LibreOffice keeps. */
function keeperOf(rows: Rows, { row, column, rows: height, columns: width }: SheetArea): string | null {
  for (let r = row; r < row + height; r++) {
    for (let c = column; c < column + width; c++) {
      if (isKept(valueOf(cellIn(rows, r, c)))) {
        return absolute(localAddressOf({ row: r, column: c, rows: 1, columns: 1 }));
      }
    }
  }
  return null;
}

function layOver(rows: BookCell[][], { row, column }: SheetArea, cells: readonly (readonly BookCell[])[]): void {
  cells.forEach((line, offset) => {
    const target = (rows[row + offset] ??= []);
    while (target.length < column) target.push(null);
    target.splice(column, line.length, ...line);
  });
}
