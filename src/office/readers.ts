import type { BookFormula, BookName, BookSheet } from "../core/review/book.ts";
import { readersAmong } from "../core/review/formula/readers.ts";
import { withSpills } from "./spills.ts";

interface Among {
  /** For each sheet its formulas that call no regression function. */
  readonly others: readonly (readonly BookFormula[])[];
  readonly names: readonly BookName[];
}

/** The sheets with those of their other formulas that read the results of a regression in the cells of another formula. */
export async function withReaders(
  context: Excel.RequestContext,
  sheets: readonly BookSheet[],
  { others, names }: Among,
): Promise<readonly BookSheet[]> {
  const candidates = sheets.map((sheet, index) => ({ sheet, others: others[index] ?? [] }));
  const found: BookSheet[] = [];
  for (const [index, readers] of (await inTurns(readersAmong(candidates, names))).entries()) {
    const sheet = sheets[index]!;
    found.push(readers.length === 0 ? sheet : { ...sheet, readers: await withSpills(context, sheet.sheet, readers) });
  }
  return found;
}

/** Runs what stops on its way to the end, and lets the page do its own at each stop. */
async function inTurns<T>(steps: Generator<void, T>): Promise<T> {
  for (;;) {
    const step = steps.next();
    if (step.done === true) return step.value;
    await new Promise((resolve) => setTimeout(resolve));
  }
}
