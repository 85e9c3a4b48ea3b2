import type { Answer } from "../../answer/answer.ts";
import type { Claim } from "../claim.ts";
import type { Comparison, Consequence } from "../claimReview.ts";
import type { Finding } from "../finding.ts";
import { agrees } from "./agreement.ts";
import { farthest, finding, rankFor } from "./oneFinding.ts";
import { contradicts, level, reportedStanding, standingOf } from "./standings.ts";
import { answeredInWords, constantWords, toDo } from "./words.ts";

/** What a constant would change that a formula leaves out. */
export interface ConstantLeftOut {
  /** The same question with a constant; null where it cannot be answered. */
  readonly answer: Answer | null;
  /** The drivers whose conclusion is another one with it, and what that is. */
  readonly turned: readonly { readonly driver: string; readonly words: string }[];
}

/** A constant is left out of a formula by a word that is easily overlooked; a report that is typed in says so itself. */
export const leavesConstantOut = ({ origin, constant }: Claim): boolean => origin.kind === "formula" && !constant;

/**
 * What it does to each driver's conclusion: compared are the answers with and without it, each under the standard errors
 * that the evidence calls for, and what the report says where they differ.
 */
export function constantLeftOut(claim: Claim, without: Answer | null, withIt: Answer | null): ConstantLeftOut {
  if (without === null || withIt === null) return { answer: withIt, turned: [] };
  const turned = claim.drivers.flatMap(({ name: driver }, term) => {
    const [plain, other] = [without.drivers[term], withIt.drivers[term + 1]];
    if (plain === undefined || other === undefined) return [];
    const [before, after] = [plain, other].map(({ coefficient, pValue }) => standingOf(coefficient, pValue));
    const reported = reportedStanding(claim, term, without.fit.degreesOfFreedom);
    const isTurned = before !== after && contradicts(reported, after!);
    return isTurned ? [{ driver, words: answeredInWords(after!, other) }] : [];
  });
  return { answer: withIt, turned };
}

/** What follows for each driver, with what a constant makes of it. */
export const withConstantSaid = (consequences: readonly Consequence[], { turned }: ConstantLeftOut): Consequence[] =>
  consequences.map((one) => {
    const other = turned.find(({ driver }) => driver === one.driver);
    if (other === undefined) return one;
    return { ...one, asItShouldBe: constantWords.beside(one.asItShouldBe, other.words), changes: true };
  });

/** Ranked by what a constant does: to a conclusion, to the numbers where it is shown to differ from zero, or to neither. */
export function constantFinding(claim: Claim, { answer, turned }: ConstantLeftOut): Finding {
  const constant = answer?.drivers[0] ?? null;
  const isShown = constant === null || constant.pValue < level;
  const drivers = turned.map(({ driver }) => driver);
  return finding({
    rank: rankFor(drivers, isShown ? "changes a number" : "worth knowing"),
    code: "no-constant",
    cells: [claim.place],
    ...farthest(answer === null ? [] : comparedWith(claim, answer)),
    what: [
      constantWords.leftOut(claim.outcome.name),
      ...(constant === null ? [] : [constantWords.withIt(constant.pValue, drivers)]),
    ].join(" "),
    toDo: toDo.noConstant,
  });
}

/** The reported coefficients beside those with a constant. */
const comparedWith = ({ reported }: Claim, { drivers }: Answer): Comparison[] =>
  reported.flatMap((number) => {
    const { quantity } = number;
    if (quantity.kind !== "coefficient" || quantity.term === null) return [];
    const recomputed = drivers[quantity.term + 1]?.coefficient ?? null;
    return [{ reported: number, recomputed, agrees: recomputed === null || agrees(number, recomputed) }];
  });
