import {
  BooleanNumber,
  BorderStyleTypes,
  HorizontalAlign,
  VerticalAlign,
  WrapStrategy,
  type IStyleData,
  type Nullable,
} from "@univerjs/core";
import type { Area } from "../workbook/areas.ts";
import { worksheetOf } from "../workbook/book.ts";
import { cellAt, cellsOf } from "../workbook/cells.ts";
import { pointsPerPixel, standardHeight, standardWidth } from "../workbook/sizes.ts";
import { applyStyle, styleAt } from "../workbook/styles.ts";
import { flag, indentPixels } from "../workbook/styleTables.ts";
import { asFlag, asNumber, asText, oneOf } from "./arguments.ts";
import { autofitColumns, autofitRows, setColumnWidth, setRowHeight } from "./autofit.ts";
import { fault } from "./fault.ts";
import { ensureWritable } from "./guards.ts";
import type { Host } from "./host.ts";
import { hold, type States } from "./held.ts";
import type { Family } from "./model.ts";
import { common, withinGrid } from "./rangeShape.ts";

type Areas = readonly Area[];

export function restyle(host: Host, areas: Areas, style: IStyleData): void {
  for (const area of areas) {
    ensureWritable(host, area.sheet);
    applyStyle(host.book, withinGrid(host, area), style);
  }
}

/** What the corners of the areas agree on; Excel answers null where cells differ. */
function styled<T>(host: Host, areas: Areas, read: (style: IStyleData) => T): T | null {
  const corners = areas.flatMap(({ sheet, row, column, rows, columns }) => {
    const cells = cellsOf(host.book, sheet);
    const rowsLooked = [row, row + Math.min(rows, mostLooked) - 1];
    const columnsLooked = [column, column + Math.min(columns, mostLooked) - 1];
    return rowsLooked.flatMap((r) => columnsLooked.map((c) => read(styleAt(host.book, cellAt(cells, r, c)))));
  });
  return common(corners);
}

/** Farther than any sheet of ours is laid out. */
const mostLooked = 100_000;

const alignments = {
  General: HorizontalAlign.UNSPECIFIED,
  Left: HorizontalAlign.LEFT,
  Center: HorizontalAlign.CENTER,
  Right: HorizontalAlign.RIGHT,
  Justify: HorizontalAlign.JUSTIFIED,
} as const;
const stands = { Top: VerticalAlign.TOP, Center: VerticalAlign.MIDDLE, Bottom: VerticalAlign.BOTTOM } as const;

const nameOf = <K extends string>(table: Readonly<Record<K, number>>, value: Nullable<number>, otherwise: K): K =>
  (Object.keys(table) as K[]).find((key) => table[key] === value) ?? otherwise;

export const rangeFormat: Family<Areas> = {
  read: {
    WrapText: (areas, host) => styled(host, areas, ({ tb }) => tb === WrapStrategy.WRAP),
    HorizontalAlignment: (areas, host) => styled(host, areas, ({ ht }) => nameOf(alignments, ht, "General")),
    VerticalAlignment: (areas, host) => styled(host, areas, ({ vt }) => nameOf(stands, vt, "Bottom")),
    ColumnWidth: (areas, host) => columnWidthOf(host, areas),
    RowHeight: (areas, host) => rowHeightOf(host, areas),
    IndentLevel: (areas, host) => styled(host, areas, ({ pd }) => Math.round((pd?.l ?? 0) / indentPixels)),
  },
  write: {
    WrapText: (areas, host, value) =>
      restyle(host, areas, { tb: asFlag(value) ? WrapStrategy.WRAP : WrapStrategy.OVERFLOW }),
    HorizontalAlignment: (areas, host, value) => restyle(host, areas, { ht: alignments[oneOf(value, alignments)] }),
    VerticalAlignment: (areas, host, value) => restyle(host, areas, { vt: stands[oneOf(value, stands)] }),
    ColumnWidth: (areas, host, value) => setColumnWidth(host, areas, asNumber(value) / pointsPerPixel),
    RowHeight: (areas, host, value) => setRowHeight(host, areas, asNumber(value) / pointsPerPixel),
    IndentLevel: (areas, host, value) => restyle(host, areas, { pd: { l: asNumber(value) * indentPixels } }),
    UseStandardWidth: (areas, host, value) => {
      if (asFlag(value)) setColumnWidth(host, areas, standardWidth);
    },
    UseStandardHeight: (areas, host, value) => {
      if (asFlag(value)) setRowHeight(host, areas, standardHeight);
    },
  },
  part: {
    Fill: (areas) => hold("RangeFill", areas),
    Font: (areas) => hold("RangeFont", areas),
    Borders: (areas) => hold("RangeBorderCollection", areas),
  },
  call: {
    AutofitColumns: (areas, host) => autofitColumns(host, areas),
    AutofitRows: (areas, host) => autofitRows(host, areas),
  },
  lacks: ["TextOrientation", "UseStandardHeight", "UseStandardWidth", "ReadingOrder", "ShrinkToFit", "AutoIndent"],
};

const columnWidthOf = (host: Host, areas: Areas): number | null =>
  common(areas.map(({ sheet, column }) => worksheetOf(host.book, sheet).getColumnWidth(column) * pointsPerPixel));

const rowHeightOf = (host: Host, areas: Areas): number | null =>
  common(areas.map(({ sheet, row }) => worksheetOf(host.book, sheet).getRowHeight(row) * pointsPerPixel));

export const rangeFill: Family<Areas> = {
  read: { Color: (areas, host) => styled(host, areas, ({ bg }) => upper(bg?.rgb ?? "#FFFFFF")) },
  write: { Color: (areas, host, value) => restyle(host, areas, { bg: { rgb: colorOf(value) } }) },
  call: { Clear: (areas, host) => restyle(host, areas, { bg: null }) },
  lacks: ["TintAndShade", "PatternTintAndShade", "Pattern", "PatternColor"],
};

export const rangeFont: Family<Areas> = {
  read: {
    Name: (areas, host) => styled(host, areas, ({ ff }) => ff ?? "Calibri"),
    Size: (areas, host) => styled(host, areas, ({ fs }) => fs ?? 11),
    Color: (areas, host) => styled(host, areas, ({ cl }) => upper(cl?.rgb ?? "#000000")),
    Bold: (areas, host) => styled(host, areas, ({ bl }) => bl === BooleanNumber.TRUE),
    Italic: (areas, host) => styled(host, areas, ({ it }) => it === BooleanNumber.TRUE),
    Underline: (areas, host) => styled(host, areas, ({ ul }) => (ul?.s === BooleanNumber.TRUE ? "Single" : "None")),
  },
  write: {
    Name: (areas, host, value) => restyle(host, areas, { ff: asText(value) }),
    Size: (areas, host, value) => restyle(host, areas, { fs: asNumber(value) }),
    Color: (areas, host, value) => restyle(host, areas, { cl: { rgb: colorOf(value) } }),
    Bold: (areas, host, value) => restyle(host, areas, { bl: flag(asFlag(value)) }),
    Italic: (areas, host, value) => restyle(host, areas, { it: flag(asFlag(value)) }),
    Underline: (areas, host, value) => restyle(host, areas, { ul: { s: flag(asText(value) !== "None") } }),
  },
  lacks: ["Strikethrough", "Subscript", "Superscript", "TintAndShade"],
};

const sides = {
  EdgeTop: "t",
  EdgeBottom: "b",
  EdgeLeft: "l",
  EdgeRight: "r",
  InsideHorizontal: "",
  InsideVertical: "",
} as const;

export const rangeBorders: Family<Areas> = {
  read: { Count: () => Object.keys(sides).length },
  part: { "": (areas, _host, args) => hold("RangeBorder", { areas, side: oneOf(args[0], sides) }) },
  items: (areas) => Object.keys(sides).map((side) => hold("RangeBorder", { areas, side })),
  lacks: ["TintAndShade"],
};

const lineStyles = {
  None: BorderStyleTypes.NONE,
  Continuous: BorderStyleTypes.THIN,
  Dash: BorderStyleTypes.DASHED,
  Dot: BorderStyleTypes.DOTTED,
  Double: BorderStyleTypes.DOUBLE,
} as const;

const weights = {
  Hairline: BorderStyleTypes.HAIR,
  Thin: BorderStyleTypes.THIN,
  Medium: BorderStyleTypes.MEDIUM,
  Thick: BorderStyleTypes.THICK,
} as const;

export const rangeBorder: Family<States["RangeBorder"]> = {
  id: ({ side }) => side,
  read: { SideIndex: ({ side }) => side },
  write: {
    Style: (state, host, value) => drawBorder(host, state, { s: lineStyles[oneOf(value, lineStyles)] }),
    Weight: (state, host, value) => drawBorder(host, state, { s: weights[oneOf(value, weights)] }),
    Color: (state, host, value) => drawBorder(host, state, { cl: { rgb: colorOf(value) } }),
  },
  lacks: ["Style", "Weight", "Color", "TintAndShade"],
};

/** Draws a line on the edge of the areas, or between their rows or columns. */
function drawBorder(
  host: Host,
  { areas, side }: States["RangeBorder"],
  line: { s?: number; cl?: { rgb: string } },
): void {
  for (const area of areas) {
    ensureWritable(host, area.sheet);
    const edge = sides[oneOf(side, sides)];
    const strips = edge === "" ? innerStrips(area, side) : [{ strip: edgeOf(area, edge), edge }];
    for (const { strip, edge: at } of strips) {
      const cells = cellsOf(host.book, strip.sheet);
      const old = styleAt(host.book, cellAt(cells, strip.row, strip.column)).bd?.[at];
      const drawn = { s: line.s ?? old?.s ?? BorderStyleTypes.THIN, cl: line.cl ?? old?.cl ?? { rgb: "#000000" } };
      const none = line.s === BorderStyleTypes.NONE;
      applyStyle(host.book, strip, { bd: { [at]: none ? null : drawn } });
    }
  }
}

type Edge = "t" | "b" | "l" | "r";

function edgeOf(area: Area, edge: Edge): Area {
  const last = { row: area.row + area.rows - 1, column: area.column + area.columns - 1 };
  if (edge === "t") return { ...area, rows: 1 };
  if (edge === "b") return { ...area, row: last.row, rows: 1 };
  return edge === "l" ? { ...area, columns: 1 } : { ...area, column: last.column, columns: 1 };
}

function innerStrips(area: Area, side: string): readonly { readonly strip: Area; readonly edge: Edge }[] {
  if (side === "InsideHorizontal") return area.rows < 2 ? [] : [{ strip: { ...area, rows: area.rows - 1 }, edge: "b" }];
  return area.columns < 2 ? [] : [{ strip: { ...area, columns: area.columns - 1 }, edge: "r" }];
}

const named: Readonly<Record<string, string>> = {
  black: "#000000",
  white: "#ffffff",
  red: "#ff0000",
  blue: "#0000ff",
  green: "#008000",
  yellow: "#ffff00",
  gray: "#808080",
  orange: "#ffa500",
};

/** "#1f2937" or one of the names that the API takes. */
export function colorOf(value: unknown): string {
  const text = asText(value).toLowerCase();
  const color = named[text] ?? text;
  if (!/^#[0-9a-f]{6}$/.test(color)) throw fault("InvalidArgument");
  return color;
}

const upper = (color: string): string => color.toUpperCase();
