import type { Answer } from "../../answer/answer.ts";
import { pValueOf } from "../../inference/ratioLaw.ts";
import type { Consequence } from "../claimReview.ts";
import type { ErrorsUsed } from "./errorMatch.ts";
import type { Blame } from "./findings.ts";
import { type Reported, type Standing, contradicts, level, reportedStanding, standingOf } from "./standings.ts";
import { type Bench, type Trial, allKinds, trial } from "./trial.ts";
import type { Intended } from "./intended.ts";
import { answeredInWords, reportedInWords } from "./words.ts";

export interface Drawn {
  readonly consequences: readonly Consequence[];
  readonly blame: Blame;
}

export interface Drawing {
  readonly intended: Intended;
  readonly answer: Answer;
  /** The regression that reproduces the report, or the one as claimed; null where it cannot be fitted. */
  readonly made: Trial | null;
  /** Whether the evidence allows the kind of standard errors that was reported; null where none was. */
  readonly allowed: boolean | null;
}

/**
 * What was concluded of each driver, what should be, and which part of the work makes the difference: the data and the
 * model, where the conclusion is another one already under the reported kind of standard errors; else the kind; or its
 * version, lags and law within a kind that is allowed, which is no fault of the work but is said.
 */
export function consequencesOf(bench: Bench, drawing: Drawing): Drawn {
  const { answer, made } = drawing;
  const { drivers, constant } = bench.claim;
  const before = underReportedErrors(bench, drawing);
  const degrees = made?.fit.degreesOfFreedom ?? answer.fit.degreesOfFreedom;
  const boundsAt = bench.claim.level ?? made?.used?.level ?? level;
  const drawn = drivers.flatMap(({ name: driver }, term) => {
    const found = answer.drivers[term + (constant ? 1 : 0)];
    if (found === undefined) return [];
    const reported = reportedStanding({ ...bench.claim, level: boundsAt }, term, degrees);
    const should = standingOf(found.coefficient, found.pValue);
    const fault = faultIn({ reported, should, before: before?.[term] ?? null, allowed: drawing.allowed });
    const words = { asReported: reportedInWords(reported), asItShouldBe: answeredInWords(should, found) };
    return [{ fault, consequence: { driver, ...words, changes: fault.includes("data") || fault.includes("errors") } }];
  });
  const blamed = (part: Fault): readonly string[] =>
    drawn.filter(({ fault }) => fault.includes(part)).map(({ consequence }) => consequence.driver);
  return {
    consequences: drawn.map(({ consequence }) => consequence),
    blame: { data: blamed("data"), errors: blamed("errors"), version: blamed("version") },
  };
}

type Fault = keyof Blame;

interface Compared {
  readonly reported: Reported;
  readonly should: Standing;
  /** Under the reported kind of standard errors on all rows; null where it cannot be had. */
  readonly before: Standing | null;
  readonly allowed: boolean | null;
}

/** Which parts of the work make the conclusion another one; none where it stays. */
function faultIn({ reported, should, before, allowed }: Compared): readonly Fault[] {
  if (!contradicts(reported, should)) return [];
  const byData = before !== null && contradicts(reported, before);
  const byErrors = before !== should && allowed !== true;
  if (!byData && !byErrors) return ["version"];
  return [...(byData ? (["data"] as const) : []), ...(byErrors ? (["errors"] as const) : [])];
}

/** What all rows would have said under the standard errors that were reported; null where they cannot be had. */
function underReportedErrors(bench: Bench, { intended, made }: Drawing): readonly Standing[] | null {
  const fitted = trial(bench, intended.recipe);
  if (fitted === null) return null;
  const used = made?.used ?? fitted.used;
  for (const kind of allKinds(bench, fitted)) {
    if (used !== null && kind.name !== used.kind.name) continue;
    const law = kind.laws.find(({ name }) => name === used?.law.name) ?? kind.laws[0]!;
    return standingsUnder(bench, fitted, { kind, law, level: 0.05 });
  }
  return null;
}

function standingsUnder({ claim }: Bench, { fit }: Trial, { kind, law }: ErrorsUsed): readonly Standing[] {
  const first = claim.constant ? 1 : 0;
  return claim.drivers.map((_, term) => {
    const place = term + first;
    const coefficient = fit.coefficients[place]!;
    return standingOf(coefficient, pValueOf(coefficient / kind.standardErrors[place]!, law.references[place]!));
  });
}
