import type { CellColumn } from "./cells.ts";

/** A rectangle of cells as read from a sheet, headings and all. Rows and columns count from 0. */
export interface CellBlock {
  readonly sheet: string;
  readonly firstRow: number;
  readonly firstColumn: number;
  readonly rowCount: number;
  readonly columns: readonly CellColumn[];
  /** Sheet rows of the block that are hidden or filtered away, where the host tells. */
  readonly hiddenRows?: readonly number[];
}
