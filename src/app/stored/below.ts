import { addressOf, mostRows, parseAddress } from "../../core/table/address.ts";
import { cellKind } from "../../core/table/cells.ts";
import type { Errand } from "../errand.ts";
import type { Host, PlacedBlock } from "../host.ts";
import { readData } from "../reading.ts";
import type { Work } from "../work.ts";

/**
 * Rows that were added right below data which go by a name: the name does not reach them, as a table's would. Without
 * a word on them, next month's figures would be missing and nobody would know.
 * @returns their address, or null where the next row is empty.
 */
export async function rowsBelow(host: Host, address: string, errand: Errand): Promise<string | null> {
  const area = parseAddress(address);
  if (area === null || area.row + area.rows >= mostRows) return null;
  const row = area.row + area.rows;
  const block = await host.read(
    { kind: "address", address: addressOf({ ...area, row, rows: mostRows - row }) },
    errand,
  );
  // Where nothing is in use below, there are no data to read.
  if (!block.ok) return null;
  const rows = block.value.firstRow === row ? filledAtTop(block.value) : 0;
  return rows === 0 ? null : addressOf({ ...area, row, rows });
}

/** How many rows follow one another, from the first on, that hold anything. */
function filledAtTop({ columns, rowCount }: PlacedBlock): number {
  let row = 0;
  while (row < rowCount && columns.some(({ kinds }) => kinds[row] !== cellKind.blank)) row++;
  return row;
}

/** Reads the data in hand again with the rows below them; what was chosen stays. */
export async function takeInBelow(work: Work): Promise<void> {
  const { data, setup, opened } = work.store.get();
  if (data === null || setup === null || data.below === null) return;
  const [all, below] = [parseAddress(data.address), parseAddress(data.below)];
  if (all === null || below === null) return;
  const address = addressOf({ ...all, rows: all.rows + below.rows });
  const anchor = { kind: "name", name: "" } as const;
  work.store.dispatch({ kind: "setup waits", setup: { name: opened ?? "", anchor, address, setup } });
  await readData(work, { kind: "address", address });
}
