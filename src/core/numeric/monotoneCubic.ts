/**
 * Piecewise cubic through given points that rises where they rise, with a continuous slope.
 * @param knots - ascending, at least three.
 * @param values - one a knot.
 * @returns the interpolating function; beyond the ends the straight line on through the last two points.
 * @see Fritsch and Carlson (1980), SIAM J. Numer. Anal. 17, 238-246; Fritsch and Butland (1984), SIAM J. Sci. Stat. Comput. 5, 300-304.
 */
export function monotoneCubic(knots: readonly number[], values: readonly number[]): (x: number) => number {
  const slopes = slopesOf(knots, values);
  return (x) => {
    const piece = Math.min(
      Math.max(
        knots.findLastIndex((knot) => knot <= x),
        0,
      ),
      knots.length - 2,
    );
    const [left, right] = [knots[piece]!, knots[piece + 1]!];
    const width = right - left;
    const share = (x - left) / width;
    const [y0, y1] = [values[piece]!, values[piece + 1]!];
    if (share < 0 || share > 1) return y0 + share * (y1 - y0);
    const rest = 1 - share;
    return (
      y0 * rest * rest * (1 + 2 * share) +
      y1 * share * share * (1 + 2 * rest) +
      width * share * rest * (slopes[piece]! * rest - slopes[piece + 1]! * share)
    );
  };
}

/** Weighted harmonic means of the neighbouring chords; zero at a turn. */
function slopesOf(knots: readonly number[], values: readonly number[]): number[] {
  const widths = knots.slice(1).map((knot, i) => knot - knots[i]!);
  const chords = widths.map((width, i) => (values[i + 1]! - values[i]!) / width);
  const inner = chords.slice(1).map((chord, i) => {
    const before = chords[i]!;
    if (before * chord <= 0) return 0;
    const [w1, w2] = [2 * widths[i + 1]! + widths[i]!, widths[i + 1]! + 2 * widths[i]!];
    return (w1 + w2) / (w1 / before + w2 / chord);
  });
  const first = endSlope(widths[0]!, widths[1]!, [chords[0]!, chords[1]!]);
  const last = endSlope(widths.at(-1)!, widths.at(-2)!, [chords.at(-1)!, chords.at(-2)!]);
  return [first, ...inner, last];
}

/** One-sided three-point slope, held to the sign of the last chord and to three times its size. */
function endSlope(width: number, next: number, [chord, nextChord]: readonly [number, number]): number {
  const slope = ((2 * width + next) * chord - width * nextChord) / (width + next);
  if (slope * chord <= 0) return 0;
  return chord * nextChord < 0 && Math.abs(slope) > 3 * Math.abs(chord) ? 3 * chord : slope;
}
