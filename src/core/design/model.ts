/** A transform of a driver or the outcome, by its plain name. Lags and changes run by time, not by row. */
export type Transform =
  | { readonly kind: "none" }
  | { readonly kind: "logarithm" }
  | { readonly kind: "square" }
  | { readonly kind: "lag"; readonly periods: number }
  | { readonly kind: "change"; readonly periods: number }
  | { readonly kind: "growth rate"; readonly periods: number };

/** One driver as the user chose it: a column, how it is read, and what is made of it. */
export interface DriverChoice {
  readonly column: string;
  readonly as: "number" | "category" | "date";
  /** For a category: the level the others are compared with; null takes the most frequent. */
  readonly base: string | null;
  readonly transform: Transform;
}

/** Columns made from the time column alone. */
export type CalendarDriver = "trend" | "month indicators" | "quarter indicators";

/** What rows are to each other. `order: null` takes the rows as they stand. */
export type RowsAre =
  | { readonly kind: "cases" }
  | { readonly kind: "time"; readonly order: string | null }
  | { readonly kind: "groups"; readonly by: string; readonly second: string | null; readonly order: string | null };

/** Everything that turns columns into a design. */
export interface Model {
  readonly outcome: { readonly column: string; readonly transform: Transform };
  readonly drivers: readonly DriverChoice[];
  readonly calendar: readonly CalendarDriver[];
  readonly rows: RowsAre;
  readonly constant: boolean;
  /** Columns whose plain text numbers the user agreed to read as numbers, and the decimal mark used there. */
  readonly textNumbers: readonly { readonly column: string; readonly decimal: "." | "," }[];
}
