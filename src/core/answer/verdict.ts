import type { Decision } from "../decision/decision.ts";
import type { ErrorsChoice } from "../covariance/choice.ts";
import type { Answer, DriverAnswer, RowsSummary } from "./answer.ts";
import type { Effect } from "./effects.ts";
import {
  capitalised,
  confidenceInWords,
  decimalsFor,
  listInWords,
  numberInWords,
  pValueInWords,
  shareInWords,
} from "./wording.ts";

type Facts = Pick<Answer, "outcome" | "observations" | "terms" | "fit" | "decision" | "lags" | "rows" | "options">;

/** The name a kind of standard errors goes by in sentences. */
export function errorsInWords(errors: ErrorsChoice, lags: number | null): string {
  switch (errors.kind) {
    case "classical":
      return "classical";
    case "white":
      return errors.degrees === undefined
        ? `White (${errors.version})`
        : `White (${errors.version}, degrees of freedom of Bell and McCaffrey)`;
    case "newey-west":
      return `Newey-West (${lags ?? 0} ${lags === 1 ? "lag" : "lags"})`;
    case "grouped":
      return `grouped (${errors.version})`;
  }
}

/** How much of the outcome the drivers account for, over which rows: "over 140 separate cases: together they account for ...". */
export function scopeInWords({ outcome, observations, terms, fit, rows }: Facts): string {
  const drivers = terms.filter((term) => term !== "constant");
  const share = shareInWords(fit.rSquared);
  const measure = fit.uncentred
    ? `R-squared about zero is ${share} (there is no constant)`
    : `together they account for ${share} of the variation in ${outcome}`;
  const subject = drivers.length === 1 ? measure.replace("together they account", "it accounts") : measure;
  return `over ${rowsInWords(rows, observations)}: ${subject}.`;
}

function rowsInWords(rows: RowsSummary, observations: number): string {
  const count = numberInWords(observations, 0);
  switch (rows.kind) {
    case "cases":
      return `${count} separate cases`;
    case "time": {
      const all = rows.gaps === 0 ? "" : ` of ${numberInWords(observations + rows.gaps, 0)}`;
      return `${count}${all} ${rows.period.unit}s from ${rows.first} to ${rows.last}`;
    }
    case "groups":
      return `${count} rows in ${[rows, ...(rows.second === null ? [] : [rows.second])]
        .map(({ groups, by }) => `${numberInWords(groups, 0)} groups by ${by}`)
        .join(" and ")}`;
  }
}

/** Which standard errors count, and why. */
export function choiceSentence({ decision, lags }: Facts): string {
  const inForce = errorsInWords(decision.inForce.errors, lags);
  if (decision.override === null) {
    return `${capitalised(decision.because)}, so the ${inForce} standard errors count.`;
  }
  const called = errorsInWords(decision.called.errors, lags);
  return `The ${inForce} standard errors were fixed by hand (reason: ${decision.override}). The evidence calls for ${called}: ${decision.because}.`;
}

export interface Spoken {
  readonly driver: Omit<DriverAnswer, "sentence">;
  /** Its term as a sentence begins with it. */
  readonly subject: string;
  readonly effect: Effect;
  readonly decision: Decision;
  readonly lags: number | null;
  readonly level: number;
  /** "all three kinds", "classical and White standard errors", ... */
  readonly agreeing: string;
  /** What keeps the coefficient from being read by itself, as a sentence; empty where nothing does. */
  readonly proviso: string;
}

/** The sentence about one driver: what it goes with, how sure, and whether that hangs on the choice of standard errors. */
export function driverSentence(spoken: Spoken): string {
  const { driver, level } = spoken;
  const differs = driver.pValue < level;
  const statement = driver.against === 0 ? aboutZero(spoken, differs) : aboutValue(spoken, differs);
  return [statement, firmnessSentence(spoken), spoken.proviso].filter((sentence) => sentence !== "").join(" ");
}

function aboutZero(spoken: Spoken, differs: boolean): string {
  const { driver, subject, effect, level } = spoken;
  const { amount, words } = effect;
  const [low, high] = [amount(driver.low), amount(driver.high)];
  const decimals = decimalsFor((high - low) / 2);
  const text = (value: number): string => numberInWords(Math.abs(value), decimals);
  const direction = driver.coefficient > 0 ? words.up : words.down;
  if (differs) {
    const [near, far] = driver.coefficient > 0 ? [low, high] : [high, low];
    const between = `between ${direction.near(text(near))} and ${direction.short(text(far))}`;
    return `${effect.step} goes with ${direction.say(text(amount(driver.coefficient)))} (${between}, ${confidenceInWords(level)}).`;
  }
  const p = pValueInWords(driver.pValue, level);
  const end = (value: number): string => (value < 0 ? words.down : words.up).short(text(value));
  const span = words.span(end(low), end(high));
  return `${subject}: no effect can be shown (${p}). ${effect.step} could go with ${span} (${confidenceInWords(level)}).`;
}

function aboutValue({ driver, subject, level }: Spoken, differs: boolean): string {
  const decimals = decimalsFor((driver.high - driver.low) / 2);
  const [coefficient, low, high] = [driver.coefficient, driver.low, driver.high].map((value) =>
    numberInWords(value, decimals),
  );
  const judged = differs ? "differs from" : "is compatible with";
  const p = pValueInWords(driver.pValue, level);
  return `${subject}: the coefficient ${coefficient ?? ""} (between ${low ?? ""} and ${high ?? ""}, ${confidenceInWords(level)}) ${judged} the tested value ${driver.against} (${p}).`;
}

/** Firm, or leaning and on what; where the kind in force says less than another, why it counts all the same. */
function firmnessSentence({ driver, decision, level, agreeing }: Spoken): string {
  const { firmness } = driver;
  if (firmness.kind === "firm") return `This is firm: ${agreeing} agree.`;
  const others = listInWords(firmness.on);
  const p = pValueInWords(firmness.farthest, level);
  if (driver.pValue < level) return `This leans on the choice: ${others} would say otherwise (up to ${p}).`;
  const because = decision.override === null ? decision.because : "the kind in force was fixed by hand";
  return `This leans on the choice: ${others} would have said otherwise (down to ${p}), but ${because}.`;
}
