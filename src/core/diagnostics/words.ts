import type { TestName } from "./outcome.ts";

/** What a test asks and what its answer means, for a reader who knows the trade but not the test. */
export interface TestWords {
  /** As the trade calls it: "Koenker's test". */
  readonly title: string;
  /** What it asks, as a sentence. */
  readonly question: string;
  /** What it means where the test rejects at the level in use. */
  readonly rejected: string;
  /** What it means where it does not: never that the null hypothesis is true. */
  readonly notRejected: string;
  /** Author and year. */
  readonly source: string;
}

/**
 * Tests that take errors not to follow on, or hardly to, and reject too often where they do. Of 300 series of 96 rows
 * with no break and no curve, whose errors carry over by 0.6, they rejected at 5 % in 10 % (RESET) to 70 % (the largest
 * Chow statistic).
 */
export const upsetByFollowOn: ReadonlySet<TestName> = new Set([
  "chow",
  "largest-chow",
  "cusum",
  "cusum-recursive",
  "reset",
  "reset-robust",
  "arch",
]);

export const testWords: Readonly<Record<TestName, TestWords>> = {
  koenker: {
    title: "Koenker's test",
    question: "Does the spread of the errors change with the drivers?",
    rejected: "The spread of the errors changes with the drivers: classical standard errors are not to be relied on.",
    notRejected: "No change of spread with the drivers shows.",
    source: "Breusch and Pagan 1979, in the form of Koenker 1981",
  },
  "breusch-pagan": {
    title: "Breusch-Pagan test",
    question: "Does the spread of the errors change with the drivers, if the errors are normal?",
    rejected:
      "The spread of the errors changes with the drivers, or the errors are far from normal; Koenker's test tells the two apart.",
    notRejected: "No change of spread with the drivers shows.",
    source: "Breusch and Pagan 1979",
  },
  white: {
    title: "White's test",
    question: "Does the spread of the errors change with the drivers, their squares or products?",
    rejected:
      "The spread of the errors is uneven, or a curve or product of drivers is missing: classical standard errors are not to be relied on.",
    notRejected: "No unevenness of spread that the drivers, their squares or products could explain shows.",
    source: "White 1980",
  },
  "white-fitted": {
    title: "White's test on the fitted values",
    question: "Does the spread of the errors change with the size of the fitted value?",
    rejected: "The spread of the errors changes with the size of the fitted value.",
    notRejected: "No change of spread with the size of the fitted value shows.",
    source: "White 1980, short form on the fitted values and their squares",
  },
  "goldfeld-quandt": {
    title: "Goldfeld-Quandt test",
    question:
      "Is the spread of the errors larger among the rows with large fitted values than among those with small ones?",
    rejected: "The spread is larger among the rows with large fitted values.",
    notRejected: "The spread is not shown to be larger among the rows with large fitted values.",
    source: "Goldfeld and Quandt 1965",
  },
  "breusch-godfrey": {
    title: "Breusch-Godfrey test",
    question: "Do the errors follow on from one period to the next ones, up to this many periods?",
    rejected:
      "The errors follow on from period to period: neither classical nor White standard errors are to be relied on.",
    notRejected: "No follow-on from period to period shows.",
    source: "Breusch 1978 and Godfrey 1978",
  },
  "durbin-watson": {
    title: "Durbin-Watson test",
    question: "Does each error tend to have the sign of the one before?",
    rejected: "Each error tends to have the sign of the one before.",
    notRejected:
      "No such tendency shows. (With the outcome's own past among the drivers this test is blind; see the Breusch-Godfrey test.)",
    source: "Durbin and Watson 1950, exact p-value after Imhof 1961",
  },
  "ljung-box": {
    title: "Ljung-Box test",
    question: "Are the residuals correlated with their own past, up to this many periods?",
    rejected: "The residuals are correlated with their own past.",
    notRejected: "No correlation of the residuals with their own past shows.",
    source: "Ljung and Box 1978",
  },
  arch: {
    title: "ARCH test",
    question: "Do large errors come in runs, up to this many periods apart?",
    rejected: "Large errors come in runs: calm and rough periods take turns.",
    notRejected: "No runs of large errors show.",
    source: "Engle 1982",
  },
  reset: {
    title: "RESET test",
    question: "Is a curve missing: do the square and cube of the fitted value explain what is left?",
    rejected: "A curve seems to be missing: try a logarithm, a square or another driver.",
    notRejected: "No missing curve shows.",
    source: "Ramsey 1969",
  },
  "reset-robust": {
    title: "RESET test with the standard errors in force",
    question: "Is a curve missing, whatever the spread and follow-on of the errors?",
    rejected: "A curve seems to be missing: try a logarithm, a square or another driver.",
    notRejected: "No missing curve shows.",
    source: "Ramsey 1969, as a Wald test with a robust covariance",
  },
  "jarque-bera": {
    title: "Jarque-Bera test",
    question: "Are the residuals shaped like a normal law?",
    rejected:
      "The residuals are skewed or have heavy tails: with few rows p-values are rough, with many it hardly matters.",
    notRejected: "The residuals are not shown to differ from a normal law.",
    source: "Jarque and Bera 1980",
  },
  chow: {
    title: "Chow test",
    question: "Are the coefficients the same before the break that is asked about and after it?",
    rejected:
      "The coefficients differ before and after the break asked about: one set of them does not describe the whole period.",
    notRejected: "No difference before and after the break asked about shows.",
    source: "Chow 1960",
  },
  "largest-chow": {
    title: "Largest Chow statistic",
    question: "Is there any row, among the middle 70 %, at which the coefficients change?",
    rejected: "The coefficients change somewhere: one set of them does not describe the whole period.",
    notRejected: "No change of the coefficients shows.",
    source: "Andrews 1993, p-value after Hansen 1997",
  },
  cusum: {
    title: "CUSUM test on the residuals",
    question: "Does the level of the outcome drift away from the fitted line?",
    rejected: "The outcome drifts away from the fitted line: its level changes over the period.",
    notRejected: "No drift away from the fitted line shows.",
    source: "Ploberger and Kramer 1992",
  },
  "cusum-recursive": {
    title: "CUSUM test on the forecast errors",
    question: "Does the regression on the earlier rows keep missing the later ones on one side?",
    rejected:
      "The regression on the earlier rows misses the later ones on one side: the coefficients change over the period.",
    notRejected: "No lasting miss on one side shows.",
    source: "Brown, Durbin and Evans 1975",
  },
};
