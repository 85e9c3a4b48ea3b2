import {
  BooleanNumber,
  BorderStyleTypes,
  HorizontalAlign,
  VerticalAlign,
  WrapStrategy,
  type IStyleData,
  type Nullable,
} from "@univerjs/core";
import type { CellStyle } from "../book/bookData.ts";

const horizontal = {
  left: HorizontalAlign.LEFT,
  right: HorizontalAlign.RIGHT,
  center: HorizontalAlign.CENTER,
} as const;
const vertical = { top: VerticalAlign.TOP, middle: VerticalAlign.MIDDLE, bottom: VerticalAlign.BOTTOM } as const;

/** One step of indentation is about three characters wide, as in Excel. */
export const indentPixels = 9;

export const flag = (on: boolean): BooleanNumber => (on ? BooleanNumber.TRUE : BooleanNumber.FALSE);

const line = (color: string) => ({ s: BorderStyleTypes.THIN, cl: { rgb: color } });

type Style = Required<CellStyle>;

const toGrid: { readonly [K in keyof Style]: (value: Style[K]) => IStyleData } = {
  numberFormat: (pattern) => ({ n: { pattern } }),
  bold: (on) => ({ bl: flag(on) }),
  italic: (on) => ({ it: flag(on) }),
  size: (points) => ({ fs: points }),
  color: (rgb) => ({ cl: { rgb } }),
  fill: (rgb) => ({ bg: { rgb } }),
  wrap: (on) => ({ tb: on ? WrapStrategy.WRAP : WrapStrategy.OVERFLOW }),
  horizontal: (side) => ({ ht: horizontal[side] }),
  vertical: (side) => ({ vt: vertical[side] }),
  indent: (steps) => ({ pd: { l: steps * indentPixels } }),
  lineAbove: (color) => ({ bd: { t: line(color) } }),
  lineBelow: (color) => ({ bd: { b: line(color) } }),
};

const fromGrid: { readonly [K in keyof Style]: (style: IStyleData) => Nullable<Style[K]> } = {
  numberFormat: ({ n }) => (n?.pattern === "General" ? null : n?.pattern),
  bold: ({ bl }) => bl === BooleanNumber.TRUE || null,
  italic: ({ it }) => it === BooleanNumber.TRUE || null,
  size: ({ fs }) => fs,
  color: ({ cl }) => cl?.rgb,
  fill: ({ bg }) => bg?.rgb,
  wrap: ({ tb }) => tb === WrapStrategy.WRAP || null,
  horizontal: ({ ht }) => named(horizontal, ht),
  vertical: ({ vt }) => named(vertical, vt),
  indent: ({ pd }) => Math.round((pd?.l ?? 0) / indentPixels) || null,
  lineAbove: ({ bd }) => bd?.t?.cl.rgb,
  lineBelow: ({ bd }) => bd?.b?.cl.rgb,
};

const keys = Object.keys(toGrid) as (keyof Style)[];

const named = <K extends string>(names: Readonly<Record<K, number>>, value: Nullable<number>): K | undefined =>
  (Object.keys(names) as K[]).find((name) => names[name] === value);

/** A style of ours as the grid keeps it. */
export function toGridStyle(style: CellStyle): IStyleData {
  return keys.reduce<IStyleData>((grid, key) => {
    const value = style[key];
    if (value === undefined) return grid;
    const part = (toGrid[key] as (given: typeof value) => IStyleData)(value);
    return { ...grid, ...part, ...(part.bd === undefined ? {} : { bd: { ...grid.bd, ...part.bd } }) };
  }, {});
}

/** The grid's style as ours, undefined where nothing is set. */
export function fromGridStyle(style: IStyleData): CellStyle | undefined {
  const set = keys.flatMap((key) => {
    const value = fromGrid[key](style);
    return value === undefined || value === null || value === "" ? [] : [[key, value] as const];
  });
  return set.length === 0 ? undefined : Object.fromEntries(set);
}
