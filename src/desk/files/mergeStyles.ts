import { appendTo, countOf, insideOf, prefixOf, withPrefix } from "./xmlText.ts";

/** The style part with the other's styles at its end, and how far those have moved. */
interface Merged {
  readonly part: string;
  /** To be added to the style number of every cell that carries one. */
  readonly shift: number;
}

/** Numbers below are the formats that every spreadsheet knows. */
const firstOwnFormat = 164;

/** Puts the styles of one workbook behind those of another; none of the latter's moves. */
export function mergeStyles(into: string, from: string): Merged {
  const prefix = prefixOf(into);
  const shiftOf = (list: string, item: string): number => countOf(insideOf(into, prefix + list), prefix + item);
  const formats = formatShift(into);
  const shifts = {
    numFmtId: formats,
    fontId: shiftOf("fonts", "font"),
    fillId: shiftOf("fills", "fill"),
    borderId: shiftOf("borders", "border"),
  };
  const withFormats = appendFormats(into, renumber(insideOf(from, "numFmts"), { numFmtId: formats }), prefix);
  const part = ["fonts", "fills", "borders"].reduce(
    (merged, list) => appendTo(merged, prefix + list, withPrefix(insideOf(from, list), prefix)) ?? merged,
    withFormats,
  );
  const cells = withPrefix(renumber(insideOf(from, "cellXfs"), shifts), prefix);
  return { part: appendTo(part, `${prefix}cellXfs`, cells) ?? part, shift: shiftOf("cellXfs", "xf") };
}

function formatShift(into: string): number {
  const used = [...into.matchAll(/numFmtId="(\d+)"/g)].map(([, id]) => Number(id));
  return Math.max(firstOwnFormat - 1, ...used) + 1 - firstOwnFormat;
}

function renumber(elements: string, shifts: Readonly<Record<string, number>>): string {
  return elements.replace(/(numFmtId|fontId|fillId|borderId)="(\d+)"/g, (_, name: string, id: string) => {
    const known = name === "numFmtId" && Number(id) < firstOwnFormat;
    return `${name}="${known ? id : Number(id) + (shifts[name] ?? 0)}"`;
  });
}

/** Formats come first in the part; a workbook that has none of its own has no list of them. */
function appendFormats(part: string, formats: string, prefix: string): string {
  if (formats === "") return part;
  const own = withPrefix(formats, prefix);
  return (
    appendTo(part, `${prefix}numFmts`, own) ??
    part.replace(/<(?:\w+:)?styleSheet[^>]*>/, (root) => `${root}<${prefix}numFmts>${own}</${prefix}numFmts>`)
  );
}
