import type { Term, TermMeaning } from "../design/design.ts";
import type { Transform } from "../design/model.ts";
import type { Fit } from "../fit/fit.ts";
import type { TermFirmness } from "../robustness/firmness.ts";
import type { Decision } from "../decision/decision.ts";
import type { Answer, DriverAnswer } from "./answer.ts";
import { effectOf } from "./effects.ts";
import type { Options } from "./options.ts";
import { driverSentence } from "./verdict.ts";
import { atStart } from "./wording.ts";

export interface DriverFacts {
  readonly fit: Fit;
  readonly inference: Answer["inference"];
  readonly decision: Decision;
  readonly lags: number | null;
  readonly firmness: Answer["firmness"];
  readonly options: Options;
}

/** What is said of each term: the figures in force, whether they are firm, and the sentence. */
export function driverAnswers(facts: DriverFacts): DriverAnswer[] {
  return facts.fit.design.terms.map((term, index) => {
    const driver = { term: term.name, kind: term.meaning.kind, ...figuresOf(facts, index) };
    if (driver.kind === "constant") return { ...driver, sentence: null };
    const { decision, lags, options, inference } = facts;
    const effect = effectOf({ meaning: term.meaning, outcome: facts.fit.design.outcome, units: options.units });
    const proviso = provisoOf(term.meaning, facts.fit.design.terms);
    const agreeing = agreeingKinds(inference);
    const subject = term.meaning.kind === "number" ? atStart(term.name, term.meaning.column) : term.name;
    const spoken = { driver, subject, effect, decision, lags, level: options.level, agreeing, proviso };
    return { ...driver, sentence: driverSentence(spoken) };
  });
}

/** Where a column enters as it is and squared, neither coefficient alone is what a step in it goes with. */
function provisoOf(meaning: TermMeaning, terms: readonly Term[]): string {
  if (meaning.kind !== "number" || !isOfCurve(meaning.transform)) return "";
  const { column } = meaning;
  const forms = terms.flatMap(({ meaning: other }) =>
    other.kind === "number" && other.column === column ? [other.transform.kind] : [],
  );
  return forms.includes("none") && forms.includes("square")
    ? `${column} enters with its square: what a step in it goes with differs along the way, and neither of the two says it alone.`
    : "";
}

const isOfCurve = ({ kind }: Transform): boolean => kind === "none" || kind === "square";

function figuresOf(
  { fit, inference, firmness, options }: DriverFacts,
  index: number,
): Omit<DriverAnswer, "term" | "kind" | "sentence"> {
  const { inForce } = inference;
  const at = (values: readonly number[]): number => values[index] ?? 0;
  return {
    coefficient: fit.coefficients[index] ?? 0,
    against: againstOf(fit, options)[index] ?? 0,
    standardError: at(inForce.standardErrors),
    ratio: at(inForce.ratio),
    pValue: at(inForce.pValue),
    low: at(inForce.low),
    high: at(inForce.high),
    firmness: firmnessOf(firmness.terms[index]!, at(inForce.pValue) < options.level),
  };
}

/** Firm when every choice falls on the same side of the level as the one in force. */
function firmnessOf({ firm, flippedBy, pValues }: TermFirmness, shown: boolean): DriverAnswer["firmness"] {
  if (firm) return { kind: "firm" };
  return { kind: "leaning", on: flippedBy, farthest: shown ? pValues.largest : pValues.smallest };
}

/** b0 of each term: the value given for the term by its name, or for the column it is made from. */
export const againstOf = ({ design }: Fit, { against }: Options): number[] =>
  design.terms.map(
    ({ name, meaning }) => against[name] ?? (meaning.kind === "number" ? against[meaning.column] : 0) ?? 0,
  );

function agreeingKinds(inference: Answer["inference"]): string {
  if (inference.neweyWest !== null) {
    return `all ${inference.grouped === null ? "three" : "four"} kinds of standard error`;
  }
  return inference.grouped === null
    ? "classical and White standard errors"
    : "classical, White and grouped standard errors";
}
