import type { SheetArea } from "../../table/address.ts";
import { type CellPlace, isTextAt, kindAt, overlap, wordsAt } from "../cellsOfBook.ts";
import { cellKind } from "../../table/cells.ts";
import { shownNumberAt } from "../found/shownNumber.ts";
import { type BracketNote, type Brackets, bracketNotes } from "./bracketNotes.ts";
import { type BracketTable, bracketTables, isName } from "./bracketTables.ts";
import { type InBrackets, inBracketsAt } from "./inBrackets.ts";
import type { Label } from "./labels.ts";
import { type ReportBlock, type ReportedTerm, areaBetween } from "./reportBlocks.ts";
import { isConstantName } from "./reportWords.ts";
import { type SummaryNumber, farthestRows, firstOfEach, nearestArea } from "./summaries.ts";
import type { BookSheet } from "../book.ts";

export interface BracketBlocks {
  readonly blocks: readonly ReportBlock[];
  /** Labels of whole regressions whose numbers the blocks have already. */
  readonly own: ReadonlySet<Label>;
}

/** One block a model, of every table on a sheet whose numbers stand in brackets under their coefficients. */
export function bracketBlocks(
  sheet: BookSheet,
  labels: readonly Label[],
  headed: readonly ReportBlock[],
): BracketBlocks {
  const tables = bracketTables(sheet).filter((table) => !headed.some((block) => readsMore(block, table)));
  if (tables.length === 0) return { blocks: [], own: new Set() };
  const areas = tables.map(areaOf);
  const notes = bracketNotes(sheet);
  const begins = [
    ...tables.map(({ first, names }) => ({ row: first, column: names })),
    ...labels.filter(({ term }) => term === "coefficient").map(({ place }) => place),
  ];
  const own = new Set<Label>();
  const blocks = tables.flatMap((table, index) => {
    const bottom = bottomOf(table, labels, begins);
    const near = notes.filter(({ place }) => nearestArea(areas, place) === index);
    if (bottom.length === 0 && near.length === 0 && !looksLikeReport(table)) return [];
    for (const label of bottom) own.add(label);
    return table.columns.flatMap((column) => blockOf(table, column, { bottom, notes: near }));
  });
  return { blocks, own };
}

/**
 * Where no word beside a table speaks of a regression, two names at the least have a number in brackets below, and no
 * name between them has none: accounts have negative subtotals without a name here and there.
 */
const looksLikeReport = (table: BracketTable): boolean => table.pairs > 1 && rowsOf(table).length === table.pairs;

/** Whether headings over the same cells give more drivers than brackets do. */
const readsMore = ({ area, terms }: ReportBlock, table: BracketTable): boolean =>
  terms.length >= table.pairs && overlap(area, areaOf(table));

const areaOf = ({ sheet, names, columns, first, last }: BracketTable): SheetArea =>
  areaBetween(sheet, [
    { sheet, row: first, column: names },
    { sheet, row: last + 1, column: columns.at(-1)! },
  ]);

type Spot = Pick<CellPlace, "row" | "column">;

/** The words for whole regressions below a table, as far as no other report begins. */
function bottomOf({ names, columns, last }: BracketTable, labels: readonly Label[], begins: readonly Spot[]): Label[] {
  const next = begins.filter(({ row, column }) => row > last && column >= names && column <= columns.at(-1)!);
  const end = Math.min(last + 1 + farthestRows, ...next.map(({ row }) => row - 1));
  return labels.filter(
    ({ place: { row, column }, summary }) => column === names && row > last && row <= end && summary !== null,
  );
}

interface Beside {
  readonly bottom: readonly Label[];
  readonly notes: readonly BracketNote[];
}

function blockOf(table: BracketTable, column: number, { bottom, notes }: Beside): ReportBlock[] {
  const { sheet, names, columns, first } = table;
  const rows = rowsOf(table);
  const terms = rows.flatMap((row) => termAt(table, row, column));
  if (!terms.some(({ isConstant, inBrackets }) => !isConstant && inBrackets !== null)) return [];
  const headings = headingsOver({ sheet, row: first, column });
  const left = columns.length === 1 ? names : column;
  const top = first - Math.min(1, headings.length);
  const places = [
    { sheet, row: top, column: left },
    { sheet, row: table.last + 1, column },
  ];
  const present = new Set(terms.map(({ name }) => name));
  const all = rows.map((row) => wordsAt({ sheet, row, column: names })).filter((name) => !isConstantName(name));
  return [
    {
      sheet,
      area: areaBetween(sheet, places),
      terms,
      summaries: summariesIn(bottom, column),
      model: {
        brackets: bracketsOf(table, column, notes),
        headings,
        absent: all.filter((name) => !present.has(name)),
        beside: columns.filter((other) => other !== column),
      },
    },
  ];
}

function rowsOf({ sheet, names, first, last }: BracketTable): number[] {
  const rows = Array.from({ length: last - first + 1 }, (_, index) => first + index);
  return rows.filter((row) => isName({ sheet, row, column: names }));
}

/** None where the model's cell is empty, or has a dash: the driver is not in it. */
function termAt({ sheet, names }: BracketTable, row: number, column: number): ReportedTerm[] {
  const place = { sheet, row, column };
  if (shownNumberAt(place) === null) return [];
  const name = wordsAt({ sheet, row, column: names });
  return [
    {
      name,
      isConstant: isConstantName(name),
      numbers: [{ word: "coefficient", place }],
      inBrackets: below({ sheet, names }, { row: row + 1, column }),
    },
  ];
}

function below({ sheet, names }: Pick<BracketTable, "sheet" | "names">, { row, column }: Spot): InBrackets | null {
  return wordsAt({ sheet, row, column: names }) === "" ? inBracketsAt({ sheet, row, column }) : null;
}

function bracketsOf(table: BracketTable, column: number, notes: readonly BracketNote[]): Brackets {
  const rows = rowsOf(table);
  const shape = rows.map((row) => below(table, { row: row + 1, column })?.shape).find((one) => one !== undefined);
  const said = new Set(notes.filter((note) => note.shape === null || note.shape === shape).map(({ word }) => word));
  return {
    note: said.size === 1 ? [...said][0]! : null,
    furtherLine: rows.some(
      (row) => below(table, { row: row + 1, column }) !== null && below(table, { row: row + 2, column }) !== null,
    ),
  };
}

/** So many rows of headings may stand over a model. */
const mostHeadings = 3;

function headingsOver({ sheet, row, column }: CellPlace): string[] {
  const headings: string[] = [];
  for (let step = 1; step <= Math.min(mostHeadings, row); step++) {
    const place = { sheet, row: row - step, column };
    if (isTextAt(place)) headings.push(wordsAt(place));
    else if (kindAt(place) !== cellKind.blank) break;
  }
  return headings;
}

const summariesIn = (bottom: readonly Label[], column: number): SummaryNumber[] =>
  firstOfEach(
    bottom.flatMap(({ place: { sheet, row }, summary }) => {
      const place = { sheet, row, column };
      const shown = shownNumberAt(place);
      return shown === null || summary === null ? [] : [{ word: summary, place, shown }];
    }),
  );
