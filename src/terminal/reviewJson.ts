import type { ClaimedLine } from "../core/review/claim.ts";
import type { BookReview, ClaimReview, Comparison, Explanation } from "../core/review/claimReview.ts";
import { quantityInWords } from "../core/review/quantityWords.ts";
import { namesOfDrivers } from "../core/review/reviewTables.ts";
import { changesConclusion, gravestFirst, rangeOfLine, titleOf } from "../core/review/reviewWords.ts";
import { answerJson } from "./answerJson.ts";

/** A review as the object that `--json` prints: full double precision, stable keys, the cells as addresses. */
export const reviewJson = (review: BookReview): object => ({
  changesConclusion: changesConclusion(review),
  regressions: review.claims.map(claimJson),
  craft: gravestFirst(review.craft),
  unread: review.unread,
});

function claimJson({ claim, answer, compared, explanation, alternatives, ...said }: ClaimReview): object {
  const { place, origin, outcome, drivers, constant, assumed = [] } = claim;
  const comparisonJson = ({ reported, recomputed, agrees }: Comparison): object => ({
    number: quantityInWords(reported.quantity, namesOfDrivers(claim)),
    quantity: reported.quantity,
    cell: reported.cell,
    shown: reported.shown,
    reported: reported.value,
    halfUnit: reported.halfUnit,
    recomputed,
    agrees,
  });
  const explanationJson = ({ hypotheses, sentence, cells, compared: under }: Explanation): object => ({
    ...{ hypotheses, sentence, cells },
    numbers: under.map(comparisonJson),
  });
  return {
    ...{ place, origin, title: titleOf(claim), verdict: said.verdict },
    ...{ outcome: lineJson(outcome), drivers: drivers.map(lineJson), constant, assumed },
    findings: gravestFirst(said.findings),
    numbers: compared.map(comparisonJson),
    explanation: explanation === null ? null : explanationJson(explanation),
    alternatives: alternatives.map(explanationJson),
    tried: said.tried,
    errors: said.errors,
    consequences: said.consequences,
    answer: answer === null ? null : answerJson(answer),
  };
}

const lineJson = (line: ClaimedLine): object => ({ name: line.name, range: rangeOfLine(line), form: line.form });
