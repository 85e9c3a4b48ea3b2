import type { BracketWord } from "./bracketNotes.ts";
import type { Outcome } from "./guessOutcome.ts";

const noNote = "The report does not say what its numbers in brackets are:";

/** What had to be taken for granted to read a report of typed numbers. */
export const assumptions = {
  data: (range: string) => `The data were taken from ${range}, whose headings fit the names of the drivers.`,
  name: (name: string, heading: string) => `"${name}" was read as the column "${heading}".`,
  noConstant: "No constant is reported; the regression was taken to have one all the same.",
  levels: "The report does not say how sure its intervals are to be: 95 %, 90 % and 99 % were tried.",
  outcome: (name: string, because: Outcome["because"]) => `The outcome was taken to be "${name}", ${reasons[because]}.`,
  nearerBrackets: (word: BracketWord) =>
    `${noNote} they were read as ${plurals[word]}, which come nearer to what the data give than ${plurals[otherThan(word)]} would.`,
  unclearBrackets: (word: BracketWord) =>
    `${noNote} they were read as ${plurals[word]}, but as ${plurals[otherThan(word)]} they would come about as near to what the data give: ask which they are.`,
  negativeBrackets: `${noNote} they were read as t ratios, as standard errors cannot be negative and some of these are.`,
  usualBrackets: `${noNote} they were read as standard errors, as is common practice.`,
  signs: "The t ratios in brackets carry no sign; each was given the sign of its coefficient.",
  furtherLine: "A further line of numbers in brackets under the coefficients was not read.",
} as const;

const plurals: Readonly<Record<BracketWord, string>> = {
  "standard-error": "standard errors",
  ratio: "t ratios",
  "p-value": "p-values",
};

const otherThan = (word: BracketWord): BracketWord => (word === "ratio" ? "standard-error" : "ratio");

const reasons: Readonly<Record<Outcome["because"], string>> = {
  heading: "which stands over the coefficients",
  named: "which the report names as such",
  "spoken of": "of which the report speaks",
  "only one": "the only other column of numbers there",
  nearest: "whose regression comes nearest to the coefficients reported",
};

/** Why the data behind a report of typed numbers were not found. */
export const whyNoData = {
  noColumns: (names: readonly string[]) =>
    `It reports ${inQuotes(names)}, but no sheet has columns with such headings; point at the data.`,
  missing: (names: readonly string[], sheet: string) =>
    `No column on sheet "${sheet}" fits ${inQuotes(names)}, though others of its drivers stand there; point at the data.`,
  noOutcome: (sheet: string) =>
    `Sheet "${sheet}" has the drivers, but no other column of numbers that they could explain; point at the outcome.`,
  fewDrivers: (reported: number, given: number) =>
    `It reports ${reported} ${reported === 1 ? "driver" : "drivers"}, but ${given === 1 ? "one column of data is" : `${given} columns of data are`} given for it.`,
} as const;

const inQuotes = (names: readonly string[]): string => names.map((name) => `"${name}"`).join(", ");
