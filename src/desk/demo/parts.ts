import { drawsFrom, roundTo } from "../../sheet/sample/draws.ts";

export interface Lot {
  readonly lot: string;
  readonly unitCost: number;
  readonly lotSize: number;
  /** In days. */
  readonly leadTime: number;
}

const count = 60;
const seed = 107;

/** Purchase lots on which nothing is wrong: the classical standard errors may be used. */
export function purchaseLots(): readonly Lot[] {
  const draws = drawsFrom(seed);
  return Array.from({ length: count }, (_, index) => {
    const lotSize = 10 * Math.round(5 + 45 * draws.uniform());
    const leadTime = Math.round(4 + 26 * draws.uniform());
    const unitCost = roundTo(19.5 - 0.011 * lotSize - 0.06 * leadTime + 0.9 * draws.normal(), 2);
    return { lot: `L-${String(index + 1).padStart(2, "0")}`, unitCost, lotSize, leadTime };
  });
}
