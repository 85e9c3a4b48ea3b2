import type { Cell } from "../../src/core/table/cells.ts";

/** 1 January 2018 as a spreadsheet counts days. */
const firstDay = 43_101;
const monthDays = [31, 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31];

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
  let day = firstDay;
  let error = 0;
  const rows = Array.from({ length: months }, (_, month): Cell[] => {
    const price = 100 + month * 0.35 + 6 * centred();
    const advertising = 20 + 8 * centred();
    const rain = Math.round(11 + 5 * centred());
    error = 0.6 * error + 9 * centred();
    const repairs = 520 - 1.9 * price + 0.8 * advertising - 3.1 * rain + error;
    const date = { date: day };
    day += monthDays[month % 12]!;
    return [date, Math.round(repairs), round(price), round(advertising), rain];
  });
  return [["Month", "Repairs", "Price index", "Advertising", "Rainy days"], ...rows];
}

const round = (value: number): number => Math.round(value * 10) / 10;
