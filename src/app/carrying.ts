import { nearestName } from "../core/problem/nearestName.ts";
import type { Problem } from "../core/problem/problem.ts";
import type { ColumnDescription } from "../core/table/describe.ts";
import { proposeSetup } from "./proposal.ts";
import type { ColumnSetup, Setup } from "./setup.ts";

/** A column that a set-up uses and that is no longer found under its heading. */
export interface LostColumn {
  /** What the set-up made of it. */
  readonly column: ColumnSetup;
  /** A column that the set-up does not know and that may be meant; null where none stands out. */
  readonly candidate: string | null;
  /** The data it was looked for in, "Months!A1:D97". */
  readonly where: string;
}

export interface Carried {
  readonly setup: Setup;
  readonly lost: readonly LostColumn[];
}

/** What columns are asked to fit to. */
export interface Found {
  readonly columns: readonly ColumnDescription[];
  /** "Months!A1:D97" */
  readonly address: string;
}

/**
 * A set-up brought to data read anew: what was chosen for columns that are still there stays, others are not used, and
 * columns with a role that are gone are named. Where none of the columns with a role is left, the set-up is of other
 * data, and all is guessed.
 */
export function carrySetup(before: Setup, found: Found): Carried {
  const carried = bringSetup(before, found);
  const isOther = carried.lost.length === usedIn(before).length;
  return isOther ? { setup: proposeSetup(found.columns), lost: [] } : carried;
}

/** The columns that take part in a set-up. */
export const usedIn = ({ columns }: Setup): readonly ColumnSetup[] => columns.filter(({ role }) => role !== "unused");

/** The same for a set-up that is asked for by name: whatever is gone is named, be it all of it. */
export function bringSetup(before: Setup, { columns, address }: Found): Carried {
  const fresh = proposeSetup(columns);
  const known = new Map(before.columns.map((entry) => [entry.column, entry]));
  const carried = fresh.columns.map((guess) => known.get(guess.column) ?? { ...guess, role: "unused" as const });
  const names = new Set(columns.map(({ name }) => name));
  const gone = usedIn(before).filter(({ column }) => !names.has(column));
  const strangers = columns.filter(({ name }) => !known.has(name)).map(({ name }) => name);
  const lost = gone.map((column) => ({
    column,
    candidate: candidateFor(column.column, { before, columns, strangers }),
    where: address,
  }));
  return { setup: { ...before, columns: carried }, lost };
}

interface Sought {
  readonly before: Setup;
  readonly columns: readonly ColumnDescription[];
  readonly strangers: readonly string[];
}

/** A new heading where the old one stood, else the one that is nearest to it. */
function candidateFor(lost: string, { before, columns, strangers }: Sought): string | null {
  const place = before.columns.findIndex(({ column }) => column === lost);
  const inPlace = before.columns.length === columns.length ? columns[place]?.name : undefined;
  return inPlace !== undefined && strangers.includes(inPlace) ? inPlace : nearestName(lost, strangers);
}

/** The sentence for a lost column is that for any heading that is not found. */
export const lostProblem = ({ column, candidate, where }: LostColumn): Problem => ({
  code: "unknown-heading",
  heading: column.column,
  nearest: candidate,
  where,
});

/** Gives a column all that was chosen for one that is lost. */
export const takeOver = (setup: Setup, { column }: LostColumn, by: string): Setup => ({
  ...setup,
  columns: setup.columns.map((entry) => (entry.column === by ? { ...column, column: by } : entry)),
});
