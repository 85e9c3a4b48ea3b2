import type { SheetArea } from "../../table/address.ts";
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
    return [...tables, ...underHeadings(sheet)].map((table) => without(here, table));
  });

function without(reports: readonly SheetArea[], table: DataTable): DataTable {
  const reaches = ({ row, rows }: SheetArea): boolean =>
    row < table.firstRow + table.rowCount && table.firstRow <= row + rows;
  const isReport = ({ column }: DataColumn): boolean =>
    reports.some((area) => reaches(area) && column >= area.column && column < area.column + area.columns);
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
