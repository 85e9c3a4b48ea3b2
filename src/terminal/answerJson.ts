import type { Answer } from "../core/answer/answer.ts";
import type { TestOutcome } from "../core/diagnostics/outcome.ts";

/** Tests that stand as one entry an order. */
const byOrder: readonly string[] = ["breusch-godfrey", "ljung-box", "arch"];

/** An answer as the object that `--json` prints: full double precision, stable keys. */
export function answerJson(answer: Answer): object {
  const { decision, inference, standardErrors } = answer;
  const { neweyWest } = standardErrors;
  return {
    observations: answer.observations,
    outcome: answer.outcome,
    terms: answer.terms,
    coefficients: answer.coefficients,
    standardErrors: {
      classical: standardErrors.classical,
      white: standardErrors.white,
      whiteFallback: standardErrors.whiteFallback,
      neweyWest: neweyWest ?? { notApplicable: "Rows do not run through time." },
      grouped: standardErrors.grouped ?? { notApplicable: "Rows are not in groups." },
    },
    fit: answer.fit,
    tests: testsJson(answer.tests),
    choice: {
      policy: decision.policy,
      errors: decision.inForce.errors.kind,
      calledFor: decision.called.errors.kind,
      version: "version" in decision.inForce.errors ? decision.inForce.errors.version : null,
      lags: decision.inForce.errors.kind === "newey-west" ? answer.lags : null,
      reference: decision.inForce.reference,
      because: decision.because,
      fourCase: decision.fourCase,
      override: decision.override,
      cautions: decision.cautions,
    },
    inference: {
      classical: inference.classical,
      white: inference.white,
      neweyWest: inference.neweyWest,
      grouped: inference.grouped,
      inForce: inference.inForce,
    },
    drivers: answer.drivers,
    verdict: answer.verdict,
    rows: answer.rows,
    leftOut: answer.leftOut,
    leftOutCount: answer.leftOutCount,
    notes: answer.notes,
  };
}

/** Tests by name; a list where each order has an entry of its own. */
function testsJson(tests: readonly TestOutcome[]): Record<string, unknown> {
  const names = [...new Set(tests.map(({ test }) => test))];
  return Object.fromEntries(
    names.map((name) => {
      const outcomes = tests.filter(({ test }) => test === name);
      const [first] = outcomes;
      const listed = byOrder.includes(name) && first?.order !== null;
      return [name, listed ? outcomes.map(outcomeJson) : first && outcomeJson(first)];
    }),
  );
}

function outcomeJson(outcome: TestOutcome): object {
  if (outcome.kind === "not-applicable") {
    return { ...(outcome.order === null ? {} : { order: outcome.order }), notApplicable: outcome.because };
  }
  const { figure, fForm, form, order, details } = outcome;
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
