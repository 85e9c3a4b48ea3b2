import type { BookReview, ClaimReview } from "../../src/core/review/claimReview.ts";
import type { Expected } from "./fault.ts";
import type { PlantedBook } from "./books.ts";

/** Whether a review says of a book what was planted there, no more and no less; else what it says. */
export function judge({ kind, expected }: Pick<PlantedBook, "kind" | "expected">, review: ClaimReview): string | null {
  if (kind === "sound") return soundly(review);
  const hypotheses = expected.flatMap((one) => (one.kind === "explanation" ? [one.hypothesis] : []));
  if (hypotheses.length > 0 && !isExplained(review, hypotheses))
    return `not explained: ${explanations(review).join(" | ") || "nothing"}`;
  const missed = expected.filter((one) => !isSaid(one, review));
  return missed.length === 0
    ? null
    : `not said: ${JSON.stringify(missed)} but ${JSON.stringify(review.errors?.kinds.slice(0, 3))}, ${review.findings.map(({ code }) => code).join()}`;
}

/** The same of a whole workbook: the one report in it, with what is said of its sheets. */
export function judgeBook(planted: PlantedBook, { claims, craft }: BookReview): string | null {
  const [review, ...others] = claims;
  if (review === undefined || others.length > 0) return `${claims.length} reports found`;
  const expected = planted.expectedInBook ?? [];
  return judge({ ...planted, expected }, { ...review, findings: [...review.findings, ...craft] });
}

function soundly({ findings, compared, verdict }: ClaimReview): string | null {
  const wrong = compared.filter(({ agrees }) => !agrees);
  if (wrong.length > 0) return `${wrong.length} numbers are said to differ`;
  return findings.some(({ rank }) => rank === "changes the conclusion") ? verdict : null;
}

const explanations = ({ explanation, alternatives }: ClaimReview): string[] =>
  (explanation === null ? [] : [explanation, ...alternatives]).map((one) => one.hypotheses.toSorted().join("+"));

const isExplained = (review: ClaimReview, hypotheses: readonly string[]): boolean =>
  explanations(review).includes(hypotheses.toSorted().join("+"));

function isSaid(expected: Expected, { errors, findings }: ClaimReview): boolean {
  switch (expected.kind) {
    case "explanation":
      return true;
    case "errors":
      return errors?.kinds.some((kind) => kind === expected.name || kind.startsWith(`${expected.name},`)) === true;
    case "finding":
      return findings.some(({ code }) => code === expected.code);
  }
}
