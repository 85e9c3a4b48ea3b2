import type { Covariance } from "../covariance/choice.ts";
import type { Design } from "../design/design.ts";
import type { Fit } from "../fit/fit.ts";
import { type Estimate, type Estimation, combinationOf, ratioOf } from "../inference/functionOf.ts";
import type { Restrictions } from "../inference/joint.ts";
import type { Side } from "../inference/ratioLaw.ts";
import type { Reference } from "../inference/reference.ts";
import { type Result, failure, success } from "../problem/result.ts";
import { type Coefficients, type Expression, type TermName, type Vocabulary, readExpression } from "./expression.ts";
import type { Options } from "./options.ts";

/** A number that was asked for, made of the coefficients; null where it divides by exactly zero. */
export interface AskedEstimate {
  readonly text: string;
  readonly against: number;
  readonly side: Side;
  readonly estimate: Estimate | null;
}

/** What the tests and intervals of what was asked are made with. */
export interface InForce {
  readonly covariance: Covariance;
  readonly reference: Reference;
}

/**
 * The numbers that the setting "estimates" asks for, under the standard errors in force; quotients by the delta method.
 * @returns Problems of the expressions.
 */
export function askedEstimates(
  fit: Fit,
  { covariance, reference }: InForce,
  { estimates, level }: Pick<Options, "estimates" | "level">,
): Result<readonly AskedEstimate[]> {
  const read = readEstimates(coefficientsOf(fit.design), estimates);
  if (!read.ok) return read;
  return success(
    read.value.map(({ text, above, below, against, side }) => {
      const estimation: Estimation = { fit, covariance, settings: { reference, against, side, level } };
      const estimate = below === null ? combinationOf(estimation, above) : ratioOf(estimation, above, below);
      return { text, against, side, estimate };
    }),
  );
}

/** Restrictions on the coefficients, all to be tested at once, and their texts. */
export interface AskedRestrictions extends Restrictions {
  readonly texts: readonly string[];
}

/**
 * The restrictions that the setting "joint test" asks for.
 * @returns null where none are; Problems of the expressions, "unknown-value" for one that is not linear or looks to one side.
 */
export function askedRestrictions(
  { design }: Fit,
  { jointTest }: Pick<Options, "jointTest">,
): Result<AskedRestrictions | null> {
  if (jointTest.length === 0) return success(null);
  const read = readJointTest(coefficientsOf(design), jointTest);
  if (!read.ok) return read;
  return success({
    texts: read.value.map(({ text }) => text),
    weights: read.value.map(({ above }) => above.weights),
    equals: read.value.map(({ above, against }) => against - above.offset),
  });
}

/**
 * Reads what the setting "estimates" asks for.
 * @returns Problems of the expressions.
 */
export const readEstimates = (coefficients: Coefficients, texts: readonly string[]): Result<readonly Expression[]> =>
  expressionsOf({ ...coefficients, setting: "estimates" }, texts);

/**
 * Reads the equations of the setting "joint test".
 * @returns Problems of the expressions, "unknown-value" for one that is not linear or looks to one side.
 */
export function readJointTest(coefficients: Coefficients, texts: readonly string[]): Result<readonly Expression[]> {
  const read = expressionsOf({ ...coefficients, setting: "joint test" }, texts);
  if (!read.ok) return read;
  const strange = read.value.find(({ below, side }) => below !== null || side !== "both");
  if (strange === undefined) return read;
  const allowed = ["sums of coefficients, each equal to a number or another sum, such as Price = 0"];
  return failure({ code: "unknown-value", setting: "joint test", value: strange.text, allowed, nearest: null });
}

function expressionsOf(vocabulary: Vocabulary, texts: readonly string[]): Result<readonly Expression[]> {
  const found: Expression[] = [];
  for (const text of texts) {
    const read = readExpression(text, vocabulary);
    if (!read.ok) return read;
    found.push(read.value);
  }
  return success(found);
}

/** What expressions may speak of in a design. */
export const coefficientsOf = (design: Design): Coefficients => ({
  names: namesOf(design),
  size: design.terms.length,
});

/** Terms go by their own names, and by their column's where one term alone is made of it. */
function namesOf({ terms }: Design): TermName[] {
  const own = terms.map(({ name }, term) => ({ name, term }));
  const columns = terms.flatMap(({ meaning }, term) =>
    meaning.kind === "number" ? [{ name: meaning.column, term }] : [],
  );
  const single = columns.filter(
    ({ name }) =>
      columns.filter((other) => other.name === name).length === 1 && !own.some((other) => other.name === name),
  );
  return [...own, ...single];
}
