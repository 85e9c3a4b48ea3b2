import jstat from "jstat";
import { incompleteBeta, incompleteGamma, type Sides } from "./specialFunctions.ts";

/**
 * Tails, lower tails and quantiles of the normal, t, F and chi-square laws, to a relative error below 1e-10 for
 * probabilities from 1e-300 to 0.999 and 1 to 1e6 degrees of freedom, whole or not. A tail is computed as a tail,
 * never as one minus the other side.
 */

/** P(Z > z). */
export function normalTail(z: number): number {
  const { lower, upper } = incompleteGamma(0.5, (z * z) / 2);
  return z >= 0 ? upper / 2 : 0.5 + lower / 2;
}

/** P(Z <= z). */
export const normalCdf = (z: number): number => normalTail(-z);

/** P(|Z| > |z|). */
export const normalTwoSided = (z: number): number => incompleteGamma(0.5, (z * z) / 2).upper;

/** P(|T| > |t|), T with `df` degrees of freedom. */
export function tTwoSided(t: number, df: number): number {
  const size = Math.abs(t);
  // Beyond this point t^2 may overflow, and the tail is a pure power of t to the last digit.
  const far = 1e140;
  if (size > far) return Math.pow(far / size, df) * tSides(far, df).upper;
  return tSides(size, df).upper;
}

/** P(T > t). */
export function tTail(t: number, df: number): number {
  return t >= 0 ? tTwoSided(t, df) / 2 : 1 - tTwoSided(t, df) / 2;
}

/** P(F > f). */
export const fTail = (f: number, df1: number, df2: number): number => fSides(f, df1, df2).upper;

/** P(X > x), X chi-square. */
export const chiSquareTail = (x: number, df: number): number => incompleteGamma(df / 2, x / 2).upper;

/** The z with P(Z <= z) = p, for p in (0, 1). */
export function normalQuantile(p: number): number {
  if (p === 0.5) return 0;
  const twoTails = 2 * Math.min(p, 1 - p);
  const start = moderate(p) ? Math.abs(jstat.normal.inv(p, 0, 1)) : 1;
  const size = solve({ upper: twoTails }, start, (z) => twice(incompleteGamma(0.5, (z * z) / 2)));
  return p < 0.5 ? -size : size;
}

/** The t with P(T <= t) = p, for p in (0, 1). */
export function tQuantile(p: number, df: number): number {
  if (p === 0.5) return 0;
  const twoTails = 2 * Math.min(p, 1 - p);
  const size = tSize(twoTails, df, moderate(p) ? Math.abs(jstat.studentt.inv(p, df)) : 1);
  return p < 0.5 ? -size : size;
}

/** The f with P(F <= f) = p, for p in (0, 1). */
export function fQuantile(p: number, df1: number, df2: number): number {
  return solve(nearerSide(p), moderate(p) ? jstat.centralF.inv(p, df1, df2) : 1, (f) => fSides(f, df1, df2));
}

/** The x with P(X <= x) = p, for p in (0, 1). */
export function chiSquareQuantile(p: number, df: number): number {
  return solve(nearerSide(p), moderate(p) ? jstat.chisquare.inv(p, df) : df, (x) => incompleteGamma(df / 2, x / 2));
}

/** |T|: the odds t^2 / df keep both sides exact where df is large. */
const tSides = (size: number, df: number): Sides => twice(incompleteBeta(0.5, df / 2, (size / df) * size));

const fSides = (f: number, df1: number, df2: number): Sides =>
  incompleteBeta(df1 / 2, df2 / 2, Math.max(0, f * (df1 / df2)));

/** The slope by ln t where the sides are functions of t^2. */
const twice = ({ lower, upper, slope }: Sides): Sides => ({ lower, upper, slope: 2 * slope });

/** Where jstat's quantiles are sound enough to start from. */
const moderate = (p: number): boolean => p >= 0.001 && p <= 0.999;

type Target = { readonly lower: number } | { readonly upper: number };

/** 1 - p is exact from a half on, so each half is solved on the side where it is small. */
const nearerSide = (p: number): Target => (p <= 0.5 ? { lower: p } : { upper: 1 - p });

function tSize(twoTails: number, df: number, start: number): number {
  const far = 1e140;
  const beyond = tTwoSided(far, df);
  if (twoTails < beyond) return far * Math.pow(beyond / twoTails, 1 / df);
  return solve({ upper: twoTails }, start, (t) => tSides(t, df));
}

/**
 * Newton's method on the logarithm of the side, as a function of ln x. Both sides of all four laws are
 * log-concave in ln x, so it converges from any start, after one step at most on the wrong side; a step so far
 * that the side is no longer a double is halved.
 */
function solve(target: Target, start: number, sidesAt: (x: number) => Sides): number {
  let sound = Math.log(start > 0 && start < Infinity ? start : 1);
  let logarithm = sound;
  for (let step = 0; step < mostSteps; step++) {
    const sides = sidesAt(Math.exp(logarithm));
    const change = newtonStep(target, sides);
    if (change === null) {
      logarithm = (sound + logarithm) / 2;
      continue;
    }
    sound = logarithm;
    logarithm += Math.max(-300, Math.min(300, change));
    if (Math.abs(change) < 1e-15) break;
  }
  return Math.exp(logarithm);
}

/** The step in ln x, or null where the side or its slope has left the range of doubles. */
function newtonStep(target: Target, { lower, upper, slope }: Sides): number | null {
  const [side, goal, sign] = "upper" in target ? [upper, target.upper, 1] : [lower, target.lower, -1];
  if (side < Number.MIN_VALUE / Number.EPSILON || slope === 0) return null;
  return (sign * Math.log(side / goal) * side) / slope;
}

/** A few dozen are used at the most; it ends where rounding makes the last step waver. */
const mostSteps = 200;
