import type { TimeUnit } from "./periodLabels.ts";
import type { Period } from "./periodNames.ts";
import { picked } from "./senses.ts";
import { type TimeCells, timeState } from "./timeCells.ts";
import { gapsIn, timesIn } from "./timesFound.ts";

/** How the times of a column run. */
export interface TimeSummary {
  readonly unit: TimeUnit;
  readonly period: Period;
  /** First and last time in words, "January 2019". */
  readonly first: string;
  readonly last: string;
  /** How many periods between them have no row. */
  readonly gaps: number;
  /** The first few of them in words. */
  readonly gapLabels: readonly string[];
  /** Different times. */
  readonly distinct: number;
  /** Whether any time stands in more than one row, as in a panel. */
  readonly repeats: boolean;
  /** Whether each row's time is later than the one above. */
  readonly ascending: boolean;
}

/** @returns null where no cell could be read as a time. */
export function summariseTime(cells: TimeCells): TimeSummary | null {
  const found = timesIn(cells);
  if (found === null) return null;
  const { distinct, period, positionOf, labelOf } = found;
  const positions = positionsOf(distinct, positionOf);
  const times = picked(cells.values, cells.states, timeState.read);
  return {
    unit: cells.unit,
    period,
    first: labelOf(0),
    last: labelOf(positions.at(-1)!),
    ...gapsIn(positions, labelOf),
    distinct: distinct.length,
    repeats: distinct.length < times.length,
    ascending: times.every((time, i) => i === 0 || time > times[i - 1]!),
  };
}

function positionsOf(distinct: Float64Array, positionOf: (time: number) => number): Int32Array {
  const positions = new Int32Array(distinct.length);
  for (let i = 0; i < distinct.length; i++) positions[i] = positionOf(distinct[i]!);
  return positions;
}
