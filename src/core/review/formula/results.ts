import type { CellPlace } from "../cellsOfBook.ts";
import type { Met } from "./met.ts";
import type { Value } from "./values.ts";

/** What a formula shows in one of the cells that it fills. */
export interface CellResult {
  readonly value: Value;
  /** All that the formula shows. */
  readonly whole: Value;
  /** Whether the formula stands in this cell itself. */
  readonly isCorner: boolean;
  /** The regressions on the way to it. */
  readonly met: Met;
}

/** The results of regressions that stand in cells, for formulas that read them there; null for any other cell. */
export type Results = (place: CellPlace) => CellResult | null;

export const noResults: Results = () => null;
