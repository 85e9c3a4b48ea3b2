import { type Result, failure, success } from "../core/problem/result.ts";
import type { Source } from "../core/table/source.ts";
import { isHeadings } from "./headings.ts";
import { columnOf, rawCells, usedHeight, widthOf } from "./rawCells.ts";

/**
 * New rows for the drivers, in the order of the drivers, with or without headings of their own.
 * @returns Problem "no-data" without any cell in use, "unknown-value" where there are not as many columns as drivers.
 */
export function readNewRows(argument: unknown, drivers: readonly string[]): Result<Source> {
  const cells = rawCells(argument);
  const height = usedHeight(cells);
  if (height === 0) return failure({ code: "no-data", where: "the new rows" });
  const width = widthOf(cells);
  if (width !== drivers.length) {
    const allowed = [`${drivers.length} (${drivers.join(", ")})`];
    return failure({
      code: "unknown-value",
      setting: "columns of the new rows",
      value: String(width),
      allowed,
      nearest: null,
    });
  }
  const firstRow = height > 1 && isHeadings(cells) ? 1 : 0;
  const columns = drivers.map((name, column) => ({
    name,
    place: { kind: "argument", argument: "rows", column, firstRow } as const,
    cells: columnOf(cells, column, [firstRow, height]),
  }));
  return success({ columns, rowCount: height - firstRow });
}
