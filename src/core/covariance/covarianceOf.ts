import type { Fit } from "../fit/fit.ts";
import { type Result, failure, success } from "../problem/result.ts";
import type { Covariance, ErrorsChoice } from "./choice.ts";
import { bellMcCaffreyDegrees } from "./bellMcCaffrey.ts";
import { classicalCovariance } from "./classical.ts";
import { groupedCovariance } from "./grouped.ts";
import { neweyWestCovariance } from "./neweyWest.ts";
import { whiteCovariance } from "./white.ts";

/**
 * The covariance of the coefficients under one kind of standard errors.
 * @returns k by k; Problems too-many-lags for Newey-West, errors-need-order for grouped where rows are not in groups.
 */
export function covarianceOf(fit: Fit, choice: ErrorsChoice): Result<Covariance> {
  switch (choice.kind) {
    case "classical":
      return success(classicalCovariance(fit));
    case "white":
      return success(withDegrees(fit, choice));
    case "newey-west":
      return neweyWestCovariance(fit, choice);
    case "grouped": {
      const { order } = fit.design;
      if (order.kind !== "groups") return failure({ code: "errors-need-order", errors: "grouped", rows: order.kind });
      return success(groupedCovariance(fit, { version: choice.version, order }));
    }
  }
}

/** Where a leverage of one leaves HC2 undefined, neither has HC1 in its place degrees of freedom of its own. */
function withDegrees(fit: Fit, choice: Extract<ErrorsChoice, { kind: "white" }>): Covariance {
  const covariance = whiteCovariance(fit, choice.version);
  if (choice.degrees === undefined) return covariance;
  return { ...covariance, choice, degreesOfFreedom: bellMcCaffreyDegrees(fit) };
}
