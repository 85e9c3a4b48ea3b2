import { describe, expect, it } from "vitest";
import { covarianceOf } from "../../../src/core/covariance/covarianceOf.ts";
import type { Fit } from "../../../src/core/fit/fit.ts";
import type { SquareMatrix } from "../../../src/core/numeric/matrix.ts";
import { randomFrom } from "../../support/random.ts";
import { symmetricFunction } from "../../../src/core/numeric/smallMatrix.ts";
import { expectAllDigits } from "../../support/referenceErrors.ts";
import { designOf, fitOf, inGroups } from "../../support/referenceFit.ts";

const random = randomFrom(91);
const draws = (n: number): number[] => Array.from({ length: n }, () => random.normal());

/** CR2 and its degrees of freedom from the definition, n by n: V = sum of (p_g'e)^2, p_g = (I - H)_g' A_g X_g A l. */
function direct(fit: Fit, groups: readonly number[]): { readonly errors: number[]; readonly degrees: number[] } {
  const { design, bread, rowCount: n, columnCount: k, residuals } = fit;
  const x = Array.from({ length: n }, (_, i) => design.terms.map(({ values }) => values[i]!));
  const weights = x.map((row) =>
    Array.from({ length: k }, (_, l) => row.reduce((sum, value, j) => sum + value * bread.values[j * k + l]!, 0)),
  );
  const hat = (i: number, j: number): number => weights[i]!.reduce((sum, value, l) => sum + value * x[j]![l]!, 0);
  const members = [...new Set(groups)].map((group) => [...groups.keys()].filter((row) => groups[row] === group));
  const roots = members.map((rows): SquareMatrix => {
    const rest = rows.flatMap((i) => rows.map((j) => (i === j ? 1 : 0) - hat(i, j)));
    const values = Float64Array.from(rest);
    return symmetricFunction({ size: rows.length, values }, (value) => (value < 1e-10 ? 0 : 1 / Math.sqrt(value)));
  });
  const found = Array.from({ length: k }, (_, l) => {
    const vectors = members.map((rows, g) => {
      const turned = rows.map((_, a) =>
        rows.reduce((sum, j, b) => sum + roots[g]!.values[a * rows.length + b]! * weights[j]![l]!, 0),
      );
      return Array.from({ length: n }, (_, i) =>
        rows.reduce((sum, j, a) => sum + turned[a]! * ((i === j ? 1 : 0) - hat(j, i)), 0),
      );
    });
    const dot = (p: readonly number[], q: ArrayLike<number>): number => p.reduce((sum, v, i) => sum + v * q[i]!, 0);
    const variance = vectors.reduce((sum, p) => sum + dot(p, residuals) ** 2, 0);
    const trace = vectors.reduce((sum, p) => sum + dot(p, p), 0);
    const squares = vectors.reduce((sum, p) => sum + vectors.reduce((all, q) => all + dot(p, q) ** 2, 0), 0);
    return { error: Math.sqrt(variance), degrees: trace ** 2 / squares };
  });
  return { errors: found.map(({ error }) => error), degrees: found.map(({ degrees }) => degrees) };
}

describe("CR2 is what its definition says", () => {
  it.each([
    { name: "groups of fewer rows than columns", sizes: [2], k: 5, n: 120 },
    { name: "groups of as many rows as columns, and of more", sizes: [5, 6, 12], k: 5, n: 138 },
    { name: "every size, with a group across the border of two blocks", sizes: [1, 3, 9, 4, 2], k: 4, n: 304 },
    { name: "groups so large that eigenvalues are needed", sizes: [20], k: 4, n: 100 },
  ])("$name", ({ sizes, k, n }) => {
    const groups: number[] = [];
    for (let g = 0; groups.length < n; g++) groups.push(...Array<number>(sizes[g % sizes.length]!).fill(g));
    const rows = groups.length;
    const columns = Array.from({ length: k - 1 }, () => draws(rows));
    const fit = fitOf(designOf(draws(rows), columns, { order: inGroups(groups) }));
    const covariance = covarianceOf(fit, { kind: "grouped", version: "CR2" });
    if (!covariance.ok) throw new Error(covariance.problem.code);
    const expected = direct(fit, groups);
    expectAllDigits(covariance.value.standardErrors, expected.errors, 11);
    expectAllDigits(covariance.value.degreesOfFreedom!, expected.degrees, 11);
    expect(expected.degrees.every((degrees) => degrees > 1)).toBe(true);
  });
});
