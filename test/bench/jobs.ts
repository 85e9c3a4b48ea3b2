import { analyse } from "../../src/core/answer/analyse.ts";
import type { ErrorsChoice } from "../../src/core/covariance/choice.ts";
import { covarianceOf } from "../../src/core/covariance/covarianceOf.ts";
import { breuschGodfreyOrders } from "../../src/core/diagnostics/breuschGodfrey.ts";
import { koenker } from "../../src/core/diagnostics/koenker.ts";
import type { TestOutcome } from "../../src/core/diagnostics/outcome.ts";
import { whiteTest } from "../../src/core/diagnostics/white.ts";
import type { Fit } from "../../src/core/fit/fit.ts";
import { fitLeastSquares } from "../../src/core/fit/fitLeastSquares.ts";
import { type Size, fitOf, questionOf } from "./data.ts";
import { functionsJob } from "./functionsJob.ts";
import { reviewJob } from "./reviewJob.ts";
import { wholeColumnsJob } from "./wholeColumnsJob.ts";

/** What is timed, once its data stand ready. */
export type Run = () => void | Promise<void>;

export interface Job {
  /** The size that is measured whatever was asked for; null takes what was asked for. */
  readonly size: Size | null;
  readonly prepare: (size: Size) => Run;
}

const neweyWest: ErrorsChoice = { kind: "newey-west", lags: { kind: "careful" }, adjusted: true };
const prewhitened: ErrorsChoice = {
  kind: "newey-west",
  lags: { kind: "newey-west 1994", prewhiten: true },
  adjusted: true,
};

export const jobs: Readonly<Record<string, Job>> = {
  fit: ofFit(({ design }) => must(fitLeastSquares(design))),
  white: ofFit((fit) => must(covarianceOf(fit, { kind: "white", version: "HC3" }))),
  "newey-west": ofFit((fit) => must(covarianceOf(fit, neweyWest))),
  // Groups of ten rows: a group for every ten rows is the most that this size is likely to meet.
  grouped: ofFit((fit) => must(covarianceOf(inTens(fit), { kind: "grouped", version: "CR2" }))),
  prewhitened: ofFit((fit) => must(covarianceOf(fit, prewhitened))),
  koenker: ofFit((fit) => computed(koenker(fit))),
  "white-test": ofFit((fit) => computed(whiteTest(fit))),
  "breusch-godfrey": ofFit((fit) => breuschGodfreyOrders(fit, [2]).forEach(computed)),
  answer: {
    size: null,
    prepare: (size) => {
      const question = questionOf(size);
      return () => must(analyse(question, () => undefined));
    },
  },
  review: { size: { rows: 10_000, drivers: 6 }, prepare: reviewJob(["observations"]) },
  "review-rows-unsaid": { size: { rows: 10_000, drivers: 6 }, prepare: reviewJob([]) },
  functions: { size: { rows: 10_000, drivers: 5 }, prepare: functionsJob },
  "whole-columns": { size: { rows: 50_000, drivers: 5 }, prepare: wholeColumnsJob(null) },
  "whole-columns-0": { size: { rows: 50_000, drivers: 5 }, prepare: wholeColumnsJob(0) },
};

function ofFit(work: (fit: Fit) => void): Job {
  return {
    size: null,
    prepare: (size) => {
      const fit = fitOf(size);
      // A copy remembers nothing: what is kept for a fit is kept for the object.
      return () => work({ ...fit });
    },
  };
}

function inTens(fit: Fit): Fit {
  const groups = Int32Array.from({ length: fit.rowCount }, (_, row) => Math.floor(row / 10));
  const labels = Array.from({ length: Math.ceil(fit.rowCount / 10) }, (_, group) => String(group));
  const order = { kind: "groups", by: "Ten", groups, labels, second: null, positions: null } as const;
  return { ...fit, design: { ...fit.design, order } };
}

function must(result: { readonly ok: boolean }): void {
  if (!result.ok) throw new Error("The job met a problem.");
}

function computed({ kind, test }: TestOutcome): void {
  if (kind !== "computed") throw new Error(`${test} does not apply.`);
}
