import type { Figure, TestOutcome } from "../diagnostics/outcome.ts";
import { testWords } from "../diagnostics/words.ts";
import type { Reference } from "../inference/reference.ts";
import type { Answer, DriverAnswer } from "./answer.ts";
import { errorsInWords } from "./verdict.ts";
import { capitalised } from "./wording.ts";

/** A rectangle of texts and numbers, headings in its first row; a figure that does not apply is an empty text. */
export type Grid = readonly (readonly (string | number)[])[];

const answerHeadings = [
  "driver",
  "coefficient",
  "classical",
  "White",
  "Newey-West",
  "in force",
  "ratio",
  "p-value",
  "low",
  "high",
  "conclusion",
] as const;

/** One row a term: the three standard errors side by side, then what is in force. */
export function answerTable(answer: Answer): Grid {
  const { inference, terms } = answer;
  const at = (values: readonly number[] | undefined, row: number): string | number => values?.[row] ?? "";
  const body = answer.drivers.map((driver, row) => [
    terms[row] ?? "",
    driver.coefficient,
    at(inference.classical.standardErrors, row),
    at(inference.white.standardErrors, row),
    at((inference.neweyWest ?? inference.grouped)?.standardErrors, row),
    driver.standardError,
    driver.ratio,
    driver.pValue,
    driver.low,
    driver.high,
    conclusionInWords(driver, answer.options.level),
  ]);
  const headings =
    inference.grouped === null
      ? answerHeadings
      : answerHeadings.map((name) => (name === "Newey-West" ? "grouped" : name));
  return [[...headings], ...body];
}

function conclusionInWords({ pValue, firmness, sentence }: DriverAnswer, level: number): string {
  if (sentence === null) return "";
  return `${pValue < level ? "shown" : "not shown"}, ${firmness.kind === "firm" ? "firm" : "leans on the choice"}`;
}

const evidenceHeadings = [
  "test",
  "looks at",
  "statistic",
  "reference",
  "p-value",
  "F form",
  "F reference",
  "F p-value",
  "reading",
] as const;

/** What the tests say of the two questions, then one row a test with its reading. */
export function evidenceTable({ decision, tests, ...answer }: Answer): Grid {
  const { spread, followOn } = decision.fourCase;
  return [
    [...evidenceHeadings],
    ["Spread of the errors", ...blanks, spread],
    ["Follow-on of the errors", ...blanks, followOn],
    ...tests.map((outcome) => testRow(outcome, { decision, ...answer })),
  ];
}

const blanks = Array.from({ length: evidenceHeadings.length - 2 }, () => "");

type Context = Pick<Answer, "decision" | "options">;

function testRow(outcome: TestOutcome, context: Context): (string | number)[] {
  const { title } = testWords[outcome.test];
  const order = outcome.order === null ? "" : `order ${outcome.order}`;
  if (outcome.kind === "not-applicable")
    return [title, order, ...blanks.slice(1), `Does not apply: ${outcome.because}`];
  const { figure, fForm } = outcome;
  return [
    title,
    outcome.form ?? order,
    figure.statistic,
    lawInWords(figure),
    figure.pValue,
    ...(fForm === null ? ["", "", ""] : [fForm.statistic, lawInWords(fForm), fForm.pValue]),
    readingOf(outcome, context),
  ];
}

/**
 * What a computed test means here, held against the level of the tests that decide; the consequence for the standard
 * errors is said only of the tests that the decision rests on.
 */
export function readingOf(outcome: Extract<TestOutcome, { kind: "computed" }>, { decision }: Context): string {
  const counted = decision.restsOn.find((entry) => entry.outcome === outcome);
  const pValue = counted?.pValue ?? (outcome.fForm ?? outcome.figure).pValue;
  const { rejected, notRejected } = testWords[outcome.test];
  const reading = pValue < decision.testLevel ? rejected : notRejected;
  return counted === undefined ? reading.replace(/: .*$/s, ".") : reading;
}

/** "chi-square(3)", "F(3, 92)". */
export function lawInWords({ law, df }: Figure): string {
  const shown = df.map((value) => (Number.isInteger(value) ? value : Number(value.toFixed(2))));
  return df.length === 0 ? law : `${law}(${shown.join(", ")})`;
}

/** The law of the ratios: "t(92)", "normal", "fixed-b (b = 0.135, t(92))". */
export function referenceInWords(reference: Reference): string {
  switch (reference.law) {
    case "t":
      return `t(${Number(reference.degreesOfFreedom.toFixed(2))})`;
    case "normal":
      return "normal";
    case "fixed-b":
      return `fixed-b (b = ${reference.b.toFixed(3)}, t(${reference.degreesOfFreedom}))`;
  }
}

/** "Newey-West (12 lags), ratio against fixed-b (b = 0.135, t(92))". */
export function choiceText({ decision, lags }: Answer): string {
  const { errors, reference } = decision.inForce;
  return `${capitalised(errorsInWords(errors, lags))}, ratio against ${referenceInWords(reference)}`;
}

/** The verdict, a sentence a line. */
export const verdictLines = (answer: Answer): readonly string[] => answer.verdict;
