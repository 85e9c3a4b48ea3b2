import type { Covariance, ErrorsChoice, WhiteVersion } from "../covariance/choice.ts";
import { covarianceOf } from "../covariance/covarianceOf.ts";
import { chosen } from "../decision/decide.ts";
import type { Decision } from "../decision/decision.ts";
import type { Sizes } from "../decision/policies.ts";
import type { RowOrder } from "../design/design.ts";
import type { Fit } from "../fit/fit.ts";
import type { InferenceTable } from "../inference/inference.ts";
import { inferenceOf } from "../inference/inferenceOf.ts";
import { type Result, success } from "../problem/result.ts";
import type { AllStandardErrors, Answer } from "./answer.ts";
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
}

const whiteVersions: readonly WhiteVersion[] = ["HC0", "HC1", "HC2", "HC3", "HC4", "HC4m", "HC5"];

/** Every kind of standard errors that what rows are allows, and the inference that follows from each. */
export function allErrors(fit: Fit, setting: Setting): Result<AllErrors> {
  const choices = choicesFor(fit.design.order, setting);
  const found = new Map<string, Covariance>();
  for (const choice of choices) {
    const covariance = covarianceOf(fit, choice);
    if (!covariance.ok) return covariance;
    found.set(keyOf(choice), covariance.value);
  }
  const of = (choice: ErrorsChoice): Covariance | null => found.get(keyOf(choice)) ?? null;
  return success({ standardErrors: standardErrorsFrom(fit, of, setting), inference: inferenceFrom(fit, of, setting) });
}

const keyOf = (choice: ErrorsChoice): string =>
  "version" in choice
    ? `${choice.kind} ${choice.version}`
    : choice.kind === "newey-west"
      ? `${choice.kind} ${choice.adjusted}`
      : choice.kind;

const neweyWest = (lags: number, adjusted: boolean): ErrorsChoice => ({
  kind: "newey-west",
  lags: { kind: "given", lags },
  adjusted,
});

function choicesFor(order: RowOrder, { lags, options }: Setting): ErrorsChoice[] {
  const white = whiteVersions.map((version): ErrorsChoice => ({ kind: "white", version }));
  const time = lags === null ? [] : [neweyWest(lags, true), neweyWest(lags, false)];
  const versions = new Set(["CR0", "CR1", options.groupedVersion] as const);
  const grouped =
    order.kind === "groups" ? [...versions].map((version): ErrorsChoice => ({ kind: "grouped", version })) : [];
  return [{ kind: "classical" }, ...white, ...time, ...grouped];
}

type Lookup = (choice: ErrorsChoice) => Covariance | null;

const listed = (covariance: Covariance | null): number[] => [...(covariance?.standardErrors ?? [])];

function standardErrorsFrom(fit: Fit, of: Lookup, { lags, options }: Setting): AllStandardErrors {
  const white = whiteVersions.map((version) => [version, listed(of({ kind: "white", version }))] as const);
  const { order } = fit.design;
  return {
    classical: listed(of({ kind: "classical" })),
    white: Object.fromEntries(white),
    whiteFallback: of({ kind: "white", version: options.whiteVersion })?.used.fallback ?? null,
    neweyWest:
      lags === null
        ? null
        : { lags, adjusted: listed(of(neweyWest(lags, true))), unadjusted: listed(of(neweyWest(lags, false))) },
    grouped:
      order.kind === "groups"
        ? {
            groups: order.labels.length,
            CR0: listed(of({ kind: "grouped", version: "CR0" })),
            CR1: listed(of({ kind: "grouped", version: "CR1" })),
          }
        : null,
  };
}

/** One table a kind, each under the law that the policy compares that kind with. */
function inferenceFrom(fit: Fit, of: Lookup, { decision, options, sizes }: Setting): Answer["inference"] {
  const against = fit.design.terms.map(({ name }) => options.against[name] ?? 0);
  const table = (kind: ErrorsChoice["kind"]): InferenceTable | null => {
    const { errors, reference } = chosen(kind, { order: fit.design.order, sizes }, options);
    const covariance = of(errors);
    return covariance === null ? null : inferenceOf(fit, covariance, { reference, against, level: options.level });
  };
  const tables = {
    classical: table("classical"),
    white: table("white"),
    "newey-west": table("newey-west"),
    grouped: table("grouped"),
  };
  const inForce = tables[decision.inForce.errors.kind];
  if (tables.classical === null || tables.white === null || inForce === null)
    throw new Error("a kind in force was not computed");
  const { classical, white, grouped } = tables;
  return { classical, white, neweyWest: tables["newey-west"], grouped, inForce };
}
