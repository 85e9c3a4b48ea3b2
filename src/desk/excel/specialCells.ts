import type { Area } from "../workbook/areas.ts";
import { fault } from "./fault.ts";
import type { Host } from "./host.ts";
import { hold, type Held } from "./held.ts";
import type { Arguments } from "./model.ts";
import { isRowHidden } from "./rangeShape.ts";

/** The cells of an area that are not hidden, in as few areas as there are stretches of rows; null where all are hidden. */
export function specialCells(host: Host, area: Area, args: Arguments): Held | null {
  if (args[0] !== "Visible")
    throw fault("ApiNotFound", `The stand-in finds no special cells of type ${String(args[0])}.`);
  const stretches: Area[] = [];
  let start = area.row;
  for (let row = area.row; row <= area.row + area.rows; row++) {
    if (row < area.row + area.rows && !isRowHidden(host, area.sheet, row)) continue;
    if (row > start) stretches.push({ ...area, row: start, rows: row - start });
    start = row + 1;
  }
  return stretches.length === 0 ? null : hold("RangeAreas", stretches);
}
