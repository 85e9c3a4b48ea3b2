import type { LineRecipe, Recipe, Run } from "./recipe.ts";

/** Every small change of data or model that is tried, in the order in which they are: what happens most comes first. */
export const hypotheses = [
  "rows-left-off-at-end",
  "rows-left-off-at-start",
  "extra-rows-at-end",
  "extra-rows-at-start",
  "total-row-counted",
  "heading-row-counted",
  "empty-rows-counted",
  "hidden-rows-left-out",
  "repeat-left-out",
  "empty-cells-as-zero",
  "text-as-zero",
  "text-numbers-read",
  "text-numbers-as-zero",
  "no-constant",
  "with-constant",
  "reverse-order",
  "drivers-exchanged",
  "factor",
  "swapped",
  "driver-left-out",
  "another-driver",
  "another-column",
  "shifted",
  "logarithm",
  "base-10-logarithm",
  "no-logarithm",
  "changes",
  "sorted-alone",
  "row-left-out",
  "rows-left-out",
  "block-repeated",
] as const;

export type Hypothesis = (typeof hypotheses)[number];

type RunHypothesis =
  | "rows-left-off-at-end"
  | "rows-left-off-at-start"
  | "extra-rows-at-end"
  | "extra-rows-at-start"
  | "row-left-out"
  | "rows-left-out"
  | "repeat-left-out"
  | "block-repeated";

export type LineHypothesis =
  | "empty-cells-as-zero"
  | "text-as-zero"
  | "text-numbers-read"
  | "text-numbers-as-zero"
  | "logarithm"
  | "base-10-logarithm"
  | "no-logarithm"
  | "changes";

/** What a change is about, for its sentence: rows and lines are those of the frame. */
export type Facts =
  | { readonly hypothesis: RunHypothesis; readonly run: Run }
  | { readonly hypothesis: "hidden-rows-left-out"; readonly runs: readonly Run[] }
  | { readonly hypothesis: "heading-row-counted"; readonly row: number }
  | { readonly hypothesis: "empty-rows-counted"; readonly count: number }
  | { readonly hypothesis: "total-row-counted"; readonly row: number | null; readonly summary: "sum" | "mean" }
  | { readonly hypothesis: LineHypothesis; readonly lines: readonly number[] }
  | {
      readonly hypothesis: "shifted";
      readonly lines: readonly number[];
      readonly shift: number;
      readonly beyond: boolean;
    }
  | { readonly hypothesis: "sorted-alone"; readonly line: number; readonly order: LineRecipe["sorted"] }
  | { readonly hypothesis: "factor"; readonly line: number; readonly factor: number }
  | { readonly hypothesis: "no-constant" | "with-constant" | "reverse-order" }
  | { readonly hypothesis: "drivers-exchanged"; readonly lines: readonly [number, number] }
  | { readonly hypothesis: "swapped" | "driver-left-out" | "another-driver"; readonly line: number }
  | { readonly hypothesis: "another-column"; readonly line: number; readonly other: number };

/** One small change, tried alone and with others. */
export interface Change {
  readonly facts: Facts;
  /** What of a recipe it touches: that decides what has to be summed up anew. */
  readonly part: "lines" | "rows" | "model";
  /** Whether it is tried together with others: changes by the thousand are not. */
  readonly inPairs: boolean;
  /** Null where it changes nothing or cannot be made of this recipe. */
  readonly apply: (recipe: Recipe) => Recipe | null;
}
