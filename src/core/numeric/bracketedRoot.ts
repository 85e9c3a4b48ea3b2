/** More halvings than this never help: 2^-200 of any bracket is below rounding. */
const mostSteps = 200;

/**
 * The x in [low, high] where an increasing or decreasing function crosses zero, by Ridders' method: the middle of the
 * bracket bends the chord, so that the steps converge fast and never leave the bracket.
 * @param f - continuous, of opposite signs at the two ends.
 * @param bracket - [low, high].
 * @see Ridders (1979), IEEE Trans. Circuits and Systems 26, 979-980.
 */
export function bracketedRoot(f: (x: number) => number, [low, high]: readonly [number, number]): number {
  let [a, b, fa, fb] = [low, high, f(low), f(high)];
  if (fa === 0) return a;
  if (fb === 0) return b;
  // Not a number has no sign either.
  if (!(Math.sign(fa) * Math.sign(fb) < 0)) throw new Error(`no sign change between ${low} and ${high}`);
  let last = Number.NaN;
  for (let step = 0; step < mostSteps; step++) {
    const middle = (a + b) / 2;
    const fm = f(middle);
    const x = middle + ((middle - a) * Math.sign(fa - fb) * fm) / bend(fa, fm, fb);
    if (fm === 0) return middle;
    const fx = f(x);
    if (fx === 0 || Math.abs(x - last) <= Number.EPSILON * Math.abs(x) || b - a <= Number.EPSILON * Math.abs(x))
      return x;
    last = x;
    if (Math.sign(fm) !== Math.sign(fx)) [a, fa, b, fb] = middle < x ? [middle, fm, x, fx] : [x, fx, middle, fm];
    else if (Math.sign(fa) !== Math.sign(fx)) [b, fb] = [x, fx];
    else [a, fa] = [x, fx];
  }
  return last;
}

/** sqrt(fm^2 - fa fb), above |fm| since fa and fb differ in sign; scaled, so that the smallest doubles do not vanish. */
function bend(fa: number, fm: number, fb: number): number {
  const scale = Math.max(Math.abs(fa), Math.abs(fm), Math.abs(fb));
  return scale * Math.sqrt((fm / scale) ** 2 - (fa / scale) * (fb / scale));
}
