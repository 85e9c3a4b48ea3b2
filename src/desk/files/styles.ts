import { resolveThemeColor, type CellStyle as FileStyle } from "hucre/xlsx";
import type { CellStyle } from "../book/bookData.ts";
import { known } from "./known.ts";

type Part<K extends keyof FileStyle> = NonNullable<FileStyle[K]>;
type FileColor = NonNullable<Part<"font">["color"]>;

/** The looks of a cell in the words of the file library. */
export function toFileStyle(style: CellStyle): FileStyle {
  return known({
    font: partOf<"font">({ ...known({ bold: style.bold, italic: style.italic, size: style.size }), ...colored(style) }),
    fill: style.fill === undefined ? undefined : filledWith(style.fill),
    border: partOf<"border">(known({ top: lineOf(style.lineAbove), bottom: lineOf(style.lineBelow) })),
    alignment: partOf<"alignment">(
      known({
        wrapText: style.wrap,
        horizontal: style.horizontal,
        vertical: style.vertical && fileVertical[style.vertical],
        indent: style.indent,
      }),
    ),
    numFmt: style.numberFormat,
  });
}

const partOf = <K extends keyof FileStyle>(part: Part<K> & object): Part<K> | undefined =>
  Object.keys(part).length > 0 ? part : undefined;

const colored = ({ color }: CellStyle): Part<"font"> => (color === undefined ? {} : { color: fileColor(color) });

const filledWith = (color: string): Part<"fill"> => ({ type: "pattern", pattern: "solid", fgColor: fileColor(color) });

const lineOf = (color: string | undefined): Part<"border">["top"] =>
  color === undefined ? undefined : { style: "thin", color: fileColor(color) };

const fileVertical = { top: "top", middle: "center", bottom: "bottom" } as const;

const fileColor = (color: string): FileColor => ({ rgb: color.replace("#", "").toUpperCase() });

/** What the workbook's cells look like where they say nothing of their own. */
export interface UsualLooks {
  /** The theme's colours, dark and light text and background first. */
  readonly theme: readonly string[];
  /** In points. */
  readonly size: number;
}

/** Text without a colour of its own. */
const usualColor = "#000000";

/** The looks that the desk knows of; others of the file are left out. */
export function toBookStyle(style: FileStyle, usual: UsualLooks): CellStyle | undefined {
  const found: CellStyle = known({
    numberFormat: style.numFmt === "General" ? undefined : style.numFmt,
    ...fontOf(style.font, usual),
    fill: fillOf(style.fill, usual.theme),
    ...linesOf(style.border, usual.theme),
    ...placingOf(style.alignment),
  });
  return Object.keys(found).length > 0 ? found : undefined;
}

function fontOf(font: FileStyle["font"], { theme, size }: UsualLooks): CellStyle {
  const color = colorOf(font?.color, theme);
  return known({
    bold: font?.bold === true ? true : undefined,
    italic: font?.italic === true ? true : undefined,
    size: font?.size === size ? undefined : font?.size,
    color: color === usualColor ? undefined : color,
  });
}

const fillOf = (fill: FileStyle["fill"], theme: readonly string[]): string | undefined =>
  fill?.type === "pattern" && fill.pattern === "solid" ? colorOf(fill.fgColor, theme) : undefined;

function linesOf(border: FileStyle["border"], theme: readonly string[]): CellStyle {
  const lineColor = (side: Part<"border">["top"]): string | undefined =>
    side && (colorOf(side.color, theme) ?? usualColor);
  return known({ lineAbove: lineColor(border?.top), lineBelow: lineColor(border?.bottom) });
}

function placingOf({ wrapText, horizontal, vertical, indent }: Part<"alignment"> = {}): CellStyle {
  return known({
    wrap: wrapText === true ? true : undefined,
    horizontal: horizontal === "left" || horizontal === "right" || horizontal === "center" ? horizontal : undefined,
    vertical: vertical === "top" ? vertical : vertical === "center" ? "middle" : undefined,
    indent: indent === 0 ? undefined : indent,
  });
}

function colorOf(color: FileColor | undefined, theme: readonly string[]): string | undefined {
  if (color?.rgb !== undefined) return `#${color.rgb.slice(-6).toLowerCase()}`;
  if (color?.theme === undefined || color.theme >= theme.length) return undefined;
  const place = cellOrder[color.theme] ?? color.theme;
  return `#${resolveThemeColor([...theme], place, color.tint)
    .slice(-6)
    .toLowerCase()}`;
}

/** Cells count background before text, the theme text before background. */
const cellOrder: readonly number[] = [1, 0, 3, 2];
