import { describe, expect, it } from "vitest";
import { explain } from "../../../src/core/numeric/explain.ts";
import { explainFromMoments } from "../../../src/core/numeric/explainFromMoments.ts";
import { productColumns, productMoments } from "../../../src/core/numeric/productMoments.ts";
import { randomFrom, type Random } from "../../support/random.ts";
import { mean, sumOfSquares } from "../../../src/core/numeric/sums.ts";
import { triangularFactor } from "../../../src/core/numeric/triangularFactor.ts";
import { expectDigits } from "../../support/digits.ts";

const n = 700;

/** Drivers of several shapes; the last ones are indicators, whose squares and products are partly dependent. */
const shapes: Readonly<Record<string, (random: Random, i: number) => number>> = {
  normal: (random) => 40 + 3 * random.normal(),
  skewed: (random) => Math.exp(random.normal()),
  trend: (_, i) => 1947 + i,
  third: (_, i) => (i % 3 === 0 ? 1 : 0),
  next: (_, i) => (i % 3 === 1 ? 1 : 0),
};

function basisOf(names: readonly string[], seed: number) {
  const random = randomFrom(seed);
  const drivers = names.map((name) => Float64Array.from({ length: n }, (_, i) => shapes[name]!(random, i)));
  const columns = [new Float64Array(n).fill(1), ...drivers];
  const y = Float64Array.from({ length: n }, () => random.normal() ** 2);
  return { basis: { columns, triangle: triangularFactor(columns) }, y };
}

describe("a regression on all products", () => {
  it.each([
    [["normal"], 3],
    [["normal", "trend"], 6],
    [["skewed", "normal", "trend"], 10],
    // Squares of indicators are the indicators, and the product of two that exclude each other is zero.
    [["third", "next"], 3],
    [["normal", "third", "next"], 7],
    [["skewed", "normal", "trend", "third", "next"], 18],
  ])("of %j is the same from moments as from columns, with %i independent columns", (names, rank) => {
    const { basis, y } = basisOf(names, 41 + names.length);
    const byColumns = explain(productColumns(basis), y);
    const byMoments = explainFromMoments(productMoments(basis, y), sumOfSquares(y, mean(y)));
    expect(byColumns.rank).toBe(rank);
    expect(byMoments.rank).toBe(rank);
    expectDigits(byMoments.explained, byColumns.explained, 11);
    expectDigits(byMoments.residual, byColumns.residual, 12);
    expectDigits(byMoments.total, byColumns.total, 13);
  });
});
