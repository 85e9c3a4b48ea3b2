import { analyse } from "../answer/analyse.ts";
import type { Answer } from "../answer/answer.ts";
import type { Question, Report } from "../answer/question.ts";
import type { Result } from "../problem/result.ts";
import type { Claim } from "./claim.ts";
import type { ClaimReview, Explanation } from "./claimReview.ts";
import { assemble } from "./engine/assemble.ts";
import { saidOf } from "./engine/changeWords.ts";
import { type Drawing, type Drawn, consequencesOf } from "./engine/consequences.ts";
import { type ConstantLeftOut, constantLeftOut, leavesConstantOut } from "./engine/constantLeftOut.ts";
import { errorsFound, fittingKinds } from "./engine/errorsFound.ts";
import { frameOf } from "./engine/frame.ts";
import { type Intended, intendedOf, questionFor } from "./engine/intended.ts";
import { orderingsOf } from "./engine/orderings.ts";
import { claimedRecipe } from "./engine/recipe.ts";
import { type SearchStep, search } from "./engine/search.ts";
import { type Bench, agreesThroughout, trial } from "./engine/trial.ts";

/**
 * Reviews one regression that someone reported: fits it as claimed, compares every number to its digits, searches for
 * what explains those that differ, says which standard errors were reported and whether the evidence allows them, and
 * what the conclusions should have been.
 * @returns never a Problem: what cannot be had is said in the review.
 */
export function reviewClaim(claim: Claim, report: Report): ClaimReview {
  const steps = reviewing(claim);
  for (;;) {
    const next = steps.next();
    if (next.done === true) return next.value;
    report(next.value.step, next.value.share);
  }
}

/** The same in steps of a few hundredths of a second: stop asking for more, and it is cancelled. */
export function* reviewing(claim: Claim): Generator<SearchStep, ClaimReview> {
  yield { step: "Fitting as claimed", share: 0 };
  const bench = benchOf(claim);
  const claimed = bench.frame.count > 0 ? trial(bench, bench.claimed) : null;
  const searched =
    claimed !== null && agreesThroughout(claimed) ? null : yield* within(search(bench, claimed), 0.05, 0.75);
  const found = searched?.found ?? [];
  const made = found[0]?.trial ?? claimed;
  yield { step: "Which standard errors", share: 0.78 };
  const kinds = made === null ? [] : yield* paused(fittingKinds(bench, made));
  yield { step: "What the evidence calls for", share: 0.85 };
  const intended = intendedOf(bench);
  const answered = answerTo(questionFor(bench, intended));
  const answer = answered.ok ? answered.value : null;
  const errors = errorsFound(kinds, answer);
  const drawn = drawnFrom(bench, { intended, made, allowed: errors?.allowed ?? null }, answer);
  const explanations = found.map(({ changes, trial: { compared } }): Explanation => {
    const hypotheses = changes.map(({ facts }) => facts.hypothesis);
    return { hypotheses, ...saidOf(changes, bench.frame), compared };
  });
  const constant = constantOf(bench, intended, answer);
  return assemble({ bench, claimed, made, searched, explanations, errors, answered, drawn, intended, constant });
}

function constantOf(bench: Bench, intended: Intended, answer: Answer | null): ConstantLeftOut | null {
  if (!leavesConstantOut(bench.claim)) return null;
  const { recipe } = intended;
  const withIt = { ...intended, recipe: { ...recipe, model: { ...recipe.model, constant: true } } };
  const answered = answerTo(questionFor(bench, withIt));
  return constantLeftOut(bench.claim, answer, answered.ok ? answered.value : null);
}

function drawnFrom(bench: Bench, drawing: Omit<Drawing, "answer">, answer: Answer | null): Drawn {
  if (answer === null) return { consequences: [], blame: { data: [], errors: [], version: [] } };
  return consequencesOf(bench, { ...drawing, answer });
}

function benchOf(claim: Claim): Bench {
  const frame = frameOf(claim);
  return { claim, frame, claimed: claimedRecipe(frame, claim.constant), orderings: orderingsOf(claim) };
}

/** A pause wherever the kinds make one. */
function* paused<T>(steps: Generator<null, T>): Generator<SearchStep, T> {
  for (;;) {
    const next = steps.next();
    if (next.done === true) return next.value;
    yield { step: "Which standard errors", share: 0.8 };
  }
}

function* within<T>(steps: Generator<SearchStep, T>, from: number, to: number): Generator<SearchStep, T> {
  for (;;) {
    const next = steps.next();
    if (next.done === true) return next.value;
    yield { ...next.value, share: from + (to - from) * next.value.share };
  }
}

/** Where the time or the groups beside the data cannot be used, the rows are taken for separate cases. */
function answerTo(question: Question): Result<Answer> {
  const quiet: Report = () => undefined;
  const answer = analyse(question, quiet);
  const { model } = question;
  if (answer.ok || model.rows.kind === "cases") return answer;
  return analyse({ ...question, model: { ...model, rows: { kind: "cases" } } }, quiet);
}
