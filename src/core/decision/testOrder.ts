import type { RowOrder } from "../design/design.ts";

const defaultOrder = 2;
const seasonsNeeded = 6;
const rowsForLongSeasons = 80;
const shortSeason = 4;

/**
 * The order of autocorrelation that the deciding test looks for: the season where there is one and the rows allow it,
 * else 2. A high order in a short series can never reject (order 12 at 20 rows), which is why a season longer than
 * four periods needs at least 80 rows.
 * @param order - what rows are to each other.
 * @param rows - n, the number of rows used.
 */
export function autocorrelationOrder(order: RowOrder, rows: number): number {
  if (order.kind !== "time") return defaultOrder;
  const { season } = order.period;
  const allowed = rows >= seasonsNeeded * season && (rows >= rowsForLongSeasons || season <= shortSeason);
  return season > 1 && allowed ? season : defaultOrder;
}
