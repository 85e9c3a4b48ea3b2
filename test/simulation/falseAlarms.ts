import { covarianceOf } from "../../src/core/covariance/covarianceOf.ts";
import { lagsOf } from "../../src/core/covariance/lags.ts";
import { decide } from "../../src/core/decision/decide.ts";
import { rulesOf } from "../../src/core/decision/policies.ts";
import { autocorrelationOrder } from "../../src/core/decision/testOrder.ts";
import type { Policy } from "../../src/core/decision/wish.ts";
import type { Design } from "../../src/core/design/design.ts";
import { breuschGodfrey } from "../../src/core/diagnostics/breuschGodfrey.ts";
import { koenker } from "../../src/core/diagnostics/koenker.ts";
import { type TestOutcome, computed } from "../../src/core/diagnostics/outcome.ts";
import { whiteTest } from "../../src/core/diagnostics/white.ts";
import type { Fit } from "../../src/core/fit/fit.ts";
import { inferenceOf } from "../../src/core/inference/inferenceOf.ts";
import { type Random, randomFrom } from "../support/random.ts";
import { designOf, fitOf, throughTime } from "../support/referenceFit.ts";
import { must } from "../support/sheet.ts";
import type { Cell } from "./cells.ts";

interface Procedure {
  readonly policy: Policy;
  /** What `decide` is told of a test of spread. */
  readonly spreadAs: (outcome: TestOutcome) => TestOutcome;
}

/**
 * The Monte Carlo behind the policies held each of the textbook's two looks at spread, Koenker's and White's, to half
 * the level, which no policy of the tool does. So `decide` is given twice their p-values: 2p < 5 % is p < 2.5 %.
 */
const procedures = {
  "textbook, looks at half": { policy: "textbook", spreadAs: atHalfTheLevel },
  textbook: { policy: "textbook", spreadAs: (outcome) => outcome },
  careful: { policy: "careful", spreadAs: (outcome) => outcome },
} as const satisfies Readonly<Record<string, Procedure>>;

type ProcedureName = keyof typeof procedures;

const procedureNames = Object.keys(procedures) as readonly ProcedureName[];

function atHalfTheLevel(outcome: TestOutcome): TestOutcome {
  if (outcome.kind !== "computed") return outcome;
  const { figure } = outcome;
  return computed({ ...outcome, figure: { ...figure, pValue: Math.min(1, 2 * figure.pValue) } });
}

/** Two-sided, of the ratio of the slope tested. */
const level = 0.05;
/** The first driver, after the constant. */
const testedSlope = 1;

/** The share of draws in which each procedure calls the first slope real, which is zero. */
export function falseAlarms(
  cell: Cell,
  { draws, seed }: { draws: number; seed: number },
): Record<ProcedureName, number> {
  const random = randomFrom(seed);
  const alarms = { "textbook, looks at half": 0, textbook: 0, careful: 0 };
  for (let draw = 0; draw < draws; draw++) {
    const fit = fitOf(drawn(cell, random));
    const tests = { spread: [koenker(fit), whiteTest(fit)], followOn: followOnTests(fit) };
    for (const name of procedureNames) {
      if (pValueUnder(procedures[name], fit, tests) < level) alarms[name] += 1;
    }
  }
  return {
    "textbook, looks at half": alarms["textbook, looks at half"] / draws,
    textbook: alarms.textbook / draws,
    careful: alarms.careful / draws,
  };
}

function drawn({ rows, rowCount, driverCount, driver, errors }: Cell, random: Random): Design {
  const drivers = Array.from({ length: driverCount }, () => driver(rowCount, random));
  const order = rows === "time" ? throughTime(rowCount) : ({ kind: "cases" } as const);
  return designOf(errors(drivers, random), drivers, { order });
}

/** At the order that decides in the tool, 2 where there is no season; orders 1 and 4 change the rates by less than a point. */
const followOnTests = (fit: Fit): TestOutcome[] =>
  fit.design.order.kind === "time" ? [breuschGodfrey(fit, autocorrelationOrder(fit.design.order, fit.rowCount))] : [];

interface DecidingTests {
  readonly spread: readonly TestOutcome[];
  readonly followOn: readonly TestOutcome[];
}

function pValueUnder({ policy, spreadAs }: Procedure, fit: Fit, { spread, followOn }: DecidingTests): number {
  const { rowCount: rows, columnCount: columns, design } = fit;
  const lags = design.order.kind === "time" ? lagsOf(fit, rulesOf(policy).lags) : 0;
  const evidence = {
    tests: [...spread.map(spreadAs), ...followOn],
    order: design.order,
    sizes: { rows, columns, lags },
    testOrder: autocorrelationOrder(design.order, rows),
  };
  const wish = { policy, fixed: null, whiteVersion: "HC3", groupedVersion: "CR1", lags: null, adjusted: true } as const;
  const { errors, reference } = must(decide(evidence, wish)).inForce;
  const against = new Array<number>(columns).fill(0);
  return inferenceOf(fit, must(covarianceOf(fit, errors)), { reference, against, level }).pValue[testedSlope]!;
}
