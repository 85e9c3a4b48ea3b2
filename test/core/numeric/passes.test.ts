import { describe, expect, it } from "vitest";
import { visitBasis } from "../../../src/core/numeric/basis.ts";
import { combinationMoments } from "../../../src/core/numeric/combinationMoments.ts";
import { squaredRowLengths, weightedCrossProducts } from "../../../src/core/numeric/crossProducts.ts";
import { filterColumns } from "../../../src/core/numeric/fourier.ts";
import { addGram, addScore, copyRows, visitGroups } from "../../../src/core/numeric/groupParts.ts";
import { keepRows, takeLessEarlier } from "../../../src/core/numeric/lessEarlier.ts";
import { movingWindowProducts } from "../../../src/core/numeric/movingWindows.ts";
import { rowsOf } from "../../../src/core/numeric/ordering.ts";
import { randomFrom } from "../../support/random.ts";
import { basisRows, columnsOf, combinedRows, storedRows, weightedRows } from "../../../src/core/numeric/rowSource.ts";
import { triangularFactor } from "../../../src/core/numeric/triangularFactor.ts";

const random = randomFrom(3);
const column = (n: number): Float64Array<ArrayBuffer> => Float64Array.from({ length: n }, () => random.normal());
const dot = (x: Float64Array, y: Float64Array): number => x.reduce((sum, value, i) => sum + value * y[i]!, 0);

/** Odd and even numbers of columns, rows that do and do not fill their blocks. */
const shapes = [
  { n: 7, k: 1 },
  { n: 256, k: 4 },
  { n: 257, k: 5 },
  { n: 1300, k: 7 },
];

describe.each(shapes)("passes over $n rows of $k columns", ({ n, k }) => {
  const columns = [new Float64Array(n).fill(1), ...Array.from({ length: k - 1 }, () => column(n))];
  const basis = { columns, triangle: triangularFactor(columns) };
  const q = columnsOf(basisRows(basis));
  const weights = column(n).map(Math.abs);

  it("the basis is orthonormal and spans the columns", () => {
    q.forEach((left, i) => q.forEach((right, j) => expect(dot(left, right)).toBeCloseTo(i === j ? 1 : 0, 13)));
    columns.forEach((x, j) => {
      const back = x.map((_, row) => q.reduce((sum, qi, i) => sum + qi[row]! * basis.triangle.values[i * k + j]!, 0));
      back.forEach((value, row) => expect(value).toBeCloseTo(x[row]!, 12));
    });
  });

  it("blocks come in order and cover every row once", () => {
    const seen: number[] = [];
    visitBasis(basis, ({ first, rows }) => seen.push(...Array.from({ length: rows }, (_, i) => first + i)));
    expect(seen).toEqual(Array.from({ length: n }, (_, i) => i));
  });

  it("weighted cross-products are their sums", () => {
    const twice = weights.map((w) => 2 * w);
    const [once, doubled] = weightedCrossProducts(basis, [weights, twice]);
    q.forEach((left, i) =>
      q.forEach((right, j) => {
        const expected = dot(
          left.map((value, row) => value * weights[row]!),
          right,
        );
        expect(once!.values[i * k + j]).toBeCloseTo(expected, 12);
        expect(doubled!.values[i * k + j]).toBeCloseTo(2 * expected, 12);
      }),
    );
  });

  it("row lengths", () => {
    squaredRowLengths(basis).forEach((length, row) => {
      const expected = q.reduce((sum, qi) => sum + qi[row]! ** 2, 0);
      expect(length).toBeCloseTo(expected, 13);
    });
  });

  it("moments of several combinations of the basis", () => {
    const combinations = [column(k), column(k)];
    const [divisors, factors] = [column(n).map((value) => 1 + value ** 2), column(n)];
    const found = combinationMoments(basis, combinations, { divisors, factors });
    combinations.forEach((z, l) => {
      const d = weights.map((_, row) => q.reduce((sum, qi, i) => sum + qi[row]! * z[i]!, 0) ** 2 / divisors[row]!);
      expect(found[l]!.squares).toBeCloseTo(
        d.reduce((sum, value, row) => sum + value ** 2 * factors[row]!, 0),
        10,
      );
      q.forEach((left, i) =>
        q.forEach((right, j) => {
          const product = d.reduce((sum, value, row) => sum + value * left[row]! * right[row]!, 0);
          expect(found[l]!.inside.values[i * k + j]).toBeCloseTo(product, 10);
        }),
      );
    });
  });

  it("groups add up their rows, wherever blocks end", () => {
    const groups = Int32Array.from({ length: n }, (_, i) => Math.floor(Math.sqrt(i)));
    const ended: number[] = [];
    const score = new Float64Array(k);
    const gram = new Float64Array(k * k);
    const copied = new Float64Array(n * k);
    let count = 0;
    visitGroups(basisRows(basis), groups, (part) => {
      addScore(score, part, weights);
      addGram(gram, part);
      count = copyRows(copied, count, { part, size: k });
      if (!part.last) return;
      const group = groups[part.first + part.from]!;
      const rows = [...groups.keys()].filter((row) => groups[row] === group);
      ended.push(group);
      expect(count).toBe(rows.length);
      q.forEach((left, i) => {
        rows.forEach((row, place) => expect(copied[place * k + i]).toBe(left[row]));
        const total = rows.reduce((sum, row) => sum + left[row]! * weights[row]!, 0);
        expect(score[i]).toBeCloseTo(total, 12);
        q.forEach((right, j) => {
          const product = rows.reduce((sum, row) => sum + left[row]! * right[row]!, 0);
          expect(gram[i * k + j]).toBeCloseTo(product, 12);
        });
      });
      score.fill(0);
      gram.fill(0);
      count = 0;
    });
    expect(ended).toEqual([...new Set(groups)]);
  });

  it.each([0, 3, 300])("moving windows of %i lags are the Bartlett sum", (lags) => {
    const positions = new Float64Array(n);
    for (let i = 1; i < n; i++) positions[i] = positions[i - 1]! + (random.uniform() < 0.9 ? 1 : 1 + random.below(9));
    const rows = columnsOf(weightedRows(basis, weights));
    const found = movingWindowProducts(weightedRows(basis, weights), positions, lags);
    expect(movingWindowProducts(storedRows(rows), positions, lags)).toEqual(found);
    const expected = new Float64Array(k * k);
    for (let t = 0; t < n; t++) {
      for (let s = t; s < n && positions[s]! - positions[t]! <= lags; s++) {
        const weight = lags + 1 - (positions[s]! - positions[t]!);
        for (let i = 0; i < k; i++) {
          for (let j = 0; j < k; j++) {
            const both = rows[i]![t]! * rows[j]![s]! + (s === t ? 0 : rows[i]![s]! * rows[j]![t]!);
            expected[i * k + j]! += weight * both;
          }
        }
      }
    }
    expected.forEach((value, index) => {
      const scale = Math.sqrt(expected[Math.floor(index / k) * (k + 1)]! * expected[(index % k) * (k + 1)]!);
      expect(Math.abs(found.values[index]! - value) / scale).toBeLessThan(1e-13);
    });
  });
});

describe("moving windows", () => {
  it("forget a spike to the last digit once it has left, with all that was added while it was there", () => {
    const n = 1000;
    const small = Float64Array.from({ length: n }, (_, i) => Math.sin(i + 1));
    const spiked = small.map((value, i) => (i === 0 ? 1e17 : value));
    const late = small.map((value, i) => (i < 10 ? 0 : value));
    const positions = Float64Array.from({ length: n }, (_, i) => i);
    // The late column's windows are zero as long as the spike is in those of the first.
    const crossed = (first: Float64Array<ArrayBuffer>): number =>
      movingWindowProducts(storedRows([first, late]), positions, 6).values[1]!;
    expect(Math.abs(crossed(spiked) / crossed(small) - 1)).toBeLessThan(1e-13);
  });
});

describe("rows less what follows from the row before", () => {
  it.each([1, 2, 256, 257, 258, 700])("are x_t - A x_(t-1), %i rows", (n) => {
    const columns = [column(n), column(n), column(n)];
    const original = columns.map((values) => values.slice());
    const transition = { size: 3, values: column(9) };
    takeLessEarlier(columns, transition);
    columns.forEach((values, j) => {
      values.forEach((value, t) => {
        const from = (m: number): number => (t === 0 ? 0 : transition.values[3 * j + m]! * original[m]![t - 1]!);
        expect(value).toBeCloseTo(original[j]![t]! - from(0) - from(1) - from(2), 12);
      });
    });
  });

  it("are moved together where some are left out", () => {
    const kept = keepRows([Float64Array.of(5, 6, 7, 8, 9), Float64Array.of(1, 2, 3, 4, 0)], Int32Array.of(1, 3, 4));
    expect(kept.map((values) => [...values])).toEqual([
      [6, 8, 9],
      [2, 4, 0],
    ]);
  });

  it("read rows in place where they stand together", () => {
    const values = Float64Array.of(5, 6, 7, 8, 9);
    expect([...rowsOf(values, Int32Array.of(1, 2, 3))]).toEqual([6, 7, 8]);
    expect(rowsOf(values, Int32Array.of(1, 2, 3)).buffer).toBe(values.buffer);
    expect([...rowsOf(values, Int32Array.of(1, 2, 4))]).toEqual([6, 7, 9]);
    expect([...rowsOf(values, new Int32Array(0))]).toEqual([]);
  });

  it("combine as weights say, from rows that stand ready and from those formed on the way", () => {
    const columns = [column(300), column(300)];
    const basis = { columns, triangle: triangularFactor(columns) };
    const weights = Float64Array.of(2, -3);
    const expected = columnsOf(basisRows(basis)).map((values) => [...values]);
    const found = combinedRows(basisRows(basis), weights);
    found.forEach((value, i) => expect(value).toBeCloseTo(2 * expected[0]![i]! - 3 * expected[1]![i]!, 13));
    expect([...combinedRows(storedRows(columnsOf(basisRows(basis))), weights)]).toEqual([...found]);
  });
});

describe("filters", () => {
  it.each([
    { n: 1, reach: 1 },
    { n: 5, reach: 9 },
    { n: 64, reach: 64 },
    { n: 300, reach: 40 },
  ])("of $reach weights over $n rows are the sums they stand for", ({ n, reach }) => {
    const columns = [column(n), column(n), column(n)];
    const weights = column(reach);
    const filtered = filterColumns(columns, weights);
    expect(filtered).toHaveLength(3);
    columns.forEach((x, j) => {
      for (let t = 0; t < n; t++) {
        let sum = 0;
        for (let s = 0; s < n; s++) sum += (weights[Math.abs(t - s)] ?? 0) * x[s]!;
        expect(filtered[j]![t]).toBeCloseTo(sum, 11);
      }
    });
  });
});
