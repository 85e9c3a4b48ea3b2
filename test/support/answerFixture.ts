import type { Answer, DriverAnswer } from "../../src/core/answer/answer.ts";
import { defaultOptions } from "../../src/core/answer/options.ts";
import { computed, notApplicable } from "../../src/core/diagnostics/outcome.ts";
import type { InferenceTable } from "../../src/core/inference/inference.ts";

/** An answer whose figures are made up, all different, so that a figure in the wrong place is seen. */
const coefficients = [101.5, -2.25, 0.375];
const terms = ["constant", "Price", "Rain"];

const table = (shift: number): InferenceTable => ({
  reference: { law: "t", degreesOfFreedom: 45 + shift },
  standardErrors: [1.5, 0.5, 0.25].map((error) => error + shift / 64),
  ratio: [11, 12, 13].map((ratio) => ratio + shift),
  pValue: [0.001, 0.02, 0.3].map((pValue) => pValue + shift / 1000),
  pValueT: [0.0011, 0.0211, 0.3011].map((pValue) => pValue + shift / 1000),
  pValueNormal: [0.0012, 0.0212, 0.3012].map((pValue) => pValue + shift / 1000),
  low: [90, -4, -1].map((low) => low - shift),
  high: [110, -1, 2].map((high) => high + shift),
});

const [classical, white, neweyWest] = [table(1), table(2), table(3)];

const driver = (row: number, sentence: string | null): DriverAnswer => ({
  term: terms[row]!,
  kind: sentence === null ? "constant" : "number",
  coefficient: coefficients[row]!,
  against: 0,
  standardError: neweyWest.standardErrors[row]!,
  ratio: neweyWest.ratio[row]!,
  pValue: neweyWest.pValue[row]!,
  low: neweyWest.low[row]!,
  high: neweyWest.high[row]!,
  firmness: row === 2 ? { kind: "leaning", on: ["classical standard errors"], farthest: 0.301 } : { kind: "firm" },
  sentence,
});

const koenker = computed({
  test: "koenker",
  form: null,
  order: null,
  figure: { statistic: 7.25, law: "chi-square", df: [2], pValue: 0.0266 },
  fForm: { statistic: 4.125, law: "F", df: [2, 45], pValue: 0.0227 },
  details: {},
});

const breuschGodfrey = [1, 2].map((order) =>
  computed({
    test: "breusch-godfrey",
    form: null,
    order,
    figure: { statistic: 5.5 + order, law: "chi-square", df: [order], pValue: 0.019 / order },
    fForm: { statistic: 6.5 + order, law: "F", df: [order, 45 - order], pValue: 0.014 / order },
    details: {},
  }),
);

const neweyWestErrors = { kind: "newey-west", lags: { kind: "given", lags: 8 }, adjusted: true } as const;

const jointly = (statistic: number, pValue: number): Answer["joint"]["classical"] => {
  const chiSquare = { statistic, law: "chi-square", df: [2], pValue } as const;
  const f = { statistic: statistic / 2, law: "F", df: [2, 45], pValue: pValue * 1.5 } as const;
  return { kind: "computed", figure: f, chiSquare, f };
};

export const answerFixture: Answer = {
  title: "Repairs explained by Price and Rain",
  outcome: "Repairs",
  observations: 48,
  terms,
  coefficients,
  standardErrors: {
    classical: classical.standardErrors,
    white: { HC3: white.standardErrors },
    whiteFallback: null,
    neweyWest: { lags: 8, adjusted: neweyWest.standardErrors, unadjusted: [1.4, 0.45, 0.22] },
    grouped: null,
  },
  fit: {
    columns: 3,
    degreesOfFreedom: 45,
    sigma: 3.125,
    rSquared: 0.625,
    adjustedRSquared: 0.6,
    uncentred: false,
    rss: 439.5,
    logLikelihood: -121.25,
    aic: 250.5,
    bic: 257.75,
  },
  tests: [koenker, ...breuschGodfrey, notApplicable("white", "too few rows for its columns")],
  decision: {
    policy: "careful",
    fourCase: { spread: "uneven", followOn: "some" },
    called: { errors: neweyWestErrors, reference: neweyWest.reference },
    inForce: { errors: neweyWestErrors, reference: neweyWest.reference },
    because: "errors follow on",
    override: null,
    testLevel: 0.1,
    restsOn: [{ outcome: koenker, pValue: 0.0227, rejected: true }],
    cautions: [],
  },
  lags: 8,
  inference: { classical, white, neweyWest, grouped: null, inForce: neweyWest },
  joint: {
    classical: jointly(21.5, 0.00021),
    white: jointly(19.25, 0.00066),
    neweyWest: jointly(17.75, 0.0014),
    grouped: null,
    asked: null,
  },
  estimates: [],
  askable: { names: terms.map((name, term) => ({ name, term })), size: terms.length },
  firmness: {
    choices: [],
    terms: terms.map((term, row) => ({
      term,
      firm: row !== 2,
      flippedBy: row === 2 ? ["classical with the t law"] : [],
      pValues: { smallest: 0.0007 * (row + 1), largest: 0.11 * (row + 1) },
      leaveOneOut: { row: row + 4, without: coefficients[row]! + 0.125, change: 0.125, cell: `B${row + 6}` },
    })),
  },
  guards: {
    found: [],
    collinearity: {
      terms: [
        { term: "Price", inflation: 1.25, madeOf: [] },
        { term: "Rain", inflation: 1.5, madeOf: [] },
      ],
      conditionNumber: 17.5,
      dependencies: [],
    },
    trending: null,
    rows: [],
  },
  drivers: [driver(0, null), driver(1, "Price matters."), driver(2, "Rain: nothing can be shown.")],
  verdict: ["Repairs were explained.", "Price matters.", "Rain: nothing can be shown."],
  rows: {
    kind: "time",
    period: { name: "monthly", unit: "month", season: 12 },
    first: "Jan 2020",
    last: "Dec 2023",
    gaps: 0,
    gapLabels: [],
  },
  leftOut: [],
  leftOutCount: 0,
  notes: [],
  options: defaultOptions,
  points: { fitted: [1, 2], residuals: [0.5, -0.5], rows: [2, 3], periods: [1, 2], thinned: false },
  shape: {
    correlations: { values: [0.5, -0.25], bound: 0.28 },
    quantiles: { residuals: [-0.5, 0.5], normal: [-0.4, 0.4] },
  },
};
