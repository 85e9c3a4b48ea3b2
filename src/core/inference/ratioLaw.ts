import { normalQuantile, normalTwoSided, tQuantile, tTail, tTwoSided, normalTail } from "../numeric/distributions.ts";
import { fixedBStretch } from "./fixedB.ts";
import { bracketedRoot } from "../numeric/bracketedRoot.ts";
import type { Reference } from "./reference.ts";

/** Which side of the null value counts as evidence against it. */
export type Side = "both" | "above" | "below";

/** A law for several ratios, and where each has t degrees of freedom of its own, those. */
export interface Laws {
  readonly reference: Reference;
  readonly degreesOfFreedom?: ArrayLike<number>;
}

/** The law of one of the ratios: degrees of freedom of its own take the place of a t reference's. */
export function lawAt({ reference, degreesOfFreedom }: Laws, place: number): Reference {
  const own = degreesOfFreedom?.[place];
  return reference.law === "t" && own !== undefined ? { law: "t", degreesOfFreedom: own } : reference;
}

/**
 * Two-sided p-value of a ratio, P(|T| > |ratio|) under the reference law.
 * Under "fixed-b" it is the level at which the ratio is just critical: p < level if and only if
 * |ratio| > criticalValue(level, reference).
 * @param ratio - (b - b0) / se, finite.
 * @returns p in [0, 1].
 */
export function pValueOf(ratio: number, reference: Reference): number {
  const size = Math.abs(ratio);
  switch (reference.law) {
    case "normal":
      return normalTwoSided(size);
    case "t":
      return tTwoSided(size, reference.degreesOfFreedom);
    case "fixed-b":
      return fixedBTwoSided(size, reference);
  }
}

/**
 * The size of ratio that is just critical two-sided at `level`.
 * @param level - two-sided, in (0, 1): 0.05 for 95 % intervals.
 */
export function criticalValue(level: number, reference: Reference): number {
  switch (reference.law) {
    case "normal":
      return -normalQuantile(level / 2);
    case "t":
      return -tQuantile(level / 2, reference.degreesOfFreedom);
    case "fixed-b":
      return stretching(reference)(-tQuantile(level / 2, reference.degreesOfFreedom));
  }
}

/**
 * One-sided p-value: "above" takes large ratios as evidence against the null value, "below" small ones.
 * All three laws are symmetric about zero.
 */
export function sidedPValueOf(ratio: number, reference: Reference, side: Side): number {
  if (side === "both") return pValueOf(ratio, reference);
  const signed = side === "above" ? ratio : -ratio;
  if (reference.law === "normal") return normalTail(signed);
  if (reference.law === "t") return tTail(signed, reference.degreesOfFreedom);
  const half = pValueOf(signed, reference) / 2;
  return signed >= 0 ? half : 1 - half;
}

type FixedB = Extract<Reference, { law: "fixed-b" }>;

/** Quantiles of t made wide enough for an estimated long-run variance: the fixed-b critical value at the same level. */
function stretching({ b, degreesOfFreedom }: FixedB): (t: number) => number {
  const stretch = fixedBStretch(b);
  return (t) => t * stretch(normalSizeOf(tTwoSided(t, degreesOfFreedom)));
}

/** Beyond this a ratio's square would not be a number any more; its p-value is taken here. */
const largestRatio = 1e150;

/** The t whose stretched value is the ratio found, and its tail. The stretch is never below one. */
function fixedBTwoSided(ratio: number, reference: FixedB): number {
  if (ratio === 0) return 1;
  const size = Math.min(ratio, largestRatio);
  const stretched = stretching(reference);
  const t = bracketedRoot((candidate) => stretched(candidate) - size, [0, size]);
  return tTwoSided(t, reference.degreesOfFreedom);
}

/** The normal critical value of a two-sided level, held to the levels that a double can halve. */
const normalSizeOf = (level: number): number => -normalQuantile(Math.max(level, 1e-300) / 2);
