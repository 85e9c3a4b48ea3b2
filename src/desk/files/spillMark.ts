import { insideOf, prefixOf } from "./xmlText.ts";

/** The name by which a workbook's metadata marks formulas that spill. */
const dynamicArrays = "XLDAPR";

/**
 * The number that marks a spilling formula in the cells of a workbook with this metadata part, counted from 1;
 * null where the part knows no such mark: the formula is then a fixed array, which still computes.
 */
export function spillMark(part: string): number | null {
  const prefix = prefixOf(part);
  const types = [...part.matchAll(/<(?:\w+:)?metadataType [^>]*name="([^"]*)"/g)].map(([, name]) => name);
  const type = types.indexOf(dynamicArrays) + 1;
  const blocks = [...insideOf(part, `${prefix}cellMetadata`).matchAll(/<(?:\w+:)?rc [^>]*t="(\d+)"/g)];
  const place = blocks.findIndex(([, t]) => Number(t) === type);
  return type === 0 || place < 0 ? null : place + 1;
}
