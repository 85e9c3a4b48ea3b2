import type { Regression } from "./foundRegression.ts";
import type { RegressionFunction } from "./telling.ts";

/** What was met on the way through a formula. */
export interface Met {
  readonly regressions: { readonly name: RegressionFunction; readonly regression: Regression }[];
  /** Why regressions in it could not be read. */
  readonly unread: string[];
}

export const nothingMet = (): Met => ({ regressions: [], unread: [] });
