import type { CellColumn } from "./cells.ts";

/** Where a column stands, so that a fault can name its cells. Rows and columns count from 0. */
export type Place =
  | { readonly kind: "sheet"; readonly sheet: string; readonly column: number; readonly firstRow: number }
  | { readonly kind: "argument"; readonly argument: string; readonly column: number; readonly firstRow: number };

/** One named column of data, heading not included. */
export interface Column {
  readonly name: string;
  readonly place: Place;
  readonly cells: CellColumn;
}

/** Rows of a source that its sheet does not show: hidden by hand, or filtered away. */
export interface HiddenRows {
  /** Counted from 0 at the first row of the data. */
  readonly rows: readonly number[];
  /** Whether they were left out because they are hidden; by default they are used like all others. */
  readonly leftOut: boolean;
}

/** Columns of equal height that stand side by side: row i of each belongs to the same observation. */
export interface Source {
  readonly columns: readonly Column[];
  readonly rowCount: number;
  /** What was not read around the columns, or otherwise than expected, as sentences; they go with the answer. */
  readonly notes?: readonly string[];
  /** Rows that the sheet does not show, where there are any and the host tells. */
  readonly hidden?: HiddenRows;
}
