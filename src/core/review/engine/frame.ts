import { sense, sensesOf } from "../../table/senses.ts";
import { likelyDecimal, readTextNumber } from "../../table/textNumbers.ts";
import type { Claim, ClaimedLine } from "../claim.ts";

/** A line of the claim laid beside the others: what each row of the frame holds. */
export interface FrameLine {
  readonly line: ClaimedLine;
  /** Bytes of `sense`, one a row of the frame; rows beyond the used range are blank. */
  readonly senses: Uint8Array;
  /** The number in the cell, or plainly in its text; 0 where there is none. */
  readonly numbers: Float64Array;
}

/**
 * The lines of a claim side by side, with what stands before and after the claimed cells. Row `first` of the frame is
 * the first claimed cell of every line, wherever on its sheet that is.
 */
export interface Frame {
  /** The outcome, the drivers as claimed, then helpers: numeric columns beside the data that may have been mistaken for them. */
  readonly lines: readonly FrameLine[];
  readonly driverCount: number;
  readonly first: number;
  /** How many rows are claimed. */
  readonly count: number;
  readonly rowCount: number;
  /** Rows of the frame that the sheet does not show. */
  readonly hidden: readonly number[];
}

/** More columns beside the data than these are not tried. */
const mostHelpers = 6;

export function frameOf(claim: Claim): Frame {
  const claimed = [claim.outcome, ...claim.drivers];
  const lines = [...claimed, ...helpersOf(claim)];
  const first = Math.max(...claimed.map((line) => line.from - line.first));
  const count = Math.min(...claimed.map((line) => line.count));
  const after = Math.max(...claimed.map((line) => line.cells.kinds.length - (line.from - line.first) - count), 0);
  const shape = { first, rowCount: first + count + after };
  const hidden = claim.outcome.hidden.map((position) => position - claim.outcome.from + first);
  return {
    lines: lines.map((line) => lineOf(line, shape)),
    driverCount: claim.drivers.length,
    first,
    count,
    rowCount: shape.rowCount,
    hidden: hidden.filter((row) => row >= 0 && row < shape.rowCount).toSorted((a, b) => a - b),
  };
}

/** Columns of numbers beside the data that hold one in three of four claimed rows at least. */
function helpersOf({ others, outcome }: Claim): ClaimedLine[] {
  const numeric = others.filter((line) => {
    const { senses } = lineOf(line, { first: 0, rowCount: line.count });
    const numbers = senses.reduce((count, one) => count + (one === sense.number ? 1 : 0), 0);
    return line.runs === outcome.runs && numbers * 4 >= line.count * 3 && line.count > 0;
  });
  return numeric.slice(0, mostHelpers);
}

function lineOf(line: ClaimedLine, { first, rowCount }: Pick<Frame, "first" | "rowCount">): FrameLine {
  const { cells } = line;
  const found = sensesOf(cells);
  const offset = line.from - line.first - first;
  const { decimal } = likelyDecimal(cells.texts);
  const texts = cells.texts.map((text) => readTextNumber(text, decimal) ?? 0);
  const senses = new Uint8Array(rowCount);
  const numbers = new Float64Array(rowCount);
  for (let row = 0; row < rowCount; row++) {
    const cell = row + offset;
    if (cell < 0 || cell >= found.length) continue;
    const one = found[cell]!;
    senses[row] = one;
    if (one === sense.textNumber) numbers[row] = texts[cells.numbers[cell]!]!;
    if (one === sense.number || one === sense.date || one === sense.boolean) numbers[row] = cells.numbers[cell]!;
  }
  return { line, senses, numbers };
}

/** The position in its sheet (row or column, from 0) of a row of the frame. */
export const positionOf = ({ line }: FrameLine, row: number, { first }: Pick<Frame, "first">): number =>
  line.from - first + row;
