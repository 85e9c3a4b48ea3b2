import { type MovedColumn, movedColumn, roughProduct } from "../../numeric/runningMoments.ts";
import { sum } from "../../numeric/sums.ts";
import type { Frame } from "./frame.ts";
import { type LineValues, lineValues } from "./lineValues.ts";
import type { LineRecipe, Run } from "./recipe.ts";

/** A line as a recipe makes it, ready to be summed up. */
export interface MadeLine extends LineValues {
  readonly moved: MovedColumn;
  /** Claimed rows in which it has no value. */
  readonly absent: readonly number[];
  /** Its own among the lines that are kept; null where it is not. */
  readonly number: number | null;
}

/** Lines made by recipes, each once as long as it is wanted often, and what their claimed rows give together. */
export interface MadeLines {
  readonly make: (index: number, recipe: LineRecipe) => MadeLine;
  /** The sum of a line as moved over the claimed rows. */
  readonly sumOf: (line: MadeLine) => number;
  /** The inner product of two lines as moved, over the claimed rows in which both have a value. */
  readonly productOf: (one: MadeLine, other: MadeLine) => number;
}

/** Lines that are kept: those of single changes, which come first and are asked for in every pair. */
const mostKept = 400;

export function madeLines(frame: Frame): MadeLines {
  const claimed = { from: frame.first, to: frame.first + frame.count };
  const lines = new Map<string, MadeLine>();
  const products = new Map<number, number>();
  const claimedPart = ({ moved }: MadeLine): Float64Array => moved.values.subarray(claimed.from, claimed.to);
  const known = (key: number | null, product: () => number): number => {
    if (key === null) return product();
    const found = products.get(key) ?? product();
    products.set(key, found);
    return found;
  };
  return {
    make: (index, recipe) => {
      const key = `${index} ${Object.values(recipe).join()}`;
      const found = lines.get(key);
      if (found !== undefined) return found;
      const isKept = lines.size < mostKept;
      const values = lineValues(frame.lines[index]!, recipe, frame);
      const line = madeLine(values, claimed, isKept ? lines.size : null);
      if (isKept) lines.set(key, line);
      return line;
    },
    sumOf: (line) => known(line.number === null ? null : -1 - line.number, () => sum(claimedPart(line))),
    productOf: (one, other) =>
      known(one.number === null || other.number === null ? null : one.number * mostKept + other.number, () =>
        roughProduct(claimedPart(one), claimedPart(other)),
      ),
  };
}

function madeLine(made: LineValues, claimed: Run, number: number | null): MadeLine {
  const absent: number[] = [];
  for (let row = claimed.from; row < claimed.to; row++) if (made.present[row] === 0) absent.push(row);
  return { ...made, moved: movedColumn(made.values, made.present, claimed), absent, number };
}
