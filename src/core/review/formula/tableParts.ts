import type { SheetArea } from "../../table/address.ts";
import { plainHeading } from "../../table/headingRow.ts";
import { readTableReference } from "../../table/tableReference.ts";
import type { Book, BookSheet, BookTable } from "../book.ts";
import { sheetNamed, wordsAt } from "../cellsOfBook.ts";
import { type Reading, read, unread } from "./reading.ts";
import { whyUnread } from "./whyUnread.ts";

/** Where a reference to a table's parts stands. */
interface Standpoint {
  readonly book: Book;
  readonly sheet: BookSheet;
  readonly row: number;
  readonly column: number;
}

interface Spoken {
  readonly table: string;
  /** What stands between the outer brackets: "Price", "[#Data],[Price]:[Rain]", "@Price". */
  readonly inside: string;
}

const tableCalled = ({ sheets }: Book, name: string): BookTable | null =>
  sheets.flatMap(({ tables }) => tables).find((one) => one.name.toLowerCase() === name.toLowerCase()) ?? null;

export const isTable = (book: Book, name: string): boolean => tableCalled(book, name) !== null;

/** The cells that a reference to a table means. */
export function tableArea(at: Standpoint, { table: name, inside }: Spoken): Reading<SheetArea> {
  const table = name === "" ? tableAround(at) : tableCalled(at.book, name);
  if (table === null) return unread(name === "" ? whyUnread.noTableHere : whyUnread.unknownTable(name));
  const { items, columns } = readTableReference(inside.trim());
  const headings = headingsOf(at.book, table);
  const places = columns.map((column) => headings.indexOf(plainHeading(column)));
  const missing = columns[places.indexOf(-1)];
  if (missing !== undefined) return unread(whyUnread.unknownColumn(table.name, missing));
  const rows = rowsOf(table, items, at.row);
  if (rows === null) return unread(whyUnread.tablePart(table.name));
  const first = Math.min(...places, table.area.columns - 1);
  const [left, right] = places.length === 0 ? [0, table.area.columns - 1] : [first, Math.max(...places)];
  return read({ ...table.area, ...rows, column: table.area.column + left, columns: right - left + 1 });
}

const tableAround = ({ sheet, row, column }: Standpoint): BookTable | null =>
  sheet.tables.find(
    ({ area }) =>
      row >= area.row && row < area.row + area.rows && column >= area.column && column < area.column + area.columns,
  ) ?? null;

function headingsOf(book: Book, { area, headings }: BookTable): string[] {
  const sheet = sheetNamed(book, area.sheet);
  return Array.from({ length: headings && sheet !== null ? area.columns : 0 }, (_, index) =>
    plainHeading(wordsAt({ sheet: sheet!, row: area.row, column: area.column + index })),
  );
}

/** @returns null where the part holds no rows of data. */
function rowsOf(table: BookTable, items: readonly string[], row: number): Pick<SheetArea, "row" | "rows"> | null {
  const { area, headings, totals } = table;
  const body = { row: area.row + Number(headings), rows: area.rows - Number(headings) - Number(totals) };
  const has = (item: string): boolean => items.includes(item);
  if (has("#this row")) return row >= body.row && row < body.row + body.rows ? { row, rows: 1 } : null;
  const from = has("#all") || has("#headers") ? area.row : body.row;
  const to = has("#all") || has("#totals") ? area.row + area.rows : body.row + body.rows;
  const withData = items.length === 0 || has("#all") || has("#data");
  return withData && to > from ? { row: from, rows: to - from } : null;
}
