import type { Frame } from "./frame.ts";
import type { Change } from "./change.ts";
import { type RowFacts, rowChange } from "./rowChanges.ts";
import type { Run } from "./recipe.ts";

/** Where the report does not say how many rows it used, blocks of these sizes are tried. */
const mostInBlock = 12;

/** What is known of the rows that a change by the row would be made to. */
export interface ManyFacts extends Pick<RowFacts, "frame" | "complete"> {
  /** How many rows the report says were used less how many there are so far; null where it does not say. */
  readonly missing: number | null;
}

/**
 * Changes by the row: any one row, or any block of rows, left out or counted twice, made as they are asked for. Where the
 * report says how many rows it used, only those that come to that many.
 */
export function* manyRowChanges(facts: ManyFacts): Generator<Change> {
  const { frame, missing } = facts;
  yield* singleRows(facts);
  for (const size of blockSizes(missing === null ? null : -missing)) yield* blocksOut(facts, size);
  for (const size of missing === null ? [...blockSizes(null), frame.count] : blockSizes(missing)) {
    yield* blocksAgain(facts, size);
  }
}

/**
 * Those that are tried with other changes: blocks only of the size that the number of rows tells. Lists of a change a
 * row are long, so that the last one is kept for whoever asks for the same.
 */
export function manyInPairs(frame: Frame): (complete: Uint8Array, missing: number | null) => readonly Change[] {
  let last: {
    readonly complete: Uint8Array;
    readonly missing: number | null;
    readonly changes: readonly Change[];
  } | null = null;
  return (complete, missing) => {
    const same = last?.missing === missing && alike(last.complete, complete);
    if (last === null || !same) {
      const facts = { frame, complete, missing };
      last = { complete, missing, changes: [...(missing === null ? singleRows(facts) : manyRowChanges(facts))] };
    }
    return last.changes;
  };
}

function alike(one: Uint8Array, other: Uint8Array): boolean {
  for (let row = 0; row < one.length; row++) if (one[row] !== other[row]) return false;
  return true;
}

function* singleRows({ frame: { first, count }, complete, missing }: ManyFacts): Generator<Change> {
  if (missing !== null && missing !== -1) return;
  for (const run of runsWithin({ from: first + 1, to: first + count - 1 }, 1, complete))
    yield leftOut("row-left-out", run);
}

function* blocksOut({ frame: { first, count }, complete }: ManyFacts, size: number): Generator<Change> {
  if (size === 1) return;
  for (const run of runsWithin({ from: first + 1, to: first + count - 1 }, size, complete))
    yield leftOut("rows-left-out", run);
}

function* blocksAgain({ frame: { first, count }, complete }: ManyFacts, size: number): Generator<Change> {
  for (const run of runsWithin({ from: first, to: first + count }, size, complete)) yield repeated(run);
}

/** @param size - that of the only block that comes to the number of rows reported; null where it is not reported. */
const blockSizes = (size: number | null): number[] => {
  if (size === null) return Array.from({ length: mostInBlock }, (_, i) => i + 1);
  return size > 0 ? [size] : [];
};

/** Every run of so many rows that begins and ends with a row that counts. */
function* runsWithin({ from, to }: Run, size: number, complete: Uint8Array): Generator<Run> {
  for (let row = from; row + size <= to; row++) {
    if (complete[row] === 1 && complete[row + size - 1] === 1) yield { from: row, to: row + size };
  }
}

const leftOut = (hypothesis: "row-left-out" | "rows-left-out", run: Run): Change =>
  rowChange({ hypothesis, run }, ({ span, without }) => {
    const apart = without.every(({ from, to }) => to <= run.from || from >= run.to);
    return apart && run.from > span.from && run.to < span.to ? { without: [...without, run] } : null;
  });

const repeated = (run: Run): Change =>
  rowChange({ hypothesis: "block-repeated", run }, ({ span, again }) =>
    again.length === 0 && run.from >= span.from && run.to <= span.to ? { again: [run] } : null,
  );
