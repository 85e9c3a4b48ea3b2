import type { Answer } from "../../core/answer/answer.ts";
import { readingOf } from "../../core/answer/tables.ts";
import type { TestName, TestOutcome } from "../../core/diagnostics/outcome.ts";

/** One test with all the orders it was made for. */
export interface TestGroup {
  readonly test: TestName;
  readonly outcomes: readonly TestOutcome[];
  /** The outcome that decided, or else the first. */
  readonly main: TestOutcome;
  readonly decided: boolean;
}

/** Tests by name, orders together, in the order of the answer. */
export function groupTests({ tests, decision }: Answer): readonly TestGroup[] {
  const names = [...new Set(tests.map(({ test }) => test))];
  return names.map((test): TestGroup => {
    const outcomes = tests
      .filter((outcome) => outcome.test === test)
      .toSorted((a, b) => (a.order ?? 0) - (b.order ?? 0));
    const deciding = outcomes.find(({ order }) =>
      decision.restsOn.some(({ outcome }) => outcome.test === test && outcome.order === order),
    );
    return { test, outcomes, main: deciding ?? outcomes[0]!, decided: deciding !== undefined };
  });
}

/** What the test means here, in the words of its main outcome. */
export const readingOfGroup = ({ main }: TestGroup, answer: Answer): string =>
  main.kind === "computed" ? readingOf(main, answer) : `Does not apply: ${main.because}`;
