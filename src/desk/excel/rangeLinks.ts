import type { Area } from "../workbook/areas.ts";
import { recordOf } from "../workbook/book.ts";
import { cellAt, cellsOf, valueOf } from "../workbook/cells.ts";
import { applyStyle } from "../workbook/styles.ts";
import { writeCells } from "../workbook/write.ts";
import { fault } from "./fault.ts";
import { ensureWritable } from "./guards.ts";
import type { Host } from "./host.ts";

/** What Excel calls a hyperlink: to a place in this workbook or to an address outside. */
interface Hyperlink {
  readonly address?: string;
  readonly documentReference?: string;
  readonly screenTip?: string;
  readonly textToDisplay?: string;
}

/** Blue and underlined, as Excel shows a link. */
const linkStyle = { cl: { rgb: "#0563c1" }, ul: { s: 1 } } as const;

const isOutside = (target: string): boolean => /^(https?|mailto|ftp|file):/i.test(target);

export function hyperlinkOf(host: Host, area: Area): Hyperlink | null {
  const link = recordOf(host.book, area.sheet).links.get(`${area.row},${area.column}`);
  if (link === undefined) return null;
  const textToDisplay = String(valueOf(cellAt(cellsOf(host.book, area.sheet), area.row, area.column)));
  const target = isOutside(link.target) ? { address: link.target } : { documentReference: link.target };
  return { ...target, screenTip: link.screenTip, textToDisplay };
}

export function setHyperlink(host: Host, area: Area, value: unknown): void {
  ensureWritable(host, area.sheet);
  if (typeof value !== "object" || value === null) throw fault("InvalidArgument");
  const { address, documentReference, screenTip = "", textToDisplay } = value as Hyperlink;
  const target = documentReference ?? address;
  if (target === undefined || target === "") throw fault("InvalidArgument");
  const { links } = recordOf(host.book, area.sheet);
  for (let row = area.row; row < area.row + area.rows; row++) {
    for (let column = area.column; column < area.column + area.columns; column++) {
      links.set(`${row},${column}`, { target, screenTip });
    }
  }
  if (textToDisplay !== undefined) writeCells(host.book, area, () => `'${textToDisplay}`);
  applyStyle(host.book, area, linkStyle);
}

export function clearLinks(host: Host, area: Area): void {
  const { links } = recordOf(host.book, area.sheet);
  for (const place of links.keys()) {
    const [row = -1, column = -1] = place.split(",").map(Number);
    const inside = row >= area.row && row < area.row + area.rows;
    if (inside && column >= area.column && column < area.column + area.columns) links.delete(place);
  }
}
