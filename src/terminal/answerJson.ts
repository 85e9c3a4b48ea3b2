import type { Answer } from "../core/answer/answer.ts";
import type { Predicted } from "./predictions.ts";
import { criticalValueOf } from "../core/diagnostics/criticalValue.ts";
import type { Figure, TestOutcome } from "../core/diagnostics/outcome.ts";

/** Tests that stand as one entry an order. */
const byOrder: readonly string[] = ["breusch-godfrey", "ljung-box", "arch"];

/** An answer as the object that `--json` prints: full double precision, stable keys. */
export function answerJson(answer: Answer, predicted: Predicted | null = null): object {
  const { observations, outcome, terms, coefficients, fit, inference, joint, drivers } = answer;
  const { guards, firmness, estimates } = answer;
  const { verdict, rows, leftOut, leftOutCount, notes } = answer;
  return {
    ...{ observations, outcome, terms, coefficients },
    standardErrors: standardErrorsJson(answer.standardErrors),
    fit,
    tests: testsJson(answer.tests, answer.decision.testLevel),
    choice: choiceJson(answer),
    ...{ inference, joint, estimates, guards, firmness, drivers, verdict, rows, leftOut, leftOutCount, notes },
    ...(predicted === null ? {} : { predictions: predicted }),
  };
}

const standardErrorsJson = (errors: Answer["standardErrors"]): object => ({
  ...errors,
  neweyWest: errors.neweyWest ?? { notApplicable: notThroughTime(errors) },
  grouped: errors.grouped ?? { notApplicable: "Rows are not in groups." },
});

const notThroughTime = ({ grouped }: Answer["standardErrors"]): string =>
  grouped === null
    ? "Rows do not run through time."
    : "Rows are in groups: Newey-West within them is given where it is fixed and the time within groups is known.";

function choiceJson({ decision, lags, inference }: Answer): object {
  const { errors, reference } = decision.inForce;
  return {
    policy: decision.policy,
    errors: errors.kind,
    calledFor: decision.called.errors.kind,
    version: "version" in errors ? errors.version : null,
    lags: errors.kind === "newey-west" ? lags : null,
    reference,
    degreesOfFreedom: inference.inForce.degreesOfFreedom ?? null,
    because: decision.because,
    fourCase: decision.fourCase,
    override: decision.override,
    cautions: decision.cautions,
  };
}

/** Tests by name; a list where each order has an entry of its own. */
function testsJson(tests: readonly TestOutcome[], level: number): Record<string, unknown> {
  const json = (outcome: TestOutcome): object => outcomeJson(outcome, level);
  const names = [...new Set(tests.map(({ test }) => test))];
  return Object.fromEntries(
    names.map((name) => {
      const outcomes = tests.filter(({ test }) => test === name);
      const [first] = outcomes;
      const listed = byOrder.includes(name) && first?.order !== null;
      return [name, listed ? outcomes.map(json) : first && json(first)];
    }),
  );
}

function outcomeJson(outcome: TestOutcome, level: number): object {
  if (outcome.kind === "not-applicable") {
    return { ...(outcome.order === null ? {} : { order: outcome.order }), notApplicable: outcome.because };
  }
  const { form, order, details } = outcome;
  const figure = withCritical(outcome.figure, level);
  const fForm = outcome.fForm === null ? null : withCritical(outcome.fForm, level);
  if (outcome.test === "breusch-godfrey") return { order, chiSquare: figure, f: fForm };
  if (outcome.test === "durbin-watson") {
    return { statistic: figure.statistic, pValuePositive: figure.pValue, method: form, ...details };
  }
  return {
    ...(form === null ? {} : { form }),
    ...(order === null ? {} : { order }),
    ...figure,
    ...(fForm === null ? {} : { f: fForm }),
    ...details,
  };
}

/** The point that the statistic must pass to reject at the level of the tests, where its law has one in closed form. */
function withCritical(figure: Figure, level: number): Figure & { readonly criticalValue?: number } {
  const criticalValue = criticalValueOf(figure, level);
  return criticalValue === null ? figure : { ...figure, criticalValue };
}
