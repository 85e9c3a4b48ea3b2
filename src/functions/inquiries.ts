import type { Answer } from "../core/answer/answer.ts";
import type { Finding, Inquiry } from "../core/answer/inquire.ts";
import type { Grid } from "../core/answer/tables.ts";
import type { Prediction } from "../core/inference/predict.ts";
import { type Result, failure, success } from "../core/problem/result.ts";
import type { FunctionId } from "./functionTable.ts";
import { kindOfErrors } from "./kinds.ts";
import type { CalledData } from "./readData.ts";
import { readNewRows } from "./readNewRows.ts";
import { readRestrictions } from "./readRestrictions.ts";
import type { CallValues, Reply } from "./replies.ts";

/** What a call is about: its answer, its data and its values. */
export interface Called {
  readonly answer: Answer;
  readonly data: CalledData;
  readonly values: CallValues;
}

/** A function that needs more than the answer: what it asks for, and how it shows what was found. */
interface Asking {
  readonly ask: (called: Called) => Result<Inquiry>;
  readonly show: (finding: Finding, called: Called) => Reply;
}

/** Functions that look beyond the answer. */
export const inquiries = {
  RESIDUALS: { ask: rowByRow, show: (finding, called) => columnOf("residuals", finding, called) },
  FITTED: { ask: rowByRow, show: (finding, called) => columnOf("fitted", finding, called) },
  COVARIANCE: {
    ask: ({ answer, values }) => {
      const kind = kindOfErrors(answer, values["kind"]);
      return kind.ok ? success({ kind: "covariance", errors: kind.value.errors }) : kind;
    },
    show: (finding) => (finding.kind === "covariance" ? success(finding.rows) : unexpected(finding)),
  },
  JOINT: {
    ask: ({ answer, values }) => {
      const kind = kindOfErrors(answer, values["kind"]);
      if (!kind.ok) return kind;
      const restrictions = readRestrictions(values, answer.terms);
      if (!restrictions.ok) return restrictions;
      return success({ kind: "joint test", errors: kind.value.errors, restrictions: restrictions.value });
    },
    show: (finding) => (finding.kind === "joint test" ? jointFigures(finding.outcome) : unexpected(finding)),
  },
  PREDICT: {
    ask: ({ answer, data, values }) => {
      const kind = kindOfErrors(answer, values["kind"]);
      if (!kind.ok) return kind;
      const rows = readNewRows(values["rows"], data.parts.drivers);
      if (!rows.ok) return rows;
      const { errors, table } = kind.value;
      const { spread } = answer.decision.fourCase;
      const settings = { reference: table.reference, level: answer.options.level, spread };
      return success({ kind: "predictions", errors, settings, rows: rows.value });
    },
    show: (finding, { values, data, answer }) => {
      if (finding.kind !== "predictions") return unexpected(finding);
      const { predictFor } = answer.options;
      if (predictFor === "single row" && finding.noSingle !== null) {
        return { ok: false, notApplicable: finding.noSingle };
      }
      const rows = readNewRows(values["rows"], data.parts.drivers);
      const headed = rows.ok && rows.value.columns.some(({ place }) => place.firstRow === 1);
      return success([
        ...(headed ? [["value", "low", "high"]] : []),
        ...finding.rows.map((row) => predictionCells(row, predictFor)),
      ]);
    },
  },
} satisfies Partial<Record<FunctionId, Asking>>;

function unexpected(finding: Finding): Reply {
  if (finding.kind === "not-applicable") return { ok: false, notApplicable: finding.because };
  throw new Error(`An inquiry was answered with ${finding.kind}.`);
}

/** Excel passes results of a function on in pieces of two million characters; a number takes up to 24. */
const mostRowsBack = 80_000;

function rowByRow({ data }: Called): Result<Inquiry> {
  const { rowCount } = data.source;
  return rowCount > mostRowsBack
    ? failure({ code: "too-much-for-excel", cells: rowCount, limit: mostRowsBack })
    : success({ kind: "row by row" });
}

/** As tall as the data, blank where a row was left out, under a heading where the data have headings. */
function columnOf(of: "residuals" | "fitted", finding: Finding, { data }: Called): Reply {
  if (finding.kind !== "row by row") return unexpected(finding);
  const { used, [of]: values } = finding;
  const headed = data.source.columns[0]?.place.firstRow === 1;
  const rows = Array.from(values, (value, row) => [used[row] === 1 ? value : ""]);
  return success(headed ? [[of], ...rows] : rows);
}

function predictionCells(prediction: Prediction | null, predictFor: Answer["options"]["predictFor"]): Grid[number] {
  if (prediction === null) return ["", "", ""];
  const { low, high } = predictFor === "mean" ? prediction : (prediction.single ?? prediction);
  return [prediction.value, low, high];
}

function jointFigures(outcome: Extract<Finding, { kind: "joint test" }>["outcome"]): Reply {
  if (outcome.kind === "not-applicable")
    return { ok: false, notApplicable: `The test does not apply: ${outcome.because}` };
  const { statistic, df, pValue } = outcome.figure;
  return success([[statistic, df.length === 1 ? (df[0] ?? "") : df.join(", "), pValue]]);
}
