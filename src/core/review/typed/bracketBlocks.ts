import type { SheetArea } from "../../table/address.ts";
import { type CellPlace, isTextAt, kindAt, wordsAt } from "../cellsOfBook.ts";
import { cellKind } from "../../table/cells.ts";
import { shownNumberAt } from "../found/shownNumber.ts";
import { type BracketNote, type Brackets, type LevelNote, bracketNotes, levelNotes } from "./bracketNotes.ts";
import { type BracketTable, bracketPlace, bracketTables, isName } from "./bracketTables.ts";
import { type InBrackets, inBracketsAt } from "./inBrackets.ts";
import { intervalInBrackets } from "./intervals.ts";
import type { Label } from "./labels.ts";
import { type ReportBlock, type ReportedTerm, areaBetween } from "./reportBlock.ts";
import { type SummaryWord, isConstantName } from "./reportWords.ts";
import type { SummaryNumber } from "./reportBlock.ts";
import { farthestRows, firstOfEach, nearestArea } from "./summaries.ts";
import { endsOf } from "./termNumbers.ts";
import type { BookSheet } from "../book.ts";

/** A table with brackets as it was read. */
export interface ReadTable {
  readonly table: BracketTable;
  readonly area: SheetArea;
  /** How many names stand between its first coefficient and its last. */
  readonly names: number;
  /** Whether a word beside it speaks of a regression. */
  readonly isSpokenOf: boolean;
  /** Whether a word does that has no other meaning: what brackets hold, or R-squared and its like. */
  readonly isSaid: boolean;
  /** Where labels of whole regressions stand whose numbers it has. */
  readonly own: readonly CellPlace[];
  /** One for each model. */
  readonly blocks: readonly ReportBlock[];
}

/** What is known of a sheet before its tables are looked for. */
export interface Seen {
  readonly labels: readonly Label[];
  /** Every cell with a number or an interval in brackets. */
  readonly brackets: readonly CellPlace[];
  readonly isReport: (found: Omit<ReadTable, "blocks">) => boolean;
}

/** The tables of a sheet whose names stand to the left, as far as they are reports. */
export function readTables(sheet: BookSheet, { labels, brackets, isReport }: Seen): ReadTable[] {
  const levels = levelNotes(sheet);
  const notes = bracketNotes(sheet);
  return (["under", "beside"] as const).flatMap((side) => {
    const tables = bracketTables(sheet, side, brackets);
    const areas = tables.map(areaOf);
    const begins = [
      ...tables.map(({ first, names }) => ({ row: first, column: names })),
      ...labels.filter(({ term }) => term === "coefficient").map(({ place }) => place),
    ];
    return tables.flatMap((table, index): ReadTable[] => {
      const isNear = ({ place }: { readonly place: CellPlace }): boolean => nearestArea(areas, place) === index;
      const beside = {
        bottom: bottomOf(table, labels, begins),
        notes: notes.filter(isNear),
        levels: levels.filter(isNear),
      };
      const found = { table, area: areas[index]!, ...wordsBeside(table, beside) };
      if (!isReport(found)) return [];
      return [{ ...found, blocks: table.columns.flatMap((column) => blockOf(table, column, beside)) }];
    });
  });
}

const wordsBeside = (table: BracketTable, { bottom, notes, levels }: Beside) => ({
  names: rowsOf(table).length,
  isSpokenOf: bottom.length + notes.length + levels.length > 0,
  isSaid:
    notes.length + levels.length > 0 || bottom.some(({ summary }) => summary !== null && tellingWords.has(summary)),
  own: bottom.map(({ place }) => place),
});

/** Numbers of whole regressions that accounts and lists do not have. */
const tellingWords: ReadonlySet<SummaryWord> = new Set(["r-squared", "adjusted-r-squared", "f", "f-p-value", "sigma"]);

const areaOf = ({ sheet, side, names, columns, first, last }: BracketTable): SheetArea =>
  areaBetween(sheet, [
    { sheet, row: first, column: names },
    bracketPlace(side, { sheet, row: last, column: columns.at(-1)! }),
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
  readonly levels: readonly LevelNote[];
}

function blockOf(table: BracketTable, column: number, { bottom, notes, levels }: Beside): ReportBlock[] {
  const { sheet, side, names, columns, first } = table;
  const rows = rowsOf(table);
  const terms = rows.flatMap((row) => termAt(table, row, column));
  const hasBrackets = ({ inBrackets, numbers }: ReportedTerm): boolean => inBrackets !== null || numbers.length > 1;
  if (!terms.some((term) => !term.isConstant && hasBrackets(term))) return [];
  const headings = headingsOver({ sheet, row: first, column });
  const left = columns.length === 1 ? names : column;
  const top = first - Math.min(1, headings.length);
  const places = [{ sheet, row: top, column: left }, bracketPlace(side, { sheet, row: table.last, column })];
  const said = new Set(levels.map(({ level }) => level));
  const present = new Set(terms.map(({ name }) => name));
  const all = rows.map((row) => wordsAt({ sheet, row, column: names })).filter((name) => !isConstantName(name));
  return [
    {
      sheet,
      area: areaBetween(sheet, places),
      terms,
      summaries: summariesIn(bottom, column),
      level: said.size === 1 ? [...said][0]! : null,
      model: {
        brackets: bracketsOf(table, column, notes),
        headings,
        absent: all.filter((name) => !present.has(name)),
        beside: { lie: "columns", at: columns.filter((other) => other !== column) },
      },
    },
  ];
}

function rowsOf({ sheet, names, first, last }: BracketTable): number[] {
  const rows = Array.from({ length: last - first + 1 }, (_, index) => first + index);
  return rows.filter((row) => isName({ sheet, row, column: names }));
}

/** None where the model's cell is empty, or has a dash: the driver is not in it. */
function termAt(table: BracketTable, row: number, column: number): ReportedTerm[] {
  const { sheet, names } = table;
  const place = { sheet, row, column };
  const shown = shownNumberAt(place);
  if (shown === null) return [];
  const name = wordsAt({ sheet, row, column: names });
  const brackets = bracketsAt(table, place);
  const interval = brackets.flatMap((at) => {
    const found = intervalInBrackets(at, shown.value);
    return found === null ? [] : [endsOf(found, at)];
  });
  return [
    {
      name,
      isConstant: isConstantName(name),
      numbers: [{ word: "coefficient", place, shown }, ...(interval[0] ?? [])],
      inBrackets: numbersIn(brackets)[0] ?? null,
    },
  ];
}

/** Two cells of brackets at the most go with a coefficient: a number and an interval, or what is left unread. */
function bracketsAt({ sheet, side, names }: BracketTable, coefficient: CellPlace): CellPlace[] {
  const isOwn = ({ row }: CellPlace): boolean => side === "beside" || wordsAt({ sheet, row, column: names }) === "";
  const places = [1, 2].map((steps) => bracketPlace(side, coefficient, steps));
  const isBracketed = (place: CellPlace): boolean => inBracketsAt(place) !== null || intervalInBrackets(place) !== null;
  const end = places.findIndex((place) => !isOwn(place) || !isBracketed(place));
  return end < 0 ? places : places.slice(0, end);
}

const numbersIn = (places: readonly CellPlace[]): InBrackets[] => places.flatMap((place) => inBracketsAt(place) ?? []);

function bracketsOf(table: BracketTable, column: number, notes: readonly BracketNote[]): Brackets {
  const { sheet } = table;
  const numbers = rowsOf(table).map((row) => numbersIn(bracketsAt(table, { sheet, row, column })));
  const shape = numbers.flat()[0]?.shape;
  const said = new Set(notes.filter((note) => note.shape === null || note.shape === shape).map(({ word }) => word));
  return {
    note: said.size === 1 ? [...said][0]! : null,
    furtherLine: numbers.some(({ length }) => length > 1),
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
