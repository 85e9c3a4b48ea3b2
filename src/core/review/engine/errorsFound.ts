import type { Answer } from "../../answer/answer.ts";
import { confidenceInWords } from "../../answer/wording.ts";
import type { ErrorsChoice } from "../../covariance/choice.ts";
import type { ErrorsFound } from "../claimReview.ts";
import { type ErrorsUsed, matchesOf } from "./errorMatch.ts";
import { type Bench, type Trial, allKinds, reportedErrors } from "./trial.ts";
import { level as usualLevel } from "./standings.ts";
import { errorsSentence } from "./words.ts";

/** Every kind of standard errors that gives the reported figures, simplest first; pauses after each that is tried. */
export function* fittingKinds(
  bench: Bench,
  { recipe, fit, errorsAgree }: Trial,
): Generator<null, readonly ErrorsUsed[]> {
  const report = reportedErrors(bench.claim);
  if (report.reported.length === 0 || !errorsAgree) return [];
  const fitted = { coefficients: fit.coefficients, model: recipe.model };
  const found: ErrorsUsed[] = [];
  for (const kind of allKinds(bench, { recipe, fit })) {
    const [match] = matchesOf(kind, report, fitted);
    if (match !== undefined) found.push(match);
    yield null;
  }
  return found;
}

/** @returns null where no kind gives the reported figures, or none was reported. */
export function errorsFound(kinds: readonly ErrorsUsed[], answer: Answer | null): ErrorsFound | null {
  if (kinds.length === 0) return null;
  const allowed = answer === null || kinds.some(({ kind }) => isAllowed(kind.kind, answer.decision.called.errors.kind));
  const named = { kinds: [...new Set(kinds.map(nameOf))], allowed };
  return { ...named, sentence: errorsSentence(named, answer) };
}

const nameOf = ({ kind, law, level }: ErrorsUsed): string =>
  [kind.name, law.name, level === usualLevel ? "" : `bounds at ${confidenceInWords(level)}`]
    .filter((part) => part !== "")
    .join(", ");

type Kind = ErrorsChoice["kind"];

/** What each call of the evidence leaves room for: more robust kinds than called for are no fault. */
const allowedUnder: Readonly<Record<Kind, readonly Kind[]>> = {
  classical: ["classical", "white", "newey-west", "grouped"],
  white: ["white", "newey-west", "grouped"],
  "newey-west": ["newey-west"],
  grouped: ["grouped"],
};

const isAllowed = (reported: Kind, called: Kind): boolean => allowedUnder[called].includes(reported);
