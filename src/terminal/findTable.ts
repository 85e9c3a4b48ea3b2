import type { Errand } from "../app/errand.ts";
import type { DataPlace, Host } from "../app/host.ts";
import { type FoundData, readPlaced } from "../app/tableInHand.ts";
import { nearestName } from "../core/problem/nearestName.ts";
import type { Problem } from "../core/problem/problem.ts";
import { type Result, failure } from "../core/problem/result.ts";
import { plainHeading } from "../core/table/headingRow.ts";
import { columnInWords } from "../core/table/headings.ts";
import { rangeOf } from "../core/table/place.ts";

/** The names the user gave, to be matched with headings. */
export interface Wanted {
  readonly sheet: string | null;
  readonly headings: readonly string[];
}

/**
 * Finds the sheet and the table that have the headings asked for.
 * @returns Problem "unknown-place" for a sheet that does not exist, "unknown-heading" with the nearest one,
 *   "ambiguous-heading" where several sheets have them all, "repeated-heading" where several columns have one.
 */
export async function findTable(host: Host, wanted: Wanted, errand: Errand): Promise<Result<FoundData>> {
  const places = await host.listPlaces();
  if (!places.ok) return places;
  const sheets = places.value.filter(({ kind }) => kind === "sheet");
  const chosen = sheets.filter(
    ({ name }) => wanted.sheet === null || plainHeading(name) === plainHeading(wanted.sheet),
  );
  if (chosen.length === 0) return failure(noSuchSheet(wanted.sheet, sheets));
  const tables: { readonly place: DataPlace; readonly table: Result<FoundData> }[] = [];
  for (const place of chosen) {
    const block = await host.read({ kind: "place", place }, errand);
    if (!block.ok) return block;
    tables.push({ place, table: readPlaced(block.value, wanted.headings) });
  }
  const fitting = tables.filter(({ table }) => table.ok && missingFrom(table.value, wanted.headings) === undefined);
  if (fitting.length > 1) {
    return failure({
      code: "ambiguous-heading",
      headings: wanted.headings,
      sheets: fitting.map(({ place }) => place.name),
    });
  }
  const [only] = fitting;
  if (only === undefined || !only.table.ok) return only?.table ?? nearMiss(tables, wanted);
  const repeated = repeatedAmong(only.table.value, wanted.headings);
  return repeated === null ? only.table : failure(repeated);
}

const noSuchSheet = (sheet: string | null, sheets: readonly DataPlace[]) =>
  sheet === null
    ? ({ code: "no-data", where: "the workbook" } as const)
    : ({
        code: "unknown-place",
        place: sheet,
        nearest: nearestName(
          sheet,
          sheets.map(({ name }) => name),
        ),
      } as const);

/** A heading asked for that stands above several columns, of which the later ones have their place in their names. */
function repeatedAmong({ source }: FoundData, headings: readonly string[]): Problem | null {
  const { columns, rowCount } = source;
  for (const heading of headings) {
    const carriers = columns.filter(({ name, place }) =>
      [heading, `${heading} (${columnInWords(place.column)})`].map(plainHeading).includes(plainHeading(name)),
    );
    if (carriers.length < 2) continue;
    return { code: "repeated-heading", heading, cells: carriers.map(({ place }) => rangeOf(place, rowCount)) };
  }
  return null;
}

const namesOf = (table: FoundData): string[] => table.source.columns.map(({ name }) => name);

const missingFrom = (table: FoundData, headings: readonly string[]): string | undefined =>
  headings.find((heading) => !namesOf(table).some((name) => plainHeading(name) === plainHeading(heading)));

/** Where no sheet has all the headings: the fault of the sheet that has most of them. */
function nearMiss(
  tables: readonly { readonly place: DataPlace; readonly table: Result<FoundData> }[],
  { headings }: Wanted,
): Result<FoundData> {
  const foundIn = (table: Result<FoundData>): number =>
    table.ok ? headings.filter((heading) => missingFrom(table.value, [heading]) === undefined).length : -1;
  const ranked = tables.map(({ place, table }) => ({ place, table, found: foundIn(table) }));
  const [best] = ranked.toSorted((a, b) => b.found - a.found);
  if (best === undefined || !best.table.ok) return best?.table ?? failure({ code: "no-data", where: "the workbook" });
  const heading = missingFrom(best.table.value, headings) ?? "";
  const nearest = nearestName(heading, namesOf(best.table.value));
  return failure({ code: "unknown-heading", heading, nearest, where: best.place.name });
}

/** The column's own name for a heading given in another case or spacing. */
export const ownName = (table: FoundData, heading: string): string =>
  namesOf(table).find((name) => plainHeading(name) === plainHeading(heading)) ?? heading;
