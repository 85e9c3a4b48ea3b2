import { describe, expect, it } from "vitest";
import { randomFrom } from "../../support/random.ts";
import { basisRows, columnsOf } from "../../../src/core/numeric/rowSource.ts";
import { differenceMoments, residualDifferences } from "../../../src/core/numeric/successiveDifferences.ts";
import { triangularFactor } from "../../../src/core/numeric/triangularFactor.ts";
import { expectDigits } from "../../support/digits.ts";
import { eigenvaluesOf, product } from "../../support/smallMatrices.ts";

/** Longer than a block, so that a difference crosses its border; one link missing there, one elsewhere. */
const n = 300;
const random = randomFrom(90);
const columns = [new Float64Array(n).fill(1), Float64Array.from({ length: n }, () => random.normal())];
const basis = { columns, triangle: triangularFactor(columns) };
const linked = Uint8Array.from({ length: n }, (_, i) => (i === 0 || i === 40 || i === 256 ? 0 : 1));
const q = columnsOf(basisRows(basis));

/** A as a dense matrix: the sum over links of the outer product of their differences. */
function dense(count: number): number[][] {
  const a = Array.from({ length: count }, () => new Array<number>(count).fill(0));
  for (let i = 1; i < count; i++) {
    if (linked[i] === 0) continue;
    a[i]![i]! += 1;
    a[i - 1]![i - 1]! += 1;
    a[i]![i - 1]! -= 1;
    a[i - 1]![i]! -= 1;
  }
  return a;
}

describe("moments of successive differences", () => {
  it("are those of the dense matrix", () => {
    const a = dense(n);
    const { cross, crossOfSquare, trace, traceOfSquare } = differenceMoments(basis, linked);
    const times = (v: Float64Array): number[] => a.map((row) => row.reduce((sum, value, j) => sum + value * v[j]!, 0));
    const aq = q.map(times);
    const inner = (x: ArrayLike<number>, y: ArrayLike<number>): number =>
      Array.from(x).reduce((sum, value, i) => sum + value * y[i]!, 0);
    [0, 1].forEach((i) => [0, 1].forEach((j) => expect(cross.values[2 * i + j]).toBeCloseTo(inner(q[i]!, aq[j]!), 12)));
    expectDigits(crossOfSquare, inner(aq[0]!, aq[0]!) + inner(aq[1]!, aq[1]!), 11);
    expect(trace).toBe(a.reduce((sum, row, i) => sum + row[i]!, 0));
    expect(traceOfSquare).toBe(a.flat().reduce((sum, value) => sum + value * value, 0));
  });

  it("have the eigenvalues of A among the residuals", () => {
    const count = 60;
    const short = columns.map((column) => column.slice(0, count));
    const some = columnsOf(basisRows({ columns: short, triangle: triangularFactor(short) }));
    const project = Array.from({ length: count }, (_, i) =>
      Array.from(
        { length: count },
        (__, j) => (i === j ? 1 : 0) - some.reduce((sum, column) => sum + column[i]! * column[j]!, 0),
      ),
    );
    const m = { size: count, values: Float64Array.from(project.flat()) };
    const mam = product(product(m, { size: count, values: Float64Array.from(dense(count).flat()) }), m);
    const symmetric = mam.values.map(
      (value, index) => (value + mam.values[(index % count) * count + Math.floor(index / count)]!) / 2,
    );
    const expected = eigenvaluesOf({ size: count, values: symmetric }).toReversed();
    const found = eigenvaluesOf(residualDifferences(some, linked.slice(0, count))).toReversed();
    found.forEach((value, i) => expect(Math.abs(value - expected[i]!)).toBeLessThan(1e-12));
    expect(found).toHaveLength(58);
  });
});
