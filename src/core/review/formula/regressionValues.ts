import { type CellPlace, numberAt, sheetNamed } from "../cellsOfBook.ts";
import type { Quantity } from "../claim.ts";
import { formOf } from "../forms.ts";
import { type Ingredient, constantOf, ingredientsOf } from "./ingredients.ts";
import { numberIn } from "./numbersIn.ts";
import type { Scope } from "./places.ts";
import type { Regression, UsedLine } from "./foundRegression.ts";
import { linesIn, truthOf } from "./regression.ts";
import type { RegressionFunction } from "./telling.ts";
import type { Formula } from "./tree.ts";
import { type Measure, type Value, after, asMeasure, coefficient, known, measured, unknown } from "./values.ts";
import { whyUnread } from "./whyUnread.ts";

/** The arguments of a call, and where they are at home. */
export interface Given {
  readonly given: readonly Formula[];
  readonly scope: Scope;
}

/** What each function gives of its regression. */
export const valuesOfCalls: Readonly<Record<RegressionFunction, (regression: Regression, call: Given) => Value>> = {
  LINEST: block,
  LOGEST: block,
  TREND: (regression, { given, scope }) => predictions(regression, given[2], scope),
  GROWTH: (regression, { given, scope }) => predictions(regression, given[2], scope),
  FORECAST: (regression, { given, scope }) => predictions(regression, given[0], scope),
  "FORECAST.LINEAR": (regression, { given, scope }) => predictions(regression, given[0], scope),
  SLOPE: (regression) => coefficient(regression, 0),
  INTERCEPT: (regression) => coefficient(regression, null),
  RSQ: (regression) => measured(regression, { kind: "r-squared" }),
  STEYX: (regression) => measured(regression, { kind: "sigma" }),
  CORREL: (regression) => measured(regression, { kind: "correlation" }),
  PEARSON: (regression) => measured(regression, { kind: "correlation" }),
};

/**
 * The block that LINEST gives with its statistics: the coefficients of the drivers from the last to the first, then the
 * constant; their standard errors; R squared and sigma; F and the degrees of freedom; the two sums of squares.
 */
function block(regression: Regression, { given }: Given): Value {
  const { drivers, constant } = regression;
  const terms = [...drivers.map((_, term) => term).reverse(), null];
  const none = unknown(whyUnread.beyondTheBlock("LINEST"));
  const coefficients = terms.map((term) =>
    // Without a constant its place holds a zero.
    term === null && !constant ? known(0) : unlogged(regression, coefficient(regression, term)),
  );
  const errors = terms.map((term) =>
    term === null && !constant ? none : measured(regression, { kind: "standard-error", term }),
  );
  const pairs = pairsBelow.map(([first, second]) =>
    terms.map((_, column) => {
      const kind = column === 0 ? first : column === 1 ? second : null;
      return kind === null ? none : measured(regression, { kind });
    }),
  );
  return { kind: "block", rows: withStatistics(given[3]) ? [coefficients, errors, ...pairs] : [coefficients] };
}

/** Without a word there are none; where it is worked out at calculation, the cells that are filled tell. */
const withStatistics = (given: Formula | undefined): boolean =>
  given !== undefined && given.kind !== "missing" && truthOf(given) !== false;

type Plain = Exclude<
  Quantity["kind"],
  "coefficient" | "standard-error" | "ratio" | "p-value" | "low" | "high" | "prediction"
>;

const pairsBelow: readonly (readonly [Plain, Plain])[] = [
  ["r-squared", "sigma"],
  ["f", "degrees-of-freedom"],
  ["explained-sum-of-squares", "residual-sum-of-squares"],
];

/** LOGEST and GROWTH show powers: their logarithm is what a regression of the logarithm gives. */
function unlogged(regression: Regression, value: Value): Value {
  const measure = value.kind === "combination" ? asMeasure(value) : value;
  if (!regression.exponential || measure?.kind !== "measure") return value;
  return after(measure, { kind: "back", from: Math.log });
}

/** More rows than these say nothing that the first do not say. */
const mostPredictions = 200;

function predictions(regression: Regression, rows: Formula | undefined, scope: Scope): Value {
  const { drivers, outcome } = regression;
  const given = rows === undefined || rows.kind === "missing" ? null : rows;
  if (given !== null && drivers.length === 1) {
    const typed = typedPredictions(regression, given, scope);
    if (typed !== null) return typed;
  }
  const lines = given === null ? drivers : linesOf(given, regression, scope);
  if (lines === null) return unknown(whyUnread.computedPrediction);
  const down = outcome.area.columns === 1;
  const count = Math.min(mostPredictions, Math.max(lines[0]!.area.rows, lines[0]!.area.columns));
  const found = Array.from({ length: count }, (_, index) => predictionAt(regression, lines, { index, scope }));
  return { kind: "block", rows: down ? found.map((one) => [one]) : [found] };
}

/** Of one driver, at numbers that stand in the formula or at one in a cell; null where the rows are cells. */
function typedPredictions(regression: Regression, given: Formula, scope: Scope): Value | null {
  if (given.kind !== "array") {
    const single = numberIn(given, scope);
    return single === null ? null : prediction(regression, [single]);
  }
  const at = (one: Formula): Value => {
    const number = constantOf(one);
    return number === null ? unknown(whyUnread.computedPrediction) : prediction(regression, [number]);
  };
  return { kind: "block", rows: given.rows.map((row) => row.map(at)) };
}

function linesOf(rows: Formula, { drivers, outcome }: Regression, scope: Scope): readonly UsedLine[] | null {
  const parts = ingredientsOf(rows, scope);
  if (!parts.ok) return null;
  const down = outcome.area.columns === 1;
  const lines = parts.value.flatMap(({ area, ...rest }: Ingredient) => {
    const alongOnly = drivers.length === 1 && Math.min(area.rows, area.columns) === 1;
    return (alongOnly ? [area] : linesIn(area, down)).map((line) => ({ area: line, ...rest }));
  });
  return lines.length === drivers.length ? lines : null;
}

interface At {
  readonly index: number;
  readonly scope: Scope;
}

function predictionAt(regression: Regression, lines: readonly UsedLine[], { index, scope }: At): Value {
  const at = lines.map((line) => enteringAt(line, index, scope));
  const numbers = at.filter((one) => one !== null);
  return numbers.length === at.length ? prediction(regression, numbers) : unknown(whyUnread.computedPrediction);
}

const prediction = (regression: Regression, at: readonly number[]): Measure => {
  const measure = measured(regression, { kind: "prediction", at });
  return regression.exponential ? after(measure, { kind: "back", from: Math.log }) : measure;
};

/** What a line's cell brings into the regression; null where it holds no number. */
function enteringAt({ area, form, factor }: UsedLine, index: number, { book }: Scope): number | null {
  if (form === "position") return index + 1;
  const sheet = sheetNamed(book, area.sheet);
  const down = area.columns === 1;
  if (sheet === null) return null;
  const place: CellPlace = { sheet, row: area.row + (down ? index : 0), column: area.column + (down ? 0 : index) };
  const cell = numberAt(place);
  const value = cell === null ? NaN : factor * formOf[form](cell);
  return Number.isFinite(value) ? value : null;
}
