import type { ColumnSetup } from "../../app/setup.ts";
import type { ColumnDescription } from "../../core/table/describe.ts";

/** A column, and what is made of it. */
export interface ColumnInHand {
  readonly column: ColumnDescription;
  readonly setup: ColumnSetup;
}
