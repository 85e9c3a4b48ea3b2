import type { BookSheet } from "../book.ts";
import { type CellPlace, isTextAt, wordsAt } from "../cellsOfBook.ts";
import { readShownText, shownNumberAt } from "../found/shownNumber.ts";
import { inBracketsAt } from "./inBrackets.ts";
import { intervalInBrackets } from "./intervals.ts";
import { isConstantName, summaryWordIn } from "./reportWords.ts";

/** Where the brackets of a coefficient stand. */
export type BracketSide = "under" | "beside";

/** Models in columns over the same names, each with brackets under its coefficients, or beside them. */
export interface BracketTable {
  readonly sheet: BookSheet;
  readonly side: BracketSide;
  /** The column of the names. */
  readonly names: number;
  /** The columns of the models. */
  readonly columns: readonly number[];
  /** The rows of the first coefficient and of the last. */
  readonly first: number;
  readonly last: number;
  /** How many names have brackets, and how many of them hold an interval. */
  readonly pairs: number;
  readonly intervals: number;
  /** Whether one of the names is that of a constant. */
  readonly hasConstant: boolean;
}

/** A coefficient with brackets. */
interface Pair {
  readonly row: number;
  readonly column: number;
  readonly names: number;
  readonly isInterval: boolean;
}

/** The cell so many steps away from a coefficient, in the direction in which its brackets stand. */
export const bracketPlace = (side: BracketSide, { sheet, row, column }: CellPlace, steps = 1): CellPlace =>
  side === "under" ? { sheet, row: row + steps, column } : { sheet, row, column: column + steps };

/**
 * The tables of a sheet from the top down, those of one column of names after the other.
 * @param brackets - every cell of the sheet with a number or an interval in brackets, in column order.
 */
export function bracketTables(
  sheet: BookSheet,
  side: BracketSide,
  brackets: readonly CellPlace[],
): readonly BracketTable[] {
  const sides = new Map<number, Pair[]>();
  for (const pair of pairsOf(sheet, side, brackets)) {
    const together = sides.get(pair.names);
    if (together === undefined) sides.set(pair.names, [pair]);
    else together.push(pair);
  }
  return [...sides.values()].flatMap((pairs) => tablesOf(sheet, side, pairs));
}

function pairsOf(sheet: BookSheet, side: BracketSide, brackets: readonly CellPlace[]): Pair[] {
  return brackets.flatMap((place): Pair[] => {
    const { row, column } = bracketPlace(side, place, -1);
    if (row < 0 || column < 0 || !isCoefficient({ sheet, row, column }, side)) return [];
    const names = columnOfNames(sheet, row, column);
    if (names === null || (side === "under" && wordsAt({ sheet, row: place.row, column: names }) !== "")) return [];
    const isOfWhole = onlyOfWhole.has(summaryWordIn(wordsAt({ sheet, row, column: names })) ?? "");
    return isOfWhole ? [] : [{ row, column, names, isInterval: intervalInBrackets(place) !== null }];
  });
}

/** Beside a coefficient stand its own brackets and no others'; under it they may be the second line of them. */
const isCoefficient = (place: CellPlace, side: BracketSide): boolean =>
  shownNumberAt(place) !== null && (side === "under" || inBracketsAt(place) === null);

/** Under these may stand a p-value in brackets; no driver is called so. */
const onlyOfWhole: ReadonlySet<string> = new Set(["f", "f-p-value", "r-squared", "adjusted-r-squared"]);

/** So many models at the most stand between a name and its number, blank columns among them. */
const farthestName = 24;

function columnOfNames(sheet: BookSheet, row: number, column: number): number | null {
  for (let names = column - 1; names >= Math.max(0, column - farthestName); names--) {
    if (isName({ sheet, row, column: names })) return names;
  }
  return null;
}

/** Marks, dashes, numbers and intervals as text are no names, nor is what counts the models. */
export const isName = (place: CellPlace): boolean =>
  isTextAt(place) &&
  /\p{L}/u.test(wordsAt(place)) &&
  readShownText(wordsAt(place)) === null &&
  intervalInBrackets(place) === null &&
  !modelLabel.test(wordsAt(place).trim());

const modelLabel = /^[([]?(?:model|specification|spec|equation|eq|regression)\.? ?\(?(?:\d+|[a-z]|[ivx]+)\)?[)\]]?$/i;

/** Further apart than this, two coefficients belong to two reports. */
const farthestRowsApart = 6;
const mostTerms = 200;

function tablesOf(sheet: BookSheet, side: BracketSide, pairs: readonly Pair[]): BracketTable[] {
  const names = pairs[0]!.names;
  const rows = [...new Set(pairs.map(({ row }) => row))].sort((one, other) => one - other);
  const nameOf = (row: number): string => wordsAt({ sheet, row, column: names });
  const runs: number[][] = [];
  for (const row of rows) {
    const run = runs.at(-1);
    const goesOn =
      run !== undefined &&
      row - run.at(-1)! <= farthestRowsApart &&
      run.length < mostTerms &&
      !run.some((earlier) => nameOf(earlier) === nameOf(row)) &&
      !hasEnded(nameOf, run.at(-1)!, row);
    if (goesOn) run.push(row);
    else runs.push([row]);
  }
  return runs.flatMap((run): BracketTable[] => {
    const constants = run.filter((row) => isConstantName(nameOf(row)));
    if (constants.length === run.length) return [];
    const within = pairs.filter(({ row }) => run.includes(row));
    const inOrder = [...new Set(within.map(({ column }) => column))].sort((one, other) => one - other);
    const intervals = new Set(within.filter(({ isInterval }) => isInterval).map(({ row }) => row)).size;
    const ends = { first: run[0]!, last: run.at(-1)! };
    return [
      {
        ...{ sheet, side, names, columns: inOrder, ...ends, pairs: run.length },
        intervals,
        hasConstant: constants.length > 0,
      },
    ];
  });
}

/** Whether a number of the whole regression stands between two coefficients: the second is of another report. */
function hasEnded(nameOf: (row: number) => string, from: number, to: number): boolean {
  for (let row = from + 1; row < to; row++) if (summaryWordIn(nameOf(row)) !== null) return true;
  return false;
}
