import type { Fit } from "../fit/fit.ts";
import type { InferenceTable } from "../inference/inference.ts";
import { inferenceOf } from "../inference/inferenceOf.ts";
import type { Reference } from "../inference/reference.ts";
import { type Result, success } from "../problem/result.ts";
import { type Alternative, type AlternativeSettings, alternatives } from "./choices.ts";
import { type LargestChange, leaveOneOut } from "./leaveOneOut.ts";
import { type ChoiceName, choicesInWords } from "./choicesInWords.ts";

/** What all coefficients look like under one kind of standard errors and one law. */
export interface ChoiceTable extends ChoiceName {
  readonly standardErrors: readonly number[];
  readonly pValue: readonly number[];
  readonly low: readonly number[];
  readonly high: readonly number[];
}

/** How firm the conclusion about one term is. */
export interface TermFirmness {
  readonly term: string;
  /** Every choice falls on the same side of the level as the one in force. */
  readonly firm: boolean;
  /** The choices that flip the conclusion, in words, alike ones together; empty where it is firm. */
  readonly flippedBy: readonly string[];
  /** The smallest and the largest p-value among all choices. */
  readonly pValues: { readonly smallest: number; readonly largest: number };
  readonly leaveOneOut: LargestChange;
}

export interface Firmness {
  /** Every choice side by side. */
  readonly choices: readonly ChoiceTable[];
  /** One entry a term. */
  readonly terms: readonly TermFirmness[];
}

export interface FirmnessSettings extends AlternativeSettings {
  /** The table in force. */
  readonly inForce: InferenceTable;
  /** b0, one value a term. */
  readonly against: readonly number[];
  readonly level: number;
}

/**
 * Whether each conclusion survives other choices of standard errors and reference law: classical, HC0 to HC4, Newey-West
 * with 0 to 2L + 4 lags, grouped; each with t and normal, Newey-West with fixed-b too.
 * @returns Problems of the covariances, as where lags reach n.
 */
export function firmness(fit: Fit, settings: FirmnessSettings): Result<Firmness> {
  const found = alternatives(fit, settings);
  if (!found.ok) return found;
  const choices = found.value.flatMap((alternative) => tablesOf(fit, alternative, settings));
  const changes = leaveOneOut(fit);
  const terms = fit.design.terms.map(({ name }, j) =>
    termFirmness({ term: name, j, leaveOneOut: changes[j]! }, choices, settings),
  );
  return success({ choices, terms });
}

function tablesOf(fit: Fit, alternative: Alternative, { against, level }: FirmnessSettings): ChoiceTable[] {
  const { covariance, references, degreesOfFreedom } = alternative;
  const { choice, used } = covariance;
  return references.map((reference) => {
    const settings = { reference, against, level, ...(degreesOfFreedom && { degreesOfFreedom }) };
    const { standardErrors, pValue, low, high } = inferenceOf(fit, covariance, settings);
    return {
      kind: choice.kind,
      version: used.version,
      lags: used.lags,
      law: lawName(reference),
      standardErrors,
      pValue,
      low,
      high,
    };
  });
}

const lawName = ({ law }: Reference): ChoiceName["law"] => law;

interface TermFacts {
  readonly term: string;
  readonly j: number;
  readonly leaveOneOut: LargestChange;
}

function termFirmness(
  { term, j, leaveOneOut }: TermFacts,
  choices: readonly ChoiceTable[],
  { inForce, level }: FirmnessSettings,
): TermFirmness {
  const shown = inForce.pValue[j]! < level;
  const dissenting = choices.filter(({ pValue }) => pValue[j]! < level !== shown);
  const pValues = choices.map(({ pValue }) => pValue[j]!);
  return {
    term,
    firm: dissenting.length === 0,
    flippedBy: choicesInWords(dissenting, choices),
    pValues: { smallest: Math.min(...pValues), largest: Math.max(...pValues) },
    leaveOneOut,
  };
}
