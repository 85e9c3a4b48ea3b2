import { describe, expect, it } from "vitest";
import { inverseRootOfRest, rootRoom } from "../../../src/core/numeric/inverseRoot.ts";
import { randomFrom } from "../../support/random.ts";
import { times, timesRows } from "../../../src/core/numeric/smallProducts.ts";

const random = randomFrom(77);
const draws = (count: number): Float64Array => Float64Array.from({ length: count }, () => random.normal());

/** A B from the definition. */
const product = (
  a: Float64Array,
  b: Float64Array,
  [rows, inner, columns]: readonly [number, number, number],
): number[] =>
  Array.from({ length: rows * columns }, (_, at) => {
    const [i, j] = [Math.floor(at / columns), at % columns];
    return Array.from({ length: inner }, (__, m) => a[i * inner + m]! * b[m * columns + j]!).reduce((x, y) => x + y, 0);
  });

const transposed = (a: Float64Array, rows: number, columns: number): Float64Array =>
  Float64Array.from({ length: a.length }, (_, at) => a[(at % rows) * columns + Math.floor(at / rows)]!);

const closeTo = (found: ArrayLike<number>, expected: ArrayLike<number>): void => {
  Array.from(expected).forEach((value, i) => expect(found[i]).toBeCloseTo(value, 13));
};

describe("products of small matrices", () => {
  it.each([
    [1, 1, 1],
    [2, 3, 4],
    [3, 4, 5],
    [5, 2, 1],
  ] as const)("%i by %i by %i", (rows, inner, columns) => {
    const [a, b] = [draws(rows * inner), draws(inner * columns)];
    // Room longer than what is asked for, with other numbers in it.
    const out = draws(40);
    times(out, [a, rows], [b, inner, columns]);
    closeTo(out, product(a, b, [rows, inner, columns]));
    const again = draws(40);
    timesRows(again, [a, rows], [transposed(b, inner, columns), columns, inner]);
    closeTo(again, product(a, b, [rows, inner, columns]));
  });
});

describe("(I - M)^(-1/2)", () => {
  /** M = U'U / scale. */
  const gramOf = (size: number, scale: number): Float64Array => {
    const u = draws(size * size);
    return Float64Array.from(product(transposed(u, size, size), u, [size, size, size]), (value) => value / scale);
  };

  it.each([
    { size: 1, scale: 1e4 },
    { size: 4, scale: 1e9 },
    { size: 5, scale: 600 },
    { size: 6, scale: 2000 },
    { size: 5, scale: 60 },
  ])("twice gives (I - M)^(-1), size $size over $scale", ({ size, scale }) => {
    const m = gramOf(size, scale);
    const room = rootRoom(size + 2);
    room.root.fill(3);
    inverseRootOfRest(room, m, size);
    const root = room.root.slice(0, size * size);
    const rest = m.map((value, at) => (at % (size + 1) === 0 ? 1 : 0) - value);
    const square = Float64Array.from(product(root, root, [size, size, size]));
    const one = product(square, rest, [size, size, size]);
    one.forEach((value, at) => expect(value).toBeCloseTo(at % (size + 1) === 0 ? 1 : 0, 14));
  });

  it("is zero where nothing is left", () => {
    const room = rootRoom(2);
    inverseRootOfRest(room, Float64Array.of(1, 0, 0, 0.75), 2);
    closeTo(room.root, [0, 0, 0, 2]);
  });

  it("loses no digit where the series takes over from the eigenvalues", () => {
    for (const trace of [0.0499999, 0.0500001]) {
      const room = rootRoom(1);
      inverseRootOfRest(room, Float64Array.of(trace), 1);
      expect(room.root[0]! * Math.sqrt(1 - trace)).toBeCloseTo(1, 15);
    }
  });
});
