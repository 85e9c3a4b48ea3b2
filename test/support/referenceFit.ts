import { readFileSync } from "node:fs";
import type { Design, RowOrder, Term } from "../../src/core/design/design.ts";
import type { Fit } from "../../src/core/fit/fit.ts";
import { fitLeastSquares } from "../../src/core/fit/fitLeastSquares.ts";

/** A data set with the figures that an independent library found for it. */
export interface Reference {
  readonly id: string;
  readonly rows: "time" | "unordered" | "group";
  readonly n: number;
  readonly k: number;
  readonly y: readonly number[];
  readonly X: readonly (readonly number[])[];
  readonly drivers: readonly string[];
  readonly group?: readonly (number | string)[];
  readonly tests: Readonly<Record<string, ReferenceTest>>;
  readonly vif?: readonly number[] | number;
  readonly influence_top5_by_cook: Readonly<Record<"row" | "leverage" | "cook" | "rstudent" | "dffits", number[]>>;
  readonly joint_all_slopes: Readonly<
    Record<"classical" | "HC3", Readonly<Record<"chisq" | "df" | "p_chisq" | "F" | "p_F", number>>>
  >;
  readonly HC2_bell_mccaffrey?: Readonly<Record<"se" | "df" | "p", number[]>>;
}

export interface ReferenceTest {
  readonly statistic: number;
  readonly df?: number | readonly number[];
  readonly p: number;
  readonly [other: string]: unknown;
}

export const referenceIds = [
  "cars",
  "consumption-lag",
  "credit-card",
  "grunfeld",
  "investment",
  "longley",
  "mandible",
  "mtcars",
  "nile-trend",
  "orange-juice-6-lags",
  "petersen",
  "public-schools",
  "school-scores-1",
  "school-scores-3",
  "stackloss",
  "wages",
] as const;

/** A single driver's name stands in the files without a list around it. */
export function reference(id: string): Reference {
  const found = JSON.parse(readFileSync(new URL(`../reference/${id}.json`, import.meta.url), "utf8")) as Reference;
  return { ...found, drivers: [found.drivers].flat() };
}

/** A design from plain columns: a constant first unless left out, numbers after it. */
export function designOf(
  y: readonly number[],
  columns: readonly (readonly number[])[],
  options: DesignOptions = {},
): Design {
  const { names = columns.map((_, j) => `x${j + 1}`), order = { kind: "cases" }, constant = true } = options;
  const numbers = columns.map((values, j): Term => ({
    name: names[j]!,
    meaning: { kind: "number", column: names[j]!, transform: { kind: "none" } },
    values: Float64Array.from(values),
  }));
  const ones: Term = { name: "constant", meaning: { kind: "constant" }, values: new Float64Array(y.length).fill(1) };
  return {
    outcome: { name: "y", column: "y", transform: { kind: "none" }, values: Float64Array.from(y) },
    terms: constant ? [ones, ...numbers] : numbers,
    hasConstant: constant,
    rowCount: y.length,
    order,
    sourceRows: Int32Array.from(y, (_, i) => i),
    leftOut: [],
    leftOutCount: 0,
    notes: [],
  };
}

export interface DesignOptions {
  readonly names?: readonly string[];
  readonly order?: RowOrder;
  readonly constant?: boolean;
}

/** Rows through time; without positions every period has its row. */
export function throughTime(
  n: number,
  positions: readonly number[] = Array.from({ length: n }, (_, i) => i),
): RowOrder {
  const gaps = positions.at(-1)! - positions[0]! + 1 - n;
  return {
    kind: "time",
    positions: Int32Array.from(positions),
    period: { name: "row by row", unit: "row", season: 1 },
    labels: { first: "1", last: String(n) },
    gaps,
    gapLabels: [],
  };
}

export function inGroups(groups: readonly number[], positions: readonly number[] | null = null): RowOrder {
  return {
    kind: "groups",
    groups: Int32Array.from(groups),
    labels: Array.from(new Set(groups), String),
    second: null,
    positions: positions === null ? null : Int32Array.from(positions),
    by: "group",
  };
}

export function fitOf(design: Design): Fit {
  const fitted = fitLeastSquares(design);
  if (!fitted.ok) throw new Error(fitted.problem.code);
  return fitted.value;
}

export function referenceFit(id: string): Fit {
  const { y, X, drivers, rows, n } = reference(id);
  return fitOf(designOf(y, X, { names: drivers, order: rows === "time" ? throughTime(n) : { kind: "cases" } }));
}
