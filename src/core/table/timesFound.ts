import { findGrid } from "./period.ts";
import { type Period, rowByRow, timeInWords } from "./periodNames.ts";
import { picked } from "./senses.ts";
import { type TimeCells, timeState } from "./timeCells.ts";

/** The different times of a column and the periods they fall on. */
export interface TimesFound {
  /** Ascending, in the unit of the column; at least one. */
  readonly distinct: Float64Array;
  /** Whether they follow a period; where not, each time counts as one step after the one before. */
  readonly regular: boolean;
  readonly period: Period;
  /** Whole periods since the first time. */
  readonly positionOf: (time: number) => number;
  readonly labelOf: (position: number) => string;
}

/** @returns null where no cell could be read as a time. */
export function timesIn({ values, states, unit, counts }: TimeCells): TimesFound | null {
  const distinct = withoutRepeats(picked(values, states, timeState.read).sort());
  if (distinct.length === 0) return null;
  const grid = findGrid({ values: distinct, unit, counts });
  if (grid !== null) return { distinct, regular: true, ...grid };
  const ranks = new Map(Array.from(distinct, (time, rank) => [time, rank]));
  return {
    distinct,
    regular: false,
    period: rowByRow,
    positionOf: (time) => ranks.get(time)!,
    labelOf: (position) => timeInWords(unit === "number" ? "step" : unit, distinct[position]!),
  };
}

function withoutRepeats(sorted: Float64Array): Float64Array {
  let kept = 0;
  for (let i = 0; i < sorted.length; i++) {
    if (i === 0 || sorted[i] !== sorted[kept - 1]) sorted[kept++] = sorted[i]!;
  }
  return sorted.subarray(0, kept);
}

/** Periods between the first and the last that have no row. */
export interface Gaps {
  readonly gaps: number;
  /** The first few of them in words. */
  readonly gapLabels: readonly string[];
}

/** Gaps beyond these are counted, not named. */
const mostGapLabels = 5;

/** @param positions - distinct and ascending. */
export function gapsIn(positions: Int32Array, labelOf: (position: number) => string): Gaps {
  const gapLabels: string[] = [];
  for (let i = 1; i < positions.length && gapLabels.length < mostGapLabels; i++) {
    for (let gap = positions[i - 1]! + 1; gap < positions[i]! && gapLabels.length < mostGapLabels; gap++) {
      gapLabels.push(labelOf(gap));
    }
  }
  const periods = positions.length === 0 ? 0 : positions.at(-1)! - positions[0]! + 1;
  return { gaps: periods - positions.length, gapLabels };
}
