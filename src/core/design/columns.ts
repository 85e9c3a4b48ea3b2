import { nearestName } from "../problem/nearestName.ts";
import { type Result, failure, success } from "../problem/result.ts";
import { rangeOf } from "../table/place.ts";
import type { Column, Source } from "../table/source.ts";

/**
 * The column of a heading: as it stands, else free of case and outer blanks.
 * @returns Problem "unknown-heading" with the nearest known one, or "repeated-heading" where several columns carry it.
 */
export function findColumn({ columns, rowCount }: Source, heading: string): Result<Column> {
  const exact = columns.filter(({ name }) => name === heading);
  const found = exact.length > 0 ? exact : columns.filter(({ name }) => plain(name) === plain(heading));
  if (found.length > 1) {
    return failure({ code: "repeated-heading", heading, cells: found.map(({ place }) => rangeOf(place, rowCount)) });
  }
  const [column] = found;
  if (column !== undefined) return success(column);
  const names = columns.map(({ name }) => name);
  return failure({ code: "unknown-heading", heading, nearest: nearestName(heading, names), where: whereOf(columns) });
}

export const sameColumn = (a: string, b: string): boolean => plain(a) === plain(b);

const plain = (heading: string): string => heading.trim().toLowerCase();

function whereOf([first]: readonly Column[]): string {
  if (first === undefined) return "the data";
  return first.place.kind === "sheet" ? `the columns chosen on ${first.place.sheet}` : "the outcome, drivers and key";
}
