import { type Result, success } from "../core/problem/result.ts";
import { type ColumnDescription, describeColumn } from "../core/table/describe.ts";
import type { Source } from "../core/table/source.ts";
import type { PlacedBlock } from "./host.ts";
import type { Anchor } from "./stored/storedBook.ts";
import { type TableInHand, readPlaced } from "./tableInHand.ts";

/** The data that the pane works on, as they were when they were read. */
export interface DataInHand {
  /** "Months!A1:D97" */
  readonly address: string;
  readonly source: Source;
  /** Sheet row of the headings, from 0; null where there are none. */
  readonly headingRow: number | null;
  /** The table that they are, if they are one. */
  readonly table: TableInHand | null;
  /** One a column, in the order of the source. */
  readonly columns: readonly ColumnDescription[];
  /** What was read otherwise than expected, or not read, as sentences. */
  readonly notes: readonly string[];
  /** The name by which they are found again wherever they move; null where they have none yet. */
  readonly anchor: Anchor | null;
  /** Filled rows right below them that their name does not reach, "Months!A98:D99"; asked where they were found by it. */
  readonly below: string | null;
  /** The first cell that has changed since, null as long as none has. */
  readonly changedCell: string | null;
}

/** So many cells are described without a pause: a few hundredths of a second's work. */
const cellsWithoutPause = 150_000;

/** Finds the table in a block and describes its columns; what else the pane has to do gets its turn in between. */
export async function takeInHand(block: PlacedBlock): Promise<Result<DataInHand>> {
  const located = readPlaced(block);
  if (!located.ok) return located;
  const { source, headingRow, table, notes } = located.value;
  const columns: ColumnDescription[] = [];
  // Finding the table has looked at all of them already.
  let cells = source.rowCount * source.columns.length;
  for (const column of source.columns) {
    cells += source.rowCount;
    if (cells > cellsWithoutPause) {
      await pause();
      cells = source.rowCount;
    }
    columns.push(describeColumn(column));
  }
  return success({
    address: block.address,
    source,
    headingRow,
    table,
    columns,
    notes,
    anchor: block.table === null ? null : { kind: "table", name: block.table },
    below: null,
    changedCell: null,
  });
}

const pause = (): Promise<void> => new Promise((resolve) => setTimeout(resolve));
