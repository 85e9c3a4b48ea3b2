import { carriedOver, drawsFrom, roundTo } from "./draws.ts";

export interface Month {
  /** Of the first day, as a serial number. */
  readonly month: number;
  readonly repairs: number;
  readonly priceIndex: number;
  /** In thousands. */
  readonly advertising: number;
  readonly rainyDays: number;
}

const count = 96;
const seed = 916;
const firstYear = 2016;

/**
 * Repairs by month: what is left unexplained carries over from month to month and swings wider where more is
 * advertised. Prices have no effect of their own, but drift slowly, as what is unexplained does: a regression that
 * takes the months for separate cases finds an effect that is not there.
 */
export function monthlyRepairs(): readonly Month[] {
  const draws = drawsFrom(seed);
  const unexplained = carriedOver(draws, count, 0.72);
  const drift = carriedOver(draws, count, 0.9);
  return Array.from({ length: count }, (_, t) => {
    const season = Math.cos((2 * Math.PI * t) / 12);
    const rainyDays = Math.max(2, Math.round(12 + 4 * season + 2.6 * draws.normal()));
    const advertising = roundTo(Math.max(1.5, 8 - 2.2 * season + 2.4 * draws.normal()), 1);
    const priceIndex = roundTo(100 + 0.12 * t + 3.2 * drift[t]!, 1);
    const swing = 4 + 2.4 * advertising;
    const repairs = Math.round(430 + 4.2 * advertising - 3.1 * rainyDays + swing * unexplained[t]!);
    return { month: serialOf(t), repairs, priceIndex, advertising, rainyDays };
  });
}

/** The first day of the month so many months after the first, as a serial number. */
const serialOf = (months: number): number => Date.UTC(firstYear, months, 1) / 86_400_000 + 25_569;
