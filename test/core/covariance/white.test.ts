import { describe, expect, it } from "vitest";
import { bellMcCaffreyDegrees } from "../../../src/core/covariance/bellMcCaffrey.ts";
import { covarianceOf } from "../../../src/core/covariance/covarianceOf.ts";
import { selfFittingRows } from "../../../src/core/covariance/leverageOfOne.ts";
import { allWhite, whiteCovariance, whiteVersions } from "../../../src/core/covariance/white.ts";
import { designOf, fitOf } from "../../support/referenceFit.ts";

const y = [4, 9, 2, 7, 11, 3, 8, 5];
const x = [1, 2, 3, 5, 8, 13, 21, 34];

describe("a row that fits itself", () => {
  const alone = y.map((_, i) => (i === 5 ? 1 : 0));
  const fit = fitOf(designOf(y, [x, alone], { names: ["Price", "Strike"] }));

  it("is found by its leverage", () => {
    expect(selfFittingRows(fit)).toEqual([5]);
    expect(bellMcCaffreyDegrees(fit)).toBeNull();
  });

  it("makes HC2 and later fall back to HC1 in the open, naming row and term", () => {
    const hc1 = whiteCovariance(fit, "HC1");
    for (const version of ["HC2", "HC3", "HC4", "HC4m", "HC5"] as const) {
      const { used, standardErrors } = whiteCovariance(fit, version);
      expect(used.version).toBe("HC1");
      expect(used.fallback).toBe(
        `${version} cannot be computed because row 6 of the data alone determines the coefficient of "Strike" (its leverage is 1); HC1 is used instead.`,
      );
      expect(standardErrors).toEqual(hc1.standardErrors);
    }
  });

  it("leaves HC0 and HC1 as they are", () => {
    expect(hasFallback("HC0")).toBeNull();
    expect(hasFallback("HC1")).toBeNull();
    expect(whiteCovariance(fit, "HC1").standardErrors.every(Number.isFinite)).toBe(true);
  });

  const hasFallback = (version: "HC0" | "HC1"): string | null => whiteCovariance(fit, version).used.fallback;

  it("counts further rows of the kind, and names the constant where only that hangs on the row", () => {
    const north = y.map((_, i) => (i > 2 ? 1 : 0));
    const east = y.map((_, i) => (i === 1 || i === 2 ? 1 : 0));
    const based = fitOf(designOf(y, [north, east], { names: ["North", "East"] }));
    expect(whiteCovariance(based, "HC3").used.fallback).toContain(
      'row 1 of the data alone determines the coefficient of "constant"',
    );
    const two = fitOf(designOf(y, [x, alone, y.map((_, i) => (i === 2 ? 1 : 0))]));
    expect(whiteCovariance(two, "HC3").used.fallback).toContain("row 3 of the data (and 1 more like it)");
  });
});

describe("the term that is named", () => {
  it("is not the constant where a driver stands apart in one row alone", () => {
    const fit = fitOf(designOf(y, [[2, 2, 2, 1, 2, 2, 2, 2]], { names: ["Shops"] }));
    expect(whiteCovariance(fit, "HC2").used.fallback).toContain(
      'row 4 of the data alone determines the coefficient of "Shops"',
    );
  });
});

describe("a leverage near one", () => {
  it("is not taken for one", () => {
    const fit = fitOf(designOf(y, [[1, 2, 3, 4, 5, 6, 7, 1e4]]));
    expect(fit.leverages[7]).toBeGreaterThan(0.999999);
    expect(whiteCovariance(fit, "HC3").used).toEqual({ lags: null, bandwidth: null, version: "HC3", fallback: null });
  });
});

describe("classical", () => {
  it("says what was asked for", () => {
    const covariance = covarianceOf(fitOf(designOf(y, [x])), { kind: "classical" });
    expect(covariance.ok && covariance.value.choice).toEqual({ kind: "classical" });
  });
});

describe("allWhite", () => {
  it("gives each version as it is had alone", () => {
    const fit = fitOf(designOf(y, [x]));
    const all = allWhite(fit);
    expect(Object.keys(all)).toEqual([...whiteVersions]);
    for (const version of whiteVersions) {
      const alone = covarianceOf(fit, { kind: "white", version });
      expect(all[version]).toEqual(alone.ok ? alone.value : null);
    }
  });
});
