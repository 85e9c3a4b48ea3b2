import { parseArea, type Area } from "../workbook/areas.ts";
import { areaOfName, namesOf } from "../workbook/names.ts";
import { areaOfTable, tableNamed } from "../workbook/tables.ts";
import { fault } from "./fault.ts";
import type { Host } from "./host.ts";

/** Longest text that Excel takes for an address. */
const longestAddress = 8192;

/** Reads what the API takes for one range: an address, a name, or a table's name. */
export function areaAt(host: Host, text: string, sheet: string): Area {
  if (text.length > longestAddress) throw fault("InvalidArgument");
  const area = parseArea(host.book, text, sheet) ?? named(host, text);
  if (area === null) throw fault("InvalidArgument", text);
  return area;
}

function named(host: Host, text: string): Area | null {
  const wanted = text.toLowerCase();
  const name = namesOf(host.book).find((known) => known.name.toLowerCase() === wanted);
  if (name !== undefined) return areaOfName(host.book, name);
  const table = tableNamed(host.book, text);
  return table === null ? null : areaOfTable(table);
}

/** Several areas, separated by commas outside of quotes: "A1:B2, 'My, data'!D1". */
export function areasAt(host: Host, text: string, sheet: string): readonly Area[] {
  const parts = text.match(/(?:'(?:[^']|'')*'|[^,'])+/g) ?? [];
  const areas = parts.map((part) => areaAt(host, part.trim(), sheet));
  if (areas.length === 0 || areas.some((area) => area.sheet !== areas[0]?.sheet)) throw fault("InvalidArgument");
  return areas;
}
