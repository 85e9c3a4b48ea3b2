import { blankSheet } from "../book/blankSheet.ts";
import type { BookCell, BookValue, CellStyle, SheetData } from "../book/bookData.ts";

const ink = "#0f4c5c";

export const looks = {
  title: { bold: true, size: 16, color: ink },
  note: { italic: true, color: "#5b6770" },
  heading: { bold: true, fill: "#e3eef1", lineBelow: ink, horizontal: "right" },
  firstHeading: { bold: true, fill: "#e3eef1", lineBelow: ink },
  input: { fill: "#fdf3d8" },
} as const satisfies Record<string, CellStyle>;

export interface DemoColumn {
  readonly heading: string;
  readonly values: readonly BookValue[];
  readonly numberFormat?: string;
  /** In characters. */
  readonly width: number;
}

/** A sheet of columns side by side, with a title and a note above where there are any. */
export function columnSheet(name: string, columns: readonly DemoColumn[], above: readonly string[] = []): SheetData {
  const headings = columns.map(({ heading }, index): BookCell => ({
    value: heading,
    style: index === 0 ? looks.firstHeading : looks.heading,
  }));
  const rows = columns[0]?.values.map((_, row) => columns.map((column) => cellOf(column, row))) ?? [];
  const top = titleRows(above);
  return {
    ...blankSheet(name, [...top, headings, ...rows]),
    columnWidths: columns.map(({ width }) => width),
    rowHeights: heightsUnder(above),
    onePageWide: true,
    frozenRows: top.length + 1,
  };
}

/** The title, the notes, and a blank row that sets them apart from the data. */
export function titleRows([title, ...notes]: readonly string[]): BookCell[][] {
  if (title === undefined) return [];
  return [[{ value: title, style: looks.title }], ...notes.map((value) => [{ value, style: looks.note }]), []];
}

/** In points; a title of 16 points needs more than the standard row. */
const titleHeight = 24;

export const heightsUnder = (above: readonly string[]): readonly number[] => (above.length === 0 ? [] : [titleHeight]);

function cellOf({ values, numberFormat }: DemoColumn, row: number): BookCell {
  const value = values[row] ?? null;
  return numberFormat === undefined ? value : { value, style: { numberFormat } };
}
