import type { Problem } from "../problem/problem.ts";
import type { SheetArea } from "./address.ts";

/** A range as the user wrote it, and where it is; an empty sheet name stands for the sheet of the others. */
export interface NamedRange {
  readonly words: string;
  readonly area: SheetArea;
}

/**
 * What keeps ranges from being read side by side, the outcome's range first; null where nothing does.
 * @returns Problem "unequal-heights", "ranges-apart" for other rows or another sheet, "overlapping-ranges" where the
 *   outcome lies within another range.
 */
export function rangesFault([outcome, ...others]: readonly NamedRange[]): Problem | null {
  if (outcome === undefined) return null;
  for (const other of others) {
    const fault = pairFault(outcome, other);
    if (fault !== null) return fault;
  }
  return null;
}

function pairFault(outcome: NamedRange, other: NamedRange): Problem | null {
  const [first, second] = [outcome.words, other.words];
  const [a, b] = [outcome.area, other.area];
  if (!sameSheet(a.sheet, b.sheet)) return { code: "ranges-apart", first, second };
  if (a.rows !== b.rows) return { code: "unequal-heights", first, rows: a.rows, second, otherRows: b.rows };
  if (a.row !== b.row) return { code: "ranges-apart", first, second };
  const shares = a.column < b.column + b.columns && b.column < a.column + a.columns;
  return shares ? { code: "overlapping-ranges", first, second } : null;
}

const sameSheet = (a: string, b: string): boolean => a === "" || b === "" || a.toLowerCase() === b.toLowerCase();
