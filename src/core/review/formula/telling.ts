import type { BookName } from "../book.ts";

/** The worksheet functions that fit a straight line or a plane, and what each of them gives. */
export const regressionFunctions = {
  LINEST: "block",
  LOGEST: "block",
  TREND: "predictions",
  GROWTH: "predictions",
  SLOPE: "number",
  INTERCEPT: "number",
  RSQ: "number",
  STEYX: "number",
  CORREL: "number",
  PEARSON: "number",
  FORECAST: "number",
  "FORECAST.LINEAR": "number",
} as const satisfies Record<string, "block" | "predictions" | "number">;

export type RegressionFunction = keyof typeof regressionFunctions;

const called = (names: readonly string[]): string =>
  String.raw`(?<![\p{L}\p{N}_.])(?:_xlfn\.)?(?:${names.map((name) => name.replace(".", String.raw`\.`)).join("|")})\s*\(`;

const regression = new RegExp(called(Object.keys(regressionFunctions)), "iu");

/** Functions that make a total row of the cells above them. */
const totals = new RegExp(called(["SUM", "SUBTOTAL", "AGGREGATE", "AVERAGE"]), "iu");

export const isRegressionFormula = (formula: string): boolean => regression.test(formula);

export const isTotalFormula = (formula: string): boolean => totals.test(formula);

/** Tells the formulas that can bear on a regression: those that show one, and those that make a total. */
export function isTelling(names: readonly BookName[]): (formula: string) => boolean {
  const shows = showsRegression(names);
  return (formula) => shows(formula) || isTotalFormula(formula);
}

/** Tells the formulas that call a regression function, or a name that stands for one. */
export function showsRegression(names: readonly BookName[]): (formula: string) => boolean {
  const standing = names.filter(({ refersTo }) => isRegressionFormula(refersTo)).map(({ name }) => name);
  const isNamed = mentions(standing);
  return (formula) => isRegressionFormula(formula) || isNamed(formula);
}

/** Tells the formulas that speak of one of some names. */
export function mentions(names: readonly string[]): (formula: string) => boolean {
  const named = names.length === 0 ? null : new RegExp(mentioned(names), "iu");
  return (formula) => named?.test(formula) === true;
}

const mentioned = (names: readonly string[]): string =>
  String.raw`(?<![\p{L}\p{N}_.])(?:${names.map((name) => name.replaceAll(/[\\.?]/g, String.raw`\$&`)).join("|")})(?![\p{L}\p{N}_.(])`;
