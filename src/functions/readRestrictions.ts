import type { Restrictions } from "../core/inference/joint.ts";
import { type Result, failure, success } from "../core/problem/result.ts";
import { numbersFor } from "./kinds.ts";
import { isMissing, plainValue, rawCells, widthOf } from "./rawCells.ts";
import type { CallValues } from "./replies.ts";

/**
 * Linear restrictions: a row of weights each, one weight a coefficient in the order of ANSWER. Where the weights leave
 * out the constant, its weight is zero. Values they are to equal: one each, or one for all; 0 where none is given.
 * @returns Problem "unknown-value" where weights or values are no numbers or not as many as needed.
 */
export function readRestrictions(values: CallValues, terms: readonly string[]): Result<Restrictions> {
  const cells = rawCells(values["weights"]);
  const without = widthOf(cells) === terms.length - 1 && terms[0] === "constant";
  const weights = cells.map((row) => [...(without ? [0] : []), ...row.map(plainValue)]);
  if (cells.length === 0 || !weights.every((row) => isNumbers(row) && row.length === terms.length)) {
    const value = `${cells.length} by ${widthOf(cells)} cells`;
    const allowed = [`numbers in ${terms.length} columns, one a coefficient (${terms.join(", ")})`];
    return failure({ code: "unknown-value", setting: "weights", value, allowed, nearest: null });
  }
  const given = values["equals"];
  const equals = isMissing(given) ? success(weights.map(() => 0)) : numbersFor("equals", given, weights.length);
  return equals.ok ? success({ weights: weights as number[][], equals: equals.value }) : equals;
}

const isNumbers = (row: readonly unknown[]): boolean => row.every((cell) => typeof cell === "number");
