/** A rectangle on a named sheet; rows and columns count from 0. */
export interface SheetArea {
  readonly sheet: string;
  readonly row: number;
  readonly column: number;
  readonly rows: number;
  readonly columns: number;
}

export const mostRows = 1_048_576;
export const mostColumns = 16_384;

/** 0 -> "A", 27 -> "AB". */
export function columnLetters(column: number): string {
  const rest = Math.floor(column / 26);
  const letter = String.fromCharCode(65 + (column % 26));
  return rest === 0 ? letter : columnLetters(rest - 1) + letter;
}

/** A sheet name as a formula writes it: quoted unless it is a plain word that is no cell address. */
export function quoteSheet(sheet: string): string {
  const plain =
    /^[\p{L}_][\p{L}\p{N}_]*$/u.test(sheet) && !/^[A-Za-z]{1,3}\d+$|^[rR]\d*([cC]\d*)?$|^[cC]\d*$/.test(sheet);
  return plain ? sheet : `'${sheet.replaceAll("'", "''")}'`;
}

/** "Months!A1:D97", "'My data'!B2". */
export function addressOf({ sheet, row, column, rows, columns }: SheetArea): string {
  return `${quoteSheet(sheet)}!${localAddressOf({ row, column, rows, columns })}`;
}

/** The same without the sheet: "A1:D97". */
export function localAddressOf(area: Omit<SheetArea, "sheet">): string {
  const first = `${columnLetters(area.column)}${area.row + 1}`;
  if (area.rows === 1 && area.columns === 1) return first;
  return `${first}:${columnLetters(area.column + area.columns - 1)}${area.row + area.rows}`;
}

/** "A" -> 0, "AB" -> 27. */
const columnOf = (letters: string): number =>
  Array.from(letters.toUpperCase()).reduce((sum, letter) => sum * 26 + letter.charCodeAt(0) - 64, 0) - 1;

const grammar =
  /^(?:(?:'((?:[^']|'')+)'|([^'!]+))!)?(?:\$?([A-Z]{1,3})\$?(\d{1,7})(?::\$?([A-Z]{1,3})\$?(\d{1,7}))?|\$?([A-Z]{1,3}):\$?([A-Z]{1,3}))$/i;

/**
 * Reads an address in A1 notation; whole columns ("A:C") take every row of the sheet.
 * @returns null where the text is no address; `sheet` is empty where it names none.
 */
export function parseAddress(text: string): SheetArea | null {
  const parts = grammar.exec(text.trim());
  if (parts === null) return null;
  const sheet = parts[1]?.replaceAll("''", "'") ?? parts[2] ?? "";
  const [first, last] = parts[7] === undefined ? cornersOfCells(parts) : cornersOfColumns(parts);
  const row = Math.min(first.row, last.row);
  const column = Math.min(first.column, last.column);
  const rows = Math.abs(last.row - first.row) + 1;
  const columns = Math.abs(last.column - first.column) + 1;
  const inside = row >= 0 && row + rows <= mostRows && column + columns <= mostColumns;
  return inside ? { sheet, row, column, rows, columns } : null;
}

interface Corner {
  readonly row: number;
  readonly column: number;
}

function cornersOfCells(parts: RegExpExecArray): readonly [Corner, Corner] {
  const first = { row: Number(parts[4]) - 1, column: columnOf(parts[3] ?? "") };
  if (parts[5] === undefined) return [first, first];
  return [first, { row: Number(parts[6]) - 1, column: columnOf(parts[5]) }];
}

const cornersOfColumns = (parts: RegExpExecArray): readonly [Corner, Corner] => [
  { row: 0, column: columnOf(parts[7] ?? "") },
  { row: mostRows - 1, column: columnOf(parts[8] ?? "") },
];
