import { drawsFrom, roundTo } from "../../sheet/sample/draws.ts";

export interface Shop {
  readonly shop: string;
  /** A week. */
  readonly takings: number;
  readonly staffHours: number;
  /** In square metres. */
  readonly floorArea: number;
  readonly footfall: number;
}

const count = 140;
const seed = 102;

/** Shops of very different size: the larger a shop, the further its takings stray from what explains them. */
export function shops(): readonly Shop[] {
  const draws = drawsFrom(seed);
  return Array.from({ length: count }, (_, index) => {
    const size = Math.exp(0.55 * draws.normal());
    const staffHours = Math.round(120 * size * Math.exp(0.18 * draws.normal()));
    const floorArea = Math.round(85 * size * Math.exp(0.25 * draws.normal()));
    const footfall = Math.round(620 * size * Math.exp(0.3 * draws.normal()));
    const stray = 4.2 * staffHours * draws.normal();
    const takings = roundTo(640 + 19 * staffHours + 6.5 * floorArea + 1.1 * footfall + stray, 0);
    return { shop: `KV-${String(index + 1).padStart(3, "0")}`, takings, staffHours, floorArea, footfall };
  });
}
