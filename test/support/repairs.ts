import type { Cell } from "../../src/core/table/cells.ts";

const firstYear = 2018;

/** The first day of a month as a spreadsheet counts days, from the end of 1899. */
const serialOf = (month: number): number => (Date.UTC(firstYear, month, 1) - Date.UTC(1899, 11, 30)) / 86_400_000;

/** The same invented figures on every machine, between 0 and 1 (Mulberry32). */
function generator(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  };
}

/**
 * Invented months of a repair shop: repairs fall with the price index and with rainy days, the errors follow on.
 * Headings first; `months` rows below.
 */
export function repairMonths(months: number): Cell[][] {
  const next = generator(20_261);
  const centred = (): number => next() + next() + next() - 1.5;
  let error = 0;
  const rows = Array.from({ length: months }, (_, month): Cell[] => {
    const price = 100 + month * 0.35 + 6 * centred();
    const advertising = 20 + 8 * centred();
    const rain = Math.round(11 + 5 * centred());
    error = 0.6 * error + 9 * centred();
    const repairs = 520 - 1.9 * price + 0.8 * advertising - 3.1 * rain + error;
    return [{ date: serialOf(month) }, Math.round(repairs), round(price), round(advertising), rain];
  });
  return [["Month", "Repairs", "Price index", "Advertising", "Rainy days"], ...rows];
}

const round = (value: number): number => Math.round(value * 10) / 10;
