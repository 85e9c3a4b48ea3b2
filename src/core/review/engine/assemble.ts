import type { Answer } from "../../answer/answer.ts";
import { messageOf } from "../../problem/messages.ts";
import type { Result } from "../../problem/result.ts";
import type { ClaimReview, Comparison, ErrorsFound, Explanation } from "../claimReview.ts";
import { agrees } from "./agreement.ts";
import { levelInstead } from "./boundsLevel.ts";
import { type ConstantLeftOut, withConstantSaid } from "./constantLeftOut.ts";
import type { Drawn } from "./consequences.ts";
import { findingsOf } from "./findings.ts";
import type { Intended } from "./intended.ts";
import { underSameErrors } from "./sameErrors.ts";
import type { Searched } from "./search.ts";
import { triedInWords } from "./triedWords.ts";
import type { Bench, Trial } from "./trial.ts";
import { boundsOfAnother, verdictInWords } from "./words.ts";

/** Everything that was found out about a claim. */
export interface Parts {
  readonly bench: Bench;
  readonly claimed: Trial | null;
  readonly made: Trial | null;
  readonly searched: Searched | null;
  readonly explanations: readonly Explanation[];
  readonly errors: ErrorsFound | null;
  readonly answered: Result<Answer>;
  readonly drawn: Drawn;
  readonly intended: Intended;
  /** Null for a regression that has a constant, or whose report says itself that it has none. */
  readonly constant: ConstantLeftOut | null;
}

/** The review of a claim from its parts. */
export function assemble(parts: Parts): ClaimReview {
  const { bench, claimed, made, searched, explanations, errors, answered, drawn, intended, constant } = parts;
  const answer = answered.ok ? answered.value : null;
  const compared = comparedAsClaimed(bench, claimed, made);
  const [explanation = null, ...alternatives] = explanations;
  const errorsUnknown = explanation === null ? kindsInVain(claimed) : null;
  const boundsAt = explanation === null ? levelInstead(bench, claimed) : null;
  const noAnswer = answered.ok ? null : messageOf(answered.problem);
  const { consequences, blame } = drawn;
  const facts = {
    boundsAt,
    constant,
    compared,
    explanation,
    alternatives,
    errors,
    errorsUnknown,
    answer,
    noAnswer,
    consequences,
    blame,
  };
  return {
    claim: bench.claim,
    compared,
    explanation,
    alternatives,
    tried: explanation === null && searched !== null ? triedInWords(searched) : [],
    errors,
    consequences: constant === null ? consequences : withConstantSaid(consequences, constant),
    answer,
    findings: findingsOf({ bench, intended, ...facts }),
    verdict: verdictInWords({ ...facts, ...verdictFacts(parts, facts) }),
  };
}

type ForVerdict = Pick<ClaimReview, "compared" | "explanation" | "alternatives"> & {
  readonly errorsUnknown: number | null;
  readonly boundsAt: number | null;
};

const verdictFacts = (
  { bench, intended, constant }: Parts,
  { compared, explanation, alternatives, errorsUnknown, boundsAt }: ForVerdict,
) => ({
  compared: compared.length,
  disagreeing: compared.filter((one) => !one.agrees).length,
  explanation: explanation?.sentence ?? null,
  alternatives: alternatives.length,
  errorsUnknown: errorsUnknown !== null,
  otherLevel: boundsAt === null ? null : boundsOfAnother(boundsAt, bench.claim.level ?? boundsAt),
  withConstant: constant?.turned.map(({ driver }) => driver) ?? [],
  beyond: intended.beyond.length > 0,
});

/** How many kinds were tried where all else comes out of the cells and none of them gives the rest; null elsewhere. */
const kindsInVain = (claimed: Trial | null): number | null =>
  claimed !== null && claimed.plainAgree && !claimed.errorsAgree ? claimed.errorsTried : null;

/** Against the cells exactly as claimed, under the standard errors that were found to be the reported ones. */
function comparedAsClaimed({ claim, ...bench }: Bench, claimed: Trial | null, made: Trial | null): Comparison[] {
  if (claimed === null) return claim.reported.map((reported) => ({ reported, recomputed: null, agrees: false }));
  const values = underSameErrors({ claim, ...bench }, claimed, made?.used ?? null);
  return claim.reported.map((reported, index) => {
    const recomputed = values[index] ?? null;
    return { reported, recomputed, agrees: recomputed !== null && agrees(reported, recomputed) };
  });
}
