import type { Covariance } from "../covariance/choice.ts";
import type { Fit } from "../fit/fit.ts";
import { type Estimate, type Estimation, combinationOf, ratioOf } from "../inference/functionOf.ts";
import type { Restrictions } from "../inference/joint.ts";
import type { Side } from "../inference/ratioLaw.ts";
import type { Reference } from "../inference/reference.ts";
import { type Result, success } from "../problem/result.ts";
import type { Options } from "./options.ts";
import { coefficientsOf, readEstimates, readJointTest } from "./readAsked.ts";

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
