import type { Report } from "../answer/question.ts";
import { type Result, failure, success } from "../problem/result.ts";
import { type SheetArea, addressOf } from "../table/address.ts";
import type { Book } from "./book.ts";
import { type CellPlace, overlap } from "./cellsOfBook.ts";
import type { Claim } from "./claim.ts";
import type { BookReview } from "./claimReview.ts";
import { type Ground, craftOf } from "./craft/craftOf.ts";
import type { Finding } from "./finding.ts";
import { type FormulaCell, readFormulas } from "./found/formulaCells.ts";
import { type Gathered, claimOf, gathered } from "./found/gatherClaims.ts";
import { firstWindows, onceEach } from "./found/movingWindows.ts";
import { resultsInCells } from "./found/resultsInCells.ts";
import { groupBehind, withBlock } from "./typed/attachBlock.ts";
import { dataTables } from "./typed/dataTables.ts";
import { areaCalled, givenData } from "./typed/pointedAt.ts";
import type { ReportBlock } from "./typed/reportBlock.ts";
import { reportBlocks } from "./typed/reportBlocks.ts";
import { type GivenData, typedClaim } from "./typed/typedClaim.ts";

/** Cells that someone points at as the report of a regression, and what they say of its data. */
export interface Pointed {
  /** An address with its sheet: "Handover!A4:D12". */
  readonly reported: string;
  /** A heading or an address, "Repairs" or "Months!B5:B100"; null where Footing is to find the data. */
  readonly outcome: string | null;
  /** Headings or addresses; null where Footing is to find them by the names beside the coefficients. */
  readonly drivers: readonly string[] | null;
}

export interface Asked {
  /** Null for every regression of the book. */
  readonly pointed: Pointed | null;
  /** Null for all sheets; else the sheet whose reports are meant, wherever their data stand. */
  readonly sheet: string | null;
}

/** The regressions that a workbook reports, before any of them is refitted. */
export interface BookClaims {
  readonly claims: readonly Claim[];
  readonly unread: BookReview["unread"];
  /** Of all sheets that the claims rest on, gravest first. */
  readonly craft: readonly Finding[];
}

/**
 * Finds the regressions in a workbook: formulas, and blocks of numbers with headings that say what they are.
 * @param report - is told after each sheet how far the search has come.
 * @returns Problem "bad-address", "unknown-place", "unknown-heading" or "no-report" for what was pointed at; without
 *   pointing there is always an answer, empty where the book reports no regression.
 */
export function claimsOf(book: Book, asked: Asked, report: Report): Result<BookClaims> {
  const { pointed } = asked;
  const area = pointed === null ? success(null) : areaCalled(book, pointed.reported);
  if (!area.ok) return area;
  const place = area.value;
  const onSheet = place?.sheet ?? asked.sheet;
  const found = regressionsIn(book, onSheet, report);
  const reports = found.blocks.map((block) => block.area);
  const given = pointed === null ? success(nothingGiven) : givenData(book, { ...pointed, reports });
  if (!given.ok) return given;
  const here = place === null ? found : touching(found, place);
  if (place !== null && here.groups.length + here.blocks.length === 0) {
    return failure({ code: "no-report", where: addressOf(place) });
  }
  report("Looking at how the sheets are made", 0.9);
  const { claims, unread, blocks } = claimsFrom(here, book, given.value);
  const missed = place === null ? onceEach(notReported([...found.unread, ...unread], claims)) : unread;
  const craft = craftOf({ book, claims, groups: here.groups, blocks, unread: missed });
  return success({ claims, unread: missed, craft });
}

/** A formula that cannot be followed is no loss where the headings beside it say what it gives. */
function notReported(unread: BookClaims["unread"], claims: readonly Claim[]): BookClaims["unread"] {
  const known = new Set(claims.flatMap(({ reported }) => reported.map(({ cell }) => cell)));
  return unread.filter(({ cell }) => !known.has(cell));
}

const nothingGiven: GivenData = { outcome: null, drivers: null };

interface Found {
  readonly groups: readonly Gathered[];
  readonly blocks: readonly ReportBlock[];
  readonly unread: BookClaims["unread"];
}

function regressionsIn(book: Book, onSheet: string | null, report: Report): Found {
  const cells: FormulaCell[] = [];
  const blocks: ReportBlock[] = [];
  const unread: BookClaims["unread"][number][] = [];
  const results = resultsInCells(book);
  for (const [index, sheet] of book.sheets.entries()) {
    report("Looking for regressions", (0.9 * index) / book.sheets.length);
    if (onSheet !== null && onSheet.toLowerCase() !== sheet.sheet.toLowerCase()) continue;
    const read = readFormulas(sheet, { book, results });
    cells.push(...read.cells);
    unread.push(...read.unread);
    blocks.push(...reportBlocks(sheet));
  }
  const windows = firstWindows(gathered(cells, book));
  return { groups: windows.groups, blocks, unread: [...unread, ...windows.unread] };
}

/** What has a cell inside an area. */
function touching({ groups, blocks, unread }: Found, area: SheetArea): Found {
  const isIn = ({ sheet, row, column }: CellPlace): boolean =>
    sheet.sheet === area.sheet && overlap(area, { row, column, rows: 1, columns: 1 });
  return {
    groups: groups.filter(({ cells }) => cells.some(({ place }) => isIn(place))),
    blocks: blocks.filter((block) => block.sheet.sheet === area.sheet && overlap(area, block.area)),
    unread,
  };
}

/** Blocks over formulas go with those; the others speak of data that are given, or found by their names. */
function claimsFrom({ groups, blocks }: Found, book: Book, given: GivenData): Omit<Ground, "book" | "groups"> {
  const unread: BookClaims["unread"][number][] = [];
  const behind = new Map(blocks.map((block) => [block, groupBehind(block, groups)]));
  const claims = groups.flatMap((group): Claim[] => {
    const claim = claimOf(group);
    if (claim === null) return [];
    const own = blocks.filter((block) => behind.get(block) === group);
    return [own.reduce((sum, block) => withBlock(sum, group, block), claim)];
  });
  const alone = blocks.filter((block) => behind.get(block) === null);
  const tables =
    alone.length === 0
      ? []
      : dataTables(
          book,
          blocks.map(({ area }) => area),
        );
  for (const block of alone) {
    const claim = typedClaim(block, tables, given);
    if (claim.ok) claims.push(claim.value);
    else unread.push({ cell: addressOf(block.area), why: claim.why });
  }
  return { claims, unread, blocks: blocks.map((block) => ({ block, group: behind.get(block) ?? null })) };
}
