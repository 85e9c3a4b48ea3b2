import type { Fit } from "../fit/fit.ts";
import { explain, type Explained } from "../numeric/explain.ts";
import { extremes, mean, sumOfSquares } from "../numeric/sums.ts";
import { constantAndDrivers, fittedValues, relativeSquares } from "./auxiliary.ts";
import { lagrangeMultiplier } from "./lagrangeMultiplier.ts";
import type { TestOutcome } from "./outcome.ts";
import { explainByProducts } from "./whiteProducts.ts";

export type WhiteForm = "squares and cross-products" | "squares" | "fitted values";

/** Rows wanted for each column of the auxiliary regression, or the fuller form loses its power. */
const rowsPerProduct = 3;
const rowsPerSquare = 2;

/**
 * White's test for uneven spread.
 * H0: the error variance does not depend on the drivers, their squares or cross-products. LM = n R^2 of the squared
 * residuals on them; under H0 chi-square with as many degrees of freedom as there are independent columns beside the
 * constant. Squares alone stand in where n < 3 (terms + 1), the fitted values and their squares where even that leaves
 * fewer than 2 rows a column.
 * @param fit - least squares fit of n rows on k columns; where it has no constant the auxiliary regression has one.
 * @param form - a form whatever the rows; by the rule where it is left out.
 * @returns LM >= 0 and the F form, `form` naming the form; not-applicable without a driver or with too few rows.
 * @see White (1980), Econometrica 48, 817-838.
 */
export function whiteTest(fit: Fit, form?: WhiteForm): TestOutcome {
  const chosen = form === undefined ? byRule(fit) : { form, explained: explainForm[form](fit) };
  return lagrangeMultiplier({ test: "white", ...chosen, ...sizesOf(fit), underNull: 1 });
}

/** White's test on the fitted values and their squares, whatever the rows. */
export function whiteFitted(fit: Fit): TestOutcome {
  const explained = onFittedValues(fit);
  return lagrangeMultiplier({ test: "white-fitted", explained, ...sizesOf(fit), underNull: 1 });
}

const sizesOf = (fit: Fit): { rowCount: number; size: number } => ({
  rowCount: fit.rowCount,
  size: sumOfSquares(relativeSquares(fit)),
});

interface Chosen {
  readonly form: WhiteForm;
  readonly explained: Explained;
}

function byRule(fit: Fit): Chosen {
  const products = explainByProducts(fit);
  if (products !== null && fit.rowCount >= rowsPerProduct * products.rank) {
    return { form: "squares and cross-products", explained: products };
  }
  const squares = onSquares(fit);
  if (fit.rowCount >= rowsPerSquare * squares.rank) return { form: "squares", explained: squares };
  return { form: "fitted values", explained: onFittedValues(fit) };
}

const onSquares = (fit: Fit): Explained => explain(withSquares(constantAndDrivers(fit)), relativeSquares(fit));

function onFittedValues(fit: Fit): Explained {
  const [constant] = constantAndDrivers(fit);
  return explain(withSquares([constant!, fittedValues(fit)]), relativeSquares(fit));
}

const explainForm: Readonly<Record<WhiteForm, (fit: Fit) => Explained>> = {
  "squares and cross-products": (fit) => explainByProducts(fit) ?? onSquares(fit),
  squares: onSquares,
  "fitted values": onFittedValues,
};

/** Squares about the middle span the same with the constant and the columns, and are no near copies of them. */
function withSquares([constant, ...columns]: readonly Float64Array[]): Float64Array[] {
  const middled = columns.map(aboutMean);
  return [constant!, ...middled, ...middled.map((column) => column.map((x) => x * x))];
}

function aboutMean(column: Float64Array): Float64Array {
  const centre = mean(column);
  const { least, greatest } = extremes(column);
  const reach = Math.max(greatest - centre, centre - least);
  return reach === 0 ? column : column.map((x) => (x - centre) / reach);
}
