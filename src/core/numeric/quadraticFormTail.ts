import { bracketedRoot } from "./bracketedRoot.ts";

/** Relative change between one halving of the step and the next at which the integral is taken as found. */
const tolerance = 1e-13;
/** Steps of the trapezoidal rule in the transformed variable: from 1/8, halved while the integral still changes. */
const firstStep = 1 / 8;
const mostHalvings = 7;
/** exp(pi/2 sinh 4.4) = 1e27: the integrand, which falls at least as u^(-3/2), is spent there. */
const range = 4.4;

/**
 * P(sum of w_j z_j^2 > 0), z_j independent standard normal: the law of a ratio of quadratic forms.
 * The inversion integral of Imhof's problem is taken along the line through the saddlepoint, where nothing cancels, so
 * that the relative error stays below 1e-10 for tails as small as the doubles hold; double exponential trapezoidal rule.
 * @param weights - any number of them, any signs; zeros are of no consequence.
 * @see Imhof (1961), Biometrika 48, 419-426; Rice (1980), SIAM J. Sci. Stat. Comput. 1, 438-448.
 */
export function quadraticFormTail(weights: Float64Array): number {
  const largest = weights.reduce((most, w) => Math.max(most, w), 0);
  if (largest === 0) return 0;
  if (!weights.some((w) => w < 0)) return 1;
  const shift = saddlepoint(weights, 1 / (2 * largest));
  const scaled = weights.map((w) => (2 * w) / (1 - 2 * w * shift));
  const height = weights.reduce((sum, w) => sum - Math.log1p(-2 * w * shift) / 2, 0) - Math.log(shift);
  const curvature = scaled.reduce((sum, a) => sum + (a * a) / 2, 1 / (shift * shift));
  const integral = alongLine({ scaled, shift, width: 1 / Math.sqrt(curvature) });
  return Math.exp(height + Math.log(integral / Math.PI));
}

/** Where K(s) - log s is least, K the cumulant generating function of the sum, 0 < s < 1 / (2 max w). */
function saddlepoint(weights: Float64Array, end: number): number {
  const slope = (s: number): number => weights.reduce((sum, w) => sum + w / (1 - 2 * w * s), 0) - 1 / s;
  // The slope runs from minus to plus infinity; any line near the saddlepoint does, so the ends need no more care.
  const nearEnd = end * (1 - 1e-12);
  return slope(nearEnd) <= 0 ? nearEnd : bracketedRoot(slope, [end * 1e-12, nearEnd]);
}

interface Line {
  readonly scaled: Float64Array;
  readonly shift: number;
  readonly width: number;
}

function alongLine(line: Line): number {
  let step = firstStep;
  let sum = atSteps(line, 0, step);
  for (let halving = 0; halving < mostHalvings; halving++) {
    const finer = (sum + atSteps(line, step / 2, step)) / 2;
    const settled = Math.abs(finer - sum) <= tolerance * finer;
    sum = finer;
    step /= 2;
    if (settled) break;
  }
  return sum;
}

/** Trapezoidal sum over u = width exp(pi/2 sinh t) at t = offset + i step. */
function atSteps({ scaled, shift, width }: Line, offset: number, step: number): number {
  let sum = 0;
  for (let t = offset - Math.ceil(range / step) * step; t <= range; t += step) {
    const u = width * Math.exp((Math.PI / 2) * Math.sinh(t));
    let logSize = -Math.log1p((u / shift) ** 2) / 2;
    let phase = -Math.atan(u / shift);
    for (const a of scaled) {
      const au = a * u;
      logSize -= Math.log1p(au * au) / 4;
      phase += Math.atan(au) / 2;
    }
    sum += Math.exp(logSize) * Math.cos(phase) * u * Math.cosh(t);
  }
  return sum * step * (Math.PI / 2);
}
