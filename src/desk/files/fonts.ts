import { insideOf, prefixOf } from "./xmlText.ts";

/** Size and name of the font of cells that say nothing of their own, as a style part writes them. */
export const standardFont = '<sz val="11"/><name val="Calibri"/>';

export function usualFontOf(stylePart: string): string {
  const prefix = prefixOf(stylePart);
  const first = insideOf(insideOf(stylePart, `${prefix}fonts`), `${prefix}font`).replaceAll(`<${prefix}`, "<");
  return piecesOf(first).join("") || standardFont;
}

/** The style part with size and name in every font: a font without them is shown as each program likes. */
export function withWholeFonts(stylePart: string, usual: string): string {
  return stylePart.replace(/<font>(.*?)<\/font>/gs, (_, inside: string) => {
    const missing = piecesOf(usual).filter((piece) => !inside.includes(piece.split(" ")[0]!));
    return `<font>${inside}${missing.join("")}</font>`;
  });
}

const piecesOf = (font: string): readonly string[] => font.match(/<(?:sz|name) [^>]*\/>/g) ?? [];
