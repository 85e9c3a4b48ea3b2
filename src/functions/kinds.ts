import type { Answer } from "../core/answer/answer.ts";
import { isNotUnderstood } from "../core/answer/settingTable.ts";
import { readErrors } from "../core/answer/settingReaders.ts";
import type { InferenceTable } from "../core/inference/inference.ts";
import { pValueOf } from "../core/inference/ratioLaw.ts";
import { nearestName } from "../core/problem/nearestName.ts";
import { type Result, failure, success } from "../core/problem/result.ts";
import { isMissing, plainValue, rawCells } from "./rawCells.ts";
import { written } from "./readSettings.ts";

/**
 * The inference under the kind of standard errors asked for; by tests where none is.
 * @returns Problem "unknown-value", or "errors-need-order" where the kind does not fit what rows are.
 */
export function inferenceOfKind({ inference, rows }: Answer, kind: unknown): Result<InferenceTable> {
  const value = isMissing(kind) ? "by tests" : written(kind);
  const errors = readErrors(value);
  if (isNotUnderstood(errors)) {
    const { allowed } = errors;
    return failure({ code: "unknown-value", setting: "kind", value, allowed, nearest: nearestName(value, allowed) });
  }
  const table = {
    "by tests": inference.inForce,
    classical: inference.classical,
    white: inference.white,
    "newey-west": inference.neweyWest,
    grouped: inference.grouped,
  }[errors];
  return table === null ? failure({ code: "errors-need-order", errors, rows: rows.kind }) : success(table);
}

/**
 * Two-sided p-values against given values: one for all coefficients, or one a coefficient; without any, the answer's own.
 * @returns Problem "unknown-value" where the values are no numbers or not as many as there are coefficients.
 */
export function pValuesAgainst(
  { coefficients }: Answer,
  table: InferenceTable,
  against: unknown,
): Result<readonly number[]> {
  const values = rawCells(against).flat().map(plainValue);
  if (values.length === 0) return success(table.pValue);
  const numbers = values.filter((value) => typeof value === "number");
  const fits = numbers.length === 1 || numbers.length === coefficients.length;
  if (numbers.length < values.length || !fits) {
    const allowed = ["one number", `${coefficients.length} numbers`];
    const value = values.map((one) => written(one)).join(", ");
    return failure({ code: "unknown-value", setting: "against", value, allowed, nearest: null });
  }
  return success(
    coefficients.map((coefficient, row) => {
      const ratio = (coefficient - (numbers[row] ?? numbers[0] ?? 0)) / (table.standardErrors[row] ?? 1);
      return pValueOf(ratio, table.reference);
    }),
  );
}
