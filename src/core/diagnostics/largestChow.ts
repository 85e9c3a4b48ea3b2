import type { Fit } from "../fit/fit.ts";
import { chiSquareTail, fTail } from "../numeric/distributions.ts";
import { largestSplit } from "../numeric/splitSums.ts";
import { largestChowSurfaces } from "./hansen1997.ts";
import { type TestOutcome, computed, notApplicable } from "./outcome.ts";
import { noTime } from "./timeLine.ts";

/** The share of rows at either end where no break is looked for. */
const trimming = 0.15;

/**
 * The largest Chow statistic over the middle 70 % of the rows, for a break whose place is not known beforehand.
 * H0: the coefficients are the same throughout. The statistic is the largest k F, F as in Chow's test; p-value from the
 * response surfaces of Hansen; where the rows allow one place only, from F(k, n - 2k), since it is then Chow's test.
 * @returns the Wald form k F, details `firstRows`: how many rows stand before the largest; not-applicable where rows
 *   do not run through time, are too few, or there are more than 40 coefficients.
 * @see Andrews (1993), Econometrica 61, 821-856; Hansen (1997), J. Business & Economic Statistics 15, 60-67.
 */
export function largestChow({ design, residuals, rowCount: n, columnCount: k }: Fit): TestOutcome {
  if (design.order.kind !== "time") return notApplicable("largest-chow", noTime);
  if (k > largestChowSurfaces.length)
    return notApplicable("largest-chow", `there are more than ${largestChowSurfaces.length} coefficients`);
  const from = Math.max(Math.floor(trimming * n), k + 1);
  const to = n - from;
  const columns = design.terms.map(({ values }) => values);
  const split = from <= to ? largestSplit({ columns, outcome: residuals }, [from, to]) : null;
  if (split === null) return notApplicable("largest-chow", `${n} rows leave too few on either side of a break`);
  const statistic = split.ratio * (n - 2 * k);
  const pValue =
    from === to ? fTail(statistic / k, k, n - 2 * k) : largestChowPValue(statistic, k, shareOf([from, to], n));
  const figure = { statistic, law: "limit", df: [], pValue } as const;
  const details = { firstRows: split.firstRows };
  return computed({ test: "largest-chow", form: null, order: null, figure, fForm: null, details });
}

/** lambda_0 of the symmetric range with the same ratio of odds as the range looked at. */
const shareOf = ([from, to]: readonly [number, number], n: number): number =>
  1 / (1 + Math.sqrt(((n - from) * to) / (from * (n - to))));

type Surface = readonly [number, number, number];

const surfacesOf = (k: number): Surface[] =>
  largestChowSurfaces[k - 1]!.split(", ").map((triple) => triple.split(" ").map(Number) as [number, number, number]);

const tail = (x: number, [constant, slope, df]: Surface): number =>
  chiSquareTail(Math.max(0, constant + slope * x), df);

/**
 * Hansen's p-value: surfaces at trimming shares 0.49, 0.47, ..., 0.01, the p-value straight between two of them, and
 * between the first and chi-square(k), the law where there is one place alone (share 0.5).
 * @param x - the largest k F.
 * @param share - lambda_0, the share of rows before the first place looked at.
 */
export function largestChowPValue(x: number, k: number, share: number): number {
  const surfaces = surfacesOf(k);
  const place = (0.51 - share) * 50;
  if (place < 1) return (1 - place) * 2 * chiSquareTail(x, k) + (2 * place - 1) * tail(x, surfaces[0]!);
  const lower = Math.min(Math.floor(place), surfaces.length - 1);
  const part = Math.min(place - lower, 1);
  return (1 - part) * tail(x, surfaces[lower - 1]!) + part * tail(x, surfaces[lower]!);
}
