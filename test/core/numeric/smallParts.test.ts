import { describe, expect, it } from "vitest";
import { explain, explainWithin } from "../../../src/core/numeric/explain.ts";
import { leastSquares } from "../../../src/core/numeric/leastSquares.ts";
import {
  ascendingRows,
  inOrder,
  isAscending,
  pairNumbers,
  rowsAbove,
  smallestRows,
} from "../../../src/core/numeric/ordering.ts";
import { randomFrom } from "../../support/random.ts";
import {
  bilinear,
  invert,
  matrixOf,
  sandwich,
  singularValues,
  spectralRadius,
  symmetricFunction,
} from "../../../src/core/numeric/smallMatrix.ts";
import { extremes, innerProduct, mean, sum, sumOfSquares } from "../../../src/core/numeric/sums.ts";
import { symmetricEigenvalues } from "../../../src/core/numeric/symmetricEigenvalues.ts";
import {
  extentOf,
  laggedProducts,
  onGrid,
  rowsWithPredecessor,
  separated,
} from "../../../src/core/numeric/timeGrid.ts";
import { triangularFactor } from "../../../src/core/numeric/triangularFactor.ts";
import { expectDigits } from "../../support/digits.ts";
import { product } from "../../support/smallMatrices.ts";

const random = randomFrom(11);
const column = (n: number): Float64Array<ArrayBuffer> => Float64Array.from({ length: n }, () => random.normal());

describe("explain", () => {
  const n = 400;
  const [ones, a, b, y] = [new Float64Array(n).fill(1), column(n), column(n), column(n).map((value) => value + 40)];

  it("splits the sum of squares about the mean as the regression does", () => {
    const { explained, residual, total, rank } = explain([ones, a, b], y);
    const solution = leastSquares([ones, a, b], y);
    if (solution.kind === "dependent") throw new Error("dependent");
    expectDigits(total, sumOfSquares(y, mean(y)), 12);
    expectDigits(residual, solution.rss, 12);
    expectDigits(explained, sumOfSquares(y, mean(y)) - solution.rss, 10);
    expect(rank).toBe(3);
  });

  it("about zero where that is asked for", () => {
    const { explained, residual, total } = explain([a, b], y, "zero");
    expectDigits(total, sumOfSquares(y), 12);
    expectDigits(explained + residual, total, 14);
  });

  it("passes over columns that say nothing new", () => {
    const made = a.map((value, i) => value - 3 * b[i]!);
    const plain = explain([ones, a, b], y);
    const more = explain([ones, a, b, made, ones], y);
    expect(more.rank).toBe(3);
    expectDigits(more.explained, plain.explained, 12);
    expectDigits(more.residual, plain.residual, 12);
  });

  it("keeps the digits of what is explained where it is next to nothing", () => {
    const size = 200_000;
    const constant = new Float64Array(size).fill(1);
    const x = Float64Array.from({ length: size }, (_, i) => (i % 2 === 0 ? 1 : -1));
    // Uncorrelated with x but for 1e-7 of it.
    const target = Float64Array.from({ length: size }, (_, i) => 5 + (i % 4 < 2 ? 1 : -1) + 1e-7 * x[i]!);
    expectDigits(explain([constant, x], target).explained, size * 1e-14, 6);
  });

  it("answers many regressions from one triangle", () => {
    const factor = triangularFactor([ones, a, b, y]);
    for (const drivers of [
      [0, 1],
      [0, 2],
      [2, 0],
      [0, 1, 2],
    ]) {
      const within = explainWithin(factor, { drivers, target: 3, about: "zero" });
      const alone = explain(
        drivers.map((j) => [ones, a, b][j]!),
        y,
        "zero",
      );
      expectDigits(within.explained, alone.explained, 12);
      expectDigits(within.residual, alone.residual, 12);
    }
  });
});

describe("sums", () => {
  it("keep what rounding would lose", () => {
    expect(sum(Float64Array.of(1e16, 1, -1e16, 1))).toBe(2);
    expect(innerProduct(Float64Array.of(1e16, 1, -1e16), Float64Array.of(1, 3, 1))).toBe(3);
    expect(sumOfSquares(Float64Array.of(1e8, 1, 1, 1))).toBe(1e16 + 3 + 1);
    expect(sumOfSquares(Float64Array.of(2, 4, 9), 5)).toBe(26);
    expect(mean(Float64Array.of(2, 4, 9))).toBe(5);
    expect(extremes(Float64Array.of(2, -4, 9))).toEqual({ least: -4, greatest: 9 });
  });
});

describe("row orders", () => {
  it("sort, keeping equal keys in their order", () => {
    const rows = ascendingRows(Int32Array.of(3, 1, 3, 0, 1));
    expect([...rows]).toEqual([3, 1, 4, 0, 2]);
    expect([...inOrder(Float64Array.of(10, 11, 12, 13, 14), rows)]).toEqual([13, 11, 14, 10, 12]);
    expect([isAscending(Int32Array.of(0, 0, 4)), isAscending(Int32Array.of(0, 5, 4))]).toEqual([true, false]);
    expect(rowsAbove(Float64Array.of(1, 5, 2, 5), 2)).toEqual([1, 3]);
  });

  it("split at a count of the smallest, earlier rows first among equals", () => {
    const keys = Float64Array.of(4, 1, 4, 9, 4, -2, 4);
    const rows = (count: number): number[][] => smallestRows(keys, count).map((part) => [...part]);
    expect(rows(0)).toEqual([[], [0, 1, 2, 3, 4, 5, 6]]);
    expect(rows(2)).toEqual([
      [1, 5],
      [0, 2, 3, 4, 6],
    ]);
    expect(rows(4)).toEqual([
      [0, 1, 2, 5],
      [3, 4, 6],
    ]);
    expect(rows(6)).toEqual([[0, 1, 2, 4, 5, 6], [3]]);
  });

  it("number pairs as they come", () => {
    expect([...pairNumbers(Int32Array.of(0, 0, 1, 0, 1), Int32Array.of(2, 0, 2, 2, 0))]).toEqual([0, 1, 2, 0, 3]);
  });
});

describe("time grids", () => {
  const positions = Int32Array.of(4, 5, 9, 2, 3, 4);
  const groups = Int32Array.of(0, 0, 0, 1, 1, 1);

  it("move groups apart and leave the distances within them", () => {
    expect([...separated(positions, groups, 3)]).toEqual([0, 1, 5, 9, 10, 11]);
    expect([...separated(positions.subarray(0, 3), null, 3)]).toEqual([0, 1, 5]);
    expect(extentOf(positions, groups)).toEqual({ rows: 3, span: 6 });
    expect(extentOf(positions.subarray(0, 3), null)).toEqual({ rows: 3, span: 6 });
  });

  it("know which rows follow on, and lay values out in time", () => {
    const apart = separated(positions, groups, 3);
    expect([...rowsWithPredecessor(apart)]).toEqual([1, 4, 5]);
    const grid = onGrid(Float64Array.of(2, 3, 5), Float64Array.of(0, 1, 4));
    expect([...grid]).toEqual([2, 3, 0, 0, 5]);
    expect([...laggedProducts(grid, 4)]).toEqual([38, 6, 0, 15, 10]);
  });
});

describe("small matrices", () => {
  const a = matrixOf([
    [4, 1, 0.5],
    [1, 3, -0.2],
    [0.5, -0.2, 2],
  ]);
  const b = matrixOf([
    [1, 2, 3],
    [0, 1, 4],
    [5, 6, 0],
  ]);

  it("multiply and invert", () => {
    expect([...product(b, a).values.slice(0, 3)]).toEqual([7.5, expect.closeTo(6.4, 14), expect.closeTo(6.1, 14)]);
    expect([...product(b, invert(b)).values].map((value) => Math.round(value * 1e12) / 1e12 + 0)).toEqual([
      1, 0, 0, 0, 1, 0, 0, 0, 1,
    ]);
    expect(bilinear([1, 2, 3], a, [0, 1, -1])).toBeCloseTo(1 * 0.5 + 2 * 3.2 + 3 * -2.2, 13);
    expect(sandwich(b, a).values[1]).toBe(sandwich(b, a).values[3]);
  });

  it("have singular values in descending order, whose squares are eigenvalues", () => {
    const { size, values } = b;
    const transposed = values.map((_, index) => values[(index % size) * size + Math.floor(index / size)]!);
    const squares = symmetricEigenvalues(product({ size, values: transposed }, b)).reverse();
    [...singularValues(b).values].forEach((value, i) => expect(value ** 2).toBeCloseTo(squares[i]!, 11));
  });

  it("have roots", () => {
    const root = symmetricFunction(a, Math.sqrt);
    product(root, root).values.forEach((value, index) => expect(value).toBeCloseTo(a.values[index]!, 13));
  });

  it("know their largest root, complex ones included", () => {
    expect(
      spectralRadius(
        matrixOf([
          [0, -2],
          [2, 0],
        ]),
      ),
    ).toBeCloseTo(2, 14);
    expect(
      spectralRadius(
        matrixOf([
          [-3, 1],
          [0, 2],
        ]),
      ),
    ).toBeCloseTo(3, 14);
  });
});

describe("random numbers", () => {
  it("are the same for the same seed and others for another", () => {
    const draws = (seed: number): number[] => {
      const { uniform } = randomFrom(seed);
      return [uniform(), uniform(), uniform()];
    };
    expect(draws(1)).toEqual(draws(1));
    expect(draws(1)).not.toEqual(draws(2));
  });

  it("follow xoshiro128** as its authors wrote it, here in whole numbers of any size", () => {
    const word = (value: bigint): bigint => BigInt.asUintN(32, value);
    const rotated = (value: bigint, bits: bigint): bigint => word((value << bits) | (word(value) >> (32n - bits)));
    let counter = 77n;
    const state = Array.from({ length: 4 }, () => {
      counter = word(counter + 0x9e3779b9n);
      const first = word((counter ^ (counter >> 16n)) * 0x21f0aaadn);
      const second = word((first ^ (first >> 15n)) * 0x735a2d97n);
      return second ^ (second >> 15n);
    });
    const next = (): number => {
      const result = word(rotated(word(state[1]! * 5n), 7n) * 9n);
      const shifted = word(state[1]! << 9n);
      state[2]! ^= state[0]!;
      state[3]! ^= state[1]!;
      state[1]! ^= state[2]!;
      state[0]! ^= state[3]!;
      state[2]! ^= shifted;
      state[3] = rotated(state[3]!, 11n);
      return Number(result);
    };
    const { uniform } = randomFrom(77);
    for (let draw = 0; draw < 100; draw++) {
      const expected = ((next() >>> 5) * 2 ** 26 + (next() >>> 6) + 0.5) / 2 ** 53;
      expect(uniform()).toBe(expected);
    }
  });

  it("below a count are whole and cover it", () => {
    const { below } = randomFrom(1);
    const draws = Array.from({ length: 200 }, () => below(6));
    expect([...new Set(draws)].sort()).toEqual([0, 1, 2, 3, 4, 5]);
  });

  it("have the moments of their laws", () => {
    const { uniform, normal } = randomFrom(20240501);
    const n = 200_000;
    const uniforms = Float64Array.from({ length: n }, uniform);
    const normals = Float64Array.from({ length: n }, normal);
    // Four standard errors of each moment.
    expect(Math.abs(mean(uniforms) - 0.5)).toBeLessThan(4 * Math.sqrt(1 / 12 / n));
    expect(Math.abs(mean(normals))).toBeLessThan(4 / Math.sqrt(n));
    expect(Math.abs(sumOfSquares(normals) / n - 1)).toBeLessThan(4 * Math.sqrt(2 / n));
    expect(Math.abs(mean(normals.map((z) => z ** 4)) - 3)).toBeLessThan(4 * Math.sqrt(96 / n));
    const lagged = normals.subarray(1).map((z, i) => z * normals[i]!);
    expect(Math.abs(mean(lagged))).toBeLessThan(4 / Math.sqrt(n));
    expect(Math.min(...uniforms.subarray(0, 1000))).toBeGreaterThan(0);
  });
});
