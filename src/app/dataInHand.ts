import { type Result, success } from "../core/problem/result.ts";
import { type ColumnDescription, describeColumn } from "../core/table/describe.ts";
import { readBlock } from "../core/table/locate.ts";
import type { Source } from "../core/table/source.ts";
import type { PlacedBlock } from "./host.ts";

/** The data that the pane works on, as they were when they were read. */
export interface DataInHand {
  /** "Months!A1:D97" */
  readonly address: string;
  readonly source: Source;
  /** Sheet row of the headings, from 0; null where there are none. */
  readonly headingRow: number | null;
  /** One a column, in the order of the source. */
  readonly columns: readonly ColumnDescription[];
  /** What was read otherwise than expected, or not read, as sentences. */
  readonly notes: readonly string[];
  readonly hiddenRows: number;
  /** The first cell that has changed since, null as long as none has. */
  readonly changedCell: string | null;
}

/** Finds the table in a block and describes its columns. */
export function takeInHand(block: PlacedBlock): Result<DataInHand> {
  const located = readBlock(block);
  if (!located.ok) return located;
  const { source, headingRow, notes } = located.value;
  return success({
    address: block.address,
    source,
    headingRow,
    columns: source.columns.map(describeColumn),
    notes,
    hiddenRows: block.hiddenRows?.length ?? 0,
    changedCell: null,
  });
}
