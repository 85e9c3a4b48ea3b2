import type { Parts } from "../core/answer/modelOf.ts";
import type { Problem } from "../core/problem/problem.ts";
import { type Result, failure, success } from "../core/problem/result.ts";
import { cellKind } from "../core/table/cells.ts";
import type { Column, Source } from "../core/table/source.ts";
import { apartFrom, beginsWithNumbers, hasHeadings, headingOf, repeatedHeading } from "./headings.ts";
import { type RawCells, columnOf, isMissing, rawCells, usedHeight, widthOf } from "./rawCells.ts";

/** The columns that a function is called over, and which part each plays. */
export interface CalledData {
  readonly source: Source;
  readonly parts: Parts;
  /** The outcome's column where the drivers' rectangle spans it: it must be left out by the setting "columns". */
  readonly spanned: SpannedOutcome | null;
}

export interface SpannedOutcome {
  /** The name that it goes by among the drivers. */
  readonly column: string;
  /** What is wrong where it is not left out. */
  readonly problem: Problem;
}

interface Argument {
  readonly name: "outcome" | "drivers" | "key";
  readonly cells: RawCells;
  /** Rows down to the last one in use. */
  readonly height: number;
}

type Arguments = Readonly<Record<Argument["name"], Argument>>;

/**
 * Brings the arguments of a function into columns: headings in the first row become names, empty rows at the end go.
 * @returns Problem "no-outcome", "no-drivers", "too-many-columns", "unequal-heights" or "repeated-heading".
 */
export function readData(values: Readonly<Record<string, unknown>>): Result<CalledData> {
  const given: Arguments = {
    outcome: argument("outcome", values["outcome"]),
    drivers: argument("drivers", values["drivers"]),
    key: argument("key", values["key"]),
  };
  const problem = shapeProblem(given);
  if (problem !== null) return failure(problem);
  const firstRow = hasHeadings(given.outcome.cells, given.drivers.cells) ? 1 : 0;
  const lower = firstRow === 0 ? undefined : [given.drivers, given.key].find(({ cells }) => beginsWithNumbers(cells));
  if (lower !== undefined) return failure(withoutHeadings(given.outcome, lower));
  const rows = [firstRow, heightOfData(Object.values(given))] as const;
  const outcome = columnsOf(given.outcome, rows);
  const called = columnsOf(given.drivers, rows);
  const repeated = repeatedHeading(called);
  if (repeated !== null) return failure(repeated);
  const drivers = called.map((column) => spannedName(outcome[0]!, column));
  const keys = columnsOf(given.key, rows).map((column) => apartFrom([...outcome, ...drivers], column, "key"));
  return success({
    source: { columns: [...outcome, ...drivers, ...keys], rowCount: rows[1] - firstRow },
    parts: partsOf(outcome, drivers, keys),
    spanned: spannedIn(outcome[0]!, called),
  });
}

/** A rectangle of drivers may span the outcome, whose column then goes by a name of its own there. */
const spannedName = (outcome: Column, column: Column): Column => apartFrom([outcome], column, "outcome");

function spannedIn(outcome: Column, drivers: readonly Column[]): SpannedOutcome | null {
  const problem = repeatedHeading([outcome, ...drivers]);
  const again = drivers.find((column) => spannedName(outcome, column) !== column);
  return problem === null || again === undefined ? null : { column: spannedName(outcome, again).name, problem };
}

/** The outcome has a heading and another range has none, so that their data differ in height. */
const withoutHeadings = (outcome: Argument, lower: Argument): Problem => ({
  code: "unequal-heights",
  first: "the outcome",
  rows: outcome.cells.length - 1,
  second: `the ${lower.name}`,
  otherRows: lower.cells.length,
});

function partsOf(outcome: readonly Column[], drivers: readonly Column[], [by, order]: readonly Column[]): Parts {
  const inGroups = order !== undefined || (by !== undefined && repeats(by));
  return {
    outcome: outcome[0]!.name,
    drivers: drivers.map(({ name }) => name),
    key: by?.name ?? null,
    keyIs: inGroups ? "groups" : "time",
    order: order?.name ?? null,
  };
}

function argument(name: Argument["name"], value: unknown): Argument {
  const cells = rawCells(value);
  return { name, cells, height: usedHeight(cells) };
}

function shapeProblem({ outcome, drivers, key }: Arguments): Problem | null {
  if (outcome.height === 0) return { code: "no-outcome" };
  if (drivers.height === 0) return { code: "no-drivers" };
  const tooWide = tooManyColumns(outcome, 1) ?? tooManyColumns(key, 2);
  return tooWide ?? unequalHeights(outcome, drivers) ?? (key.height === 0 ? null : unequalHeights(outcome, key));
}

function tooManyColumns({ name, cells }: Argument, most: number): Problem | null {
  const columns = widthOf(cells);
  return columns > most ? { code: "too-many-columns", where: `the ${name}`, columns, most } : null;
}

/** Ranges may differ by empty rows alone: the shorter one must reach as far as the data of the other. */
function unequalHeights(one: Argument, other: Argument): Problem | null {
  const needed = Math.max(one.height, other.height);
  const rows = Math.min(one.cells.length, needed);
  const otherRows = Math.min(other.cells.length, needed);
  if (rows === otherRows) return null;
  return { code: "unequal-heights", first: `the ${one.name}`, rows, second: `the ${other.name}`, otherRows };
}

/** Hardly any data end in so many rows in which everything is exactly zero. */
const zeroRowsTakenForEmpty = 100;

/**
 * Rows down to the last one in use. Older versions of Excel hand blanks over as zeros: where a range reaches far beyond
 * its data and not one blank arrives, the rows at its end that are zero in every argument are taken for empty.
 */
function heightOfData(given: readonly Argument[]): number {
  const rows = Math.max(...given.map(({ height }) => height));
  const isZero = (row: number): boolean => given.every(({ cells }) => (cells[row] ?? []).every((cell) => cell === 0));
  let nonZero = rows;
  while (nonZero > 0 && isZero(nonZero - 1)) nonZero--;
  if (rows - nonZero < zeroRowsTakenForEmpty) return rows;
  return given.some(({ cells }) => cells.some((row) => row.some(isMissing))) ? rows : nonZero;
}

const columnsOf = ({ name, cells }: Argument, [first, last]: readonly [number, number]): Column[] =>
  Array.from({ length: widthOf(cells) }, (_, column) => ({
    name: headingOf(first === 0 ? null : cells[0]?.[column]) ?? unnamed(name, column),
    place: { kind: "argument", argument: name, column, firstRow: first },
    cells: columnOf(cells, column, [first, last]),
  }));

const unnamed = (argument: Argument["name"], column: number): string =>
  argument === "drivers" ? `driver ${column + 1}` : column === 0 ? argument : `${argument} ${column + 1}`;

/** A key that comes back names groups; times come once. */
function repeats({ cells: { kinds, numbers } }: Column): boolean {
  const seen = Object.values(cellKind).map(() => new Set<number>());
  for (let row = 0; row < kinds.length; row++) {
    const kind = kinds[row]!;
    if (kind === cellKind.blank) continue;
    if (seen[kind]!.has(numbers[row]!)) return true;
    seen[kind]!.add(numbers[row]!);
  }
  return false;
}
