import type { Answer } from "../../core/answer/answer.ts";
import { readingOf } from "../../core/answer/tables.ts";
import type { TestName, TestOutcome } from "../../core/diagnostics/outcome.ts";
import { testWords } from "../../core/diagnostics/words.ts";

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
    const deciding = outcomes.find(
      ({ order }) =>
        isAsked(decision, test) &&
        decision.restsOn.some(({ outcome }) => outcome.test === test && outcome.order === order),
    );
    return { test, outcomes, main: deciding ?? outcomes[0]!, decided: deciding !== undefined };
  });
}

/** Tests are looked at under every policy; where the question is not asked they do not decide. */
const isAsked = ({ fourCase }: Answer["decision"], test: TestName): boolean =>
  (test === "breusch-godfrey" ? fourCase.followOn : fourCase.spread) !== "not asked";

/** A reason why tests do not apply, with the tests that it keeps out. */
export interface KeptOut {
  readonly because: string;
  readonly titles: readonly string[];
}

/** Whether a test says anything here, at any order. */
export const applies = ({ outcomes }: TestGroup): boolean => outcomes.some(({ kind }) => kind === "computed");

/** The tests that say nothing here, by their reasons. */
export function keptOut(groups: readonly TestGroup[]): readonly KeptOut[] {
  const found = groups.flatMap(({ test, main }) =>
    main.kind === "computed" ? [] : [{ title: testWords[test].title, because: main.because }],
  );
  return [...new Set(found.map(({ because }) => because))].map((because) => ({
    because,
    titles: found.filter((one) => one.because === because).map(({ title }) => title),
  }));
}

/** What the test means here, in the words of its main outcome. */
export const readingOfGroup = ({ main }: TestGroup, answer: Answer): string =>
  main.kind === "computed" ? readingOf(main, answer) : `Does not apply: ${main.because}`;
