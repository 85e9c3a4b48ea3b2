import type { Figure, TestOutcome } from "../diagnostics/outcome.ts";
import { testWords, upsetByFollowOn } from "../diagnostics/words.ts";
import type { InferenceTable } from "../inference/inference.ts";
import type { Reference } from "../inference/reference.ts";
import type { Answer, DriverAnswer } from "./answer.ts";
import { followsOn } from "./findings.ts";
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
    at((inference.grouped ?? inference.neweyWest)?.standardErrors, row),
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

/** What the tests say of the two questions, one row a test with its reading, then the fit as a whole. */
export function evidenceTable(answer: Answer): Grid {
  return [
    [...evidenceHeadings],
    questionRow("Spread of the errors", answer.decision, "spread"),
    questionRow("Follow-on of the errors", answer.decision, "followOn"),
    ...answer.tests.map((outcome) => testRow(outcome, answer)),
    ...fitRows(answer),
  ];
}

const blanks = (count: number): string[] => Array.from({ length: count }, () => "");

/** One of the two questions behind the four cases: the smallest p-value of the tests that decide it, and the answer. */
function questionRow(
  title: string,
  decision: Answer["decision"],
  question: "spread" | "followOn",
): (string | number)[] {
  const asked = decision.restsOn.filter(
    ({ outcome }) => (outcome.test === "breusch-godfrey") === (question === "followOn"),
  );
  const found = decision.fourCase[question];
  const pValue = found === "not asked" ? "" : Math.min(...asked.map((entry) => entry.pValue));
  const heldAgainst = found === "not asked" ? "" : `smallest p, held against ${decision.testLevel}`;
  return [title, heldAgainst, "", "", pValue, "", "", "", found];
}

function fitRows({ observations, fit }: Answer): (string | number)[][] {
  const figures: readonly (readonly [string, number])[] = [
    ["Rows used", observations],
    ["Degrees of freedom", fit.degreesOfFreedom],
    [fit.uncentred ? "R-squared about zero" : "R-squared", fit.rSquared],
    ["Adjusted R-squared", fit.adjustedRSquared],
    ["Standard error of the regression", fit.sigma],
    ["Log-likelihood", fit.logLikelihood],
    ["AIC", fit.aic],
    ["BIC", fit.bic],
  ];
  return figures.map(([name, value]) => [name, "", value, ...blanks(evidenceHeadings.length - 3)]);
}

type Context = Pick<Answer, "decision" | "options">;

function testRow(outcome: TestOutcome, context: Context): (string | number)[] {
  const { title } = testWords[outcome.test];
  const order = outcome.order === null ? "" : `order ${outcome.order}`;
  if (outcome.kind === "not-applicable") return [title, order, ...blanks(6), `Does not apply: ${outcome.because}`];
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
 * errors is said only of the tests that the decision rests on, and a test that follow-on upsets is not believed in full.
 */
export function readingOf(outcome: Extract<TestOutcome, { kind: "computed" }>, { decision }: Context): string {
  const counted = decision.restsOn.find((entry) => entry.outcome === outcome);
  const pValue = counted?.pValue ?? (outcome.fForm ?? outcome.figure).pValue;
  const { rejected, notRejected } = testWords[outcome.test];
  const reading = pValue < decision.testLevel ? rejected : notRejected;
  if (counted !== undefined) return reading;
  const plain = reading.replace(/: .*$/s, ".");
  const isDoubtful = reading === rejected && upsetByFollowOn.has(outcome.test) && followsOn(decision);
  return isDoubtful ? `${plain} But the errors follow on, and this test then says so too often.` : plain;
}

/** "chi-square(3)", "F(3, 92)". */
export function lawInWords({ law, df }: Figure): string {
  const shown = df.map((value) => (Number.isInteger(value) ? value : Number(value.toFixed(2))));
  return df.length === 0 ? law : `${law}(${shown.join(", ")})`;
}

/** The law of a table's ratios, one for all or each its own: "t(41)", "t(8.12) to t(41), each coefficient its own". */
export function lawsInWords({ reference, degreesOfFreedom }: InferenceTable): string {
  if (reference.law !== "t" || degreesOfFreedom === undefined) return referenceInWords(reference);
  const [least, most] = [Math.min(...degreesOfFreedom), Math.max(...degreesOfFreedom)];
  const fewest = referenceInWords({ law: "t", degreesOfFreedom: least });
  if (most === least) return fewest;
  return `${fewest} to ${referenceInWords({ law: "t", degreesOfFreedom: most })}, each coefficient its own`;
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
export function choiceText({ decision, lags, inference }: Answer): string {
  const { errors } = decision.inForce;
  return `${capitalised(errorsInWords(errors, lags))}, ratio against ${lawsInWords(inference.inForce)}`;
}

/** The verdict, a sentence a line. */
export const verdictLines = (answer: Answer): readonly string[] => answer.verdict;
