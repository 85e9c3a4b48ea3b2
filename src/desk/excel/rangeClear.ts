import { intersectionOf, type Area } from "../workbook/areas.ts";
import { usedWithin } from "../workbook/cells.ts";
import { clearStyles } from "../workbook/styles.ts";
import { writeCells } from "../workbook/write.ts";
import { oneOf } from "./arguments.ts";
import { ensureWritable } from "./guards.ts";
import type { Host } from "./host.ts";
import { clearLinks } from "./rangeLinks.ts";
import { unmergeRange } from "./rangeShape.ts";

/** What may be cleared, by the API's names. */
const parts = {
  All: { contents: true, formats: true, links: true },
  Contents: { contents: true, formats: false, links: false },
  Formats: { contents: false, formats: true, links: false },
  Hyperlinks: { contents: false, formats: true, links: true },
  RemoveHyperlinks: { contents: false, formats: true, links: true },
} as const;

export function clearRange(host: Host, area: Area, applyTo: unknown): void {
  ensureWritable(host, area.sheet);
  const { contents, formats, links } = parts[oneOf(applyTo ?? "All", parts)];
  const used = usedWithin(host.book, area, false);
  const reach = used === null ? null : intersectionOf(used, area);
  if (links) clearLinks(host, area);
  if (contents && formats) unmergeRange(host, area);
  if (reach === null) return;
  if (contents) writeCells(host.book, reach, () => "");
  if (formats) clearStyles(host.book, reach);
}
