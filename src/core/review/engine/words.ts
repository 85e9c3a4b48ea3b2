import type { Answer } from "../../answer/answer.ts";
import { errorsInWords } from "../../answer/verdict.ts";
import { capitalised, confidenceInWords, listInWords, pValueInWords } from "../../answer/wording.ts";
import type { Consequence, ErrorsFound } from "../claimReview.ts";
import { type Reported, type Standing, level } from "./standings.ts";

/** The sentences of a review of one regression, beside those about single changes (changeWords.ts). */

const directions = { more: "shown to go with more", less: "shown to go with less" } as const;

const figures: Readonly<Record<string, string>> = {
  "p-value": "p-value",
  ratio: "ratio",
  "standard-error": "standard error",
  low: "interval",
  coefficient: "coefficient",
};

/** What a report says of a driver, as a clause. */
export function reportedInWords({ standing, from }: Reported): string {
  if (from === null) return "nothing is said of it";
  const figure = `${figures[from.kind] ?? "figure"} ${from.shown}`;
  switch (standing) {
    case "more":
    case "less":
      return `${directions[standing]} (${figure})`;
    case "not shown":
      return `no effect shown (${figure})`;
    case "open":
      return `the figures shown are too coarse to tell (${figure})`;
    case "unsaid":
      return `a coefficient of ${from.shown}, and nothing said of how sure it is`;
  }
}

/** What the data say of a driver under the choice in force, as a clause. */
export function answeredInWords(standing: Standing, { pValue, firmness }: Answer["drivers"][number]): string {
  const p = pValueInWords(pValue, level);
  const leans = firmness.kind === "leaning" ? ", and leans on the choice" : "";
  return standing === "more" || standing === "less"
    ? `${directions[standing]} (${p}${leans})`
    : `no effect can be shown (${p}${leans})`;
}

/** Kinds beyond these are counted, not named. */
const mostNamed = 4;

/** Which standard errors were reported, and whether the evidence allows them. */
export function errorsSentence({ kinds, allowed }: Omit<ErrorsFound, "sentence">, answer: Answer | null): string {
  const [simplest = "", ...others] = kinds;
  const rest =
    others.length > mostNamed ? [...others.slice(0, mostNamed), `${others.length - mostNamed} more`] : others;
  const also =
    others.length === 0 ? "" : ` The digits shown fit ${listInWords(rest)} as well, so that it could be these.`;
  const which = `The reported standard errors are ${simplest}.${also}`;
  return answer === null ? which : `${which} ${verdictOnErrors(allowed, answer)}`;
}

function verdictOnErrors(allowed: boolean, { decision, lags }: Answer): string {
  const called = errorsInWords(decision.called.errors, lags);
  return allowed
    ? `The evidence does not speak against them: ${decision.because}.`
    : `The evidence does not allow them: ${decision.because}, so ${called} standard errors are called for.`;
}

export const unknownErrors = (tried: number): string =>
  `None of the ${tried} kinds of standard errors that were tried gives the reported ones from these cells.`;

export const boundsOfAnother = (found: number, said: number): string =>
  `The bounds come out of the cells at ${confidenceInWords(found)}, not at ${confidenceInWords(said)} as the report says.`;

export interface VerdictFacts {
  readonly compared: number;
  readonly disagreeing: number;
  /** The sentence of the explanation, null where none was found. */
  readonly explanation: string | null;
  readonly alternatives: number;
  readonly errors: ErrorsFound | null;
  readonly errorsUnknown: boolean;
  /** What is said of bounds that come out at another level; null where they do not. */
  readonly otherLevel: string | null;
  readonly consequences: readonly Consequence[];
  /** Drivers whose conclusion is another one with the constant that was left out. */
  readonly withConstant: readonly string[];
  readonly answer: Answer | null;
  /** Whether more rows of data stand beside those claimed. */
  readonly beyond: boolean;
}

/** The work as a whole, in a few sentences. */
export function verdictInWords(facts: VerdictFacts): string {
  return [numbersSentence(facts), errorsPart(facts), consequencePart(facts)].filter((part) => part !== "").join(" ");
}

function numbersSentence({
  compared,
  disagreeing,
  explanation,
  alternatives,
  errorsUnknown,
  otherLevel,
  beyond,
}: VerdictFacts): string {
  const more = beyond ? " The data go on beyond them." : "";
  if (compared === 0) return "No number was reported that could be recomputed.";
  if (disagreeing === 0)
    return `${compared === 1 ? "The reported number comes" : `All ${compared} reported numbers come`} out of the cells.${more}`;
  if (explanation !== null) {
    const others =
      alternatives === 0
        ? ""
        : ` ${alternatives === 1 ? "Another change does" : `${alternatives} other changes do`} so too.`;
    return `The reported numbers do not come out of the cells as claimed, but they do as follows. ${explanation}${others}`;
  }
  if (otherLevel !== null) return `The coefficients come out of the cells. ${otherLevel}${more}`;
  if (errorsUnknown)
    return `The coefficients come out of the cells, the figures that rest on standard errors do not.${more}`;
  return `${outOf(disagreeing, compared)} not come out of the cells, and nothing that was tried explains it.${more}`;
}

function errorsPart({ errors, answer }: VerdictFacts): string {
  if (errors === null || answer === null || errors.allowed) return "";
  const called = errorsInWords(answer.decision.called.errors, answer.lags);
  return `The standard errors are ${errors.kinds[0] ?? ""}, but ${answer.decision.because}: ${called} are called for.`;
}

function consequencePart({ consequences, withConstant, answer }: VerdictFacts): string {
  if (answer === null) return "What the conclusions should be could not be recomputed.";
  if (consequences.length === 0) return "";
  const changed = consequences.filter(({ changes }) => changes).map(({ driver }) => driver);
  const constant =
    withConstant.length === 0 ? "" : ` With a constant the conclusion on ${listInWords(withConstant)} is another one.`;
  if (changed.length === 0) {
    const without = constant === "" ? "" : ", as long as there is no constant";
    return `No conclusion of the report is contradicted by the recomputation${without}.${constant}`;
  }
  return `On all rows and with the standard errors that the evidence calls for, the conclusion on ${listInWords(changed)} does not hold as reported.${constant}`;
}

export const toDo = {
  redo: "Make the regression again from all rows as claimed, or say in the report what was done and why.",
  errors:
    "Report the standard errors that the evidence calls for, with their p-values, and draw the conclusion from them.",
  version: "Say which standard errors and which law were used; the conclusion hangs on it.",
  unexplained: "Ask for the file or the program behind the numbers; do not rely on them until they can be redone.",
  recalculate:
    "Calculate the workbook again (F9), then review it again: the formula may not have been calculated since.",
  oneNumber: "Check this number for a slip in typing against the calculation it was taken from.",
  beyond: "Take in the rows that were left off, or say why they are left off.",
  summary: "Take the row that sums up the others out of the range.",
  textNumbers: "Turn the text into numbers, and make the regression again.",
  noConstant: "Let the formula have a constant, or say in the report why the line must pass through zero.",
  boundsLevel: "Say the level that the bounds have, or form them anew at the level that is said.",
  noAnswer: "Mend the data and review the regression again.",
} as const;

/** What is said of a constant that a formula leaves out. */
export const constantWords = {
  leftOut: (outcome: string) =>
    `The formula leaves the constant out: the line of "${outcome}" is forced through zero, and its R-squared is counted from zero, not from the mean.`,
  withIt: (pValue: number, drivers: readonly string[]) => {
    const p = pValueInWords(pValue, level);
    const isShown = pValue < level;
    const constant = isShown
      ? `A constant is shown to differ from zero (${p})`
      : `A constant is not shown to differ from zero (${p})`;
    const conclusion =
      drivers.length > 0
        ? `with one the conclusion on ${listInWords(drivers)} is another one`
        : "with one no conclusion of the report is another one";
    return `${constant}; ${conclusion}.`;
  },
  beside: (words: string, withConstant: string) => `${words}; with a constant, ${withConstant}`,
} as const;

export const rowsBeyond = (cells: string, count: number): string =>
  `The range stops before the data do: ${count === 1 ? `one more row stands in ${cells}` : `${count} more rows stand in ${cells}`}.`;

export const summaryInside = (cells: string): string =>
  `${cells} sums up the rows above it and is counted as a row of data.`;

export const textsLeftOut = (cells: readonly string[], count: number): string =>
  `${count === 1 ? "A number" : `${count} numbers`} kept as text ${count === 1 ? "was" : "were"} left out (${listInWords(cells)}).`;

/** "The reported number does", "3 of 9 reported numbers do". */
function outOf(disagreeing: number, compared: number): string {
  if (compared === 1) return "The reported number does";
  return `${disagreeing} of ${compared} reported numbers ${disagreeing === 1 ? "does" : "do"}`;
}

export const notReproduced = (disagreeing: number, compared: number): string =>
  `${outOf(disagreeing, compared)} not come out of the cells as claimed, and no change that was tried gives ${compared === 1 ? "it" : "them all"}.`;

export const oneDiffers = (name: string, compared: number, slip: string | null): string =>
  `${capitalised(name)} is the only one of ${compared} reported numbers that does not come out of the cells.${slip === null ? "" : ` It would come out ${slip}; one number alone cannot show whether that was done.`}`;

export const slips = {
  sign: "with its sign changed",
  power: (factor: number) =>
    factor > 1
      ? `${factor.toLocaleString("en-US")} times as large`
      : `${Math.round(1 / factor).toLocaleString("en-US")} times smaller`,
} as const;

export const lawsDiffer = (drivers: readonly string[]): string =>
  `The kind of standard errors is allowed, but the conclusion on ${listInWords(drivers)} hangs on the version, the lags or the law that the p-value is taken from.`;
