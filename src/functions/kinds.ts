import type { Answer } from "../core/answer/answer.ts";
import { readErrors } from "../core/answer/settingReaders.ts";
import { isNotUnderstood } from "../core/answer/settingSpec.ts";
import type { ErrorsChoice } from "../core/covariance/choice.ts";
import { whiteErrors } from "../core/decision/wish.ts";
import type { InferenceTable } from "../core/inference/inference.ts";
import { lawAt, pValueOf } from "../core/inference/ratioLaw.ts";
import { nearestName } from "../core/problem/nearestName.ts";
import { type Result, failure, success } from "../core/problem/result.ts";
import { isMissing, plainValue, rawCells } from "./rawCells.ts";
import { written } from "./readSettings.ts";

/** One kind of standard errors as the answer has it: the choice with its settings, and the inference under it. */
export interface KindOfErrors {
  readonly errors: ErrorsChoice;
  readonly table: InferenceTable;
}

/**
 * The kind of standard errors asked for; by tests where none is.
 * @returns Problem "unknown-value", or "errors-need-order" where the kind does not fit what rows are.
 */
export function kindOfErrors(answer: Answer, kind: unknown): Result<KindOfErrors> {
  const value = isMissing(kind) ? "by tests" : written(kind);
  const asked = readErrors(value);
  if (isNotUnderstood(asked)) {
    const { allowed } = asked;
    return failure({ code: "unknown-value", setting: "kind", value, allowed, nearest: nearestName(value, allowed) });
  }
  const { inference, decision, rows } = answer;
  if (asked === "by tests") return success({ errors: decision.inForce.errors, table: inference.inForce });
  const table = {
    classical: inference.classical,
    white: inference.white,
    "newey-west": inference.neweyWest,
    grouped: inference.grouped,
  }[asked];
  if (table === null) return failure({ code: "errors-need-order", errors: asked, rows: rows.kind });
  return success({ errors: choiceOf(asked, answer), table });
}

/** The settings that the answer's own table of a kind was made with. */
function choiceOf(kind: ErrorsChoice["kind"], { options, lags }: Answer): ErrorsChoice {
  switch (kind) {
    case "classical":
      return { kind };
    case "white":
      return whiteErrors(options.whiteVersion);
    case "newey-west":
      return { kind, lags: { kind: "given", lags: lags ?? 0 }, adjusted: options.adjusted };
    case "grouped":
      return { kind, version: options.groupedVersion };
  }
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
  if (rawCells(against).flat().every(isMissing)) return success(table.pValue);
  const values = numbersFor("against", against, coefficients.length);
  if (!values.ok) return values;
  return success(
    coefficients.map((coefficient, row) =>
      pValueOf((coefficient - values.value[row]!) / table.standardErrors[row]!, lawAt(table, row)),
    ),
  );
}

/**
 * Numbers of an argument: as many as are needed, or one that stands for all.
 * @returns Problem "unknown-value" for anything else.
 */
export function numbersFor(name: string, argument: unknown, needed: number): Result<readonly number[]> {
  const cells = rawCells(argument).flat();
  const numbers = cells.map(plainValue).filter((value) => typeof value === "number");
  if (numbers.length === cells.length && numbers.length === needed) return success(numbers);
  if (numbers.length === cells.length && numbers.length === 1) return success(Array(needed).fill(numbers[0]));
  const allowed = needed === 1 ? ["one number"] : ["one number", `${needed} numbers`];
  return failure({
    code: "unknown-value",
    setting: name,
    value: cells.map(written).join(", "),
    allowed,
    nearest: null,
  });
}
