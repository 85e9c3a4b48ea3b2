import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { ErrorsChoice, LagRule } from "../../src/core/covariance/choice.ts";
import { covarianceOf } from "../../src/core/covariance/covarianceOf.ts";
import { whiteVersions } from "../../src/core/covariance/white.ts";
import type { RowOrder } from "../../src/core/design/design.ts";
import type { Fit } from "../../src/core/fit/fit.ts";
import { fitLeastSquares } from "../../src/core/fit/fitLeastSquares.ts";
import { type Numbers, designs, shuffled } from "../support/randomDesigns.ts";
import { designOf, fitOf, inGroups, throughTime } from "../support/referenceFit.ts";

const lags = (count: number): LagRule => ({ kind: "given", lags: count });
const neweyWest = (count: number): ErrorsChoice => ({ kind: "newey-west", lags: lags(count), adjusted: true });
const ofCases: readonly ErrorsChoice[] = [
  { kind: "classical" },
  ...whiteVersions.map((version): ErrorsChoice => ({ kind: "white", version })),
];
const ofTime: readonly ErrorsChoice[] = [...ofCases, neweyWest(0), neweyWest(3), neweyWest(9)];

const ordered = ({ y, columns }: Numbers, order?: RowOrder): Fit =>
  fitOf(designOf(y, columns, order === undefined ? {} : { order }));

const timed = (numbers: Numbers): Fit => ordered(numbers, throughTime(numbers.y.length));

function matrixOf(fit: Fit, choice: ErrorsChoice): Float64Array {
  const covariance = covarianceOf(fit, choice);
  if (!covariance.ok) throw new Error(covariance.problem.code);
  return covariance.value.matrix.values;
}

/** Matrices and vectors equal but for rounding, in parts of what each entry could be at most. */
function expectClose(found: Float64Array, expected: Float64Array, tolerance: number): void {
  const size = Math.sqrt(found.length);
  const worst = expected.reduce((most, value, index) => {
    const [i, j] = [Math.floor(index / size), index % size];
    const scale = Math.sqrt(Math.abs(expected[i * size + i]! * expected[j * size + j]!));
    const distance = Math.abs(found[index]! - value) / scale;
    return Number.isNaN(most) || distance <= most ? most : distance;
  }, 0);
  expect(worst).toBeLessThanOrEqual(tolerance);
}

/** Coefficients equal but for rounding, in parts of their classical errors or their own size, whichever is more. */
function expectSameCoefficients(found: Fit, expected: Fit): void {
  expected.coefficients.forEach((value, j) => {
    const error = expected.sigma * Math.sqrt(expected.bread.values[j * (expected.columnCount + 1)]!);
    expect(Math.abs(found.coefficients[j]! - value)).toBeLessThanOrEqual(1e-12 * Math.max(Math.abs(value), error));
  });
}

const law = <T extends [unknown, ...unknown[]]>(
  arbitraries: { [K in keyof T]: fc.Arbitrary<T[K]> },
  holds: (...values: T) => void,
) => {
  fc.assert(fc.property(...arbitraries, holds), { seed: 20240502, numRuns: 300 });
};

const picked = <T>(values: readonly T[], order: readonly number[]): T[] => order.map((index) => values[index]!);

describe("laws of every estimator", () => {
  it("scaling a column scales its coefficient and errors, and nothing else", () => {
    law([designs, fc.nat(), fc.double({ min: -9, max: 9, noNaN: true })], ({ y, columns }, which, exponent) => {
      const j = which % columns.length;
      const factor = 10 ** exponent;
      const plain = timed({ y, columns });
      const scaled = timed({
        y,
        columns: columns.map((x, index) => (index === j ? x.map((value) => value * factor) : x)),
      });
      const back = plain.coefficients.map((_, index) => (index === j + 1 ? factor : 1));
      expectSameCoefficients(
        { ...scaled, coefficients: scaled.coefficients.map((b, index) => b * back[index]!) },
        plain,
      );
      for (const choice of ofTime) {
        const found = matrixOf(scaled, choice).map(
          (value, index) => value * back[Math.floor(index / back.length)]! * back[index % back.length]!,
        );
        expectClose(found, matrixOf(plain, choice), 1e-9);
      }
    });
  });

  it("scaling the outcome scales everything", () => {
    law([designs, fc.double({ min: -9, max: 9, noNaN: true })], ({ y, columns }, exponent) => {
      const factor = 10 ** exponent;
      const plain = timed({ y, columns });
      const scaled = timed({ y: y.map((value) => value * factor), columns });
      for (const choice of ofTime) {
        expectClose(
          matrixOf(scaled, choice).map((value) => value / factor ** 2),
          matrixOf(plain, choice),
          1e-9,
        );
      }
      expect(scaled.rSquared).toBeCloseTo(plain.rSquared, 12);
    });
  });

  it("the order of the columns does not matter", () => {
    law([designs, fc.integer()], ({ y, columns }, seed) => {
      const order = shuffled(columns.length, seed);
      const plain = timed({ y, columns });
      const turned = timed({ y, columns: picked(columns, order) });
      const place = [0, ...columns.map((_, j) => order.indexOf(j) + 1)];
      const size = place.length;
      expectSameCoefficients(
        { ...turned, coefficients: Float64Array.from(place, (j) => turned.coefficients[j]!) },
        plain,
      );
      for (const choice of ofTime) {
        const found = matrixOf(turned, choice);
        const back = found.map((_, index) => found[place[Math.floor(index / size)]! * size + place[index % size]!]!);
        expectClose(back, matrixOf(plain, choice), 1e-10);
      }
    });
  });

  it("the order of rows that are cases does not matter", () => {
    law([designs, fc.integer()], ({ y, columns }, seed) => {
      const order = shuffled(y.length, seed);
      const plain = ordered({ y, columns });
      const turned = ordered({ y: picked(y, order), columns: columns.map((x) => picked(x, order)) });
      expectSameCoefficients(turned, plain);
      for (const choice of ofCases) expectClose(matrixOf(turned, choice), matrixOf(plain, choice), 1e-12);
    });
  });

  it("time may run backwards", () => {
    law([designs], ({ y, columns }) => {
      const plain = timed({ y, columns });
      const turned = timed({ y: y.toReversed(), columns: columns.map((x) => x.toReversed()) });
      for (const choice of ofTime) expectClose(matrixOf(turned, choice), matrixOf(plain, choice), 1e-12);
    });
  });

  it("adding a multiple of a driver to the outcome moves its coefficient alone", () => {
    law([designs, fc.nat(), fc.double({ min: -50, max: 50, noNaN: true })], ({ y, columns }, which, multiple) => {
      const j = which % columns.length;
      const plain = timed({ y, columns });
      const moved = timed({ y: y.map((value, i) => value + multiple * columns[j]![i]!), columns });
      plain.coefficients.forEach((b, index) => {
        const expected = index === j + 1 ? b + multiple : b;
        const error = plain.sigma * Math.sqrt(plain.bread.values[index * (plain.columnCount + 1)]!);
        expect(Math.abs(moved.coefficients[index]! - expected) / error).toBeLessThan(1e-9);
      });
      for (const choice of ofTime) expectClose(matrixOf(moved, choice), matrixOf(plain, choice), 1e-8);
    });
  });

  it("writing the rows twice leaves coefficients alone and halves HC0", () => {
    law([designs], ({ y, columns }) => {
      const plain = ordered({ y, columns });
      const twice = ordered({ y: [...y, ...y], columns: columns.map((x) => [...x, ...x]) });
      expectSameCoefficients(twice, plain);
      const hc0: ErrorsChoice = { kind: "white", version: "HC0" };
      expectClose(
        matrixOf(twice, hc0).map((value) => 2 * value),
        matrixOf(plain, hc0),
        1e-10,
      );
      const ratio = twice.degreesOfFreedom / plain.degreesOfFreedom;
      expectClose(
        matrixOf(twice, { kind: "classical" }).map((value) => value * ratio),
        matrixOf(plain, { kind: "classical" }),
        1e-10,
      );
    });
  });

  it("a driver split in two: the whole beside one part has the other part's coefficient and errors", () => {
    law([designs, fc.integer()], ({ y, columns }, seed) => {
      const [x, ...others] = columns;
      const share = shuffled(y.length, seed).map((rank) => (rank + 1) / (y.length + 1));
      const part = x!.map((value, i) => (value + 3) * share[i]!);
      const rest = x!.map((value, i) => value - part[i]!);
      const split = timed({ y, columns: [part, rest, ...others] });
      const whole = timed({ y, columns: [x!, part, ...others] });
      const size = split.columnCount;
      // y = a part + b rest = b x + (a - b) part.
      const [, a, b] = split.coefficients;
      const scale = Math.abs(a!) + Math.abs(b!);
      expect(Math.abs(whole.coefficients[1]! - b!)).toBeLessThan(1e-10 * scale);
      expect(Math.abs(whole.coefficients[2]! - (a! - b!))).toBeLessThan(1e-10 * scale);
      for (const choice of ofTime) {
        const ofRest = matrixOf(split, choice)[2 * size + 2]!;
        expect(Math.abs(matrixOf(whole, choice)[size + 1]! / ofRest - 1)).toBeLessThan(1e-8);
      }
    });
  });

  it("a driver given as two equal halves is dependent", () => {
    law([designs], ({ y, columns: [x, ...others] }) => {
      const half = x!.map((value) => value / 2);
      const fitted = fitLeastSquares(designOf(y, [half, half, ...others]));
      expect(fitted).toEqual({ ok: false, problem: { code: "dependent-columns", column: "x2", madeOf: ["x1"] } });
    });
  });

  it("no lags is HC1, or HC0 without the factor", () => {
    law([designs], (numbers) => {
      const fit = timed(numbers);
      expectClose(matrixOf(fit, neweyWest(0)), matrixOf(fit, { kind: "white", version: "HC1" }), 1e-12);
      const bare: ErrorsChoice = { kind: "newey-west", lags: lags(0), adjusted: false };
      expectClose(matrixOf(fit, bare), matrixOf(fit, { kind: "white", version: "HC0" }), 1e-12);
    });
  });

  it("groups of one are HC0, HC1 and HC2", () => {
    law([designs], (numbers) => {
      const fit = ordered(numbers, inGroups(numbers.y.map((_, i) => i)));
      (["0", "1", "2"] as const).forEach((version) => {
        const alone = matrixOf(fit, { kind: "grouped", version: `CR${version}` });
        expectClose(alone, matrixOf(fit, { kind: "white", version: `HC${version}` }), 1e-9);
      });
    });
  });

  it("no covariance is indefinite", () => {
    law(
      [designs, fc.array(fc.double({ min: -1, max: 1, noNaN: true }), { minLength: 5, maxLength: 5 })],
      (numbers, weights) => {
        const fit = timed(numbers);
        for (const choice of ofTime) {
          const values = matrixOf(fit, choice);
          let form = 0;
          let most = 0;
          values.forEach((value, index) => {
            const term = weights[Math.floor(index / fit.columnCount)]! * value * weights[index % fit.columnCount]!;
            form += term;
            most += Math.abs(term);
          });
          expect(form).toBeGreaterThanOrEqual(-1e-12 * most);
        }
      },
    );
  });
});
