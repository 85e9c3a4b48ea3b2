import type { SheetArea } from "../../table/address.ts";
import type { BookSheet } from "../book.ts";
import { type CellPlace, overlap } from "../cellsOfBook.ts";
import { allInBrackets } from "./inBrackets.ts";
import { type Label, labelsOf } from "./labels.ts";
import { type ReadTable, readTables } from "./bracketBlocks.ts";
import type { ReportBlock } from "./reportBlock.ts";
import { spotOf } from "./termNumbers.ts";
import { turnedPlace, turnedSheet } from "./turnedSheet.ts";

export interface BracketBlocks {
  readonly blocks: readonly ReportBlock[];
  /** Where labels of whole regressions stand whose numbers the blocks have already. */
  readonly own: ReadonlySet<string>;
}

/**
 * One block a model, of every table on a sheet whose coefficients have brackets: under them or beside them, the names
 * to their left or above them. Where a table can be read in several ways, the one with a constant among the names counts,
 * then the one that is met more often.
 */
export function bracketBlocks(
  sheet: BookSheet,
  labels: readonly Label[],
  headed: readonly ReportBlock[],
): BracketBlocks {
  const brackets = allInBrackets(sheet);
  if (brackets.length === 0) return { blocks: [], own: new Set() };
  const all = [
    ...readTables(sheet, { labels, brackets, isReport: isStandingReport }),
    ...lyingTables(sheet, brackets).map((one) => turnedRound(one, sheet)),
  ];
  const kept: ReadTable[] = [];
  for (const one of all.sort((a, b) => Number(b.table.hasConstant) - Number(a.table.hasConstant))) {
    const isTaken = kept.some(({ area }) => overlap(area, one.area)) || headed.some((block) => readsMore(block, one));
    if (!isTaken) kept.push(one);
  }
  return {
    blocks: kept.flatMap(({ blocks }) => blocks),
    own: new Set(kept.flatMap(({ own }) => own.map(spotOf))),
  };
}

function lyingTables(sheet: BookSheet, brackets: readonly CellPlace[]): ReadTable[] {
  const turned = turnedSheet(sheet);
  if (turned === null) return [];
  const places = brackets.map((place) => turnedPlace(turned, place));
  return readTables(turned, { labels: labelsOf(turned), brackets: places, isReport: isLyingReport });
}

/** Whether headings over the same cells give more drivers than brackets do. */
const readsMore = ({ area, terms }: ReportBlock, { table, area: other }: ReadTable): boolean =>
  terms.length >= table.pairs && overlap(area, other);

/**
 * Where no word beside a table speaks of a regression, two names at the least have brackets below, and, where these
 * hold one number, no name between them has none: accounts have negative subtotals without a name here and there.
 * Beside a number they have others in brackets everywhere, so that a word is asked for there.
 */
const isStandingReport = ({ table, names, isSpokenOf, isSaid }: Omit<ReadTable, "blocks">): boolean =>
  table.side === "under" ? isSpokenOf || table.intervals > 1 || (table.pairs > 1 && names === table.pairs) : isSaid;

const isLyingReport = ({ isSaid }: Omit<ReadTable, "blocks">): boolean => isSaid;

/** What was read from a turned sheet, as it stands on the sheet itself. */
function turnedRound(found: ReadTable, sheet: BookSheet): ReadTable {
  const back = <T extends { readonly place: Parameters<typeof turnedPlace>[1] }>(one: T) => ({
    ...one,
    place: turnedPlace(sheet, one.place),
  });
  const areaBack = ({ row, column, rows, columns }: SheetArea): SheetArea => ({
    ...{ sheet: sheet.sheet, row: column, column: row },
    ...{ rows: columns, columns: rows },
  });
  return {
    ...found,
    area: areaBack(found.area),
    own: found.own.map((place) => turnedPlace(sheet, place)),
    blocks: found.blocks.map((block) => ({
      ...block,
      sheet,
      area: areaBack(block.area),
      terms: block.terms.map((term) => ({
        ...term,
        numbers: term.numbers.map(back),
        inBrackets: term.inBrackets === null ? null : back(term.inBrackets),
      })),
      summaries: block.summaries.map(back),
      model: block.model && { ...block.model, beside: { ...block.model.beside, lie: "rows" } },
    })),
  };
}
