import { describe, expect, it } from "vitest";
import { constantAndDrivers, relativeSquares } from "../../../src/core/diagnostics/auxiliary.ts";
import { whiteTest } from "../../../src/core/diagnostics/white.ts";
import { explainByProducts } from "../../../src/core/diagnostics/whiteProducts.ts";
import type { Fit } from "../../../src/core/fit/fit.ts";
import { type Explained, explain } from "../../../src/core/numeric/explain.ts";
import { randomFrom } from "../../support/random.ts";
import { expectDigits } from "../../support/digits.ts";
import { designOf, fitOf } from "../../support/referenceFit.ts";

const random = randomFrom(64);
const draws = (n: number): number[] => Array.from({ length: n }, () => random.normal());

/** Every square and cross-product of the columns as they stand, the constant's among them. */
function plainly(fit: Fit): Explained {
  const columns = constantAndDrivers(fit);
  const products = columns.flatMap((a, i) => columns.slice(i).map((b) => a.map((value, row) => value * b[row]!)));
  return explain(products, relativeSquares(fit));
}

function expectAlike(found: Explained | null, expected: Explained): void {
  expect(found?.rank).toBe(expected.rank);
  expectDigits(found!.explained, expected.explained, 8);
  expectDigits(found!.total, expected.total, 10);
}

describe("squares and cross-products", () => {
  it("explain as much whether their columns or their moments are worked with", () => {
    const fit = fitOf(
      designOf(
        draws(4700),
        Array.from({ length: 29 }, () => draws(4700)),
      ),
    );
    expectAlike(explainByProducts(fit), plainly(fit));
  });

  it("take in a constant where the fit has none", () => {
    const n = 90;
    const fit = fitOf(designOf(draws(n), [draws(n), draws(n).map((value) => value + 3)], { constant: false }));
    const expected = plainly(fit);
    expect(expected.rank).toBe(6);
    expectAlike(explainByProducts(fit), expected);
    expect(whiteTest(fit)).toMatchObject({ form: "squares and cross-products", figure: { df: [5] } });
  });

  it("do without one that the columns make up already", () => {
    const n = 80;
    const first = Array.from({ length: n }, (_, i) => (i % 3 === 0 ? 1 : 0));
    const columns = [first, first.map((value) => 1 - value), draws(n)];
    const fit = fitOf(designOf(draws(n), columns, { constant: false }));
    const expected = plainly(fit);
    expect(expected.rank).toBe(5);
    expectAlike(explainByProducts(fit), expected);
  });

  it("are given up where there are too many, for the squares alone", () => {
    const n = 300;
    const fit = fitOf(
      designOf(
        draws(n),
        Array.from({ length: 71 }, () => draws(n)),
      ),
    );
    expect(explainByProducts(fit)).toBeNull();
    expect(whiteTest(fit)).toMatchObject({ form: "squares", figure: { df: [142] } });
    expect(whiteTest(fit, "squares and cross-products")).toMatchObject({ figure: { df: [142] } });
  });
});
