import type { Answer, DriverAnswer } from "../core/answer/answer.ts";
import type { Question } from "../core/answer/question.ts";
import { choiceText } from "../core/answer/tables.ts";
import { confidenceInWords, listInWords } from "../core/answer/wording.ts";
import { counted } from "../core/problem/spots.ts";

/** One of several answers that are set side by side. */
export interface ComparedModel {
  /** Of its set-up. */
  readonly name: string;
  readonly answer: Answer;
  readonly question: Question;
  /** "Months!A1:D97" */
  readonly address: string;
}

/** One driver across the models; null where a model is without it. */
export interface ComparedDriver {
  readonly term: string;
  readonly in: readonly (DriverAnswer | null)[];
}

/** Every term that any of the models has, the constant last, as it is seldom what was asked. */
export function comparedDrivers(models: readonly ComparedModel[]): ComparedDriver[] {
  const terms = [...new Set(models.flatMap(({ answer }) => answer.terms))];
  const isConstant = (term: string): boolean =>
    models.some(({ answer }) => answer.drivers.some((driver) => driver.term === term && driver.sentence === null));
  return [...terms.filter((term) => !isConstant(term)), ...terms.filter(isConstant)].map((term) => ({
    term,
    in: models.map(({ answer }) => answer.drivers.find((driver) => driver.term === term) ?? null),
  }));
}

/** A line about the models as a whole. */
export interface ComparedLine {
  readonly label: string;
  readonly values: readonly (string | number)[];
}

/** The choice in force, the rows and the fit of each model. */
export function comparedLines(models: readonly ComparedModel[]): ComparedLine[] {
  const line = (label: string, value: (model: ComparedModel) => string | number): ComparedLine => ({
    label,
    values: models.map(value),
  });
  return [
    line("Outcome", ({ answer }) => answer.outcome),
    line("Standard errors in force", ({ answer }) => choiceText(answer)),
    line("Because", ({ answer }) => answer.decision.because),
    line("Rows are", ({ answer }) => rowsInWord[answer.rows.kind]),
    line("Rows used", ({ answer }) => answer.observations),
    line("Rows left out", ({ answer }) => answer.leftOutCount),
    line("R-squared", ({ answer }) => answer.fit.rSquared),
    line("Adjusted R-squared", ({ answer }) => answer.fit.adjustedRSquared),
    line("Standard error of the regression", ({ answer }) => answer.fit.sigma),
    line("Akaike's criterion (AIC)", ({ answer }) => answer.fit.aic),
  ];
}

const rowsInWord = { cases: "separate cases", time: "through time", groups: "in groups" } as const;

/** What keeps the models from being set against one another, and on what they agree, as sentences. */
export function comparabilityOf(models: readonly ComparedModel[]): string[] {
  return [...outcomeNotes(models), ...rowNotes(models), ...levelNotes(models), ...uncentredNotes(models)];
}

const quoted = ({ name }: ComparedModel): string => `"${name}"`;

function outcomeNotes(models: readonly ComparedModel[]): string[] {
  const outcomes = [...new Set(models.map(({ answer }) => answer.outcome))];
  if (outcomes.length === 1) return [];
  return [
    `The models explain different outcomes (${outcomes.join("; ")}): neither their coefficients nor their fit can be set against each other.`,
  ];
}

function levelNotes(models: readonly ComparedModel[]): string[] {
  const levels = [...new Set(models.map(({ answer }) => confidenceInWords(answer.options.level)))];
  return levels.length === 1 ? [] : [`The intervals are not of the same level: ${levels.join(", ")}.`];
}

function uncentredNotes(models: readonly ComparedModel[]): string[] {
  const kinds = new Set(models.map(({ answer }) => answer.fit.uncentred));
  return kinds.size === 1
    ? []
    : ["Some models have no constant: their R-squared measures from 0 and cannot be set against that of the others."];
}

function rowNotes(models: readonly ComparedModel[]): string[] {
  const [first, ...others] = models;
  if (first === undefined) return [];
  const differences = others.flatMap((other) => rowDifference(first, other));
  if (differences.length === 0) {
    return [`All models rest on the same ${first.answer.observations.toLocaleString("en-US")} rows.`];
  }
  return [
    ...differences,
    "Where rows differ, so may the coefficients for that reason alone; R-squared and Akaike's criterion cannot be set against each other.",
  ];
}

/** Whether two models rest on the same rows of the same sheet, and if not, on how many each does alone. */
function rowDifference(one: ComparedModel, other: ComparedModel): string[] {
  const [a, b] = [usedRows(one), usedRows(other)];
  const pair = `${quoted(one)} and ${quoted(other)}`;
  if (a.sheet !== b.sheet) return [`${pair} rest on data of different sheets.`];
  if (a.rows === null || b.rows === null) {
    const [n, m] = [one.answer.observations, other.answer.observations];
    return [`${pair} use ${n} and ${m} rows; so many are left out that it is not told here which differ.`];
  }
  const { rows } = b;
  const onlyA = [...a.rows].filter((row) => !rows.has(row)).length;
  const onlyB = rows.size - (a.rows.size - onlyA);
  if (onlyA === 0 && onlyB === 0) return [];
  return [
    `${pair} do not rest on the same rows: ${listInWords([...usedAlone(one, onlyA), ...usedAlone(other, onlyB)])}.`,
  ];
}

const usedAlone = (model: ComparedModel, rows: number): string[] =>
  rows === 0 ? [] : [`${counted(rows, "row")} ${rows === 1 ? "is" : "are"} used by ${quoted(model)} alone`];

/** Rows of the sheet (from 1) that a model rests on; null where more were left out than are listed. */
function usedRows({ question, answer }: ComparedModel): {
  readonly sheet: string;
  readonly rows: ReadonlySet<number> | null;
} {
  const { columns, rowCount } = question.source;
  const place = columns[0]?.place;
  const sheet = place?.kind === "sheet" ? place.sheet : "";
  if (answer.leftOut.length < answer.leftOutCount || place === undefined) return { sheet, rows: null };
  const left = new Set(answer.leftOut.map(({ row }) => row));
  const all = Array.from({ length: rowCount }, (_, index) => place.firstRow + index + 1);
  return { sheet, rows: new Set(all.filter((row) => !left.has(row))) };
}
