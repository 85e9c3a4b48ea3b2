import { cellKind } from "../core/table/cells.ts";
import { type Result, success } from "../core/problem/result.ts";
import { type LocatedTable, readBlock } from "../core/table/locate.ts";
import type { PlacedBlock } from "./host.ts";

/** The workbook's table that the data are: formulas that speak of its columns follow it as it grows. */
export interface TableInHand {
  readonly name: string;
  /** The sheet's column in which it begins, from 0. */
  readonly firstColumn: number;
  /** As they stand in its cells. */
  readonly headings: readonly string[];
}

/** A table of data as it was found in a block, and the workbook's table that it is, if it is one. */
export interface FoundData extends LocatedTable {
  readonly table: TableInHand | null;
}

/** Finds the data in a block, as `readBlock` does, and asks whether they are a table of the workbook. */
export function readPlaced(block: PlacedBlock, wanted: readonly string[] = []): Result<FoundData> {
  const located = readBlock(block, wanted);
  return located.ok ? success({ ...located.value, table: tableInHand(block, located.value) }) : located;
}

/**
 * The table behind a block, if the data are all of it: where its last rows were not read, as those of a total are not,
 * a formula over its columns would take them in.
 */
function tableInHand(block: PlacedBlock, { source, headingRow }: LocatedTable): TableInHand | null {
  const first = source.columns[0]?.place;
  if (block.table === null || headingRow !== block.firstRow || first?.kind !== "sheet") return null;
  const end = first.firstRow - block.firstRow + source.rowCount;
  const isEmpty = block.columns.every(({ kinds }) => kinds.subarray(end).every((kind) => kind === cellKind.blank));
  if (first.firstRow !== headingRow + 1 || !isEmpty) return null;
  // The headings of a table are texts, each in one column alone.
  const headings = block.columns.flatMap(({ kinds, numbers, texts }) =>
    kinds[0] === cellKind.text ? [texts[numbers[0]!]!] : [],
  );
  if (headings.length < block.columns.length) return null;
  return { name: block.table, firstColumn: block.firstColumn, headings };
}

/** Columns of a table with their heading, without its total row: "Sales[[#Headers],[#Data],[Price]:[Rain]]". */
export function columnsOfTable({ name, firstColumn, headings }: TableInHand, first: number, last: number): string {
  const named = (column: number): string => `[${escaped(headings[column - firstColumn] ?? "")}]`;
  return `${name}[[#Headers],[#Data],${first === last ? named(first) : `${named(first)}:${named(last)}`}]`;
}

/** Signs that mean something else between the brackets of a reference. */
const escaped = (heading: string): string => heading.replaceAll(/['#@[\]]/g, "'$&");
