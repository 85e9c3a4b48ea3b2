import type { TimeUnit } from "./periodLabels.ts";
import { type TimeCells, timeState } from "./timeCells.ts";

/** How the times of a column run. */
export interface TimeSummary {
  readonly unit: TimeUnit;
  /** Different times. */
  readonly distinct: number;
  /** Whether any time stands in more than one row, as in a panel. */
  readonly repeats: boolean;
  /** Whether each row's time is later than the one above. */
  readonly ascending: boolean;
}

export function summariseTime({ unit, values, states }: TimeCells): TimeSummary {
  const times = values.filter((_, row) => states[row] === timeState.read);
  const ascending = times.every((time, i) => i === 0 || time > times[i - 1]!);
  const distinct = ascending ? times.length : new Set(times).size;
  return { unit, distinct, repeats: distinct < times.length, ascending };
}
