import type { ErrorsWish } from "../decision/wish.ts";

/** How the answer is to be made, beside the model. */
export interface Options extends ErrorsWish {
  /** Two-sided level, 0.05 for 95 % intervals. */
  readonly level: number;
  /** The value each driver is tested against, by term name; 0 where none is given. */
  readonly against: Readonly<Record<string, number>>;
  /** Words for one unit by column: "repairs a month", "rainy day". */
  readonly units: Readonly<Record<string, string>>;
  /** After how many rows, in time, Chow's test parts them; null for half of them. */
  readonly breakAfter: number | null;
  /** Whether the interval of a prediction is for the mean of many rows like it, or for one. */
  readonly predictFor: "mean" | "single row";
  /** Numbers made of the coefficients: "Price + Rain", "Price / (1 - Lagged) = 2", "Price > 0". */
  readonly estimates: readonly string[];
  /** Restrictions on the coefficients that are tested at once: "Price = 0", "Rain = Fuel". */
  readonly jointTest: readonly string[];
}

export const defaultOptions: Options = {
  policy: "careful",
  fixed: null,
  whiteVersion: "HC3",
  groupedVersion: "CR1",
  lags: null,
  adjusted: true,
  level: 0.05,
  against: {},
  units: {},
  breakAfter: null,
  predictFor: "mean",
  estimates: [],
  jointTest: [],
};
