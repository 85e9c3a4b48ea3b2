import { describe, expect, it } from "vitest";
import { leastSquares } from "../../../src/core/numeric/leastSquares.ts";
import { levelRatio } from "../../../src/core/numeric/levelRatio.ts";
import { randomFrom } from "../../support/random.ts";
import { expectDigits } from "../../support/digits.ts";

/** The same regression with its columns written out. */
function byColumns(series: Float64Array, lags: number): number {
  const changes = series.slice(1).map((value, i) => value - series[i]!);
  const rows = changes.length - lags;
  const earlier = Array.from({ length: lags }, (_, lag) => changes.slice(lags - lag - 1, lags - lag - 1 + rows));
  const found = leastSquares([series.slice(lags, lags + rows), ...earlier], changes.slice(lags));
  if (found.kind === "dependent") throw new Error("dependent");
  const row = found.inverseTriangle.values.subarray(0, lags + 1);
  const variance = (found.rss / (rows - lags - 1)) * row.reduce((sum, value) => sum + value ** 2, 0);
  return found.coefficients[0]! / Math.sqrt(variance);
}

describe("levelRatio", () => {
  const random = randomFrom(8);
  const series = (n: number, rho: number): Float64Array => {
    let value = 0;
    return Float64Array.from({ length: n }, () => (value = rho * value + random.normal()));
  };

  it.each([
    { n: 12, rho: 0.2, lags: 0 },
    { n: 40, rho: 0.6, lags: 1 },
    { n: 90, rho: 0.95, lags: 4 },
    { n: 500, rho: 1, lags: 7 },
    { n: 3000, rho: 0.5, lags: 14 },
  ])("is the ratio of the regression on $lags changes, n = $n, root $rho", ({ n, rho, lags }) => {
    const values = series(n, rho);
    expectDigits(levelRatio(values, lags)!, byColumns(values, lags), 11);
  });

  it("is not there where the changes never vary", () => {
    expect(levelRatio(Float64Array.of(1, 2, 3, 4, 5, 6, 7, 8), 2)).toBeNull();
  });
});
