import { numfmt, type ICellData } from "@univerjs/core";
import type { Area } from "../workbook/areas.ts";
import { cellAt, cellsOf, formulaAt, isFormula, kindOf, valueOf, type CellValue } from "../workbook/cells.ts";
import { formatAt, setStyles } from "../workbook/styles.ts";
import { writeCells } from "../workbook/write.ts";
import { fault } from "./fault.ts";
import { ensureWritable, isReadable, isUnbounded } from "./guards.ts";
import type { Host } from "./host.ts";

type Block<T> = readonly (readonly T[])[];

interface Place {
  readonly row: number;
  readonly column: number;
}

/** Reads a property cell by cell; null for areas that Excel does not spell out. */
export function blockOf<T>(
  host: Host,
  area: Area,
  read: (cell: ICellData | undefined, at: Place) => T,
): Block<T> | null {
  if (!isReadable(area)) return null;
  const cells = cellsOf(host.book, area.sheet);
  const rows = new Array<readonly T[]>(area.rows);
  for (let r = 0; r < area.rows; r++) {
    const line = new Array<T>(area.columns);
    const row = area.row + r;
    for (let c = 0; c < area.columns; c++) {
      const column = area.column + c;
      line[c] = read(cellAt(cells, row, column), { row, column });
    }
    rows[r] = line;
  }
  return rows;
}

export const valuesOf = (host: Host, area: Area): Block<CellValue> | null => blockOf(host, area, valueOf);
export const kindsOf = (host: Host, area: Area): Block<string> | null => blockOf(host, area, kindOf);

export const formulasOf = (host: Host, area: Area): Block<CellValue> | null =>
  blockOf(host, area, (cell, at) => (isFormula(cell) ? formulaAt(host.book, area.sheet, at) : valueOf(cell)));

export const formatsOf = (host: Host, area: Area): Block<string> | null =>
  blockOf(host, area, (cell) => formatAt(host.book, cell));

/** What the cells show: numbers in their formats, TRUE and FALSE, errors by their signs. */
export const textsOf = (host: Host, area: Area): Block<string> | null =>
  blockOf(host, area, (cell) => {
    const value = valueOf(cell);
    if (typeof value === "boolean") return value ? "TRUE" : "FALSE";
    return typeof value === "string" ? value : numfmt.format(formatAt(host.book, cell), value);
  });

const categories: Readonly<Record<string, string>> = {
  general: "General",
  number: "Number",
  grouped: "Number",
  currency: "Currency",
  date: "Date",
  datetime: "Date",
  time: "Time",
  percent: "Percentage",
  fraction: "Fraction",
  scientific: "Scientific",
  text: "Text",
};

export const categoriesOf = (host: Host, area: Area): Block<string> | null =>
  blockOf(host, area, (cell) => {
    const format = formatAt(host.book, cell);
    const kind = categories[numfmt.getFormatInfo(format).type] ?? "Custom";
    return kind === "Currency" && format.includes("_(") ? "Accounting" : kind;
  });

/** A block of the area's shape; one value alone is meant for every cell. */
export function shaped<T>(area: Area, value: T | Block<T>): (row: number, column: number) => T | null {
  if (!Array.isArray(value)) return () => value as T;
  const block = value as Block<T>;
  const fits = block.length === area.rows && block.every((row) => Array.isArray(row) && row.length === area.columns);
  if (!fits) {
    throw fault(
      "InvalidArgument",
      "The number of rows or columns in the input array doesn't match the size or dimensions of the range.",
    );
  }
  return (row, column) => block[row]?.[column] ?? null;
}

/** Longest formula Excel takes, in characters. */
const longestFormula = 8192;

export function setValues(host: Host, area: Area, value: unknown): void {
  ensureWritable(host, area.sheet);
  if (isUnbounded(area)) throw fault("InvalidArgument");
  const cellOf = shaped(area, value);
  writeCells(host.book, area, (row, column) => written(cellOf(row, column)));
}

function written(value: unknown): string | number | boolean | null {
  if (value === null || typeof value === "number" || typeof value === "boolean") return value;
  if (typeof value !== "string") throw fault("InvalidArgument");
  if (value.startsWith("=") && value.length > longestFormula) throw fault("InvalidArgument");
  return value;
}

export function setFormats(host: Host, area: Area, value: unknown): void {
  ensureWritable(host, area.sheet);
  if (isUnbounded(area)) throw fault("InvalidArgument");
  const formatOf = shaped(area, value);
  setStyles(host.book, area, (row, column) => {
    const format = formatOf(row, column);
    if (format === null) return null;
    if (typeof format !== "string") throw fault("InvalidArgument");
    return { n: format === "General" ? null : { pattern: format } };
  });
}
