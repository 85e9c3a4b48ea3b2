import type { ErrorsChoice } from "../covariance/choice.ts";
import { covarianceOf } from "../covariance/covarianceOf.ts";
import { buildDesign } from "../design/buildDesign.ts";
import type { Fit } from "../fit/fit.ts";
import { fitLeastSquares } from "../fit/fitLeastSquares.ts";
import { type JointOutcome, type Restrictions, jointTest } from "../inference/joint.ts";
import { type Prediction, type PredictionSettings, predict } from "../inference/predict.ts";
import { type Result, success } from "../problem/result.ts";
import type { Source } from "../table/source.ts";
import { type NewRows, readNewRows } from "./newRows.ts";
import type { Question } from "./question.ts";

/** What may be asked of a fit beyond its answer; `errors` is the kind of standard errors, with its settings. */
export type Inquiry =
  | { readonly kind: "row by row" }
  | { readonly kind: "covariance"; readonly errors: ErrorsChoice }
  | { readonly kind: "joint test"; readonly errors: ErrorsChoice; readonly restrictions: Restrictions }
  | {
      readonly kind: "predictions";
      readonly errors: ErrorsChoice;
      readonly settings: PredictionSettings;
      /** New rows: one column a driver, named as the drivers are. */
      readonly rows: Source;
    };

export type Finding =
  | {
      readonly kind: "row by row";
      /** One a source row; 0 where the row was left out. */
      readonly fitted: Float64Array<ArrayBuffer>;
      readonly residuals: Float64Array<ArrayBuffer>;
      /** 1 where the row was used. */
      readonly used: Uint8Array<ArrayBuffer>;
    }
  | { readonly kind: "covariance"; readonly rows: readonly (readonly number[])[] }
  | { readonly kind: "joint test"; readonly outcome: JointOutcome }
  /** null for a new row that lacks a driver. */
  | { readonly kind: "predictions"; readonly rows: readonly (Prediction | null)[]; readonly noSingle: string | null }
  | { readonly kind: "not-applicable"; readonly because: string };

/**
 * Fits the question's regression and looks up what else is asked of it.
 * @returns Problems of the data, the fit and the covariance as they are found.
 */
export function inquire({ source, model }: Omit<Question, "options">, inquiry: Inquiry): Result<Finding> {
  const design = buildDesign(source, model);
  if (!design.ok) return design;
  const fitted = fitLeastSquares(design.value);
  if (!fitted.ok) return fitted;
  const fit = fitted.value;
  if (inquiry.kind === "row by row") return success(rowByRow(fit, source.rowCount));
  const found = covarianceOf(fit, inquiry.errors);
  if (!found.ok) return found;
  const covariance = found.value;
  switch (inquiry.kind) {
    case "covariance": {
      const { size, values } = covariance.matrix;
      const rows = Array.from({ length: size }, (_, i) => [...values.subarray(i * size, (i + 1) * size)]);
      return success({ kind: "covariance", rows });
    }
    case "joint test":
      return success({ kind: "joint test", outcome: jointTest(fit, covariance, inquiry.restrictions) });
    case "predictions": {
      const read = readNewRows(inquiry.rows, fit.design, model);
      if (!read.ok) return read;
      if (read.value.kind === "not-applicable") return success(read.value);
      return success({ kind: "predictions", ...predicted({ fit, covariance }, read.value.rows, inquiry.settings) });
    }
  }
}

/** Rows that lack a driver are left blank. */
function predicted(
  from: Parameters<typeof predict>[0],
  rows: NewRows,
  settings: PredictionSettings,
): { readonly rows: readonly (Prediction | null)[]; readonly noSingle: string | null } {
  const whole = rows.filter((row) => row !== null);
  const found = predict(from, whole, settings);
  const inTurn = found.rows[Symbol.iterator]();
  return {
    rows: rows.map((row) => (row === null ? null : (inTurn.next().value ?? null))),
    noSingle: found.noSingle,
  };
}

/** Brings residuals and fitted values back from design order to the rows of the source. */
function rowByRow({ design, residuals: found, rowCount }: Fit, sourceRows: number): Finding {
  const fitted = new Float64Array(sourceRows);
  const residuals = new Float64Array(sourceRows);
  const used = new Uint8Array(sourceRows);
  for (let i = 0; i < rowCount; i++) {
    const row = design.sourceRows[i]!;
    used[row] = 1;
    residuals[row] = found[i]!;
    fitted[row] = design.outcome.values[i]! - found[i]!;
  }
  return { kind: "row by row", fitted, residuals, used };
}
