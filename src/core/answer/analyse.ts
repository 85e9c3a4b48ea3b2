import { lagsOf } from "../covariance/lags.ts";
import { decide } from "../decision/decide.ts";
import { rulesOf } from "../decision/policies.ts";
import { autocorrelationOrder } from "../decision/testOrder.ts";
import { buildDesign } from "../design/buildDesign.ts";
import type { Design, RowOrder, TermMeaning } from "../design/design.ts";
import type { Fit } from "../fit/fit.ts";
import { fitLeastSquares } from "../fit/fitLeastSquares.ts";
import { type Result, success } from "../problem/result.ts";
import { type Firmness, firmness } from "../robustness/firmness.ts";
import { allErrors } from "./allErrors.ts";
import type { Answer, FitFigures } from "./answer.ts";
import { askedSentences } from "./askedWords.ts";
import { againstOf, driverAnswers } from "./drivers.ts";
import { followsOn } from "./findings.ts";
import { guardsOf } from "./guards.ts";
import type { Options } from "./options.ts";
import { residualPoints } from "./points.ts";
import type { Question, Report } from "./question.ts";
import { coefficientsOf } from "./readAsked.ts";
import { residualShape } from "./residualShape.ts";
import { type RowPlaces, rowPlacesOf } from "./rowPlaces.ts";
import { rowsSummary } from "./rowsSummary.ts";
import { decidingTests, furtherTests } from "./runTests.ts";
import { choiceSentence, scopeInWords } from "./verdict.ts";
import { atStart, driversInWords } from "./wording.ts";

/**
 * The whole chain: columns to design, fit, tests, decision, standard errors of every kind, inference, verdict.
 * @param question - the columns, what is made of them, and how the answer is to be made.
 * @param report - told between the steps how far the work has come.
 * @returns every figure finite; Problems of the table, the model and the fit as they are found.
 */
export function analyse(question: Question, report: Report): Result<Answer> {
  const { source, model } = question;
  report("Reading the columns", 0);
  const design = buildDesign(source, model);
  if (!design.ok) return design;
  report("Fitting", 0.15);
  const fitted = fitLeastSquares(design.value);
  if (!fitted.ok) return fitted;
  return answerFrom(fitted.value, question, (step, share) => report(step, 0.35 + 0.65 * share));
}

function answerFrom(fit: Fit, { source, options }: Question, report: Report): Result<Answer> {
  const { design } = fit;
  const testOrder = autocorrelationOrder(design.order, fit.rowCount);
  const deciding = decidingTests(fit, testOrder, report);
  const lags = asksLags(design.order, options) ? lagsOf(fit, options.lags ?? rulesOf(options.policy).lags) : null;
  const sizes = { rows: fit.rowCount, columns: fit.columnCount, lags: lags ?? 0 };
  const decided = decide({ tests: deciding, order: design.order, sizes, testOrder }, options);
  if (!decided.ok) return decided;
  const decision = decided.value;
  report("Standard errors", 0.55);
  const errors = allErrors(fit, { decision, options, lags, sizes });
  if (!errors.ok) return errors;
  const { standardErrors, inference, joint, estimates } = errors.value;
  report("The other tests", 0.7);
  const tests = [
    ...deciding,
    ...furtherTests(fit, decision.inForce.errors, { testOrder, breakAfter: options.breakAfter }),
  ];
  report("How firm it is", 0.85);
  const against = againstOf(fit, options);
  const { adjusted, level } = options;
  const firm = firmness(fit, { inForce: inference.inForce, against, level, lags, adjusted });
  if (!firm.ok) return firm;
  const places = rowPlacesOf(design, source);
  const guards = guardsOf(fit, { tests, level, followsOn: followsOn(decision), places });
  const found = {
    decision,
    lags,
    tests,
    standardErrors,
    inference,
    joint,
    estimates,
    firmness: placed(firm.value, places),
    guards,
  };
  return success(spoken(fit, found, { options, places }));
}

/** Within groups lags are asked for only where Newey-West is fixed by hand: the evidence calls for errors by group. */
const asksLags = (order: RowOrder, { fixed }: Options): boolean =>
  order.kind === "time" || (order.kind === "groups" && order.positions !== null && fixed?.errors === "newey-west");

type Found = Pick<
  Answer,
  "decision" | "lags" | "tests" | "standardErrors" | "inference" | "joint" | "estimates" | "firmness" | "guards"
>;

/** Each coefficient's most telling row by its place in the sheet. */
const placed = ({ choices, terms }: Firmness, { cell }: RowPlaces): Answer["firmness"] => ({
  choices,
  terms: terms.map((term) => ({ ...term, leaveOneOut: { ...term.leaveOneOut, cell: cell(term.leaveOneOut.row) } })),
});

/** The figures with everything that is said of them. */
function spoken(fit: Fit, found: Found, { options, places }: { options: Options; places: RowPlaces }): Answer {
  const { design } = fit;
  const drivers = driverAnswers({ fit, options, ...found });
  const said = {
    ...found,
    outcome: design.outcome.name,
    observations: fit.rowCount,
    terms: design.terms.map(({ name }) => name),
    askable: coefficientsOf(design),
    fit: figuresOf(fit),
    rows: rowsSummary(design),
    options,
  };
  const title = titleOf(design);
  const opening = [`${title} ${scopeInWords(said)}`, choiceSentence(said)];
  const verdict = [...opening, ...sentences(drivers), ...askedSentences(said), ...found.decision.cautions];
  const { leftOut, leftOutCount, notes } = design;
  return {
    ...said,
    title,
    coefficients: [...fit.coefficients],
    drivers,
    verdict,
    ...{ leftOut, leftOutCount, notes },
    points: residualPoints(fit, places),
    shape: residualShape(fit),
  };
}

const sentences = (drivers: Answer["drivers"]): string[] =>
  drivers.flatMap(({ sentence }) => (sentence === null ? [] : [sentence]));

function titleOf({ outcome, terms }: Design): string {
  const drivers = new Set(terms.flatMap(({ name, meaning }) => titledAs(name, meaning)));
  return `${atStart(outcome.name, outcome.column)} explained by ${driversInWords([...drivers])}`;
}

/** A driver of categories is named once, and so are the seasons; each of their terms has its sentence. */
function titledAs(name: string, meaning: TermMeaning): string[] {
  switch (meaning.kind) {
    case "constant":
      return [];
    case "level":
      return [meaning.column];
    case "season":
      return ["the season"];
    case "number":
    case "date":
    case "trend":
      return [name];
  }
}

const figuresOf = (fit: Fit): FitFigures => ({
  columns: fit.columnCount,
  degreesOfFreedom: fit.degreesOfFreedom,
  sigma: fit.sigma,
  rSquared: fit.rSquared,
  adjustedRSquared: fit.adjustedRSquared,
  uncentred: fit.uncentred,
  rss: fit.residualSumOfSquares,
  logLikelihood: fit.logLikelihood,
  aic: fit.aic,
  bic: fit.bic,
});
