import type { ClaimedForm } from "../claim.ts";
import type { Frame } from "./frame.ts";

/** What is made of one line's cells before they enter the regression. */
export interface LineRecipe {
  readonly blanks: "left out" | "zero";
  readonly texts: "left out" | "zero";
  readonly textNumbers: "left out" | "read" | "zero";
  readonly form: ClaimedForm | "base-10 logarithm";
  readonly changes: boolean;
  /** Each row takes the cell so many rows further down, up where negative. */
  readonly shift: number;
  /** Whether a shifted line takes in cells beyond the claimed ones. */
  readonly beyond: boolean;
  readonly sorted: "as it stands" | "ascending" | "descending";
}

export interface Run {
  readonly from: number;
  readonly to: number;
}

/** Which rows of the frame enter, the second end of a run not included. */
export interface RowRecipe {
  readonly span: Run;
  /** Runs within the span that are left out, apart from one another. */
  readonly without: readonly Run[];
  /** Runs that are counted once more. */
  readonly again: readonly Run[];
  /** Rows of nothing but zeros. */
  readonly zeros: number;
  /** A row that sums up the rows above it. */
  readonly summary: "none" | "sum" | "mean";
}

/** Which columns are regressed on which, by their index among the frame's lines. */
export interface ModelRecipe {
  readonly outcome: number;
  readonly drivers: readonly number[];
  /** For each claimed driver the place among `drivers` of the one whose figures stand beside it; null for none. */
  readonly reportedAs: readonly (number | null)[];
  readonly constant: boolean;
  /** What each line's values are multiplied by; lines that are not named by 1. */
  readonly factors: Readonly<Record<number, number>>;
}

/** A regression that could have been made of the frame. */
export interface Recipe {
  readonly lines: readonly LineRecipe[];
  readonly rows: RowRecipe;
  readonly model: ModelRecipe;
}

/** The regression exactly as claimed: a row counts where every line holds a number. */
export function claimedRecipe({ lines, driverCount, first, count }: Frame, constant: boolean): Recipe {
  const drivers = Array.from({ length: driverCount }, (_, j) => j + 1);
  return {
    lines: lines.map(({ line }) => ({ ...plainLine, form: line.form })),
    rows: { span: { from: first, to: first + count }, without: [], again: [], zeros: 0, summary: "none" },
    model: { outcome: 0, drivers, reportedAs: drivers.map((_, j) => j), constant, factors: {} },
  };
}

const plainLine: LineRecipe = {
  blanks: "left out",
  texts: "left out",
  textNumbers: "left out",
  form: "as it is",
  changes: false,
  shift: 0,
  beyond: false,
  sorted: "as it stands",
};

/** The recipe with some lines made otherwise. */
export const withLines = (recipe: Recipe, lines: readonly number[], changed: Partial<LineRecipe>): Recipe => ({
  ...recipe,
  lines: recipe.lines.map((line, index) => (lines.includes(index) ? { ...line, ...changed } : line)),
});
