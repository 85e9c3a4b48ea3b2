import type { Fit } from "../fit/fit.ts";
import { type Result, failure, success } from "../problem/result.ts";
import type { Covariance, ErrorsChoice } from "./choice.ts";
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
      return success(whiteCovariance(fit, choice.version));
    case "newey-west":
      return neweyWestCovariance(fit, choice);
    case "grouped": {
      const { order } = fit.design;
      if (order.kind !== "groups") return failure({ code: "errors-need-order", errors: "grouped", rows: order.kind });
      return success(groupedCovariance(fit, { version: choice.version, order }));
    }
  }
}
