import type { Covariance, ErrorsChoice, GroupedVersion } from "../covariance/choice.ts";
import { covarianceOf } from "../covariance/covarianceOf.ts";
import { vanishingTerm } from "../covariance/vanishing.ts";
import { allWhite, whiteVersions } from "../covariance/white.ts";
import { chosen } from "../decision/decide.ts";
import type { Decision } from "../decision/decision.ts";
import type { Sizes } from "../decision/policies.ts";
import { whiteErrors } from "../decision/wish.ts";
import type { RowOrder } from "../design/design.ts";
import type { Fit } from "../fit/fit.ts";
import type { InferenceTable } from "../inference/inference.ts";
import { inferenceOf } from "../inference/inferenceOf.ts";
import { type Restrictions, allDriversZero, jointTest } from "../inference/joint.ts";
import type { Problem } from "../problem/problem.ts";
import { type Result, failure, success } from "../problem/result.ts";
import type { AllStandardErrors, Answer, GroupedErrors } from "./answer.ts";
import { askedEstimates, askedRestrictions } from "./asked.ts";
import { againstOf } from "./drivers.ts";
import type { Options } from "./options.ts";

interface Setting {
  readonly decision: Decision;
  readonly options: Options;
  readonly lags: number | null;
  readonly sizes: Sizes;
}

interface AllErrors {
  readonly standardErrors: AllStandardErrors;
  readonly inference: Answer["inference"];
  readonly joint: Answer["joint"];
  readonly estimates: Answer["estimates"];
}

/** Every kind of standard errors that what rows are allows, and the inference that follows from each. */
export function allErrors(fit: Fit, setting: Setting): Result<AllErrors> {
  const white = allWhite(fit);
  const found = new Map<string, Covariance>(
    whiteVersions.map((version) => [keyOf({ kind: "white", version }), white[version]]),
  );
  for (const choice of choicesFor(fit.design.order, setting)) {
    const covariance = covarianceOf(fit, choice);
    if (!covariance.ok) return covariance;
    found.set(keyOf(choice), covariance.value);
  }
  const of: Lookup = (choice) => found.get(keyOf(choice)) ?? null;
  const inForce = inForceOf(fit, of, setting);
  const zero = zeroError(fit, inForce);
  if (zero !== null) return failure(zero);
  const inference = inferenceFrom(fit, inForce, setting);
  const joint = jointFrom(fit, inForce, setting);
  if (!joint.ok) return joint;
  const covariance = inForce[setting.decision.inForce.errors.kind]!;
  const estimates = askedEstimates(fit, { covariance, reference: inference.inForce.reference }, setting.options);
  if (!estimates.ok) return estimates;
  const standardErrors = standardErrorsFrom(fit, of, setting);
  return success({ standardErrors, inference, joint: joint.value, estimates: estimates.value });
}

type Lookup = (choice: ErrorsChoice) => Covariance | null;

const keyOf = (choice: ErrorsChoice): string =>
  "version" in choice
    ? `${choice.kind} ${choice.version} ${"degrees" in choice ? choice.degrees : ""}`
    : choice.kind === "newey-west"
      ? `${choice.kind} ${choice.adjusted}`
      : choice.kind;

const neweyWest = (lags: number, adjusted: boolean): ErrorsChoice => ({
  kind: "newey-west",
  lags: { kind: "given", lags },
  adjusted,
});

const groupedVersions: readonly GroupedVersion[] = ["CR0", "CR1", "CR2"];

function choicesFor(order: RowOrder, { lags, options }: Setting): ErrorsChoice[] {
  const white = whiteErrors(options.whiteVersion);
  const time = lags === null ? [] : [neweyWest(lags, true), neweyWest(lags, false)];
  const grouped =
    order.kind === "groups" ? groupedVersions.map((version): ErrorsChoice => ({ kind: "grouped", version })) : [];
  return [{ kind: "classical" }, ...(white.degrees === undefined ? [] : [white]), ...time, ...grouped];
}

const listed = (covariance: Covariance | null): number[] => [...(covariance?.standardErrors ?? [])];

function standardErrorsFrom(fit: Fit, of: Lookup, { lags, options }: Setting): AllStandardErrors {
  const white = whiteVersions.map((version) => [version, listed(of({ kind: "white", version }))] as const);
  return {
    classical: listed(of({ kind: "classical" })),
    white: Object.fromEntries(white),
    whiteFallback: of(whiteErrors(options.whiteVersion))?.used.fallback ?? null,
    neweyWest:
      lags === null
        ? null
        : { lags, adjusted: listed(of(neweyWest(lags, true))), unadjusted: listed(of(neweyWest(lags, false))) },
    grouped: groupedFrom(fit.design.order, of),
  };
}

function groupedFrom(order: RowOrder, of: Lookup): GroupedErrors | null {
  if (order.kind !== "groups") return null;
  const version = (name: GroupedVersion): Covariance | null => of({ kind: "grouped", version: name });
  return {
    groups: order.labels.length,
    CR0: listed(version("CR0")),
    CR1: listed(version("CR1")),
    CR2: listed(version("CR2")),
    CR2DegreesOfFreedom: [...(version("CR2")?.degreesOfFreedom ?? [])],
  };
}

/** A standard error of zero would call any coefficient shown: that is no finding but a fault of the design. */
function zeroError(fit: Fit, covariances: ByKind): Problem | null {
  const { classical } = covariances;
  if (classical === null) return null;
  for (const [errors, covariance] of Object.entries(covariances)) {
    const term = covariance === null ? null : vanishingTerm(covariance, classical);
    if (term !== null) return { code: "zero-standard-error", errors, term: fit.design.terms[term]?.name ?? "" };
  }
  return null;
}

type ByKind = Readonly<Record<ErrorsChoice["kind"], Covariance | null>>;

/** The covariance that each kind has under the wishes: which White version, which factor, which grouped version. */
function inForceOf(fit: Fit, of: Lookup, { options, sizes }: Setting): ByKind {
  const kind = (name: ErrorsChoice["kind"]): Covariance | null =>
    of(chosen(name, { order: fit.design.order, sizes }, options).errors);
  return {
    classical: kind("classical"),
    white: kind("white"),
    "newey-west": kind("newey-west"),
    grouped: kind("grouped"),
  };
}

/** One table a kind, each under the law that the policy compares that kind with. */
function inferenceFrom(fit: Fit, covariances: ByKind, { decision, options, sizes }: Setting): Answer["inference"] {
  const against = againstOf(fit, options);
  const table = (kind: ErrorsChoice["kind"]): InferenceTable | null => {
    const covariance = covariances[kind];
    if (covariance === null) return null;
    const { reference } = chosen(kind, { order: fit.design.order, sizes }, options);
    const { degreesOfFreedom } = covariance;
    const settings = { reference, against, level: options.level };
    return inferenceOf(fit, covariance, degreesOfFreedom === null ? settings : { ...settings, degreesOfFreedom });
  };
  const [classical, white, inForce] = [table("classical"), table("white"), table(decision.inForce.errors.kind)];
  if (classical === null || white === null || inForce === null) throw new Error("a kind in force was not computed");
  return { classical, white, neweyWest: table("newey-west"), grouped: table("grouped"), inForce };
}

function jointFrom(fit: Fit, covariances: ByKind, { decision, options }: Setting): Result<Answer["joint"]> {
  const restrictions = askedRestrictions(fit, options);
  if (!restrictions.ok) return restrictions;
  const all = jointByKind(fit, covariances, allDriversZero(fit));
  if (restrictions.value === null) return success({ ...all, asked: null });
  const { texts, ...wanted } = restrictions.value;
  const inForce = jointTest(fit, covariances[decision.inForce.errors.kind]!, wanted);
  return success({ ...all, asked: { texts, ...jointByKind(fit, covariances, wanted), inForce } });
}

function jointByKind(fit: Fit, covariances: ByKind, restrictions: Restrictions): Omit<Answer["joint"], "asked"> {
  const test = (covariance: Covariance | null) =>
    covariance === null ? null : jointTest(fit, covariance, restrictions);
  const [classical, white] = [test(covariances.classical), test(covariances.white)];
  if (classical === null || white === null) throw new Error("classical and White covariances always exist");
  return { classical, white, neweyWest: test(covariances["newey-west"]), grouped: test(covariances.grouped) };
}
