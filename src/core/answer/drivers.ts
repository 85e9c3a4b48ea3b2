import type { Fit } from "../fit/fit.ts";
import type { InferenceTable } from "../inference/inference.ts";
import type { Decision } from "../decision/decision.ts";
import type { Answer, DriverAnswer } from "./answer.ts";
import { effectOf } from "./effects.ts";
import type { Options } from "./options.ts";
import { driverSentence } from "./verdict.ts";
import { pValueInWords } from "./wording.ts";

export interface DriverFacts {
  readonly fit: Fit;
  readonly inference: Answer["inference"];
  readonly decision: Decision;
  readonly lags: number | null;
  readonly options: Options;
}

/** What is said of each term: the figures in force, whether they are firm, and the sentence. */
export function driverAnswers(facts: DriverFacts): DriverAnswer[] {
  return facts.fit.design.terms.map((term, index) => {
    const figures = figuresOf(facts, index);
    if (term.meaning.kind === "constant") return { term: term.name, ...figures, sentence: null };
    const { decision, lags, options, inference } = facts;
    const effect = effectOf({ meaning: term.meaning, outcome: facts.fit.design.outcome, units: options.units });
    const driver = { term: term.name, ...figures };
    const spoken = { driver, effect, decision, lags, level: options.level, agreeing: agreeingKinds(inference) };
    return { ...driver, sentence: driverSentence(spoken) };
  });
}

function figuresOf({ fit, inference, options }: DriverFacts, index: number): Omit<DriverAnswer, "term" | "sentence"> {
  const { inForce } = inference;
  const at = (values: readonly number[]): number => values[index] ?? 0;
  return {
    coefficient: fit.coefficients[index] ?? 0,
    against: options.against[fit.design.terms[index]?.name ?? ""] ?? 0,
    standardError: at(inForce.standardErrors),
    ratio: at(inForce.ratio),
    pValue: at(inForce.pValue),
    low: at(inForce.low),
    high: at(inForce.high),
    firmness: firmnessOf(inference, index, options.level),
  };
}

/** Firm when every kind, under its own law and under the normal, falls on the same side of the level as the one in force. */
function firmnessOf(inference: Answer["inference"], index: number, level: number): DriverAnswer["firmness"] {
  const shown = (inference.inForce.pValue[index] ?? 1) < level;
  const on = kindsOf(inference).flatMap(({ name, table }) => {
    const pValues = [table.pValue[index] ?? 1, table.pValueNormal[index] ?? 1];
    const dissenting = pValues.find((pValue) => pValue < level !== shown);
    return dissenting === undefined ? [] : [`${name} standard errors (${pValueInWords(dissenting, level)})`];
  });
  return on.length === 0 ? { kind: "firm" } : { kind: "leaning", on };
}

function kindsOf(inference: Answer["inference"]): { name: string; table: InferenceTable }[] {
  const kinds = [
    { name: "classical", table: inference.classical },
    { name: "White", table: inference.white },
    { name: "Newey-West", table: inference.neweyWest },
    { name: "grouped", table: inference.grouped },
  ];
  return kinds.flatMap(({ name, table }) => (table === null ? [] : [{ name, table }]));
}

function agreeingKinds(inference: Answer["inference"]): string {
  if (inference.neweyWest !== null) return "all three kinds of standard error";
  return inference.grouped === null
    ? "classical and White standard errors"
    : "classical, White and grouped standard errors";
}
