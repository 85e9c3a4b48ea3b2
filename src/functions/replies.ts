import type { Answer } from "../core/answer/answer.ts";
import { type Grid, answerTable, choiceText, evidenceTable, verdictLines } from "../core/answer/tables.ts";
import { readOneOf } from "../core/answer/settingReaders.ts";
import { isNotUnderstood } from "../core/answer/settingSpec.ts";
import { settingTable } from "../core/answer/settingTable.ts";
import { lagsForRows } from "../core/covariance/lags.ts";
import type { TestOutcome } from "../core/diagnostics/outcome.ts";
import { type Result, failure, success } from "../core/problem/result.ts";
import { nearestName } from "../core/problem/nearestName.ts";
import type { FunctionId } from "./functionTable.ts";
import { kindOfErrors, pValuesAgainst } from "./kinds.ts";
import { isMissing } from "./rawCells.ts";
import { written } from "./readSettings.ts";

/** What a function replies: a rectangle, a problem, or word that what was asked for does not apply here. */
export type Reply = Result<Grid> | { readonly ok: false; readonly notApplicable: string };

/** The values of a call by the names of its parameters; what was left out is null. */
export type CallValues = Readonly<Record<string, unknown>>;

/** What each function over data shows of the answer. */
export const replies = {
  ANSWER: (answer) => success(answerTable(answer)),
  VERDICT: (answer, { driver }) =>
    isMissing(driver) ? success(column(verdictLines(answer))) : sentence(answer, driver),
  CHOICE: (answer) => success([[choiceText(answer)]]),
  EVIDENCE: (answer, { test }) => (isMissing(test) ? success(evidenceTable(answer)) : oneTest(answer, written(test))),
  COEFFICIENTS: (answer) => success(column(answer.coefficients)),
  ERRORS: (answer, { kind }) => {
    const found = kindOfErrors(answer, kind);
    return found.ok ? success(column(found.value.table.standardErrors)) : found;
  },
  PVALUES: (answer, { kind, against }) => {
    const found = kindOfErrors(answer, kind);
    if (!found.ok) return found;
    const pValues = pValuesAgainst(answer, found.value.table, against);
    return pValues.ok ? success(column(pValues.value)) : pValues;
  },
  INTERVALS: (answer, { kind }) => {
    const found = kindOfErrors(answer, kind);
    if (!found.ok) return found;
    const { low, high } = found.value.table;
    return success(low.map((from, row) => [from, high[row]!]));
  },
} satisfies Partial<Record<FunctionId, (answer: Answer, values: CallValues) => Reply>>;

/** What the other functions reply, without data. */
export const plainReplies = {
  SETTINGS: (): Reply =>
    success([
      ["setting", "values", "when left out", "meaning"],
      ...settingTable.map(({ name, values, standard, meaning }) => [name, values, standard, meaning]),
    ]),
  LAGS: ({ rows, rule }: CallValues) => lags(rows, isMissing(rule) ? "careful" : written(rule)),
} satisfies Partial<Record<FunctionId, (values: CallValues) => Reply>>;

const column = (values: readonly (string | number)[]): Grid => values.map((value) => [value]);

function sentence(answer: Answer, driver: unknown): Reply {
  const wanted = written(driver).trim();
  const drivers = answer.drivers.filter((entry) => entry.sentence !== null);
  const found =
    drivers.find(({ term }) => term.toLowerCase() === wanted.toLowerCase()) ??
    (typeof driver === "number" ? drivers[driver - 1] : undefined);
  if (found !== undefined) return success([[found.sentence ?? ""]]);
  const names = drivers.map(({ term }) => term);
  const nearest = nearestName(wanted, names);
  return failure({ code: "unknown-heading", heading: wanted, nearest, where: "the drivers" });
}

/** Statistic, degrees of freedom and p-value, a row an order where the test has orders. */
function oneTest({ tests }: Answer, wanted: string): Reply {
  const plain = (name: string): string =>
    name
      .trim()
      .toLowerCase()
      .replaceAll(/[\s_]+/g, "-");
  const found = tests.filter(({ test }) => test === plain(wanted));
  if (found.length === 0) {
    const allowed = [...new Set(tests.map(({ test }) => test))];
    const nearest = nearestName(plain(wanted), allowed);
    return failure({ code: "unknown-value", setting: "test", value: wanted, allowed, nearest });
  }
  const computed = found.filter(isComputed);
  if (computed.length > 0) return success(computed.map(figures));
  const because = found.flatMap((outcome) => (isComputed(outcome) ? [] : [outcome.because]));
  return { ok: false, notApplicable: `The test does not apply: ${because[0] ?? ""}` };
}

type Computed = Extract<TestOutcome, { kind: "computed" }>;

const isComputed = (outcome: TestOutcome): outcome is Computed => outcome.kind === "computed";

const figures = ({ figure }: Computed): (string | number)[] => [
  figure.statistic,
  figure.df.length === 1 ? (figure.df[0] ?? "") : figure.df.join(", "),
  figure.pValue,
];

const readRule = readOneOf("careful", "thumb", "cube root");

function lags(rows: unknown, rule: string): Reply {
  if (typeof rows !== "number" || !Number.isInteger(rows) || rows < 1) {
    return failure({ ...notUnderstood, setting: "rows", value: written(rows), allowed: ["a whole number above 0"] });
  }
  const known = readRule(rule);
  if (!isNotUnderstood(known)) return success([[lagsForRows(rows, known)]]);
  const nearest = nearestName(rule, known.allowed);
  return failure({ ...notUnderstood, setting: "rule", value: rule, allowed: known.allowed, nearest });
}

const notUnderstood = { code: "unknown-value", nearest: null } as const;
