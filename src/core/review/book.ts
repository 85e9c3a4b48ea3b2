import type { SheetArea } from "../table/address.ts";
import type { CellBlock } from "../table/block.ts";

/** A workbook as a review reads it: everything that a regression in it can rest on, and nothing of its looks. */
export interface Book {
  readonly sheets: readonly BookSheet[];
  readonly names: readonly BookName[];
  readonly calculation: "automatic" | "automatic except tables" | "manual";
}

/** A sheet's used range. Rows and columns count from 0 at the sheet's corner wherever nothing else is said. */
export interface BookSheet extends CellBlock {
  readonly visible: boolean;
  /** Hidden or filtered away, in ascending order. */
  readonly hiddenRows: readonly number[];
  readonly hiddenColumns: readonly number[];
  /** The formulas that can bear on a regression, in row order: see `isTelling`. */
  readonly formulas: readonly BookFormula[];
  /** Formulas that read the cells of those: see `readersAmong`. */
  readonly readers: readonly BookFormula[];
  /** For each column of the block: 1 in each row of the block that holds a formula of any kind; null where none does. */
  readonly calculated: readonly (Uint8Array<ArrayBuffer> | null)[];
  readonly formats: readonly FormatWindow[];
  readonly tables: readonly BookTable[];
}

export interface BookFormula {
  readonly row: number;
  readonly column: number;
  /** With its "=", in English with commas. */
  readonly formula: string;
  /** How far its result reaches, itself included: 1 and 1 where it fills no other cell. */
  readonly rows: number;
  readonly columns: number;
}

/**
 * The number formats of some rows. Those of a small sheet are known throughout, those of a large one at both ends:
 * formats of half a million rows of data cost more than they tell.
 */
export interface FormatWindow {
  readonly firstRow: number;
  readonly rowCount: number;
  /** For each cell of the window, row by row over the columns of the block: which of `formats` it has. */
  readonly indices: Uint16Array<ArrayBuffer>;
  readonly formats: readonly string[];
}

export interface BookName {
  readonly name: string;
  /** Without its "=": "Months!$B$5:$B$100", or any formula. */
  readonly refersTo: string;
  /** The sheet whose name it is, null for a name of the workbook. */
  readonly sheet: string | null;
}

export interface BookTable {
  readonly name: string;
  /** All of it, headings and total row included. */
  readonly area: SheetArea;
  readonly headings: boolean;
  readonly totals: boolean;
}
