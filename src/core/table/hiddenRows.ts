import { cellKind } from "./cells.ts";
import type { Column, HiddenRows, Source } from "./source.ts";

/** The hidden ones among the rows of the data, given as rows of the sheet; null where there are none. */
export function hiddenAmong(sheetRows: readonly number[], firstRow: number, rowCount: number): HiddenRows | null {
  const rows = sheetRows.map((row) => row - firstRow).filter((row) => row >= 0 && row < rowCount);
  return rows.length === 0 ? null : { rows, leftOut: false };
}

/** The source as if its hidden rows were empty: no value, time or group of theirs counts, not even as an earlier one. */
export function withoutHidden(source: Source): Source {
  const { hidden } = source;
  if (hidden === undefined) return source;
  return {
    ...source,
    columns: source.columns.map((column) => emptiedAt(column, hidden.rows)),
    hidden: { ...hidden, leftOut: true },
  };
}

function emptiedAt(column: Column, rows: readonly number[]): Column {
  const kinds = column.cells.kinds.slice();
  const numbers = column.cells.numbers.slice();
  for (const row of rows) {
    kinds[row] = cellKind.blank;
    numbers[row] = 0;
  }
  return { ...column, cells: { ...column.cells, kinds, numbers } };
}

/** What is said of the hidden rows, which a reader of the sheet would not expect to count. */
export function hiddenNotes({ hidden }: Source): string[] {
  if (hidden === undefined) return [];
  const count = hidden.rows.length;
  const [rows, verb] = count === 1 ? ["row", "is"] : ["rows", "are"];
  const which = `${count.toLocaleString("en-US")} ${rows} of the data ${verb} hidden or filtered away`;
  return [
    hidden.leftOut
      ? `${which}, and left out as if ${count === 1 ? "it" : "they"} were not there.`
      : `${which}, but counted like the others.`,
  ];
}
