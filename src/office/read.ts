import type { Errand } from "../app/errand.ts";
import type { PlacedBlock } from "../app/host.ts";
import { type Result, failure, success } from "../core/problem/result.ts";
import { addressOf } from "../core/table/address.ts";
import { type ColumnBuilder, type ReadCells, columnBuilder } from "./columnBuilder.ts";
import { isTooMuchAtOnce } from "./faults.ts";
import { hiddenRowsOf } from "./hidden.ts";
import type { Located } from "./locate.ts";
import { persist } from "./session.ts";

/**
 * Excel on the web refuses answers above 5 MB; a cell with its value, type and format takes up to some 40 bytes. A quarter
 * of what would pass is asked for, since the pane stands still while an answer is unpacked: under 100 ms at this size.
 */
const cellsAtOnce = 30_000;
const rowsAtOnce = 10_000;

/** Reads a block chunk by chunk; a chunk that is too much for Excel is halved and tried again. */
export async function readCells(
  context: Excel.RequestContext,
  place: Located,
  errand: Errand,
): Promise<Result<PlacedBlock>> {
  const builders = Array.from({ length: place.columns }, () => columnBuilder(place.rows));
  let height = Math.max(1, Math.min(rowsAtOnce, Math.floor(cellsAtOnce / place.columns)));
  for (let row = 0; row < place.rows;) {
    if (errand.signal.aborted) return failure({ code: "cancelled" });
    errand.progress({ what: "Reading cells", share: row / place.rows });
    const rows = Math.min(height, place.rows - row);
    const cells = await chunk(context, { ...place, row: place.row + row, rows });
    if (cells !== null) {
      fill(builders, cells, row);
      row += rows;
    } else if (rows > 1) height = Math.floor(rows / 2);
    else return failure({ code: "too-much-for-excel", cells: place.columns, limit: cellsAtOnce });
  }
  return success({
    sheet: place.sheet,
    firstRow: place.row,
    firstColumn: place.column,
    rowCount: place.rows,
    columns: builders.map(({ column }) => column()),
    address: addressOf(place),
    table: place.table,
    hiddenRows: await hiddenRowsOf(context, place),
  });
}

function fill(builders: readonly ColumnBuilder[], cells: ReadCells, firstRow: number): void {
  for (const [column, { put }] of builders.entries()) put(cells, column, firstRow);
}

/** null where it is too much at once; Excel says so with an error, or with values that are null and no error at all. */
async function chunk(context: Excel.RequestContext, place: Located): Promise<ReadCells | null> {
  try {
    return await persist(async () => {
      const sheet = context.workbook.worksheets.getItem(place.sheet);
      const range = sheet.getRangeByIndexes(place.row, place.column, place.rows, place.columns);
      range.load("values,valueTypes,numberFormat");
      await context.sync();
      const { values, valueTypes, numberFormat } = range as { [Key in keyof ReadCells]: ReadCells[Key] | null };
      return values === null || valueTypes === null || numberFormat === null
        ? null
        : { values, valueTypes, numberFormat };
    });
  } catch (fault) {
    if (isTooMuchAtOnce(fault)) return null;
    throw fault;
  }
}
