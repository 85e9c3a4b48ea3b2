import type { ICellData } from "@univerjs/core";
import { intersectionOf, type Area } from "../workbook/areas.ts";
import { usedWithin } from "../workbook/cells.ts";
import { carryOut, command } from "../workbook/grid.ts";
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
  if (formats) clearStyles(host, reach);
}

function clearStyles(host: Host, area: Area): void {
  const cellValue: Record<number, Record<number, ICellData>> = {};
  for (let row = area.row; row < area.row + area.rows; row++) {
    const line: Record<number, ICellData> = {};
    for (let column = area.column; column < area.column + area.columns; column++) line[column] = { s: null };
    cellValue[row] = line;
  }
  const trigger = "sheet.command.set-style";
  carryOut(host.book.grid, command.setValues, { unitId: host.book.unit, subUnitId: area.sheet, cellValue, trigger });
}
