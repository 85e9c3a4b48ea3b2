import { normalQuantile } from "../numeric/distributions.ts";
import { monotoneCubic } from "../numeric/monotoneCubic.ts";
import { bandwidthShares, normalPoints, ratios } from "./fixedBLaw.ts";

/** Where the polynomial of Kiefer and Vogelsang holds: two-sided 5 %. */
const anchor = -normalQuantile(0.025);

/**
 * How many times wider than the normal (or t) critical value the fixed-b one is: a function of the normal critical
 * value z of the same two-sided level.
 * The law is tabulated exactly (fixedBLaw.ts), joined by monotone cubics in b and in z, and scaled so that at 5 % it
 * is the published polynomial, (1.9600 + 2.9694 b + 0.4160 b^2 - 0.5324 b^3) / 1.96: at most 1.1 % above the exact law.
 * It is 1 at b = 0 for every level.
 * @param b - (L + 1) / n; above 1 it is taken as 1.
 * @see Kiefer and Vogelsang (2005), Econometric Theory 21, 1130-1164, table 1.
 */
export function fixedBStretch(b: number): (z: number) => number {
  const share = Math.min(Math.max(b, 0), 1);
  const atShare = normalPoints.map((_, point) =>
    monotoneCubic(
      bandwidthShares,
      ratios.map((row) => row[point]!),
    )(share),
  );
  const ratio = monotoneCubic(normalPoints, atShare);
  const scale = publishedRatio(share) / ratio(anchor);
  return (z) => ratio(z) * scale;
}

const publishedRatio = (b: number): number => (1.96 + b * (2.9694 + b * (0.416 - b * 0.5324))) / 1.96;
