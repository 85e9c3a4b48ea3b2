import {
  BooleanNumber,
  BorderStyleTypes,
  HorizontalAlign,
  VerticalAlign,
  WrapStrategy,
  type ICellData,
  type IStyleData,
  type Nullable,
} from "@univerjs/core";
import type { CellStyle } from "../book/bookData.ts";
import type { Area } from "./areas.ts";
import { workbookOf, type Book } from "./book.ts";
import { carryOut, command, styleTrigger } from "./grid.ts";

const horizontal = {
  left: HorizontalAlign.LEFT,
  right: HorizontalAlign.RIGHT,
  center: HorizontalAlign.CENTER,
} as const;
const vertical = { top: VerticalAlign.TOP, middle: VerticalAlign.MIDDLE, bottom: VerticalAlign.BOTTOM } as const;
const line = (color: string) => ({ s: BorderStyleTypes.THIN, cl: { rgb: color } });

/** A style of ours as the grid keeps it. */
export function toGridStyle(style: CellStyle): IStyleData {
  const borders = {
    ...(style.lineAbove === undefined ? {} : { t: line(style.lineAbove) }),
    ...(style.lineBelow === undefined ? {} : { b: line(style.lineBelow) }),
  };
  return {
    ...(style.numberFormat === undefined ? {} : { n: { pattern: style.numberFormat } }),
    ...(style.bold === undefined ? {} : { bl: flag(style.bold) }),
    ...(style.italic === undefined ? {} : { it: flag(style.italic) }),
    ...(style.size === undefined ? {} : { fs: style.size }),
    ...(style.color === undefined ? {} : { cl: { rgb: style.color } }),
    ...(style.fill === undefined ? {} : { bg: { rgb: style.fill } }),
    ...(style.wrap === undefined ? {} : { tb: style.wrap ? WrapStrategy.WRAP : WrapStrategy.OVERFLOW }),
    ...(style.horizontal === undefined ? {} : { ht: horizontal[style.horizontal] }),
    ...(style.vertical === undefined ? {} : { vt: vertical[style.vertical] }),
    ...(Object.keys(borders).length === 0 ? {} : { bd: borders }),
  };
}

export const flag = (on: boolean): BooleanNumber => (on ? BooleanNumber.TRUE : BooleanNumber.FALSE);

const named = <K extends string>(names: Readonly<Record<K, number>>, value: Nullable<number>): K | undefined =>
  (Object.keys(names) as K[]).find((name) => names[name] === value);

/** The grid's style as ours, undefined where nothing is set. */
export function fromGridStyle(style: IStyleData): CellStyle | undefined {
  const aligned = named(horizontal, style.ht);
  const stands = named(vertical, style.vt);
  const [above, below] = [style.bd?.t?.cl?.rgb, style.bd?.b?.cl?.rgb];
  const ours: CellStyle = {
    ...(isPattern(style.n?.pattern) ? { numberFormat: style.n?.pattern ?? "General" } : {}),
    ...(style.bl === BooleanNumber.TRUE ? { bold: true } : {}),
    ...(style.it === BooleanNumber.TRUE ? { italic: true } : {}),
    ...(style.fs === undefined ? {} : { size: style.fs }),
    ...(typeof style.cl?.rgb === "string" ? { color: style.cl.rgb } : {}),
    ...(typeof style.bg?.rgb === "string" ? { fill: style.bg.rgb } : {}),
    ...(style.tb === WrapStrategy.WRAP ? { wrap: true } : {}),
    ...(aligned === undefined ? {} : { horizontal: aligned }),
    ...(stands === undefined ? {} : { vertical: stands }),
    ...(typeof above === "string" ? { lineAbove: above } : {}),
    ...(typeof below === "string" ? { lineBelow: below } : {}),
  };
  return Object.keys(ours).length === 0 ? undefined : ours;
}

const isPattern = (pattern: string | undefined): boolean =>
  pattern !== undefined && pattern !== "" && pattern !== "General";

export function styleAt(book: Book, cell: ICellData | undefined): IStyleData {
  if (cell?.s === undefined || cell.s === null) return {};
  return workbookOf(book).getStyles().getStyleByCell(cell) ?? {};
}

export const formatAt = (book: Book, cell: ICellData | undefined): string => {
  const pattern = styleAt(book, cell).n?.pattern;
  return pattern === undefined || pattern === "" ? "General" : pattern;
};

/** Lays a style over every cell of an area; what the style does not speak of stays. */
export function applyStyle(book: Book, area: Area, style: IStyleData): void {
  setStyles(book, area, () => style);
}

export function setStyles(book: Book, area: Area, styleOf: (row: number, column: number) => IStyleData | null): void {
  const cellValue: Record<number, Record<number, ICellData>> = {};
  for (let row = 0; row < area.rows; row++) {
    const cells: Record<number, ICellData> = {};
    for (let column = 0; column < area.columns; column++) {
      const style = styleOf(row, column);
      if (style !== null) cells[area.column + column] = { s: style };
    }
    cellValue[area.row + row] = cells;
  }
  carryOut(book.grid, command.setValues, {
    unitId: book.unit,
    subUnitId: area.sheet,
    cellValue,
    trigger: styleTrigger,
  });
}
