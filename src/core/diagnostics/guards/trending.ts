import type { Fit } from "../../fit/fit.ts";
import type { TestOutcome } from "../outcome.ts";
import type { Guard } from "./guard.ts";
import { type UnitRoot, unitRoot } from "./unitRoot.ts";

/** Whether the fit may rest on series that wander or trend side by side. */
export interface Trending {
  /** R^2 above the Durbin-Watson statistic. */
  readonly suspected: boolean;
  readonly durbinWatson: number;
  /** null where periods are missing or rows are too few. */
  readonly unitRoot: UnitRoot | null;
}

/**
 * The sign of a spurious regression, R^2 above the Durbin-Watson statistic, and the residual-based unit-root test with
 * floor((n - 1)^(1/3)) earlier changes.
 * @param watson - the outcome of the Durbin-Watson test.
 * @returns null where rows do not run through time.
 * @see Granger and Newbold (1974), J. Econometrics 2, 111-120; Said and Dickey (1984), Biometrika 71, 599-607.
 */
export function trending(fit: Fit, watson: TestOutcome): Trending | null {
  const { order, terms } = fit.design;
  if (order.kind !== "time" || watson.kind !== "computed") return null;
  const deterministic = terms.some(({ meaning }) => meaning.kind === "trend" || meaning.kind === "date")
    ? "trend"
    : "constant";
  const wandering = terms.filter(({ meaning }) => meaning.kind === "number").length;
  const settings = { variables: wandering + 1, deterministic, lags: Math.floor(Math.cbrt(fit.rowCount - 1)) } as const;
  return {
    suspected: fit.rSquared > watson.figure.statistic,
    durbinWatson: watson.figure.statistic,
    unitRoot: order.gaps === 0 && wandering > 0 ? unitRoot(fit.residuals, settings) : null,
  };
}

/** What it means, as sentences. */
export function trendingGuard(found: Trending): Guard {
  if (!found.suspected) {
    return {
      guard: "trending",
      finding: "nothing found",
      sentences: [
        "R-squared is not above the Durbin-Watson statistic: no sign of series that merely wander side by side.",
      ],
    };
  }
  const returns = returnsToZero(found.unitRoot);
  return {
    guard: "trending",
    finding: returns === true ? "worth knowing" : "look into it",
    sentences: [
      "R-squared is above the Durbin-Watson statistic: series that trend or wander fit each other well without having anything to do with each other.",
      aboutUnitRoot(found.unitRoot, returns),
      ...(returns === true ? [] : ["Try the changes from period to period instead of the levels, or add a trend."]),
    ],
  };
}

/** Whether a unit root is rejected at 5 %; null where that cannot be said. */
function returnsToZero(found: UnitRoot | null): boolean | null {
  if (found === null || found.critical === null) return null;
  return found.statistic < found.critical[1];
}

function aboutUnitRoot(found: UnitRoot | null, returns: boolean | null): string {
  if (found === null)
    return "Whether the residuals return to zero could not be tested: periods are missing, or rows are too few.";
  const figure = `(unit-root test of the residuals ${found.statistic.toFixed(2)}`;
  if (found.critical === null) return `There are too many drivers for the tables of the unit-root test ${figure}).`;
  const against = `${figure}, 5 % point ${found.critical[1].toFixed(2)})`;
  return returns === true
    ? `The residuals return to zero, though ${against}: the series belong together.`
    : `The residuals are not shown to return to zero ${against}.`;
}
