import { carriedOver, drawsFrom, roundTo } from "../../sheet/sample/draws.ts";

export interface Week {
  /** Its Monday, as a serial number. */
  readonly week: number;
  readonly courierCost: number;
  readonly parcels: number;
  /** Price of a litre. */
  readonly fuel: number;
}

const count = 156;
const seed = 101;
/** Monday, 4 January 2021. */
const firstWeek = 44_200;

/** Courier cost by week: what is unexplained carries over from week to week, as wide in one as in another. */
export function courierWeeks(): readonly Week[] {
  const draws = drawsFrom(seed);
  const unexplained = carriedOver(draws, count, 0.6);
  const fuels = carriedOver(draws, count, 0.95);
  return Array.from({ length: count }, (_, t) => {
    const parcels = Math.round(340 + 55 * draws.normal());
    const fuel = roundTo(1.52 + 0.16 * fuels[t]!, 3);
    const courierCost = roundTo(180 + 2.35 * parcels + 310 * fuel + 62 * unexplained[t]!, 2);
    return { week: firstWeek + 7 * t, courierCost, parcels, fuel };
  });
}
