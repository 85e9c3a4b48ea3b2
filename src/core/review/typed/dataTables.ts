import type { SheetArea } from "../../table/address.ts";
import { cellKind } from "../../table/cells.ts";
import { readBlock, rowsOf } from "../../table/locate.ts";
import type { Source } from "../../table/source.ts";
import type { Book, BookSheet, BookTable } from "../book.ts";

/** A table of data on a sheet, found by its headings. */
export interface DataTable {
  readonly sheet: BookSheet;
  readonly columns: readonly DataColumn[];
  /** The sheet row of its first row of data, and how many there are. */
  readonly firstRow: number;
  readonly rowCount: number;
}

export interface DataColumn {
  readonly name: string;
  /** The sheet column, from 0. */
  readonly column: number;
  readonly source: Source["columns"][number];
}

/** The tables of a book, and what stands under the headings of each sheet; no report is its own data. */
export const dataTables = (book: Book, reports: readonly SheetArea[]): readonly DataTable[] =>
  book.sheets.flatMap((sheet) => {
    const tables = sheet.tables.filter(({ headings }) => headings).flatMap((table) => tableOf(sheet, table));
    const here = reports.filter((area) => area.sheet === sheet.sheet);
    return [...tables, ...underHeadings(sheet)].map((table) => without(here, above(here, table)));
  });

/** The part of a table that stands above the first report in its columns: some write the report below their data. */
function above(reports: readonly SheetArea[], table: DataTable): DataTable {
  const below = reports.filter(
    (area) => area.row > table.firstRow && table.columns.some(({ column }) => isAcross(area, column)),
  );
  const end = Math.min(table.firstRow + table.rowCount, ...below.map(({ row }) => row));
  const rowCount = below.length === 0 ? table.rowCount : rowsWithFigures(table, end - table.firstRow);
  return rowCount === 0 ? table : { ...table, rowCount };
}

/** How many of the first rows there are up to the last that holds a number or a date: words below are the report's. */
function rowsWithFigures({ columns }: DataTable, rows: number): number {
  const hasFigure = (row: number): boolean =>
    columns.some(({ source }) => [cellKind.number, cellKind.date].some((kind) => source.cells.kinds[row] === kind));
  let count = rows;
  while (count > 0 && !hasFigure(count - 1)) count--;
  return count;
}

const isAcross = (area: SheetArea, column: number): boolean =>
  column >= area.column && column < area.column + area.columns;

function without(reports: readonly SheetArea[], table: DataTable): DataTable {
  const reaches = ({ row, rows }: SheetArea): boolean =>
    row < table.firstRow + table.rowCount && table.firstRow <= row + rows;
  const isReport = ({ column }: DataColumn): boolean => reports.some((area) => reaches(area) && isAcross(area, column));
  return { ...table, columns: table.columns.filter((column) => !isReport(column)) };
}

function underHeadings(sheet: BookSheet): DataTable[] {
  const located = readBlock(sheet);
  return located.ok && located.value.headingRow !== null ? inSource(sheet, located.value.source) : [];
}

function tableOf(sheet: BookSheet, { area, totals }: BookTable): DataTable[] {
  const from = area.row - sheet.firstRow;
  const to = from + area.rows - Number(totals);
  const left = area.column - sheet.firstColumn;
  const columns = sheet.columns.slice(left, left + area.columns).map((cells) => rowsOf(cells, from, to));
  const block = { sheet: sheet.sheet, firstRow: area.row, firstColumn: area.column, rowCount: to - from, columns };
  const located = readBlock(block);
  return located.ok ? inSource(sheet, located.value.source) : [];
}

function inSource(sheet: BookSheet, { columns, rowCount }: Source): DataTable[] {
  const placed = columns.flatMap((source): (DataColumn & { readonly firstRow: number })[] => {
    const { place, name } = source;
    return place.kind === "sheet" ? [{ name, column: place.column, firstRow: place.firstRow, source }] : [];
  });
  const [first] = placed;
  return first === undefined ? [] : [{ sheet, columns: placed, firstRow: first.firstRow, rowCount }];
}
