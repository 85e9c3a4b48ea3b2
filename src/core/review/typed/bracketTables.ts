import type { BookSheet } from "../book.ts";
import { type CellPlace, isTextAt, wordsAt } from "../cellsOfBook.ts";
import { readShownText, shownNumberAt } from "../found/shownNumber.ts";
import { allInBrackets } from "./inBrackets.ts";
import { isConstantName, summaryWordIn } from "./reportWords.ts";

/** Models in columns over the same names, each with numbers in brackets under its coefficients. */
export interface BracketTable {
  readonly sheet: BookSheet;
  /** The column of the names. */
  readonly names: number;
  /** The columns of the models. */
  readonly columns: readonly number[];
  /** The rows of the first coefficient and of the last. */
  readonly first: number;
  readonly last: number;
  /** How many names have a number in brackets below them. */
  readonly pairs: number;
}

/** A coefficient with a number in brackets below it. */
interface Pair {
  readonly row: number;
  readonly column: number;
  readonly names: number;
}

/** The tables of a sheet from the top down, those of one column of names after the other. */
export function bracketTables(sheet: BookSheet): readonly BracketTable[] {
  const sides = new Map<number, Pair[]>();
  for (const pair of pairsOf(sheet)) {
    const side = sides.get(pair.names);
    if (side === undefined) sides.set(pair.names, [pair]);
    else side.push(pair);
  }
  return [...sides.values()].flatMap((pairs) => tablesOf(sheet, pairs));
}

function pairsOf(sheet: BookSheet): Pair[] {
  return allInBrackets(sheet).flatMap(({ place: { row, column } }): Pair[] => {
    if (shownNumberAt({ sheet, row: row - 1, column }) === null) return [];
    const names = columnOfNames(sheet, row - 1, column);
    if (names === null || wordsAt({ sheet, row, column: names }) !== "") return [];
    const isOfWhole = onlyOfWhole.has(summaryWordIn(wordsAt({ sheet, row: row - 1, column: names })) ?? "");
    return isOfWhole ? [] : [{ row: row - 1, column, names }];
  });
}

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

/** Marks, dashes and numbers as text are no names. */
export const isName = (place: CellPlace): boolean =>
  isTextAt(place) && /\p{L}/u.test(wordsAt(place)) && readShownText(wordsAt(place)) === null;

/** Further apart than this, two coefficients belong to two reports. */
const farthestRowsApart = 6;
const mostTerms = 200;

function tablesOf(sheet: BookSheet, pairs: readonly Pair[]): BracketTable[] {
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
    if (run.every((row) => isConstantName(nameOf(row)))) return [];
    const within = new Set(run);
    const columns = new Set(pairs.filter(({ row }) => within.has(row)).map(({ column }) => column));
    const inOrder = [...columns].sort((one, other) => one - other);
    return [{ sheet, names, columns: inOrder, first: run[0]!, last: run.at(-1)!, pairs: run.length }];
  });
}

/** Whether a number of the whole regression stands between two coefficients: the second is of another report. */
function hasEnded(nameOf: (row: number) => string, from: number, to: number): boolean {
  for (let row = from + 1; row < to; row++) if (summaryWordIn(nameOf(row)) !== null) return true;
  return false;
}
