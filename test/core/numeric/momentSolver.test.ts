import { describe, expect, it } from "vitest";
import { leastSquares } from "../../../src/core/numeric/leastSquares.ts";
import { momentSolver } from "../../../src/core/numeric/momentSolver.ts";
import { randomFrom } from "../../support/random.ts";
import {
  addRow,
  addRun,
  movedColumn,
  packedLength,
  rowsInRun,
  runningMoments,
  takeRun,
} from "../../../src/core/numeric/runningMoments.ts";
import { expectDigits } from "../../support/digits.ts";

const rows = 60;

/** Three columns far from zero, of different sizes; the first is the outcome. */
function columns(): Float64Array<ArrayBuffer>[] {
  const random = randomFrom(41);
  const x = Float64Array.from({ length: rows }, () => 1000 + 3 * random.normal());
  const z = Float64Array.from({ length: rows }, () => 0.002 * random.normal() + 0.05);
  const y = x.map((value, i) => 12 - 0.4 * value + 900 * z[i]! + random.normal());
  return [y, x, z];
}

const incomplete = [0, 17, 30];

function setUp() {
  const all = columns();
  const complete = Uint8Array.from({ length: rows }, (_, i) => (incomplete.includes(i) ? 0 : 1));
  const moments = runningMoments(
    all.map((column) => movedColumn(column, complete, { from: 0, to: rows })),
    complete,
  );
  return { all, moments, target: new Float64Array(packedLength(4)) };
}

const listed = (from: number, to: number): number[] =>
  Array.from({ length: to - from }, (_, i) => from + i).filter((row) => !incomplete.includes(row));

/** The regression by QR of the rows listed. */
function direct(all: readonly Float64Array[], kept: readonly number[], constant: boolean) {
  const [y, ...x] = all.map((column) => Float64Array.from(kept, (row) => column[row]!));
  const solution = leastSquares(constant ? [new Float64Array(kept.length).fill(1), ...x] : x, y!);
  if (solution.kind === "dependent") throw new Error("dependent");
  return solution;
}

describe("regressions from running moments", () => {
  it("are those of any run of rows, less some of them", () => {
    const { all, moments, target } = setUp();
    addRun(target, moments, { from: 5, to: 55 });
    takeRun(target, moments, { from: 20, to: 23 });
    const kept = listed(5, 55).filter((row) => row < 20 || row > 22);
    const found = momentSolver(4).solve(target, moments, { outcome: 1, drivers: [2, 3], constant: true });
    const expected = direct(all, kept, true);
    expect(found?.rows).toBe(kept.length);
    expect(rowsInRun(moments, { from: 5, to: 55 })).toBe(48);
    expectDigits(found!.constant, expected.coefficients[0]!, 7);
    expectDigits(found!.slopes[0]!, expected.coefficients[1]!, 8);
    expectDigits(found!.slopes[1]!, expected.coefficients[2]!, 8);
    expectDigits(found!.rss, expected.rss, 8);
  });

  it("take drivers in any order, and rows that stand nowhere", () => {
    const { all, moments, target } = setUp();
    addRun(target, moments, { from: 0, to: rows });
    addRow(target, moments, { values: [3, 1010, 0.07], times: 1 });
    const found = momentSolver(4).solve(target, moments, { outcome: 3, drivers: [2, 1], constant: true });
    const [y, x, z] = all.map((column, j) => Float64Array.from([...column, [3, 1010, 0.07][j]!]));
    const expected = direct([z!, x!, y!], [...listed(0, rows), rows], true);
    expectDigits(found!.slopes[0]!, expected.coefficients[1]!, 8);
    expectDigits(found!.slopes[1]!, expected.coefficients[2]!, 8);
  });

  it("go through the origin without a constant", () => {
    const { all, moments, target } = setUp();
    addRun(target, moments, { from: 0, to: rows });
    const found = momentSolver(4).solve(target, moments, { outcome: 1, drivers: [2, 3], constant: false });
    const expected = direct(all, listed(0, rows), false);
    expect(found?.constant).toBe(0);
    expectDigits(found!.slopes[0]!, expected.coefficients[0]!, 8);
    expectDigits(found!.slopes[1]!, expected.coefficients[1]!, 8);
    expectDigits(found!.rss, expected.rss, 8);
  });

  it("give the drivers' entries of (X'X)^-1", () => {
    const { all, moments, target } = setUp();
    addRun(target, moments, { from: 0, to: rows });
    const solver = momentSolver(4);
    const found = solver.solve(target, moments, { outcome: 1, drivers: [2, 3], constant: true });
    solver.fillBreads();
    const { inverseTriangle } = direct(all, listed(0, rows), true);
    for (const [driver, row] of [
      [0, 1],
      [1, 2],
    ] as const) {
      const entries = [0, 1, 2].map((column) => inverseTriangle.values[row * 3 + column]! ** 2);
      expectDigits(found!.breads[driver]!, entries[0]! + entries[1]! + entries[2]!, 8);
    }
  });

  it("are refused where columns depend on one another, or rows are too few", () => {
    const [y, x] = columns();
    const complete = new Uint8Array(rows).fill(1);
    const twice = x!.map((value) => 2 * value + 1);
    const moved = [y!, x!, twice].map((column) => movedColumn(column, complete, { from: 0, to: rows }));
    const moments = runningMoments(moved, complete);
    const target = new Float64Array(packedLength(4));
    addRun(target, moments, { from: 0, to: rows });
    const model = { outcome: 1, drivers: [2, 3], constant: true };
    expect(momentSolver(4).solve(target, moments, model)).toBeNull();
    target.fill(0);
    addRun(target, moments, { from: 0, to: 2 });
    expect(momentSolver(4).solve(target, moments, { ...model, drivers: [2] })).toBeNull();
  });
});
