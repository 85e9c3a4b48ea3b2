import type { Decision } from "../decision/decision.ts";
import type { TestName } from "../diagnostics/outcome.ts";
import { testWords } from "../diagnostics/words.ts";
import { pValueInWords } from "./wording.ts";

export type CaseQuestion = "spread" | "follow-on";

const followOnTests: readonly TestName[] = ["breusch-godfrey"];

/** Whether errors were found to follow on, be the choice left to that or not. */
export const followsOn = ({ restsOn }: Decision): boolean =>
  restsOn.some(({ outcome, rejected }) => rejected && followOnTests.includes(outcome.test));

/** The test that settled a question: the one with the smallest p-value among those looked at. */
export function settledBy(decision: Decision, question: CaseQuestion): Decision["restsOn"][number] | null {
  const asked = decision.restsOn.filter(
    ({ outcome }) => followOnTests.includes(outcome.test) === (question === "follow-on"),
  );
  return asked.reduce<(typeof asked)[number] | null>(
    (least, test) => (least === null || test.pValue < least.pValue ? test : least),
    null,
  );
}

/** "uneven: Koenker's test, p = 0.0031, tested at 10 %", "not asked". */
export function findingInWords(decision: Decision, question: CaseQuestion): string {
  const found = question === "spread" ? decision.fourCase.spread : decision.fourCase.followOn;
  const test = settledBy(decision, question);
  if (test === null || found === "not asked") return found;
  const p = pValueInWords(test.pValue, decision.testLevel);
  return `${found}: ${testWords[test.outcome.test].title}, ${p}, tested at ${Number((100 * decision.testLevel).toPrecision(6))} %`;
}
