import { describe, expect, it } from "vitest";
import { bandwidthOf } from "../../../src/core/covariance/bandwidth.ts";
import { bellMcCaffreyDegrees } from "../../../src/core/covariance/bellMcCaffrey.ts";
import type { ErrorsChoice, Kernel, LagRule } from "../../../src/core/covariance/choice.ts";
import { covarianceOf } from "../../../src/core/covariance/covarianceOf.ts";
import { lagsOf } from "../../../src/core/covariance/lags.ts";
import { allWhite, whiteVersions } from "../../../src/core/covariance/white.ts";
import {
  directErrors,
  errorsOf,
  expectAllDigits,
  orderedFit,
  referenceErrors,
  statsmodelsErrors,
} from "../../support/referenceErrors.ts";
import { referenceIds } from "../../support/referenceFit.ts";

const neweyWest = (lags: LagRule, adjusted: boolean): ErrorsChoice => ({ kind: "newey-west", lags, adjusted });
const given = (lags: number): LagRule => ({ kind: "given", lags });

/**
 * R forms X'X for all but its classical covariance. On Longley's data that costs it the digits after the eighth, as
 * the values at 60 digits below show; everywhere else ten agree.
 */
const digitsOfR = (id: string): number => (id === "longley" ? 7 : 10);

describe.each(referenceIds)("errors of %s against R", (id) => {
  const expected = referenceErrors(id);
  const fit = orderedFit(id);
  const digits = digitsOfR(id);

  it("coefficients and the figures of the fit", () => {
    expectAllDigits(fit.coefficients, expected.coefficients, 10);
    const { sigma, rSquared, adjustedRSquared, residualSumOfSquares, logLikelihood, aic, bic } = fit;
    expectAllDigits(
      [sigma, rSquared, adjustedRSquared, residualSumOfSquares, logLikelihood, aic, bic],
      [expected.sigma, expected.r2, expected.adj_r2, expected.rss, expected.logLik, expected.AIC, expected.BIC],
      10,
    );
  });

  it("classical errors and their covariance", () => {
    expectAllDigits(errorsOf(fit, { kind: "classical" }), expected.se.classical, 10);
    const covariance = covarianceOf(fit, { kind: "classical" });
    expectAllDigits(covariance.ok ? covariance.value.matrix.values : [], expected.cov.classical.flat(), 10);
  });

  it("every version of White's, alone and in one pass", () => {
    const all = allWhite(fit);
    for (const version of whiteVersions) {
      expectAllDigits(errorsOf(fit, { kind: "white", version }), expected.se[version], digits);
      expectAllDigits(all[version].standardErrors, expected.se[version], digits);
    }
  });

  it("the covariances between coefficients under HC3", () => {
    const size = Math.sqrt(expected.cov.HC3.flat().length);
    const found = allWhite(fit).HC3.matrix.values;
    // Measured against the diagonal: a covariance near zero has fewer digits of its own.
    expected.cov.HC3.flat().forEach((value, index) => {
      const scale = Math.sqrt(
        expected.cov.HC3[Math.floor(index / size)]![Math.floor(index / size)]! *
          expected.cov.HC3[index % size]![index % size]!,
      );
      expect(Math.abs(found[index]! - value) / scale).toBeLessThan(10 ** -digits);
    });
  });

  if (expected.newey_west)
    it("Newey-West errors at each lag, with and without the factor", () => {
      for (const { lag, se, se_adjusted } of expected.newey_west ?? []) {
        expectAllDigits(errorsOf(fit, neweyWest(given(lag), false)), se, digits);
        expectAllDigits(errorsOf(fit, neweyWest(given(lag), true)), se_adjusted, digits);
      }
      expect(lagsOf(fit, { kind: "thumb" })).toBe(expected.newey_west_rule_of_thumb_lag);
    });

  if (expected.newey_west_1994)
    it("the automatic lags of Newey and West", () => {
      const { bandwidth_noprewhite, bandwidth_prewhite, ...errors } = expected.newey_west_1994!;
      const plain: LagRule = { kind: "newey-west 1994", prewhiten: false };
      const filtered: LagRule = { kind: "newey-west 1994", prewhiten: true };
      expectAllDigits(
        [bandwidthOf(fit, plain), bandwidthOf(fit, filtered)],
        [bandwidth_noprewhite, bandwidth_prewhite],
        10,
      );
      expect(lagsOf(fit, plain)).toBe(Math.floor(bandwidth_noprewhite));
      expectAllDigits(errorsOf(fit, neweyWest(plain, true)), errors.se_noprewhite_adjusted, digits);
      expectAllDigits(errorsOf(fit, neweyWest(filtered, false)), errors.se_prewhite, digits);
      expectAllDigits(errorsOf(fit, neweyWest(filtered, true)), errors.se_prewhite_adjusted, digits);
    });

  if (expected.andrews_1991)
    it("Andrews's bandwidths under three kernels", () => {
      const names: Readonly<Record<Kernel, "bartlett" | "parzen" | "qs">> = {
        bartlett: "bartlett",
        parzen: "parzen",
        "quadratic spectral": "qs",
      };
      for (const [kernel, name] of Object.entries(names) as [Kernel, "bartlett" | "parzen" | "qs"][]) {
        const rule = { kind: "andrews 1991", kernel, prewhiten: false } as const;
        expectAllDigits([bandwidthOf(fit, rule)], [expected.andrews_1991![`bandwidth_${name}`]], 10);
        expectAllDigits(errorsOf(fit, neweyWest(rule, true)), expected.andrews_1991![`se_${name}_adjusted`], digits);
      }
    });

  if (expected.HC2_bell_mccaffrey)
    it("degrees of freedom for HC2", () => {
      expectAllDigits(bellMcCaffreyDegrees(fit)!, expected.HC2_bell_mccaffrey!.df, digits);
    });

  if (expected.cluster)
    it("grouped errors and the degrees of freedom of CR2", () => {
      for (const version of ["CR0", "CR1", "CR2"] as const) {
        expectAllDigits(errorsOf(fit, { kind: "grouped", version }), expected.cluster![version], 10);
      }
      const covariance = covarianceOf(fit, { kind: "grouped", version: "CR2" });
      expectAllDigits(covariance.ok ? covariance.value.degreesOfFreedom! : [], expected.cluster!.CR2_df, 10);
    });
});

describe.each(Object.keys(statsmodelsErrors))("errors of %s against statsmodels", (id) => {
  const expected = statsmodelsErrors[id]!;
  const fit = orderedFit(id);

  it("coefficients, figures of the fit, classical and White", () => {
    expectAllDigits(fit.coefficients, expected.coefficients, 10);
    expectAllDigits(
      [fit.logLikelihood, fit.rSquared, fit.adjustedRSquared],
      [expected.logLikelihood, expected.rSquared, expected.adjustedRSquared],
      10,
    );
    expectAllDigits(errorsOf(fit, { kind: "classical" }), expected.classical, 10);
    for (const version of ["HC0", "HC1", "HC2", "HC3"] as const) {
      expectAllDigits(errorsOf(fit, { kind: "white", version }), expected[version], 10);
    }
  });

  if (expected["newey-west"])
    it("Newey-West", () => {
      for (const { lags, adjusted, unadjusted } of expected["newey-west"] ?? []) {
        expectAllDigits(errorsOf(fit, neweyWest(given(lags), true)), adjusted, 10);
        expectAllDigits(errorsOf(fit, neweyWest(given(lags), false)), unadjusted, 10);
      }
    });

  if (expected.CR0)
    it("groups, two ways of grouping, and lags that stay within groups", () => {
      expectAllDigits(errorsOf(fit, { kind: "grouped", version: "CR0" }), expected.CR0!, 10);
      expectAllDigits(errorsOf(fit, { kind: "grouped", version: "CR1" }), expected.CR1!, 10);
      expectAllDigits(
        errorsOf(orderedFit(id, "by year too"), { kind: "grouped", version: "CR0" }),
        expected["two-way CR0"]!,
        10,
      );
      const { lags, unadjusted } = expected["newey-west in groups"]!;
      expectAllDigits(errorsOf(fit, neweyWest(given(lags), false)), unadjusted, 10);
    });
});

describe.each(Object.keys(directErrors).filter((id) => id !== "filip"))(
  "errors of %s against their definitions at 60 digits",
  (id) => {
    const expected = directErrors[id]!;
    const fit = orderedFit(id);

    it("coefficients, classical and every version of White's", () => {
      expectAllDigits(fit.coefficients, expected.coefficients, 13);
      expectAllDigits(errorsOf(fit, { kind: "classical" }), expected.classical, 11);
      for (const version of whiteVersions) {
        expectAllDigits(errorsOf(fit, { kind: "white", version }), expected.white[version], 11);
      }
    });

    if (expected.bellMcCaffrey)
      it("degrees of freedom for HC2", () => {
        expectAllDigits(bellMcCaffreyDegrees(fit)!, expected.bellMcCaffrey!, 11);
      });

    if (expected.time)
      it("Newey-West with given and automatic lags, and every kernel, prewhitened or not", () => {
        const { "newey-west": fixed, "newey-west 1994": automatic, "andrews 1991": kernels } = expected.time!;
        for (const { lags, adjusted, unadjusted } of fixed) {
          expectAllDigits(errorsOf(fit, neweyWest(given(lags), true)), adjusted, 11);
          expectAllDigits(errorsOf(fit, neweyWest(given(lags), false)), unadjusted, 11);
        }
        for (const { prewhiten, bandwidth, adjusted } of automatic) {
          const rule = { kind: "newey-west 1994", prewhiten } as const;
          expectAllDigits([bandwidthOf(fit, rule)], [bandwidth], 10);
          expectAllDigits(errorsOf(fit, neweyWest(rule, true)), adjusted, 10);
        }
        for (const { kernel, prewhiten, bandwidth, adjusted } of kernels) {
          const rule = { kind: "andrews 1991", kernel, prewhiten } as const;
          expectAllDigits([bandwidthOf(fit, rule)], [bandwidth], 10);
          expectAllDigits(errorsOf(fit, neweyWest(rule, true)), adjusted, 10);
        }
      });

    if (expected.groups)
      it("groups one and two ways", () => {
        const { CR2DegreesOfFreedom, "two-way CR1": twoWay, ...versions } = expected.groups!;
        for (const version of ["CR0", "CR1", "CR2"] as const) {
          expectAllDigits(errorsOf(fit, { kind: "grouped", version }), versions[version], 12);
        }
        const covariance = covarianceOf(fit, { kind: "grouped", version: "CR2" });
        expectAllDigits(covariance.ok ? covariance.value.degreesOfFreedom! : [], CR2DegreesOfFreedom, 12);
        expectAllDigits(errorsOf(orderedFit(id, "by year too"), { kind: "grouped", version: "CR1" }), twoWay, 11);
      });
  },
);

describe("figures that books print", () => {
  /** To half a unit of the last digit printed, and what was lost when the book rounded 700.15 up. */
  const expectPrinted = (found: number, printed: string): void => {
    const unit = 10 ** -(printed.split(".")[1] ?? "").length;
    expect(Math.abs(found - Number(printed)) / unit).toBeLessThan(0.51);
  };

  // Stock and Watson, Introduction to Econometrics, chapters 5 and 7; standard errors are HC1.
  it.each([
    { id: "school-scores-1", coefficients: ["698.9", "-2.28"], errors: ["10.4", "0.52"] },
    {
      id: "school-scores-3",
      coefficients: ["700.2", "-1.00", "-0.122", "-0.547"],
      errors: ["5.6", "0.27", "0.033", "0.024"],
    },
  ])("$id", ({ id, coefficients, errors }) => {
    const fit = orderedFit(id);
    const found = errorsOf(fit, { kind: "white", version: "HC1" });
    coefficients.forEach((printed, j) => expectPrinted(fit.coefficients[j]!, printed));
    errors.forEach((printed, j) => expectPrinted(found[j]!, printed));
  });
});
