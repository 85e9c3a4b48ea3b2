import { readFileSync, readdirSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { leastSquares, type Solution } from "../../../src/core/numeric/leastSquares.ts";
import { randomFrom } from "../../support/random.ts";
import { triangularFactor } from "../../../src/core/numeric/triangularFactor.ts";
import { digitsOf } from "../../support/digits.ts";

interface Certified {
  readonly id: string;
  readonly n: number;
  readonly k: number;
  readonly design_by_row: readonly (readonly number[])[];
  readonly y: readonly number[];
  readonly certified_coefficients: readonly number[];
  readonly certified_standard_errors: readonly number[];
  readonly digits_possible: number;
}

const folder = new URL("../../reference/nist/", import.meta.url);
const problems = readdirSync(folder).map(
  (file) => JSON.parse(readFileSync(new URL(file, folder), "utf8")) as Certified,
);

const columnsOf = (rows: readonly (readonly number[])[]): Float64Array[] =>
  rows[0]!.map((_, j) => Float64Array.from(rows, (row) => row[j]!));

function solved(columns: readonly Float64Array[], y: Float64Array): Solution {
  const solution = leastSquares(columns, y);
  if (solution.kind === "dependent") throw new Error(`column ${solution.column} is dependent`);
  return solution;
}

const fewest = (found: ArrayLike<number>, certified: readonly number[]): number =>
  Math.min(
    ...certified.map((value, j) => (value === 0 && Math.abs(found[j]!) < 1e-9 ? 16 : digitsOf(found[j]!, value))),
  );

describe("NIST's linear least squares problems", () => {
  it("are all eleven there", () => expect(problems).toHaveLength(11));

  it.each(problems)("$id: coefficients", ({ design_by_row, y, certified_coefficients, digits_possible }) => {
    const { coefficients } = solved(columnsOf(design_by_row), Float64Array.from(y));
    // Certified values carry fifteen digits: no more can be seen.
    expect(fewest(coefficients, certified_coefficients)).toBeGreaterThan(Math.min(digits_possible, 15) - 0.5);
  });

  it.each(problems)(
    "$id: standard errors",
    ({ design_by_row, y, n, k, certified_standard_errors, digits_possible }) => {
      const { rss, inverseTriangle } = solved(columnsOf(design_by_row), Float64Array.from(y));
      const errors = certified_standard_errors.map((_, j) => {
        const row = inverseTriangle.values.subarray(j * k, (j + 1) * k);
        return Math.sqrt((rss / (n - k)) * row.reduce((sum, value) => sum + value * value, 0));
      });
      // The residual sum of squares of Wampler 3 to 5 is itself sensitive in the fourteenth digit.
      expect(fewest(errors, certified_standard_errors)).toBeGreaterThan(Math.min(digits_possible, 14) - 0.5);
    },
  );
});

describe("Filip's problem, as its powers of x are stored", () => {
  // The exact solution of the doubles given: NIST certifies that of the powers before rounding.
  const exact = (
    JSON.parse(readFileSync(new URL("../../reference/direct.json", import.meta.url), "utf8")) as {
      results: { filip: { coefficients: number[]; classical: number[] } };
    }
  ).results.filip;
  const { design_by_row, y, n, k } = problems.find(({ id }) => id === "nist-filip")!;
  const { coefficients, rss, inverseTriangle } = solved(columnsOf(design_by_row), Float64Array.from(y));

  it("is solved to twelve digits, its standard errors to eleven", () => {
    const errors = exact.classical.map((_, j) => {
      const row = inverseTriangle.values.subarray(j * k, (j + 1) * k);
      return Math.sqrt((rss / (n - k)) * row.reduce((sum, value) => sum + value * value, 0));
    });
    expect(fewest(coefficients, exact.coefficients)).toBeGreaterThan(12);
    expect(fewest(errors, exact.classical)).toBeGreaterThan(11);
  });
});

describe("triangularFactor", () => {
  it("keeps every digit of columns whose squares are no doubles", () => {
    const random = randomFrom(9);
    const columns = Array.from({ length: 3 }, () => Float64Array.from({ length: 700 }, () => random.normal()));
    const plain = triangularFactor(columns).values;
    const powers = [2 ** 700, 2 ** -700, 1];
    const extreme = triangularFactor(columns.map((column, j) => column.map((value) => value * powers[j]!))).values;
    expect([...extreme].map((value, index) => value / powers[index % 3]!)).toEqual([...plain]);
  });
});

describe("leastSquares", () => {
  const random = randomFrom(20240611);
  const column = (n: number): Float64Array => Float64Array.from({ length: n }, () => random.normal());
  const constant = (n: number): Float64Array => new Float64Array(n).fill(1);

  it("solves as many rows as columns exactly", () => {
    const { coefficients, rss } = solved([constant(2), Float64Array.of(1, 3)], Float64Array.of(5, 11));
    expect([...coefficients]).toEqual([2, 3]);
    expect(rss).toBeLessThan(1e-30);
  });

  it("does not depend on how rows fall into blocks", () => {
    const n = 1700;
    const columns = [constant(n), column(n), column(n), column(n), column(n), column(n)];
    const y = column(n);
    const whole = solved(columns, y);
    const reversed = solved(
      columns.map((values) => values.slice().reverse()),
      y.slice().reverse(),
    );
    expect(fewest(reversed.coefficients, [...whole.coefficients])).toBeGreaterThan(13);
    expect(Math.abs(reversed.rss / whole.rss - 1)).toBeLessThan(1e-14);
  });

  it("leaves residuals at right angles to every column", () => {
    const columns = [constant(900), column(900), column(900).map((value) => value * 1e6 + 3e7)];
    const { residuals } = solved(columns, column(900));
    for (const x of columns) {
      const length = Math.hypot(...x) * Math.hypot(...residuals);
      expect(Math.abs(x.reduce((sum, value, i) => sum + value * residuals[i]!, 0)) / length).toBeLessThan(1e-15);
    }
  });

  it("gives R with R'R = X'X, and its inverse", () => {
    const columns = [constant(40), column(40), column(40)];
    const { triangle, inverseTriangle } = solved(columns, column(40));
    for (let i = 0; i < 3; i++) {
      for (let j = 0; j < 3; j++) {
        const product = columns[i]!.reduce((sum, value, row) => sum + value * columns[j]![row]!, 0);
        let square = 0;
        let unit = 0;
        for (let m = 0; m < 3; m++) {
          square += triangle.values[m * 3 + i]! * triangle.values[m * 3 + j]!;
          unit += triangle.values[i * 3 + m]! * inverseTriangle.values[m * 3 + j]!;
        }
        expect(square).toBeCloseTo(product, 10);
        expect(unit).toBeCloseTo(i === j ? 1 : 0, 13);
      }
    }
  });

  it("names a dependent column and what it is made of", () => {
    const [a, b, unused] = [column(50), column(50), column(50)];
    const made = a.map((value, i) => 2 * value - 0.5 * b[i]! + 4);
    const found = leastSquares([constant(50), a, unused, b, made], column(50));
    if (found.kind !== "dependent") throw new Error("not seen");
    expect(found.column).toBe(4);
    expect(found.madeOf.map((part) => part.column)).toEqual([0, 1, 3]);
    found.madeOf.forEach(({ coefficient }, index) => expect(coefficient).toBeCloseTo([4, 2, -0.5][index]!, 10));
  });

  it("calls a column of zeros dependent on nothing", () => {
    expect(leastSquares([constant(9), new Float64Array(9)], column(9))).toEqual({
      kind: "dependent",
      column: 1,
      madeOf: [],
    });
  });

  it("keeps a column that is nearly dependent", () => {
    const a = column(60);
    const near = a.map((value) => value + 1e-8 * random.normal());
    const { condition, coefficients } = solved([constant(60), a, near], a);
    expect(condition).toBeGreaterThan(1e7);
    expect(coefficients[1]).toBeCloseTo(1, 6);
  });

  it("is untouched by units far from one", () => {
    const x = column(30);
    const y = column(30);
    const plain = solved([constant(30), x], y).coefficients;
    const scaled = solved(
      [constant(30), x.map((value) => value * 2 ** 300)],
      y.map((value) => value * 2 ** -200),
    ).coefficients;
    expect(scaled[0]! / 2 ** -200).toBe(plain[0]);
    expect((scaled[1]! * 2 ** 300) / 2 ** -200).toBe(plain[1]);
  });
});
