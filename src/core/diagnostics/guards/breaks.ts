import type { TestOutcome } from "../outcome.ts";
import { testWords } from "../words.ts";
import { type Guard, namesInWords } from "./guard.ts";

type Computed = Extract<TestOutcome, { kind: "computed" }>;

/** The tests that look for coefficients that change over the period. */
const lookForBreaks: readonly TestOutcome["test"][] = ["largest-chow", "cusum", "cusum-recursive"];

export interface BreakSettings {
  readonly level: number;
  /** Whether the errors were found to follow on: these tests then see changes where there are none. */
  readonly followsOn: boolean;
}

/**
 * Whether the coefficients hold over the whole period, by the break tests among the outcomes.
 * @param rowName - how the reader knows a row, from its number in design order.
 * @returns null where none of them was computed.
 */
export function breaksGuard(
  outcomes: readonly TestOutcome[],
  { level, followsOn }: BreakSettings,
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
  if (followsOn) {
    return { guard: "breaks", finding: "worth knowing", sentences: [doubtful(rejected, rowName)] };
  }
  return {
    guard: "breaks",
    finding: "look into it",
    sentences: rejected.map((outcome) => sentenceOf(outcome, rowName)),
  };
}

/** What the tests would say, and why it may be nothing. */
function doubtful(rejected: readonly Computed[], rowName: (row: number) => string): string {
  const named = rejected.map(({ test, details }) => {
    const place = placeOf(details, rowName);
    return `the ${testWords[test].title.replace(/^L/, "l")}${place === null ? "" : ` (${place})`}`;
  });
  return `By ${namesInWords(named)} the coefficients would change over the period. But the errors follow on, and then ${
    named.length === 1 ? "this test finds" : "these tests find"
  } changes where there are none: look at the residuals through time before you believe it.`;
}

function sentenceOf({ test, details }: Computed, rowName: (row: number) => string): string {
  const { title, rejected } = testWords[test];
  const place = placeOf(details, rowName);
  return `${title}: ${rejected}${place === null ? "" : ` It is ${place}.`}`;
}

/** Where a test sees the change, if it names a place. */
function placeOf(details: Computed["details"], rowName: (row: number) => string): string | null {
  const firstRows = details["firstRows"];
  return firstRows === undefined ? null : `largest between ${rowName(firstRows - 1)} and ${rowName(firstRows)}`;
}
