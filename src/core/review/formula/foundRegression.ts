import { addressOf, type SheetArea } from "../../table/address.ts";
import type { ClaimedForm } from "../claim.ts";

/** A regression that a formula makes. */
export interface Regression {
  readonly outcome: UsedLine;
  /** In the order in which they are given. */
  readonly drivers: readonly UsedLine[];
  readonly constant: boolean;
  /** Whether pairs of cells that are not both numbers are passed over; the other functions end in an error then. */
  readonly passesOver: boolean;
  /** Whether the function itself takes the logarithm of the outcome: its coefficients are then factors. */
  readonly exponential: boolean;
}

/** One line of cells in a regression: what enters is `factor` times the form of each cell. */
export interface UsedLine {
  /** One cell wide or one cell high. */
  readonly area: SheetArea;
  readonly form: ClaimedForm;
  readonly factor: number;
}

/** Whether two formulas use the same cells in the same way, whatever each of them gives. */
export const sameRegression = (one: Regression, other: Regression): boolean => keyOf(one) === keyOf(other);

/** One text for the cells and how they are used. */
export const keyOf = ({ outcome, drivers, constant }: Pick<Regression, "outcome" | "drivers" | "constant">): string =>
  [...[outcome, ...drivers].map(keyOfLine), constant].join("|");

const keyOfLine = ({ area, form, factor }: UsedLine): string => `${addressOf(area)} ${form} ${factor}`;
