import { type Value, each, unknown } from "./values.ts";
import { whyUnread } from "./whyUnread.ts";

/** A value as the block it is: one cell is a block too. */
const rowsOf = (value: Value): readonly (readonly Value[])[] => (value.kind === "block" ? value.rows : [[value]]);

const blockOf = (rows: readonly (readonly Value[])[]): Value => {
  const [first] = rows;
  if (first === undefined || first.length === 0) return unknown(whyUnread.beyondTheBlock("a regression"));
  return rows.length === 1 && first.length === 1 ? first[0]! : { kind: "block", rows };
};

/** A number that an argument comes to; null where none is known. Zero and an argument left away stand for all. */
const positionIn = (value: Value | undefined): number | null =>
  value === undefined ? 0 : value.kind === "known" ? Math.trunc(value.value) : null;

/** INDEX(block, row, column): the numbers of one row stand in line, so that one position is enough. */
export function indexOf(block: Value, first: Value | undefined, second: Value | undefined): Value {
  const rows = rowsOf(block);
  const alongRow = rows.length === 1 && second === undefined;
  if (first?.kind === "block" || second?.kind === "block") return severalIndexed(block, first, second);
  const [row, column] = alongRow ? [0, positionIn(first)] : [positionIn(first), positionIn(second)];
  if (row === null || column === null) return unknown(whyUnread.computedPlace("INDEX"));
  const chosen = row === 0 ? rows : rows.slice(row - 1, row);
  return blockOf(column === 0 ? chosen : chosen.map((line) => line.slice(column - 1, column)));
}

/** INDEX(block, 1, {1,2}) gives several numbers. */
function severalIndexed(block: Value, first: Value | undefined, second: Value | undefined): Value {
  if (second?.kind === "block") return each(second, (one) => indexOf(block, first, one));
  return first?.kind === "block" ? each(first, (one) => indexOf(block, one, second)) : block;
}

/** CHOOSEROWS and CHOOSECOLS: positions count from the end where they are negative. */
export function chosenLines(block: Value, positions: readonly Value[], along: "rows" | "columns"): Value {
  const rows = along === "rows" ? rowsOf(block) : rowsOf(turned(block));
  const wanted = positions.flatMap(rowsOf).flat().map(positionIn);
  const lines = wanted.map((one) => (one === null ? undefined : rows[one < 0 ? rows.length + one : one - 1]));
  const found = lines.filter((line) => line !== undefined);
  if (found.length < lines.length) return unknown(whyUnread.computedPlace("CHOOSEROWS"));
  return along === "rows" ? blockOf(found) : turned(blockOf(found));
}

/** TAKE(block, rows, columns): from the end where the number is negative. */
export function taken(block: Value, rows: Value | undefined, columns: Value | undefined): Value {
  const [high, wide] = [positionIn(rows), positionIn(columns)];
  if (high === null || wide === null) return unknown(whyUnread.computedPlace("TAKE"));
  return blockOf(firstOf(rowsOf(block), high).map((line) => firstOf(line, wide)));
}

const firstOf = <T>(list: readonly T[], count: number): readonly T[] =>
  count === 0 ? list : count > 0 ? list.slice(0, count) : list.slice(count);

/** A block as it lies when turned on its side. */
export function turned(value: Value): Value {
  if (value.kind !== "block") return value;
  const width = value.rows[0]?.length ?? 0;
  return blockOf(Array.from({ length: width }, (_, column) => value.rows.map((row) => row[column]!)));
}
