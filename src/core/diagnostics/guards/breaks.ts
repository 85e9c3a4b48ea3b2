import type { TestOutcome } from "../outcome.ts";
import { testWords } from "../words.ts";
import type { Guard } from "./guard.ts";

type Computed = Extract<TestOutcome, { kind: "computed" }>;

/** The tests that look for coefficients that change over the period. */
const lookForBreaks: readonly TestOutcome["test"][] = ["largest-chow", "cusum", "cusum-recursive"];

/**
 * Whether the coefficients hold over the whole period, by the break tests among the outcomes.
 * @param rowName - how the reader knows a row, from its number in design order.
 * @returns null where none of them was computed.
 */
export function breaksGuard(
  outcomes: readonly TestOutcome[],
  level: number,
  rowName: (row: number) => string,
): Guard | null {
  const computed = outcomes.flatMap((outcome) =>
    outcome.kind === "computed" && lookForBreaks.includes(outcome.test) ? [outcome] : [],
  );
  if (computed.length === 0) return null;
  const rejected = computed.filter(({ figure }) => figure.pValue < level);
  if (rejected.length === 0) {
    const sentences = ["No change of the coefficients over the period shows."];
    return { guard: "breaks", finding: "nothing found", sentences };
  }
  return {
    guard: "breaks",
    finding: "look into it",
    sentences: rejected.map((outcome) => sentenceOf(outcome, rowName)),
  };
}

function sentenceOf({ test, details }: Computed, rowName: (row: number) => string): string {
  const { title, rejected } = testWords[test];
  const firstRows = details["firstRows"];
  const place =
    firstRows === undefined ? "" : ` It is largest between ${rowName(firstRows - 1)} and ${rowName(firstRows)}.`;
  return `${title}: ${rejected}${place}`;
}
