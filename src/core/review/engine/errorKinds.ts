import type { ErrorsChoice, GroupedVersion, Kernel, LagRule } from "../../covariance/choice.ts";
import { classicalCovariance } from "../../covariance/classical.ts";
import { covarianceOf } from "../../covariance/covarianceOf.ts";
import { lagsForRows } from "../../covariance/lags.ts";
import { whiteVersions } from "../../covariance/white.ts";
import type { Fit } from "../../fit/fit.ts";
import type { Reference } from "../../inference/reference.ts";

/** Standard errors that someone may have reported, and the laws that go with them, the usual one first. */
export interface ErrorKind {
  /** "classical", "White (HC3)", "Newey-West with 4 lags". */
  readonly name: string;
  readonly kind: ErrorsChoice["kind"];
  readonly standardErrors: ArrayLike<number>;
  readonly laws: readonly NamedLaw[];
}

export interface NamedLaw {
  /** Words behind the name of the kind: "p-values of the normal law"; empty for the usual one. */
  readonly name: string;
  /** One for each coefficient. */
  readonly references: readonly Reference[];
}

/** Kinds that need no order of rows: classical, and White in every version that is defined. */
export function* plainKinds(fit: Fit): Generator<ErrorKind> {
  const laws = usualLaws(fit);
  const classical = classicalCovariance(fit).standardErrors;
  yield { name: "classical", kind: "classical", standardErrors: classical, laws };
  for (const version of whiteVersions) {
    const kind = kindOf(fit, { kind: "white", version }, `White (${version})`);
    if (kind !== null) yield version === "HC2" ? { ...kind, laws: [...kind.laws, ...bellMcCaffreyLaws(fit)] } : kind;
  }
  const factor = Math.sqrt(fit.degreesOfFreedom / fit.rowCount);
  const standardErrors = classical.map((error) => error * factor);
  yield { name: "classical, divided by n in place of n - k", kind: "classical", standardErrors, laws };
}

/** With more rows than these the degrees of freedom are so many that the law is the usual one. */
const mostForOwnDegrees = 2000;

function bellMcCaffreyLaws(fit: Fit): NamedLaw[] {
  if (fit.rowCount > mostForOwnDegrees) return [];
  const found = covarianceOf(fit, { kind: "white", version: "HC2", degrees: "bell-mccaffrey" });
  const degrees = found.ok && found.value.used.fallback === null ? found.value.degreesOfFreedom : null;
  return degrees === null ? [] : [{ ...ownLaw(degrees), name: "with Bell and McCaffrey's degrees of freedom" }];
}

/**
 * Newey-West with numbers of lags that people take, with and without the factor n / (n - k). No lags at all are White's
 * HC0 and HC1.
 * @param suffix - words for the order of the rows: ", rows by Month"; empty where they are taken as they stand.
 */
export function* lagKinds(fit: Fit, suffix: string): Generator<ErrorKind> {
  for (const lags of lagsTried(fit)) {
    const words = `Newey-West with ${lags} ${lags === 1 ? "lag" : "lags"}`;
    yield* bothFactors(fit, { kind: "given", lags }, `${words}${suffix}`);
  }
}

/** The same by the rules that look at the residuals, which cost more. */
export function* ruleKinds(fit: Fit, suffix: string): Generator<ErrorKind> {
  for (const [rule, words] of lagRules) yield* bothFactors(fit, rule, `Newey-West by ${words}${suffix}`);
}

/** Someone who counts lags by hand seldom goes further; the careful rule of long series does. */
const mostByHand = 24;

function lagsTried({ rowCount, columnCount }: Fit): number[] {
  const byHand = Array.from({ length: mostByHand }, (_, i) => i + 1);
  const lags = [...new Set([...byHand, lagsForRows(rowCount, "careful")])];
  return lags.filter((one) => one > 0 && one < rowCount - columnCount);
}

const kernels: readonly Kernel[] = ["bartlett", "parzen", "quadratic spectral"];

const lagRules: readonly (readonly [LagRule, string])[] = [false, true].flatMap((prewhiten) => {
  const whitened = prewhiten ? " with prewhitening" : "";
  return [
    [{ kind: "newey-west 1994", prewhiten }, `the automatic lags of 1994${whitened}`] as const,
    ...kernels.map(
      (kernel) =>
        [{ kind: "andrews 1991", kernel, prewhiten }, `Andrews's bandwidth, ${kernel} kernel${whitened}`] as const,
    ),
  ];
});

function* bothFactors(fit: Fit, lags: LagRule, name: string): Generator<ErrorKind> {
  for (const adjusted of [true, false]) {
    const kind = kindOf(fit, { kind: "newey-west", lags, adjusted }, adjusted ? name : `${name}, no factor n/(n - k)`);
    if (kind !== null) yield kind;
  }
}

const groupedVersions: readonly GroupedVersion[] = ["CR1", "CR0", "CR2"];

/** @param fit - with its rows in groups. @param by - the heading of the column that groups them. */
export function* groupedKinds(fit: Fit, by: string): Generator<ErrorKind> {
  for (const version of groupedVersions) {
    const kind = kindOf(fit, { kind: "grouped", version }, `grouped by ${by} (${version})`);
    if (kind !== null) yield kind;
  }
}

/** Null where the choice cannot be met as asked. */
function kindOf(fit: Fit, choice: ErrorsChoice, name: string): ErrorKind | null {
  const found = covarianceOf(fit, choice);
  if (!found.ok || (found.value.used.fallback !== null && choice.kind !== "grouped")) return null;
  const { standardErrors, degreesOfFreedom, used } = found.value;
  const own = degreesOfFreedom === null ? [] : [ownLaw(degreesOfFreedom)];
  const fixedB = choice.kind === "newey-west" && used.lags !== null ? [fixedBLaw(fit, used.lags)] : [];
  return { name, kind: choice.kind, standardErrors, laws: [...own, ...usualLaws(fit), ...fixedB] };
}

const same = (fit: Fit, name: string, reference: Reference): NamedLaw => ({
  name,
  references: Array.from(fit.coefficients, () => reference),
});

const usualLaws = (fit: Fit): NamedLaw[] => [
  same(fit, "", { law: "t", degreesOfFreedom: fit.degreesOfFreedom }),
  same(fit, "compared with the normal law", { law: "normal" }),
];

const ownLaw = (degreesOfFreedom: ArrayLike<number>): NamedLaw => ({
  name: "",
  references: Array.from(degreesOfFreedom, (degrees) => ({ law: "t", degreesOfFreedom: degrees })),
});

const fixedBLaw = (fit: Fit, lags: number): NamedLaw =>
  same(fit, "compared with the fixed-b law", {
    law: "fixed-b",
    b: (lags + 1) / fit.rowCount,
    degreesOfFreedom: fit.degreesOfFreedom,
  });
