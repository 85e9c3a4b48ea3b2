import type { Change } from "./change.ts";
import { type RowFacts, rowChange } from "./rowChanges.ts";
import type { Run } from "./recipe.ts";

/** Where the report does not say how many rows it used, blocks of these sizes are tried. */
const mostInBlock = 12;

/** Changes by the row: any one row, or any block of rows, left out or counted twice. */
export function manyRowChanges(facts: RowFacts): Change[] {
  const { frame, complete, missing } = facts;
  const { first, count } = frame;
  const sizes = Array.from({ length: mostInBlock }, (_, i) => i + 1);
  const outSizes = missing === null ? sizes.slice(1) : missing < -1 ? [-missing] : [];
  const againSizes = missing === null ? [...sizes, count] : missing > 0 ? [missing] : [];
  const inside = (size: number): Run[] => runsWithin({ from: first + 1, to: first + count - 1 }, size, complete);
  const anywhere = (size: number): Run[] => runsWithin({ from: first, to: first + count }, size, complete);
  return [
    ...inside(1).map((run) => leftOut("row-left-out", run)),
    ...outSizes.flatMap((size) => inside(size).map((run) => leftOut("rows-left-out", run))),
    ...againSizes.flatMap((size) => anywhere(size).map(repeated)),
  ];
}

/** Every run of so many rows that begins and ends with a row that counts. */
function runsWithin({ from, to }: Run, size: number, complete: Uint8Array): Run[] {
  const runs: Run[] = [];
  for (let row = from; row + size <= to; row++) {
    if (complete[row] === 1 && complete[row + size - 1] === 1) runs.push({ from: row, to: row + size });
  }
  return runs;
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
