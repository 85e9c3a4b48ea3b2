import { sense } from "../../table/senses.ts";
import type { Change } from "./change.ts";
import type { Frame } from "./frame.ts";
import type { Recipe, RowRecipe, Run } from "./recipe.ts";
import { looksLikeSummary } from "./summaryRow.ts";

/** What is known of the rows before any change is tried. */
export interface RowFacts {
  readonly frame: Frame;
  /** 1 for each row of the frame in which every claimed line holds a number. */
  readonly complete: Uint8Array;
}

/** In pairs more rows than these at one end are not tried. */
const mostInPairs = 12;
const mostExtra = 12;
const mostEmpty = 24;
const emptyInPairs = 3;

/** The changes of rows that are few: ends, rows counted in, hidden rows, what stands there twice. */
export function fewRowChanges(facts: RowFacts): Change[] {
  return [
    ...leftOff(facts),
    ...extra(facts, "extra-rows-at-end"),
    ...extra(facts, "extra-rows-at-start"),
    ...countedIn(facts),
    ...hiddenRows(facts.frame),
    ...repeats(facts),
  ];
}

/** A change of the rows alone. */
export const rowChange = (
  facts: Change["facts"],
  change: (rows: RowRecipe, recipe: Recipe) => Partial<RowRecipe> | null,
  inPairs = true,
): Change => ({
  facts,
  part: "rows",
  inPairs,
  apply: (recipe) => {
    const changed = change(recipe.rows, recipe);
    return changed === null ? null : { ...recipe, rows: { ...recipe.rows, ...changed } };
  },
});

function leftOff({ frame: { first, count } }: RowFacts): Change[] {
  const sizes = Array.from({ length: Math.max(0, count - 3) }, (_, i) => i + 1);
  const last = first + count;
  return sizes.flatMap((size) => [
    rowChange(
      { hypothesis: "rows-left-off-at-end", run: { from: last - size, to: last } },
      ({ span }) => shorter(span, { from: 0, to: -size }),
      size <= mostInPairs,
    ),
    rowChange(
      { hypothesis: "rows-left-off-at-start", run: { from: first, to: first + size } },
      ({ span }) => shorter(span, { from: size, to: 0 }),
      size <= mostInPairs,
    ),
  ]);
}

function shorter({ from, to }: Run, by: Run): Partial<RowRecipe> | null {
  const span = { from: from + by.from, to: to + by.to };
  return span.to - span.from > 2 ? { span } : null;
}

/** Rows with numbers next to the claimed ones; a row without any is stepped over once. */
function extra(facts: RowFacts, hypothesis: "extra-rows-at-end" | "extra-rows-at-start"): Change[] {
  const { frame } = facts;
  const atEnd = hypothesis === "extra-rows-at-end";
  return filledBeyond(facts, atEnd).map((row, index) => {
    const { first, count } = frame;
    const run = atEnd ? { from: first + count, to: row + 1 } : { from: row, to: first };
    const summary = atEnd && index === 0 ? looksLikeSummary(frame, row) : null;
    return rowChange(
      summary === null ? { hypothesis, run } : { hypothesis: "total-row-counted", row, summary },
      ({ span }) => ({ span: atEnd ? { from: span.from, to: run.to } : { from: run.from, to: span.to } }),
    );
  });
}

function filledBeyond({ frame: { first, count, rowCount }, complete }: RowFacts, atEnd: boolean): number[] {
  const step = atEnd ? 1 : -1;
  const rows: number[] = [];
  let gap = 0;
  for (let row = atEnd ? first + count : first - 1; row >= 0 && row < rowCount && gap < 2; row += step) {
    gap = complete[row] === 1 ? 0 : gap + 1;
    if (gap === 0) rows.push(row);
  }
  return rows.slice(0, mostExtra);
}

/** Rows that hold no data and were counted in: the heading, empty rows, a total that the sheet no longer has. */
function countedIn({ frame, complete }: RowFacts): Change[] {
  const end = frame.first + frame.count;
  const empties = Array.from({ length: mostEmpty }, (_, i) => i + 1);
  const hasTotal = complete[end] === 1 && looksLikeSummary(frame, end) !== null;
  const heading = frame.first - 1;
  const words = heading >= 0 && frame.lines.some(({ senses }) => senses[heading] === sense.text);
  const zeros =
    (count: number) =>
    (rows: RowRecipe): Partial<RowRecipe> | null =>
      rows.zeros > 0 ? null : { zeros: count };
  return [
    ...(hasTotal ? [] : (["sum", "mean"] as const)).map((summary) =>
      rowChange({ hypothesis: "total-row-counted", row: null, summary }, (rows) =>
        rows.summary === "none" ? { summary } : null,
      ),
    ),
    ...(words ? [rowChange({ hypothesis: "heading-row-counted", row: heading }, zeros(1))] : []),
    ...empties.map((count) =>
      rowChange({ hypothesis: "empty-rows-counted", count }, zeros(count), count <= emptyInPairs),
    ),
  ];
}

function hiddenRows({ hidden, first, count }: Frame): Change[] {
  const within = hidden.filter((row) => row >= first && row < first + count);
  if (within.length === 0) return [];
  const runs = within.map((row) => ({ from: row, to: row + 1 }));
  return [
    rowChange({ hypothesis: "hidden-rows-left-out", runs }, ({ without }) => ({ without: [...without, ...runs] })),
  ];
}

/** Fewer alike rows in a row than these may be chance where columns hold few values. */
const fewestRepeated = 2;

/** Rows that stand among the claimed ones twice, one block after another: the second was left out. */
function repeats({ frame, complete }: RowFacts): Change[] {
  const { first, count, lines, driverCount } = frame;
  const claimed = lines.slice(0, driverCount + 1);
  const known = new Map<string, number>();
  const earlier = new Map<number, number>();
  for (let row = first; row < first + count; row++) {
    if (complete[row] === 0) continue;
    const key = claimed.map(({ numbers }) => numbers[row]).join(" ");
    const before = known.get(key);
    if (before === undefined) known.set(key, row);
    else earlier.set(row, before);
  }
  const changes: Change[] = [];
  for (let row = first; row < first + count; row++) {
    let size = 0;
    while (earlier.get(row + size) !== undefined && earlier.get(row + size) === earlier.get(row)! + size) size++;
    if (size < fewestRepeated) continue;
    const run = { from: row, to: row + size };
    changes.push(rowChange({ hypothesis: "repeat-left-out", run }, ({ without }) => ({ without: [...without, run] })));
    row += size - 1;
  }
  return changes;
}
