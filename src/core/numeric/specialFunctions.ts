/**
 * The incomplete beta and gamma functions, both sides at once, so that a tail is never one minus its complement
 * where that would lose digits. The saddle-point form of the leading factor follows Loader (2000), "Fast and
 * accurate computation of binomial probabilities"; the continued fraction of the beta side is that of
 * DiDonato and Morris (1992), ACM Trans. Math. Software 18, 360-373.
 */
export interface Sides {
  readonly lower: number;
  readonly upper: number;
  /** How fast `lower` grows with the logarithm of the argument (of x / y for the beta function). */
  readonly slope: number;
}

/**
 * The regularised incomplete beta function I_x(a, b) and its complement.
 * @param a - first shape, above 0.
 * @param b - second shape, above 0.
 * @param odds - x / (1 - x), from 0 to Infinity; given as odds, neither x nor 1 - x is rounded to 1.
 */
export function incompleteBeta(a: number, b: number, odds: number): Sides {
  const x = odds === Infinity ? 1 : odds / (1 + odds);
  const y = 1 / (1 + odds);
  if (x === 0) return { lower: 0, upper: 1, slope: 0 };
  if (y === 0) return { lower: 1, upper: 0, slope: 0 };
  const slope = betaFactor(a, b, { x, y });
  if (a * y + 1 > b * x + x - y) {
    const lower = slope / betaFraction(a, b, { x, y });
    return { lower, upper: 1 - lower, slope };
  }
  const upper = slope / betaFraction(b, a, { x: y, y: x });
  return { lower: 1 - upper, upper, slope };
}

/**
 * The regularised incomplete gamma functions P(a, x) and Q(a, x).
 * @param a - shape, above 0.
 * @param x - from 0 to Infinity.
 */
export function incompleteGamma(a: number, x: number): Sides {
  if (x <= 0) return { lower: 0, upper: 1, slope: 0 };
  if (x === Infinity) return { lower: 1, upper: 0, slope: 0 };
  const slope = Math.exp(-stirlingError(a) - deviance(a, x, a - x)) * Math.sqrt(a / (2 * Math.PI));
  if (x < a + 1) {
    const lower = slope * gammaSeries(a, x);
    return { lower, upper: 1 - lower, slope };
  }
  const upper = slope * gammaFraction(a, x);
  return { lower: 1 - upper, upper, slope };
}

/** A point between 0 and 1 with its complement, y = 1 - x, both to full precision. */
interface Point {
  readonly x: number;
  readonly y: number;
}

/** x^a y^b / B(a, b), by the saddle point: no large terms that cancel. */
function betaFactor(a: number, b: number, { x, y }: Point): number {
  const n = a + b;
  const distance = a * y - b * x;
  const exponent =
    stirlingError(n) -
    stirlingError(a) -
    stirlingError(b) -
    deviance(a, n * x, distance) -
    deviance(b, n * y, -distance);
  return Math.exp(exponent) * Math.sqrt((a * (b / n)) / (2 * Math.PI));
}

/** The continued fraction f with I_x(a, b) = x^a y^b / (B(a, b) f), by Lentz's method. */
function betaFraction(a: number, b: number, { x, y }: Point): number {
  const lambda = a * y - b * x;
  let value = (a * (lambda + 1)) / (a + 1);
  let c = value;
  let d = 0;
  for (let m = 1; m < mostTerms; m++) {
    const q = a + 2 * m - 1;
    const numerator = (((((a + m - 1) * (a + b + m - 1)) / q) * m * (b - m)) / q) * x * x;
    const denominator = m + (m * (b - m) * x) / q + ((a + m) * (lambda + 1 + m * (1 + y))) / (a + 2 * m + 1);
    d = 1 / (denominator + numerator * d);
    c = denominator + numerator / c;
    value *= c * d;
    if (Math.abs(c * d - 1) < Number.EPSILON) break;
  }
  return value;
}

/** P(a, x) / (x^a e^-x / Gamma(a)) by its power series. */
function gammaSeries(a: number, x: number): number {
  let sum = 1 / a;
  let term = sum;
  for (let n = a + 1; term > sum * 1e-17; n++) {
    term *= x / n;
    sum += term;
  }
  return sum;
}

/** Q(a, x) / (x^a e^-x / Gamma(a)) by Legendre's continued fraction. */
function gammaFraction(a: number, x: number): number {
  let b = x + 1 - a;
  let c = 1e300;
  let d = 1 / b;
  let value = d;
  for (let i = 1; i < mostTerms; i++) {
    const numerator = -i * (i - a);
    b += 2;
    d = 1 / (numerator * d + b);
    c = b + numerator / c;
    value *= c * d;
    if (Math.abs(c * d - 1) < Number.EPSILON) break;
  }
  return value;
}

/** Far above what any shape up to 1e6 needs (a few thousand): keeps a wrong argument from hanging. */
const mostTerms = 100_000;

/** ln Gamma(z) - ((z - 1/2) ln z - z + ln(2 pi) / 2): the error of Stirling's formula. */
function stirlingError(z: number): number {
  let shifted = z;
  let sum = 0;
  for (; shifted < 15; shifted++) sum += stirlingStep(shifted);
  const w = 1 / (shifted * shifted);
  // Bernoulli numbers B_2j / (2j (2j - 1)); eight of them are exact to a double from z = 15 on.
  const series = [3617 / 122400, 1 / 156, 691 / 360360, 1 / 1188, 1 / 1680, 1 / 1260, 1 / 360, 1 / 12];
  return sum + series.reduce((rest, term) => term - w * rest, 0) / shifted;
}

/** stirlingError(z) - stirlingError(z + 1) = (z + 1/2) ln(1 + 1/z) - 1. */
function stirlingStep(z: number): number {
  if (z < 1) return (z + 0.5) * Math.log1p(1 / z) - 1;
  // atanh(u) / u - 1 with u = 1 / (2z + 1), by its series, which does not cancel.
  const square = 1 / (2 * z + 1) ** 2;
  let sum = 0;
  let power = square;
  for (let i = 3; power > 1e-19 * square; i += 2) {
    sum += power / i;
    power *= square;
  }
  return sum;
}

/** x ln(x / m) + m - x, where `distance` is x - m to full precision (Loader's bd0). */
function deviance(x: number, m: number, distance: number): number {
  if (Math.abs(distance) >= 0.1 * (x + m)) return x * Math.log(x / m) - distance;
  const v = distance / (x + m);
  let sum = distance * v;
  let power = 2 * x * v;
  for (let j = 1; j < mostTerms; j++) {
    power *= v * v;
    const next = sum + power / (2 * j + 1);
    if (next === sum) break;
    sum = next;
  }
  return sum;
}
