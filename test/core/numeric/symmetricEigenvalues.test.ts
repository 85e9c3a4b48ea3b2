import { describe, expect, it } from "vitest";
import type { SquareMatrix } from "../../../src/core/numeric/matrix.ts";
import { randomFrom } from "../../support/random.ts";
import { symmetricEigenvalues } from "../../../src/core/numeric/symmetricEigenvalues.ts";
import { eigenvaluesOf } from "../../support/smallMatrices.ts";

const matrixOf = (size: number, entry: (i: number, j: number) => number): SquareMatrix => ({
  size,
  values: Float64Array.from({ length: size * size }, (_, index) => entry(Math.floor(index / size), index % size)),
});

function randomSymmetric(size: number, seed: number): SquareMatrix {
  const random = randomFrom(seed);
  const lower = Array.from({ length: size }, (_, i) => Array.from({ length: i + 1 }, () => random.normal()));
  return matrixOf(size, (i, j) => lower[Math.max(i, j)]![Math.min(i, j)]!);
}

/** Within so many roundings of the largest in size. */
function expectWithin(found: Float64Array, expected: readonly number[], roundings: number): void {
  const largest = Math.max(...expected.map(Math.abs));
  expect(found).toHaveLength(expected.length);
  found.forEach((value, i) => {
    expect(Math.abs(value - expected[i]!)).toBeLessThanOrEqual(roundings * Number.EPSILON * largest);
  });
}

describe("eigenvalues without vectors", () => {
  it.each([1, 2, 3, 8, 33, 120])("are those of another method at size %i", (size) => {
    const a = randomSymmetric(size, size);
    expectWithin(symmetricEigenvalues(a), eigenvaluesOf(a), 100);
  });

  it("are known for steps and for the lesser of two indices", () => {
    const n = 150;
    const steps = matrixOf(n, (i, j) => (i === j ? 2 : Math.abs(i - j) === 1 ? -1 : 0));
    const wave = (i: number, m: number): number => 4 * Math.sin((Math.PI * i) / (2 * m)) ** 2;
    expectWithin(
      symmetricEigenvalues(steps),
      Array.from({ length: n }, (_, i) => wave(i + 1, n + 1)),
      10,
    );
    // The inverse of min(i, j) has steps in it, with 1 in the last place of the diagonal.
    const lesser = matrixOf(n, (i, j) => Math.min(i, j) + 1);
    const known = Array.from({ length: n }, (_, i) => 1 / wave(2 * (n - i) - 1, 2 * n + 1));
    expectWithin(symmetricEigenvalues(lesser), known, 20);
  });

  it("repeat where the matrix repeats itself, and fall into blocks", () => {
    const ones = matrixOf(30, () => 1);
    expectWithin(symmetricEigenvalues(ones), [...new Array<number>(29).fill(0), 30], 4);
    const blocks = matrixOf(6, (i, j) => (i === j ? [5, 5, -2, 7, 0, 0][i]! : i + j === 9 ? 3 : 0));
    expectWithin(
      symmetricEigenvalues(blocks),
      [-3, -2, 3, 5, 5, 7].toSorted((p, q) => p - q),
      4,
    );
    expect([...symmetricEigenvalues(matrixOf(4, () => 0))]).toEqual([0, 0, 0, 0]);
    expect(symmetricEigenvalues({ size: 0, values: new Float64Array(0) })).toHaveLength(0);
  });

  it("leave the matrix as it was and read its lower triangle", () => {
    const a = randomSymmetric(7, 1);
    const before = a.values.slice();
    const lowerOnly = matrixOf(7, (i, j) => (j > i ? NaN : a.values[7 * i + j]!));
    expect(symmetricEigenvalues(lowerOnly)).toEqual(symmetricEigenvalues(a));
    expect(a.values).toEqual(before);
  });
});
