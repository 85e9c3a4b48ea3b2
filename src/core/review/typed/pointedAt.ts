import { nearestName } from "../../problem/nearestName.ts";
import { type Result, failure, success } from "../../problem/result.ts";
import type { SheetArea } from "../../table/address.ts";
import type { Book } from "../book.ts";
import { plainHeading } from "../../table/headingRow.ts";
import { isTextAt, sheetNamed, usedPart } from "../cellsOfBook.ts";
import { parseFormula } from "../formula/parse.ts";
import { placeOf } from "../formula/places.ts";
import { noResults } from "../formula/results.ts";
import { linesIn } from "../formula/regression.ts";
import type { Formula } from "../formula/tree.ts";
import { type Stretch, placeAlong } from "../found/claimedLines.ts";
import { type DataTable, dataTables } from "./dataTables.ts";
import { bestTable, type Matched } from "./matchNames.ts";
import type { DataLine, GivenData } from "./typedClaim.ts";

/** The cells that an address, a name or a table's part stands for. Problem "bad-address", "unknown-place". */
export function areaCalled(book: Book, text: string): Result<SheetArea> {
  const [home] = book.sheets;
  const formula = parseFormula(text);
  if (home === undefined || formula === null) return failure({ code: "bad-address", address: text });
  const place = placeOf(formula, {
    ...{ book, sheet: home, row: 0, column: 0 },
    ...{ given: new Map(), followed: 0, results: noResults },
  });
  if (place?.ok === true) return success(place.value);
  const named = placeNamed(formula);
  if (named === null) return failure({ code: "bad-address", address: text });
  const places = [...book.sheets.map(({ sheet }) => sheet), ...book.names.map(({ name }) => name)];
  return sheetNamed(book, named) === null
    ? failure({ code: "unknown-place", place: named, nearest: nearestName(named, places) })
    : failure({ code: "no-data", where: text });
}

const placeNamed = (formula: Formula): string | null => {
  if (formula.kind === "cells") return formula.area.sheet;
  return formula.kind === "name" ? formula.name : null;
};

/** What was said of the data of a report, and where the book's reports stand: their cells are no data. */
interface Said {
  readonly outcome: string | null;
  readonly drivers: readonly string[] | null;
  readonly reports: readonly SheetArea[];
}

/** Headings and addresses as lines of data. Problem "unknown-heading", beside those of an address. */
export function givenData(book: Book, { outcome, drivers, reports }: Said): Result<GivenData> {
  const words = [...(outcome === null ? [] : [outcome]), ...(drivers ?? [])];
  const tables = dataTables(book, reports);
  const headings = words.filter((word) => isHeading(tables, word) || !isPlace(book, word));
  const matched = headings.length === 0 ? null : bestTable(headings, tables, () => false);
  const found: DataLine[][] = [];
  for (const word of words) {
    const lines = headings.includes(word) ? lineUnder(word, { headings, matched, tables }) : linesAt(book, word);
    if (!lines.ok) return lines;
    found.push([...lines.value]);
  }
  const ofOutcome = outcome === null ? null : (found.shift()?.[0] ?? null);
  return success({ outcome: ofOutcome, drivers: drivers === null ? null : found.flat() });
}

/** A heading may look like a cell: "Q1". */
const isHeading = (tables: readonly DataTable[], word: string): boolean =>
  tables.some(({ columns }) => columns.some(({ name }) => plainHeading(name) === plainHeading(word)));

const isPlace = (book: Book, word: string): boolean =>
  parseFormula(word)?.kind === "cells" ||
  book.names.some(({ name }) => name.toLowerCase() === word.trim().toLowerCase());

function linesAt(book: Book, word: string): Result<readonly DataLine[]> {
  const area = areaCalled(book, word);
  if (!area.ok) return area;
  const sheet = sheetNamed(book, area.value.sheet);
  const used = sheet === null ? null : usedPart(sheet, area.value);
  if (sheet === null || used === null) return failure({ code: "no-data", where: word });
  const down = used.rows > 1;
  return success(
    linesIn(used, down).map((line): DataLine => {
      const stretch: Stretch = down
        ? { sheet, runs: "down", track: line.column, from: line.row, count: line.rows }
        : { sheet, runs: "across", track: line.row, from: line.column, count: line.columns };
      return { stretch: withoutHeading(stretch), form: "as it is" };
    }),
  );
}

function withoutHeading(stretch: Stretch): Stretch {
  const isHeading = stretch.count > 1 && isTextAt(placeAlong(stretch, stretch.from));
  return isHeading ? { ...stretch, from: stretch.from + 1, count: stretch.count - 1 } : stretch;
}

interface Fit {
  readonly tables: readonly DataTable[];
  readonly headings: readonly string[];
  readonly matched: Matched | null;
}

/** From this likeness on a heading that someone typed is taken for one that stands in the sheet. */
const likeEnough = 3;

function lineUnder(word: string, { headings, matched, tables }: Fit): Result<readonly DataLine[]> {
  const match = matched?.matches[headings.indexOf(word)] ?? null;
  if (matched === null || match === null || match.score < likeEnough) {
    const looked = matched === null ? tables : [matched.table];
    const known = looked.flatMap(({ columns }) => columns.map(({ name }) => name));
    const where = matched === null ? "the workbook" : `sheet ${matched.table.sheet.sheet}`;
    return failure({ code: "unknown-heading", heading: word, nearest: nearestName(word, known), where });
  }
  return success([lineOf(matched.table, match.column.column, match.form)]);
}

const lineOf = ({ sheet, firstRow, rowCount }: DataTable, track: number, form: DataLine["form"]): DataLine => ({
  stretch: { sheet, runs: "down", track, from: firstRow, count: rowCount },
  form,
});
